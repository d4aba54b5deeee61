import { type Reading, levelNames, parseIon, recordText, shownLabel, suggestedId, suggestedMeasurementId } from '#engine';
import { fittedGeometry } from '../../../scripts/content/spin.ts';
import { showFaults } from '../page/faults.ts';
import { fetchJson } from '../page/fetchJson.ts';
import type { ComparedComplex, ComparedMeasurement, PackedCollection } from './compareData.ts';
import { formFields } from './formFields.ts';
import { type ReadForm, readForm } from './readForm.ts';
import type { Placer } from './placing.ts';
import { readingMarkup, readingStatus } from './readingMarkup.ts';
import type { Reader } from './reckon.ts';
import { type TypedForm, emptyForm, formOfQuery, formOfRecord, formQuery, holdsForm, recordOfForm } from './typedForm.ts';

/** The measurement whose bands are read otherwise. */
interface Original {
  readonly complex: string;
  readonly published: ComparedMeasurement;
  readonly form: TypedForm;
}

/** How long typing must rest before the place is looked for, and the address written, ms. */
const REST = 180;

const notFetched = (what: string, error: unknown): string => `${what} could not be loaded (${error instanceof Error ? error.message : 'unknown reason'}). Reload the page to try again.`;

/** Starts the part where bands are typed: the engine reads them at every keystroke, and places them when typing rests. */
export async function startTyped(part: HTMLElement): Promise<void> {
  const form = part.querySelector('form')!;
  const places = Object.fromEntries(['status', 'reading', 'placement', 'record', 'about'].map((name) => [name, part.querySelector<HTMLElement>(`[data-place=${name}]`)!])) as Record<'status' | 'reading' | 'placement' | 'record' | 'about', HTMLElement>;
  const fields = formFields(form);
  const [packed, original] = await Promise.all([fetchJson<PackedCollection>('data/compare.json'), fetchOriginal()]);
  let readMeasurement: Reader | null = null;
  let place: Placer | null = null;
  const abbreviations = packed.ligands.flatMap(({ abbreviation }) => abbreviation ?? []);
  let resting: ReturnType<typeof setTimeout> | undefined;
  let latest: TypedForm | null = null;

  const show = (): void => {
    const typed = fields.typed();
    latest = typed;
    showDetails(form);
    offerTerms(typed);
    const read = readForm(typed, packed);
    showFaults(form, read.faults);
    form.querySelector<HTMLInputElement>('[name=formula]')!.placeholder = read.formula ?? '[Cr(NH3)6]3+';
    const { measurement } = read;
    clearTimeout(resting);
    if (measurement === null) {
      places.status.textContent = read.faults.length > 0 ? 'Not read: see the fields marked.' : 'Give an ion and at least one band.';
      for (const name of ['reading', 'placement', 'record'] as const) places[name].replaceChildren();
      resting = setTimeout(() => writeAddress(typed), REST);
      return;
    }
    if (readMeasurement === null) {
      places.status.textContent = 'The engine is on its way.';
      fetchReader();
      return;
    }
    const result = readMeasurement(measurement);
    places.status.textContent = readingStatus(result.chosen);
    places.reading.innerHTML = readingMarkup(result, measurement, original?.published ?? null);
    resting = setTimeout(() => {
      writeAddress(typed);
      showPlace(typed, read, result.chosen).catch((error: unknown) => {
        places.placement.textContent = notFetched('The place', error);
      });
    }, REST);
  };

  let fetching = false;
  const fetchReader = (): void => {
    if (fetching) return;
    fetching = true;
    import('./reckon.ts').then(({ createReader }) => {
      readMeasurement = createReader(packed);
      show();
    }).catch((error: unknown) => {
      fetching = false;
      places.status.textContent = notFetched('The engine', error);
    });
  };

  const showPlace = async (typed: TypedForm, read: ReadForm, reading: Reading): Promise<void> => {
    const { identity, measurement, formula } = read;
    if (identity === null || measurement === null || formula === null) {
      places.placement.innerHTML = '<p class="note">Give the ligands to see where the complex stands.</p>';
      places.record.replaceChildren();
      return;
    }
    const draft = recordOfForm(typed, formula, 'draft');
    const id = original?.complex ?? suggestedId(draft);
    const measurementId = original?.published.id ?? suggestedMeasurementId(draft.measurements![0]!);
    const { createPlacer, placementMarkup } = await import('./placing.ts');
    // What was typed while the script came is placed by its own turn.
    if (latest !== typed) return;
    place ??= createPlacer(packed);
    const placement = place({ ...identity, id }, measurementId, measurement, reading, original === null ? null : `${original.complex}/${original.published.id}`);
    places.placement.innerHTML = placementMarkup(placement, abbreviations);
    showRecord(places.record, id, recordText(recordOfForm(typed, formula, measurementId)));
  };

  const writeAddress = (typed: TypedForm): void => {
    const address = new URL(location.href);
    const query = original !== null && JSON.stringify(typed) === JSON.stringify(original.form) ? new URLSearchParams() : formQuery(typed);
    if (original !== null) query.set('otherwise', `${original.complex}/${original.published.id}`);
    else if (query.size === 0) query.set('new', '');
    address.search = query.toString();
    if (address.href !== location.href) history.replaceState(null, '', address);
  };

  const fromAddress = (): void => {
    const { searchParams } = new URL(location.href);
    fields.fill(holdsForm(searchParams) ? formOfQuery(searchParams) : original?.form ?? emptyForm);
    show();
  };

  if (original !== null) places.about.textContent = `The bands of ${original.complex}/${original.published.id}, ${original.published.conditions}. Change a term, a position or a kind: the reading follows, and the published one stands beside it. Nothing in the collection changes.${original.published.result.policy === packed.policyId ? '' : ' The published reading was fitted under values of its own; here the collection’s policy holds.'}`;
  form.addEventListener('submit', (event) => event.preventDefault());
  form.addEventListener('input', show);
  form.addEventListener('click', (event) => {
    const button = event.target instanceof Element ? event.target.closest<HTMLElement>('button') : null;
    if (button?.dataset['addRow'] !== undefined) fields.addRow(button.dataset['addRow'] as 'ligands' | 'bands');
    else if (button?.dataset['removeRow'] !== undefined) fields.removeRow(button.closest('[data-row]')!);
    else return;
    show();
  });
  addEventListener('popstate', fromAddress);
  fromAddress();
  form.hidden = false;
}

