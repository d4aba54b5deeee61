import type { Policy } from '#engine';
import { escapeText } from '../../charts/text.ts';
import { partsMarkup } from '../../components/resultRow.ts';
import { fetchJson } from '../page/fetchJson.ts';
import type { ComparedComplex } from './compareData.ts';
import { type Picked, pickedMarkup } from './pickedMarkup.ts';
import { type Offer, offers } from './offers.ts';

const MOST = 6;

/** Starts the part that compares picked measurements. The address holds them: ?with=cr-am6/aq-295&with=cr-en3/aq-295. */
export async function startPicked(part: HTMLElement): Promise<void> {
  const input = part.querySelector('input')!;
  const [status, offered, chips, answer] = ['status', 'offers', 'chips', 'answer'].map((name) => part.querySelector<HTMLElement>(`[data-place=${name}]`)!) as [HTMLElement, HTMLElement, HTMLElement, HTMLElement];
  const floor = JSON.parse(part.dataset['floor']!) as Policy['differentialFloor'];
  const loaded = new Map<string, Promise<ComparedComplex>>();
  const load = (id: string): Promise<ComparedComplex> => {
    const known = loaded.get(id) ?? fetchJson<ComparedComplex>(`data/compare/${encodeURIComponent(id)}.json`);
    loaded.set(id, known);
    known.catch(() => loaded.delete(id));
    return known;
  };
  const picks = (): readonly string[] => [...new Set(new URL(location.href).searchParams.getAll('with'))].slice(0, MOST);

  const resolve = async (pick: string): Promise<Omit<Picked, 'key'> | null> => {
    const [id = '', measurement] = pick.split('/');
    try {
      const complex = await load(id);
      const found = complex.measurements.find((one) => one.id === measurement) ?? (measurement === undefined ? complex.measurements[0] : undefined);
      return found === undefined ? null : { formula: complex.formula, measurement: found };
    } catch {
      return null;
    }
  };

  let turn = 0;
  const show = async (): Promise<void> => {
    const mine = ++turn;
    const wanted = picks();
    const found = await Promise.all(wanted.map(resolve));
    if (mine !== turn) return;
    const known = wanted.flatMap((pick, index) => found[index] === null ? [] : [{ pick, ...found[index]! }]);
    const picked: readonly Picked[] = known.map((one, index) => ({ key: String.fromCharCode(97 + index), formula: one.formula, measurement: one.measurement }));
    const missing = wanted.filter((_, index) => found[index] === null);
    chips.innerHTML = known.map(({ pick, formula, measurement }, index) =>
      `<li><i>${picked[index]!.key}</i> <span class="formula">${partsMarkup(formula.parts)}</span>, ${escapeText(measurement.conditions)} <button type="button" data-remove="${escapeText(pick)}" aria-label="Take away ${escapeText(`${formula.text} ${measurement.id}`)}">take away</button></li>`).join('');
    status.textContent = missing.length > 0 ? `Not in the collection: ${missing.join(', ')}.` : picked.length === 0 ? 'Nothing picked yet: two to six can be compared.' : `${picked.length} picked${picked.length >= MOST ? ', which is the most' : ''}.`;
    answer.innerHTML = picked.length === 0 ? '' : pickedMarkup(picked, floor);
  };

  const change = (next: readonly string[]): void => {
    const address = new URL(location.href);
    address.searchParams.delete('with');
    for (const pick of next) address.searchParams.append('with', pick);
    history.pushState(null, '', address);
    void show();
  };

  const offer = async (): Promise<void> => {
    const query = input.value;
    const list = query.trim() === '' ? [] : await offers(query);
    if (input.value !== query) return;
    const taken = picks();
    offered.innerHTML = list.filter(({ pick }) => !taken.includes(pick)).map(offerMarkup).join('') || (query.trim() === '' ? '' : '<li>Nothing found.</li>');
  };

  part.addEventListener('click', (event) => {
    const button = event.target instanceof Element ? event.target.closest<HTMLElement>('button') : null;
    const { add, remove } = button?.dataset ?? {};
    if (remove !== undefined) {
      change(picks().filter((pick) => pick !== remove));
      input.focus();
    } else if (add !== undefined && picks().length < MOST) {
      input.value = '';
      offered.replaceChildren();
      change([...picks(), add]);
      input.focus();
    }
  });
  input.addEventListener('input', () => { void offer(); });
  part.querySelector('form')?.addEventListener('submit', (event) => event.preventDefault());
  addEventListener('popstate', () => { void show(); });
  // Typed while the script was on its way.
  if (input.value !== '') void offer();
  await show();
}

const offerMarkup = ({ pick, formula, conditions }: Offer): string =>
  `<li><button type="button" data-add="${escapeText(pick)}">add</button> <span class="formula">${partsMarkup(formula.parts)}</span>, ${escapeText(conditions)}</li>`;
