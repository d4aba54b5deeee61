import { predict } from '../../../scripts/predict/prediction.ts';
import { showFaults } from '../page/faults.ts';
import { type PredictForm, readAsked, stepped } from './asked.ts';
import { predictionMarkup } from './shown.ts';

const FIELDS = ['ion', 'geometry', 'spin', 'Delta', 'B', 'C', 'ratio'] as const satisfies readonly (keyof PredictForm)[];

/** Starts the predict page: fields, address and answer stay in step. */
function startPredict(form: HTMLFormElement, answer: HTMLElement, status: HTMLElement): void {
  const field = (name: string): HTMLInputElement | HTMLSelectElement => form.elements.namedItem(name) as HTMLInputElement | HTMLSelectElement;
  const typed = (): PredictForm => Object.fromEntries(FIELDS.map((name) => [name, field(name).value])) as unknown as PredictForm;

  const show = (): void => {
    const { asked, faults } = readAsked(typed());
    showFaults(form, faults);
    if (asked === null) {
      status.textContent = faults.length > 0 ? 'No prediction: see the fields marked above.' : 'Give an ion, Δ and B.';
      answer.replaceChildren();
      return;
    }
    const prediction = predict({ electrons: asked.ion.electrons, geometry: asked.geometry, multiplicity: asked.multiplicity, delta: asked.delta, racahB: asked.racahB, racahC: asked.racahC });
    const allowed = prediction.transitions.filter(({ spinAllowed }) => spinAllowed).length;
    status.textContent = `${allowed} spin-allowed and ${prediction.transitions.length - allowed} spin-forbidden bands.`;
    answer.innerHTML = predictionMarkup(asked, prediction);
  };

  const write = (): void => {
    const address = new URL(location.href);
    const now = typed();
    for (const name of FIELDS) {
      if (now[name].trim() === '') address.searchParams.delete(name);
      else address.searchParams.set(name, now[name]);
    }
    history.replaceState(null, '', address);
  };

  // An address without fields opens with the example that the build wrote into them.
  const read = (): void => {
    const { searchParams } = new URL(location.href);
    form.reset();
    if (FIELDS.some((name) => searchParams.has(name))) for (const name of FIELDS) field(name).value = searchParams.get(name) ?? (name === 'geometry' ? 'octahedral' : '');
    show();
  };

  form.addEventListener('submit', (event) => event.preventDefault());
  form.addEventListener('input', () => { write(); show(); });
  form.addEventListener('keydown', (event) => {
    const input = event.target;
    if (!(input instanceof HTMLInputElement) || (event.key !== 'ArrowUp' && event.key !== 'ArrowDown')) return;
    const next = stepped(input.name, input.value, (event.key === 'ArrowUp' ? 1 : -1) * (event.shiftKey ? 10 : 1));
    if (next === null) return;
    event.preventDefault();
    input.value = next;
    write();
    show();
  });
  addEventListener('popstate', read);
  form.hidden = false;
  read();
}

const form = document.querySelector<HTMLFormElement>('#predict');
const answer = document.getElementById('answer');
const status = document.getElementById('answer-status');
if (form && answer && status) startPredict(form, answer, status);
