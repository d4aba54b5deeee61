import { recordFiles } from '../../scripts/export/files.ts';
import { complexName } from './complexName.ts';
import { conditions } from './conditions.ts';
import { type PlaceOnDiagram, placeOnDiagram } from './diagram.ts';
import { type MeasurementMeaning, measurementMeaning } from './measurementMeaning.ts';
import { type MeasurementRead, measurementRead } from './measurementRead.ts';
import { type Rivals, measurementRivals } from './measurementRivals.ts';
import { type MeasurementSure, measurementSure } from './measurementSure.ts';
import { type Neighbours, neighbours } from './neighbours.ts';
import { cautionPath, complexPath, ionPath, ligandPath, otherwisePath } from './paths.ts';
import { type FileShown, filesShown } from './downloads.ts';
import { type HeadData, complexHead } from './head.ts';
import { type Placements, placements } from './placements.ts';
import { type Citation, citation } from './publication.ts';
import { type Quote, quotes } from './quotes.ts';
import { type RecordHistory, recordHistory } from './recordHistory.ts';
import { groupBy } from './group.ts';
import { oncePerCollection } from './memo.ts';
import { complexSchematic } from './schematic.ts';
import { tellingStructure } from './structure.ts';
import { listed, parameterShown } from './show.ts';
import { type Origin, measurementOrigin } from './origin.ts';
import { type Table, column, quantity, rowColumn, soft } from './table.ts';
import type { CollectionTree, ComplexNode, MeasurementNode } from './tree.ts';
import { type FormulaShown, type Parts, configuration, sentenceShown } from './typeset.ts';

export interface MeasurementShown {
  readonly id: string;
  readonly heading: string;
  readonly sample: string | null;
  readonly read: MeasurementRead;
  readonly meaning: MeasurementMeaning;
  readonly sure: MeasurementSure;
  readonly rivals: Rivals | null;
  /** The compare page opened with these bands. */
  readonly otherwise: string;
  readonly origin: Origin;
  readonly notes: string | null;
}

export interface ComplexPage {
  readonly id: string;
  readonly formula: FormulaShown;
  readonly name: string;
  readonly description: string;
  readonly hazards: readonly { readonly code: string; readonly path: string; readonly name: string; readonly text: string; readonly foundIn: string | null }[];
  /** What all hazard cautions of the complex end with, said once. */
  readonly hazardAdvice: string;
  readonly hazardOverrides: readonly { readonly code: string; readonly reason: string }[];
  readonly ion: { readonly name: string; readonly path: string; readonly configuration: Parts };
  readonly facts: readonly { readonly name: string; readonly value: string }[];
  readonly ligands: readonly { readonly text: string; readonly path: string; readonly count: string }[];
  /** The donors around the metal, and each ligand whose structure tells more than its formula. */
  readonly drawings: readonly { readonly name: string; readonly path: string | null; readonly svg: string }[];
  readonly notes: string | null;
  /** Side by side where there is more than one measurement. */
  readonly summary: Table | null;
  readonly measurements: readonly MeasurementShown[];
  /** Spectral cautions, each once; `where` names the measurements where not all have it. */
  readonly cautions: readonly { readonly code: string; readonly path: string; readonly text: Parts; readonly where: string | null }[];
  readonly neighbours: Neighbours;
  readonly placements: Placements;
  readonly diagram: PlaceOnDiagram | null;
  readonly quotes: readonly Quote[];
  readonly record: { readonly file: string; readonly hash: string; readonly files: readonly FileShown[] };
  readonly citation: Citation;
  readonly history: RecordHistory;
  readonly head: HeadData;
  readonly report: { readonly text: string; readonly address: string | null };
}

const byId = oncePerCollection((tree) => new Map(tree.complexes.map((complex) => [complex.row.id, complex])));

/** The complex of a page. @throws RangeError where the collection has none of that id */
export function complexOf(tree: CollectionTree, id: string): ComplexNode {
  const found = byId(tree).get(id);
  if (found === undefined) throw new RangeError(`the collection has no complex "${id}"`);
  return found;
}

export function complexPage(tree: CollectionTree, complex: ComplexNode): ComplexPage {
  const { row, ion } = complex;
  return {
    id: row.id, formula: complex.formula, name: complexName(complex),
    description: `${complex.formula.text}: band readings, assignment and ligand-field parameters of ${row.geometry} ${ion.name}.`,
    ...hazards(complex),
    hazardOverrides: complex.hazardOverrides.map(({ code, reason }) => ({ code, reason })),
    ion: { name: ion.name, path: ionPath(ion.name), configuration: configuration(ion.electrons) },
    facts: identity(complex),
    ligands: complex.ligands.map(({ row: link, ligand }) => ({
      text: ligand.name, path: ligandPath(ligand.id), count: `${link.count}${link.bound === ligand.denticity ? '' : `, bound by ${link.bound} of ${ligand.denticity}`}`,
    })),
    drawings: drawings(tree, complex), notes: row.notes, summary: summary(complex),
    measurements: complex.measurements.map((measurement) => measurementShown(tree, measurement)),
    cautions: cautions(complex), neighbours: neighbours(tree, complex), placements: placements(complex), diagram: placeOnDiagram(tree, complex), quotes: quotes(tree, complex),
    record: { file: row.file, hash: row.hash, files: filesShown(recordFiles, complexPath(row.id)) },
    citation: citation(tree, complex), history: recordHistory(tree, complex), head: complexHead(tree, complex), report: report(tree, complex),
  };
}

