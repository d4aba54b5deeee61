import type * as R from './rows.ts';
import { type FormulaShown, formulaShown } from './typeset.ts';
import { groupBy } from './group.ts';

export interface TransitionNode { readonly row: R.ReadingBandRow; readonly bands: readonly R.BandRow[] }

export interface ReadingNode {
  readonly row: R.ReadingRow;
  readonly transitions: readonly TransitionNode[];
  /** Reason by band number. */
  readonly notFitted: ReadonlyMap<number, string>;
  readonly branches: readonly R.BranchRow[];
  /** The fit with each band left out. */
  readonly leftOut: readonly R.StressLeftOutRow[];
  /** The fit to each pair of bands alone. */
  readonly pairs: readonly R.StressPairRow[];
  /** What speaks against the reading; the sum is its score. */
  readonly evidence: readonly R.EvidenceRow[];
  /** Bands worth looking for, most helpful first, one row for each number they would help. */
  readonly helpful: readonly R.HelpfulBandRow[];
  readonly parameters: Readonly<Record<R.ParameterRow['name'], R.ParameterRow>>;
  readonly correlations: readonly R.CorrelationRow[];
  readonly predicted: readonly R.PredictedBandRow[];
  readonly cautions: readonly R.CautionRow[];
}

export interface MeasurementNode {
  readonly row: R.MeasurementRow;
  readonly complex: ComplexNode;
  readonly bands: readonly R.BandRow[];
  readonly scanned: readonly R.ObservedRangeRow[];
  readonly absent: readonly R.ObservedRangeRow[];
  readonly quoted: readonly R.QuotedRow[];
  readonly audits: readonly R.AuditRow[];
  readonly placements: readonly R.PlacementRow[];
  readonly chosen: ReadingNode;
  readonly rivals: readonly ReadingNode[];
}

export interface ComplexNode {
  readonly row: R.ComplexRow;
  readonly formula: FormulaShown;
  readonly ion: R.IonRow;
  readonly ligands: readonly { readonly row: R.ComplexLigandRow; readonly ligand: R.LigandRow }[];
  readonly measurements: readonly MeasurementNode[];
  readonly hazards: readonly R.CautionRow[];
  readonly hazardOverrides: readonly R.HazardOverrideRow[];
}

/** The collection as nested plain data with every list in its stored order. */
export interface CollectionTree {
  readonly meta: ReadonlyMap<string, string>;
  readonly people: readonly R.PersonRow[];
  readonly policies: ReadonlyMap<string, R.PolicyRow>;
  readonly policy: R.PolicyRow;
  readonly ions: readonly R.IonRow[];
  readonly freeIons: readonly R.FreeIonRow[];
  readonly sources: ReadonlyMap<string, R.SourceRow>;
  readonly ligands: readonly R.LigandRow[];
  /** Symbols of ligands that formulas of the collection may hold. */
  readonly abbreviations: readonly string[];
  readonly complexes: readonly ComplexNode[];
  /** What needs a person, most pressing first. */
  readonly review: readonly R.ReviewRow[];
  readonly floorFactors: readonly R.FloorFactorRow[];
  /** Frozen releases, what changed between them and since the last, and what became of published addresses. */
  readonly history: {
    readonly releases: readonly R.FrozenReleaseRow[]; readonly changes: readonly R.ChangeRow[]; readonly gone: readonly R.GoneRow[];
    /** Numbers as each release froze them. */
    readonly frozen: readonly R.FrozenValueRow[];
  };
}

/**
 * Nests the rows. Foreign keys hold in the database, so a missing parent is a broken file.
 * @throws Error where a row has no parent, a measurement no chosen reading, or no policy is in force
 */
