import { difference, parameterShown, plainNumber, ratio } from './show.ts';
import { sourceAddress } from './origin.ts';
import type { AuditRow, QuotedRow } from './rows.ts';
import type { CollectionTree, ComplexNode, MeasurementNode } from './tree.ts';
import { type Parts, sentenceShown } from './typeset.ts';

/** A parameter as printed elsewhere against the refitted one. */
export interface Quote {
  /** Measurement whose record quotes it; null where the complex has one only. */
  readonly measurement: string | null;
  readonly parameter: Parts;
  readonly typed: string;
  readonly refitted: string;
  /** Printed less refitted; null where nothing was refitted. */
  readonly difference: string | null;
  /** Difference over its standard uncertainty; null likewise. */
  readonly z: string | null;
  /** A likely cause of the difference, found by trying. */
  readonly cause: Parts | null;
  readonly source: string;
  readonly address: string | undefined;
}

const SYMBOL: Readonly<Record<string, { readonly text: string; readonly unit: string }>> = {
  Delta: { text: 'Δ', unit: ' / cm⁻¹' }, Dq: { text: 'Δ', unit: ' / cm⁻¹, printed as Dq = Δ/10' }, B: { text: 'B', unit: ' / cm⁻¹' }, C: { text: 'C', unit: ' / cm⁻¹' }, beta: { text: 'β', unit: '' },
};

export function quotes(tree: CollectionTree, { measurements }: ComplexNode): readonly Quote[] {
  return measurements.flatMap((measurement) => measurement.quoted.map((row) => quote(tree, measurement, row, measurements.length > 1)));
}

function quote(tree: CollectionTree, measurement: MeasurementNode, row: QuotedRow, several: boolean): Quote {
  const source = tree.sources.get(row.source);
  const parameter: AuditRow['parameter'] = row.parameter === 'Dq' ? 'Delta' : row.parameter as AuditRow['parameter'];
  const audit = measurement.audits.find((one) => one.number === row.number && one.parameter === parameter);
  const { total } = parameterShown(measurement.chosen.parameters[parameter]);
  const apart = audit?.difference ?? null;
  return {
    measurement: several ? measurement.row.id : null,
    parameter: [{ text: SYMBOL[row.parameter]?.text ?? row.parameter, style: 'italic' }, { text: SYMBOL[row.parameter]?.unit ?? '', style: 'plain' }], typed: row.typed, refitted: total.text ?? `withheld: ${total.reason}`,
    difference: apart === null ? null : parameter === 'beta' ? plainNumber(apart, 2) : difference(apart),
    z: audit?.z == null ? null : ratio(audit.z, 1),
    cause: audit?.cause == null ? null : sentenceShown(audit.cause),
    source: row.source_place ? `${(source?.reference ?? row.source).replace(/\.$/, '')}, ${row.source_place}` : source?.reference ?? row.source,
    address: source === undefined ? undefined : sourceAddress(source),
  };
}
