// The fields that a column of a table may hold: every text of a complex record, by the level at which it stands.

/** How a cell of the field is read. */
export type CellKind =
  | 'text' | 'energy' | 'temperature' | 'coefficient' | 'number' | 'with-unit' | 'range'
  | 'term' | 'ligands' | 'hazards' | 'ion' | 'geometry' | 'spin' | 'uncertainty';

export type Level = 'complex' | 'measurement' | 'band' | 'quoted';

export interface TableField {
  /** As columns and mapping files name it. */
  readonly name: string;
  readonly level: Level;
  /** Where the text stands within its complex, measurement, band or set of quoted values. */
  readonly path: readonly string[];
  readonly kind: CellKind;
}

function fields(level: Level, rows: Readonly<Record<string, CellKind>>): TableField[] {
  return Object.entries(rows).map(([name, kind]) => ({ name, level, path: pathOf(name, level), kind }));
}

/** "source.notebook" stands at source, notebook; "measurement.notes" and "quoted.B" name their level first. */
function pathOf(name: string, level: Level): string[] {
  if (name === 'measurement') return ['id'];
  const steps = name.split('.');
  return steps[0] === level ? steps.slice(1) : steps;
}

/** Every field, in the order in which a table shows them. `id` is the file name; `position.u` becomes part of the position. */
export const tableFields: readonly TableField[] = [
  ...fields('complex', {
    id: 'text', formula: 'text', name: 'text', ion: 'ion', geometry: 'geometry', isomer: 'text', ligands: 'ligands', spin: 'spin', nuclearity: 'number',
    innocence: 'text', 'charge-note': 'text', hazards: 'hazards', notes: 'text',
  }),
  ...fields('measurement', {
    measurement: 'text', sample: 'text', phase: 'text', medium: 'text', host: 'text', temperature: 'temperature', technique: 'text', scanned: 'range',
    concentration: 'with-unit', 'path-length': 'with-unit', batch: 'text', 'raw.file': 'text', 'raw.sha256': 'text', 'magnetic-moment': 'with-unit', 'epr-g': 'number',
    'source.notebook': 'text', 'source.by': 'text', 'source.date': 'text', 'source.cite': 'text', 'source.where': 'text',
    'policy.C/B': 'number', 'policy.C': 'text', 'policy.floors.general': 'energy', 'policy.floors.spin-flip': 'energy', 'policy.floors.two-electron': 'energy',
    'policy.ceilings.Delta': 'with-unit', 'policy.ceilings.B': 'with-unit', 'policy.ceilings.C': 'with-unit', 'policy.rival-margin': 'number',
    'policy.default-uncertainties.maximum': 'energy', 'policy.default-uncertainties.line': 'energy', 'policy.because': 'text', 'measurement.notes': 'text',
  }),
  ...fields('band', {
    position: 'energy', 'position.u': 'uncertainty', kind: 'text', side: 'text', degeneracy: 'number', deconvoluted: 'text', epsilon: 'coefficient', strength: 'text',
    width: 'energy', term: 'term', 'left-out': 'text', absent: 'range', 'band.notes': 'text',
  }),
  ...fields('quoted', {
    'quoted.Delta': 'energy', 'quoted.Dq': 'energy', 'quoted.B': 'energy', 'quoted.C': 'energy', 'quoted.beta': 'number', 'quoted.cite': 'text', 'quoted.where': 'text',
  }),
];

const byName: ReadonlyMap<string, TableField> = new Map(tableFields.map((field) => [field.name, field]));

/** @throws RangeError for a name that is no field */
export function fieldNamed(name: string): TableField {
  const field = byName.get(name);
  if (field === undefined) throw new RangeError(`no field "${name}"`);
  return field;
}

export function isField(name: string): boolean {
  return byName.has(name);
}

/** The word for a column that is not taken over. */
export const notTaken = 'leave-out';

export const columnFieldNames: [string, ...string[]] = [notTaken, ...tableFields.map(({ name }) => name)];