export function collectionTree(rows: Rows): CollectionTree {
  const ions = byKey(rows.ion, (row) => row.name);
  const ligands = byKey(rows.ligand, (row) => row.id);
  const policy = rows.policy.find((row) => row.in_force === 1);
  if (policy === undefined) throw new Error('the database names no policy in force');
  const abbreviations = rows.ligand.map((row) => row.abbreviation).filter((text) => text !== null);
  const readings = readingNodes(rows);
  const complexLigands = grouped(rows.complex_ligand, (row) => row.complex);
  const measurements = grouped(rows.measurement, (row) => row.complex);
  const bands = grouped(rows.band, ofMeasurement);
  const ranges = grouped(rows.observed_range, ofMeasurement);
  const quoted = grouped(rows.quoted, ofMeasurement);
  const audits = grouped(rows.audit, ofMeasurement);
  const placements = grouped(rows.placement, ofMeasurement);
  const hazards = grouped(rows.caution.filter((row) => row.subject === 'hazard'), (row) => row.complex);
  const overrides = grouped(rows.hazard_override, (row) => row.complex);

  const complexes = rows.complex.map((row): ComplexNode => {
    const inner: MeasurementNode[] = [];
    const node: ComplexNode = {
      row,
      formula: formulaShown(row.formula, row.isomer, abbreviations),
      ion: found(ions, row.ion),
      ligands: [...complexLigands(row.id)].sort((a, b) => a.number - b.number)
        .map((link) => ({ row: link, ligand: found(ligands, link.ligand) })),
      measurements: inner,
      hazards: hazards(row.id),
      hazardOverrides: overrides(row.id),
    };
    for (const measurement of [...measurements(row.id)].sort((a, b) => a.number - b.number)) {
      const key = `${row.id}/${measurement.id}`;
      const own = readings(key);
      const chosen = own.find((reading) => reading.row.chosen === 1);
      if (chosen === undefined) throw new Error(`${key} has no chosen reading`);
      inner.push({
        row: measurement, complex: node, bands: bands(key), quoted: quoted(key), audits: audits(key), placements: placements(key),
        scanned: ranges(key).filter((range) => range.kind === 'scanned'),
        absent: ranges(key).filter((range) => range.kind === 'absent'),
        chosen, rivals: own.filter((reading) => reading !== chosen),
      });
    }
    return node;
  });
  return {
    meta: new Map(rows.meta.map(({ key, value }) => [key, value])),
    people: rows.person, policies: byKey(rows.policy, (row) => row.id), policy,
    ions: rows.ion, freeIons: rows.free_ion, sources: byKey(rows.source, (row) => row.id), ligands: rows.ligand,
    abbreviations, complexes, review: rows.review, floorFactors: rows.floor_factor,
    history: { releases: rows.frozen_release, changes: rows.change, gone: rows.gone, frozen: rows.frozen_value },
  };
}

type Rows = R.Rows;

function readingNodes(rows: Rows): (key: string) => readonly ReadingNode[] {
  const bands = byKey(rows.band, (row) => `${ofMeasurement(row)}#${row.number}`);
  const transitions = grouped(rows.reading_band, ofReading);
  const members = grouped(rows.reading_band_member, (row) => `${ofReading(row)}:${row.reading_band}`);
  const notFitted = grouped(rows.not_fitted, ofReading);
  const branches = grouped(rows.branch, ofReading);
  const leftOut = grouped(rows.stress_left_out, ofReading);
  const pairs = grouped(rows.stress_pair, ofReading);
  const evidence = grouped(rows.evidence, ofReading);
  const helpful = grouped(rows.helpful_band, ofReading);
  const parameters = grouped(rows.parameter, ofReading);
  const correlations = grouped(rows.correlation, ofReading);
  const predicted = grouped(rows.predicted_band, ofReading);
  const cautions = grouped(rows.caution.filter((row) => row.subject === 'spectral'), (row) => `${row.complex}/${row.measurement}@${row.reading}`);
  const nodes = rows.reading.map((row): ReadingNode => {
    const key = `${ofMeasurement(row)}@${row.number}`;
    return {
      row,
      transitions: transitions(key).map((transition) => ({
        row: transition,
        bands: members(`${key}:${transition.number}`).map((member) => found(bands, `${ofMeasurement(row)}#${member.band}`)),
      })),
      notFitted: new Map(notFitted(key).map(({ band, reason }) => [band, reason])),
      branches: branches(key), leftOut: leftOut(key), pairs: pairs(key), evidence: evidence(key), helpful: helpful(key),
      parameters: Object.fromEntries(parameters(key).map((parameter) => [parameter.name, parameter])) as ReadingNode['parameters'],
      correlations: correlations(key), cautions: cautions(key),
      predicted: [...predicted(key)].sort((a, b) => a.position - b.position),
    };
  });
  return grouped(nodes, (node) => ofMeasurement(node.row));
}

function ofMeasurement(row: { readonly complex: string; readonly measurement: string }): string {
  return `${row.complex}/${row.measurement}`;
}

function ofReading(row: { readonly complex: string; readonly measurement: string; readonly reading: number }): string {
  return `${row.complex}/${row.measurement}@${row.reading}`;
}

function byKey<Row>(rows: readonly Row[], key: (row: Row) => string): ReadonlyMap<string, Row> {
  return new Map(rows.map((row) => [key(row), row]));
}

function grouped<Row>(rows: readonly Row[], key: (row: Row) => string): (key: string) => readonly Row[] {
  const groups = groupBy(rows, key);
  return (wanted) => groups.get(wanted) ?? [];
}

function found<Row>(map: ReadonlyMap<string, Row>, key: string): Row {
  const row = map.get(key);
  if (row === undefined) throw new Error(`the database has no row for ${key}`);
  return row;
}
