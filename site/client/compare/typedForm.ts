import type { TypedBand, TypedComplex } from '#engine';

/** One row of the form's bands, every field as typed. */
export interface BandFields {
  readonly position: string;
  readonly kind: string;
  readonly side: string;
  readonly width: string;
  /** Molar absorption coefficient, or one of the words strong, medium, weak. */
  readonly epsilon: string;
  readonly degeneracy: string;
  readonly term: string;
  readonly leftOut: string;
  /** "true" where a record says so; not typed here. */
  readonly deconvoluted: string;
}

/** One ligand of the form. `bound` is empty where each binds with all its donor atoms. */
export interface LigandFields {
  readonly ligand: string;
  readonly count: string;
  readonly bound: string;
}

/** The form for new bands as typed; an empty text is an empty field. */
export interface TypedForm {
  readonly formula: string;
  readonly ion: string;
  readonly geometry: string;
  readonly isomer: string;
  readonly spin: string;
  readonly ligands: readonly LigandFields[];
  readonly phase: string;
  readonly medium: string;
  readonly temperature: string;
  readonly technique: string;
  readonly scanned: string;
  readonly absent: string;
  readonly notebook: string;
  readonly bands: readonly BandFields[];
  /** Taken over from a record, not typed here: "doubtful", and the number of metals. */
  readonly innocence: string;
  readonly nuclearity: string;
}

export const PLAIN_FIELDS = ['formula', 'ion', 'geometry', 'isomer', 'spin', 'phase', 'medium', 'temperature', 'technique', 'scanned', 'absent', 'notebook', 'innocence', 'nuclearity'] as const;
export const BAND_FIELDS = ['position', 'kind', 'term', 'epsilon', 'width', 'side', 'degeneracy', 'leftOut', 'deconvoluted'] as const satisfies readonly (keyof BandFields)[];

export const emptyBand: BandFields = { position: '', kind: 'maximum', side: '', width: '', epsilon: '', degeneracy: '', term: '', leftOut: '', deconvoluted: '' };

/** Words that may stand in place of an absorption coefficient. */
export const STRENGTHS = ['strong', 'medium', 'weak'] as const;
export const strengthOf = (typed: string): (typeof STRENGTHS)[number] | null => STRENGTHS.find((word) => word === typed.trim()) ?? null;

export const emptyForm: TypedForm = {
  formula: '', ion: '', geometry: 'octahedral', isomer: 'none', spin: '', ligands: [{ ligand: '', count: '', bound: '' }], phase: 'solution', medium: '', temperature: '', technique: '',
  scanned: '', absent: '', notebook: '', bands: [emptyBand, emptyBand, emptyBand], innocence: '', nuclearity: '',
};

const fieldsOf = (text: string): string[] => text.split(/(?<!\\)\|/).map((part) => part.replaceAll('\\|', '|'));
const joined = (texts: readonly string[]): string => texts.map((text) => text.replaceAll('|', '\\|')).join('|').replace(/\|+$/, '');

/**
 * The form in an address: every field by its name, one `ligand=` for each ligand ("ammine|6") and one `band=` for each band
 * ("21550(60) cm-1|maximum|4T2g").
 */
export function formQuery(form: TypedForm): URLSearchParams {
  const query = new URLSearchParams();
  for (const name of PLAIN_FIELDS) if (form[name] !== '' && form[name] !== emptyForm[name]) query.set(name, form[name]);
  for (const { ligand, count, bound } of form.ligands) if (ligand !== '' || count !== '') query.append('ligand', joined([ligand, count, bound]));
  for (const band of form.bands) {
    const fields = BAND_FIELDS.map((name) => band[name] === emptyBand[name] ? '' : band[name]);
    if (fields.some((field) => field !== '')) query.append('band', joined(fields));
  }
  return query;
}

/** true where an address holds a form. */
export const holdsForm = (query: URLSearchParams): boolean => ['band', 'ligand', ...PLAIN_FIELDS].some((name) => query.has(name));

export function formOfQuery(query: URLSearchParams): TypedForm {
  const ligands = query.getAll('ligand').map(fieldsOf).map(([ligand = '', count = '', bound = '']) => ({ ligand, count, bound }));
  const bands = query.getAll('band').map(fieldsOf).map((fields) =>
    Object.fromEntries(BAND_FIELDS.map((name, place) => [name, fields[place] || emptyBand[name]])) as unknown as BandFields);
  return {
    ...emptyForm, ...Object.fromEntries(PLAIN_FIELDS.map((name) => [name, query.get(name) ?? emptyForm[name]])),
    ligands: ligands.length === 0 ? emptyForm.ligands : ligands, bands: bands.length === 0 ? emptyForm.bands : bands,
  };
}