async function fetchOriginal(): Promise<Original | null> {
  const [complex, measurement] = new URL(location.href).searchParams.get('otherwise')?.split('/') ?? [];
  if (complex === undefined || complex === '') return null;
  const data = await fetchJson<ComparedComplex>(`data/compare/${encodeURIComponent(complex)}.json`);
  const place = measurement === undefined ? 0 : data.measurements.findIndex(({ id }) => id === measurement);
  const [published, record] = [data.measurements[place], data.typed[place]];
  if (published === undefined || record === undefined) throw new Error(`${complex} has no measurement ${measurement}`);
  return { complex, published, form: formOfRecord(record) };
}

/** A shoulder has a side and a component a number of states; other kinds have neither. */
function showDetails(form: HTMLElement): void {
  for (const row of form.querySelectorAll('[data-rows=bands] [data-row]')) {
    const kind = row.querySelector<HTMLSelectElement>('[data-name=kind]')!.value;
    row.querySelector<HTMLElement>('[data-name=side]')!.hidden = kind !== 'shoulder';
    row.querySelector<HTMLElement>('[data-name=degeneracy]')!.hidden = kind !== 'component';
  }
}

let termsShown = '';

/** Offers the levels of the ion for the terms of bands. */
function offerTerms({ ion, geometry }: TypedForm): void {
  const known = parseIon(ion.trim()).ion;
  const fitted = fittedGeometry(geometry);
  const key = known === null || fitted === null ? '' : `${known.electrons} ${fitted}`;
  if (key === termsShown) return;
  termsShown = key;
  const names = known === null || fitted === null || known.electrons < 1 || known.electrons > 9 ? [] : [...new Set(levelNames(known.electrons, fitted).map((name) => shownLabel(name, known.electrons)))];
  document.getElementById('terms')!.replaceChildren(...[...names, 'CT', 'ligand', 'vibration', 'impurity'].map((name) => new Option(name, name)));
}

let lastFile: string | null = null;

/** The record as a file to keep. */
function showRecord(place: HTMLElement, id: string, text: string): void {
  if (lastFile !== null) URL.revokeObjectURL(lastFile);
  lastFile = URL.createObjectURL(new Blob([text], { type: 'text/yaml' }));
  const open = place.querySelector('details')?.open ?? false;
  const link = document.createElement('a');
  link.href = lastFile;
  link.download = `${id}.yaml`;
  link.textContent = `Save as ${id}.yaml`;
  const about = document.createElement('p');
  about.append(link, ' for content/complexes/; then run npm run check.');
  const details = document.createElement('details');
  details.open = open;
  const summary = document.createElement('summary');
  summary.textContent = 'The record';
  const pre = document.createElement('pre');
  // Long lines scroll within it, by keyboard too.
  pre.tabIndex = 0;
  pre.textContent = text;
  details.append(summary, pre);
  place.replaceChildren(about, details);
}