function drawings(tree: CollectionTree, complex: ComplexNode): ComplexPage['drawings'] {
  const schematic = complexSchematic(tree, complex);
  return [
    ...(schematic === null ? [] : [{ name: 'Donors, schematic', path: null, svg: schematic }]),
    ...complex.ligands.flatMap(({ ligand }) => {
      const svg = tellingStructure(tree, ligand.id);
      return svg === null ? [] : [{ name: ligand.abbreviation ?? ligand.name, path: ligandPath(ligand.id), svg }];
    }),
  ];
}

function identity({ row }: ComplexNode): ComplexPage['facts'] {
  return [
    { name: 'Geometry', value: row.fitted === 1 ? row.geometry : `${row.geometry}: stored and drawn, not fitted` },
    ...(row.isomer === 'none' ? [] : [{ name: 'Isomer', value: row.isomer }]),
    { name: 'Spin', value: row.spin === null ? 'not recorded' : `${row.spin}${row.spin_assumed === 1 ? ' (assumed)' : ''}` },
    { name: 'Record', value: row.id },
  ];
}

function hazards({ hazards: rows }: ComplexNode): Pick<ComplexPage, 'hazards' | 'hazardAdvice'> {
  const sentences = rows.map(({ text }) => text.split(/(?<=\.)\s+/));
  const shared: string[] = [];
  // The first sentence names the hazard and always stays.
  while (rows.length > 0 && sentences.every((list) => list.length > 1 && list.at(-1) === sentences[0]!.at(-1))) {
    shared.unshift(sentences[0]!.at(-1)!);
    for (const list of sentences) list.pop();
  }
  return { hazards: rows.map(({ code, found_in }, index) => ({ code, path: cautionPath(code), name: sentences[index]![0] ?? code, text: sentences[index]!.slice(1).join(' '), foundIn: found_in })), hazardAdvice: shared.join(' ') };
}

function cautions({ measurements }: ComplexNode): ComplexPage['cautions'] {
  const each = measurements.flatMap((measurement) => measurement.chosen.cautions.map(({ code, text }) => ({ code, text, id: measurement.row.id })));
  return [...groupBy(each, ({ code, text }) => `${code} ${text}`).values()].map((same) => ({
    code: same[0]!.code, path: cautionPath(same[0]!.code), text: sentenceShown(same[0]!.text), where: same.length === measurements.length ? null : listed(same.map(({ id }) => id)),
  }));
}

function summary({ measurements }: ComplexNode): Table | null {
  if (measurements.length < 2) return null;
  return {
    caption: 'Measurements of this complex',
    columns: [rowColumn('Measurement'), column('Conditions'), quantity('Δ', 'cm-1'), quantity('B', 'cm-1'), quantity('β', null), column('Verdict')],
    rows: measurements.map((measurement) => [
      { parts: [{ text: measurement.row.id, style: 'plain' }], path: `${complexPath(measurement.row.complex)}#${measurement.row.id}` }, conditions(measurement),
      ...(['Delta', 'B', 'beta'] as const).map((name) => { const { total } = parameterShown(measurement.chosen.parameters[name]); return total.text ?? soft('withheld'); }),
      measurement.chosen.row.verdict,
    ]),
  };
}

function measurementShown(tree: CollectionTree, measurement: MeasurementNode): MeasurementShown {
  const { row } = measurement;
  return {
    id: row.id, heading: conditions(measurement), sample: row.sample, notes: row.notes,
    read: measurementRead(measurement, row.id), meaning: measurementMeaning(measurement, row.id),
    sure: measurementSure(measurement), rivals: measurementRivals(measurement, row.id),
    otherwise: otherwisePath(row.complex, row.id),
    origin: measurementOrigin(tree, measurement),
  };
}

function report(tree: CollectionTree, { row }: ComplexNode): ComplexPage['report'] {
  const contact = tree.meta.get('group.contact') ?? null;
  const text = `Name the record, ${row.id}, the measurement, the band or number, and what it should be.`;
  if (contact === null) return { text: `${text} The group gives no contact.`, address: null };
  return /^[^\s@]+@[^\s@]+$/.test(contact)
    ? { text, address: `mailto:${contact}?subject=${encodeURIComponent(`Record ${row.id}`)}` }
    : { text: `${text} Contact: ${contact}.`, address: null };
}