/** The form filled with a record that has one measurement. */
export function formOfRecord(record: TypedComplex): TypedForm {
  const [measurement] = record.measurements ?? [];
  const bands = measurement?.bands ?? [];
  const text = (typed: string | null | undefined): string => typed ?? '';
  const source = measurement?.source;
  return {
    formula: record.formula, ion: text(record.ion), geometry: text(record.geometry), isomer: text(record.isomer) || 'none', spin: text(record.spin),
    ligands: Object.entries(record.ligands ?? {}).map(([ligand, count]) => typeof count === 'string' ? { ligand, count, bound: '' } : { ligand, count: count.count, bound: text(count.bound) }),
    phase: text(measurement?.phase), medium: text(measurement?.medium), temperature: text(measurement?.temperature), technique: text(measurement?.technique),
    scanned: [measurement?.scanned ?? ''].flat().join('; '), absent: bands.flatMap(({ absent }) => absent ?? []).join('; '),
    notebook: text(source?.notebook) || text(source?.cite),
    bands: bands.filter(({ position }) => position != null).map((band): BandFields => ({
      position: text(band.position), kind: text(band.kind) || 'maximum', side: text(band.side), width: text(band.width), epsilon: text(band.epsilon) || text(band.strength), degeneracy: text(band.degeneracy),
      term: [band.term ?? ''].flat().join(', '), leftOut: text(band['left-out']), deconvoluted: text(band.deconvoluted),
    })),
    innocence: text(record.innocence), nuclearity: text(record.nuclearity),
  };
}

/** Candidates typed into one field, separated by commas; a comma inside brackets separates nothing. */
export const termsOf = (typed: string): readonly string[] => typed.split(',').map((term) => term.trim()).filter((term) => term !== '');

/** Bands in which something was typed, with their place in the form. */
export const filledBands = ({ bands }: TypedForm): readonly { readonly band: BandFields; readonly place: number }[] =>
  bands.map((band, place) => ({ band, place })).filter(({ band }) => BAND_FIELDS.some((name) => band[name].trim() !== emptyBand[name]));

/** Ligands in which something was typed. */
export const filledLigands = ({ ligands }: TypedForm): readonly { readonly ligand: LigandFields; readonly place: number }[] =>
  ligands.map((ligand, place) => ({ ligand, place })).filter(({ ligand: { ligand, count } }) => ligand !== '' || count.trim() !== '');

/** The form as a record for the engine's record writer. */
export function recordOfForm(form: TypedForm, formula: string, id: string): TypedComplex {
  const or = (text: string): string | null => text.trim() === '' ? null : text.trim();
  return {
    formula, ion: or(form.ion), geometry: form.geometry, isomer: form.isomer === 'none' ? null : form.isomer, spin: or(form.spin),
    ligands: Object.fromEntries(filledLigands(form).map(({ ligand: { ligand, count, bound } }) => [ligand, bound.trim() === '' ? count.trim() : { count: count.trim(), bound: bound.trim() }])),
    innocence: or(form.innocence), nuclearity: or(form.nuclearity),
    measurements: [{
      id, phase: form.phase, medium: or(form.medium), temperature: or(form.temperature), technique: or(form.technique), scanned: or(form.scanned),
      source: { notebook: or(form.notebook) ?? 'to be filled in' },
      bands: [
        ...filledBands(form).map(({ band }): TypedBand => {
          const terms = termsOf(band.term);
          return {
            position: or(band.position), kind: or(band.kind), side: band.kind === 'shoulder' ? or(band.side) : null, width: or(band.width), epsilon: strengthOf(band.epsilon) === null ? or(band.epsilon) : null, strength: strengthOf(band.epsilon),
            deconvoluted: or(band.deconvoluted),
            degeneracy: band.kind === 'component' ? or(band.degeneracy) : null, term: terms.length > 1 ? terms : or(band.term), 'left-out': or(band.leftOut),
          };
        }),
        ...form.absent.split(';').map((range) => range.trim()).filter((range) => range !== '').map((absent) => ({ absent })),
      ],
    }],
  };
}
