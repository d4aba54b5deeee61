import type { Geometry } from '#engine';
import { type LevelDiagram, levelDiagram } from '../charts/levelCurves.ts';
import { type DiagramMark, diagramCeiling, diagramOverlay, levelDiagramFigure } from '../charts/levelDiagram.ts';
import { newDocument } from '../charts/plot.ts';
import { oncePerCollection } from './memo.ts';
import { csvText } from '../../scripts/export/csv.ts';
import { conditions } from './conditions.ts';
import { type FigureShown, type PublishedFigure, figureFiles, ownFigureFiles } from './figure.ts';
import { complexPath, ionSlug } from './paths.ts';
import { counted, difference, energy, figures, listed, ratio } from './show.ts';
import { type Cell, type Table, column, quantity, rowColumn, words } from './table.ts';
import type { CollectionTree, ComplexNode, MeasurementNode } from './tree.ts';
import { configuration, termShown } from './typeset.ts';
import { groupBy } from './group.ts';

/** The diagram of one ion in one geometry, and what the collection has to put on it. */
export interface IonDiagram {
  readonly id: string;
  readonly ion: string;
  readonly electrons: number;
  readonly geometry: Geometry;
  readonly diagram: LevelDiagram;
  readonly ceiling: number;
  readonly marked: readonly { readonly key: string; readonly measurement: MeasurementNode; readonly mark: DiagramMark }[];
}

/** One diagram for each ion and fitted geometry of the collection. */
export const ionDiagrams = oncePerCollection((tree): readonly IonDiagram[] => {
  const fitted = tree.complexes.filter((complex) => complex.row.fitted === 1 && complex.ion.electrons > 0 && complex.ion.electrons < 10);
  return [...groupBy(fitted, (complex) => `${complex.ion.name}|${complex.row.geometry}`).values()].map((complexes) => {
    const { ion, row } = complexes[0]!;
    return ionDiagram(tree, ion.name, ion.electrons, row.geometry as Geometry, complexes.flatMap((complex) => complex.measurements));
  });
});

/** Letters beside more marks than this could not be told apart; the table then stands alone for them. */
const MOST_KEYS = 45;

function ionDiagram(tree: CollectionTree, ion: string, electrons: number, geometry: Geometry, measurements: readonly MeasurementNode[]): IonDiagram {
  const placed = measurements.map((measurement) => ({ measurement, place: placeOf(measurement) }))
    .filter((one): one is { measurement: MeasurementNode; place: Omit<DiagramMark, 'key'> } => one.place !== null)
    .sort((a, b) => a.place.x - b.place.x);
  const furthest = Math.max(0, ...placed.map(({ place }) => place.x));
  const reach = Math.min(80, Math.max(geometry === 'octahedral' ? 40 : 20, 5 * Math.ceil((1.1 * furthest) / 5)));
  const inReach = placed.filter(({ place }) => place.x <= reach);
  const keyed = inReach.length <= MOST_KEYS;
  const marked = inReach.map(({ measurement, place }, index) => {
    const key = keyed ? letterKey(index) : '';
    return { key, measurement, mark: { ...place, key } };
  });
  return {
    id: `${ionSlug(ion)}-${geometry}`, ion, electrons, geometry, marked,
    diagram: levelDiagram({ electrons, geometry }, cOverBFor(tree, ion), reach),
    ceiling: diagramCeiling(reach, marked.map(({ mark }) => mark)),
  };
}

/** Where a measurement's chosen reading lies on its ion's diagram; null where Delta or B is not known. */
export function placeOf({ chosen }: MeasurementNode): Omit<DiagramMark, 'key'> | null {
  const racahB = chosen.parameters.B.value;
  const x = chosen.row.Delta_over_B;
  if (racahB === null || x === null) return null;
  return { x, bands: chosen.transitions.map(({ row }) => ({ y: row.observed / racahB, used: row.used === 1 })) };
}

/** The policy's C/B for an ion. */
export function cOverBFor(tree: CollectionTree, ion: string): number {
  const perIon = JSON.parse(tree.policy.C_over_B_per_ion) as Readonly<Record<string, { readonly value: number }>>;
  return perIon[ion]?.value ?? tree.policy.C_over_B;
}

/** a, b, ... z, aa, ab, ... */
export function letterKey(index: number): string {
  const letter = String.fromCharCode(97 + (index % 26));
  return index < 26 ? letter : letterKey(Math.floor(index / 26) - 1) + letter;
}

/** The diagrams of one ion with every complex of the collection that has both Delta and B. */
export const ionDiagramFigures = oncePerCollection((tree, ion): readonly PublishedFigure[] =>
  ionDiagrams(tree).filter((one) => one.ion === ion).map(diagramFigure));

function diagramFigure(one: IonDiagram): PublishedFigure {
  const { ion, geometry, diagram, marked, electrons } = one;
  const title = `Energy levels of ${geometry} ${ion}, d${electrons}, as a Tanabe-Sugano diagram.`;
  const id = `${one.id}-levels`;
  const ratioText = ratio(diagram.cOverB, 2);
  const crossings = diagram.grounds.slice(1).map((range) => figures(range.from, 3));
  return {
    id, title, asPicture: marked.some(({ key }) => key === ''), titleParts: [...words(`Energy levels of ${geometry} ${ion}, `), ...configuration(electrons), ...words(', as a Tanabe-Sugano diagram.')],
    svg: levelDiagramFigure(diagram, one.ceiling, marked.map(({ mark }) => mark), newDocument(), { id, title, description: describe(one) }),
    caption: [
      `E/B against Δ/B at C/B = ${ratioText}. Solid: the ground level's multiplicity; thin and dashed: other multiplicities.`,
      ...(crossings.length > 0 ? [`Dotted upright: the ground level changes at Δ/B = ${crossings.join(', ')}.`] : []),
      marked.length > 0
        ? `${counted(marked.length, 'reading')} of the collection at the fitted Δ/B, n = ${marked.length}: full dots are observed bands in the fit, open dots are bands only compared with it.`
        : 'No complex of the collection has both Δ and B here.',
      ...(marked.some(({ measurement }) => measurement.chosen.parameters.C.standing === 'fitted') ? ['Where C is fitted, spin-flip bands lie off these curves by as much as that C/B differs.'] : []),
    ],
    keys: marked.filter(({ key }) => key !== '').map(({ key, measurement: { complex, row } }) => ({ key, formula: complex.formula.parts, path: `${complexPath(complex.row.id)}#${row.id}`, measurement: row.id })),
    source: 'Levels computed from the full configuration; bands from this collection, conditions as listed in its table.',
    table: markTable(one), files: figureFiles(id), csv: diagramCsv(one),
  };
}

/** The same diagram without marks, for complex pages to lay theirs over; drawn once. */
export function diagramBackground(one: IonDiagram): string {
  const known = backgrounds.get(one);
  if (known !== undefined) return known;
  const drawn = levelDiagramFigure(one.diagram, one.ceiling, [], newDocument(), { id: `${one.id}-background`, title: `Energy levels of ${one.geometry} ${one.ion}`, description: describe(one) });
  backgrounds.set(one, drawn);
  return drawn;
}

const backgrounds = new WeakMap<IonDiagram, string>();

/** A complex on its ion's diagram: the background's file, and its own marks to lay over it. */
export interface PlaceOnDiagram {
  readonly background: string;
  readonly alt: string;
  readonly overlay: string;
  /** Background and marks in one drawing, for a file. */
  readonly whole: () => { readonly id: string; readonly svg: string };
  readonly title: string;
  readonly caption: string;
  readonly source: string;
  readonly table: Table;
  readonly files: FigureShown['files'];
}

const placedOn = (tree: CollectionTree, complex: ComplexNode): IonDiagram | undefined =>
  ionDiagrams(tree).find(({ ion, geometry }) => ion === complex.ion.name && geometry === complex.row.geometry);

/** Whether a complex has a place on its ion's diagram. */
export const hasPlace = (tree: CollectionTree, complex: ComplexNode): boolean => placedOn(tree, complex)?.marked.some(({ measurement }) => measurement.complex === complex) ?? false;

/** All measurements of a complex that have a place on its ion's diagram; null where none has. */
export function placeOnDiagram(tree: CollectionTree, complex: ComplexNode): PlaceOnDiagram | null {
  const one = placedOn(tree, complex);
  const placed = one?.marked.filter(({ measurement }) => measurement.complex === complex) ?? [];
  if (one === undefined || placed.length === 0) return null;
  const marks = placed.map(({ mark }, index) => ({ ...mark, key: placed.length === 1 ? '' : letterKey(index) }));
  const names = placed.map(({ measurement }, index) => `${placed.length === 1 ? '' : `${letterKey(index)}: `}${measurement.row.id} at Δ/B = ${figures(placed[index]!.mark.x, 3)}`);
  const overlay = diagramOverlay(one.diagram.reach, one.ceiling, marks, {
    id: 'place', title: `${complex.formula.text} on the diagram`,
    description: marks.map((mark) => `Observed bands at Δ/B = ${figures(mark.x, 4)}: E/B = ${mark.bands.map((band) => figures(band.y, 4)).join(', ')}.`).join(' '),
  });
  const where = placed.map(({ measurement }) => conditions(measurement));
  return {
    background: `figures/${one.id}-background.svg`, alt: `Tanabe-Sugano diagram of ${one.geometry} ${one.ion}`, overlay,
    whole: () => ({ id: 'place', svg: laidOver(diagramBackground(one), overlay) }),
    title: `${complex.formula.text} on the Tanabe-Sugano diagram of ${one.ion}.`,
    source: `Levels computed from the full configuration; bands from this record, fitted under policy ${placed[0]!.measurement.chosen.row.policy}.`,
    table: markTable({ ...one, marked: placed.map((entry, index) => ({ ...entry, key: marks[index]!.key })) }), files: ownFigureFiles(complex.row.id, 'place'),
    caption: `n = ${placed.length === 1 ? '1 reading' : `${placed.length} readings`}; ${listed([...new Set(where)])}. E/B against Δ/B at the policy’s C/B = ${ratio(one.diagram.cOverB, 2)}. ${names.join('; ')}. Full dots are observed bands in the fit, open dots are compared only.`,
  };
}

/** One drawing of two of the same size: the upper one's name and marks over the lower one's lines. */
function laidOver(lower: string, upper: string): string {
  const lines = lower.slice(lower.indexOf('</desc>') + '</desc>'.length, -'</svg>'.length);
  return upper.replace('</desc>', () => `</desc>${lines}`);
}

function describe({ diagram, ceiling }: IonDiagram): string {
  return `${counted(diagram.curves.length, 'level')} drawn over Δ/B from 0 to ${diagram.reach} and E/B from 0 to ${ceiling}. Ground level: ${diagram.grounds.map((range) => range.label).join(', then ')}.`;
}

/** Rows of the diagram's table on a page. */
const MOST_ROWS = 100;

function markTable({ marked, electrons }: IonDiagram): Table {
  const keyed = marked.some(({ key }) => key !== '');
  const rows = marked.flatMap(({ key, measurement, mark }) => measurement.chosen.transitions.map(({ row }, index): readonly Cell[] => [
    ...(keyed ? [key] : []), { parts: measurement.complex.formula.parts, path: complexPath(measurement.complex.row.id) },
    measurement.row.id, figures(mark.x, 4), { parts: termShown(row.label, electrons) }, energy(row.observed, null), figures(mark.bands[index]!.y, 4),
    row.residual === null ? { parts: words('none'), soft: true } : difference(row.residual),
  ]));
  return {
    caption: rows.length > MOST_ROWS ? `Readings on the diagram, the first ${MOST_ROWS} rows of ${rows.length}; all stand in the CSV file` : 'Readings on the diagram',
    columns: [...(keyed ? [column('Key')] : []), rowColumn('Complex'), column('Measurement'), quantity('Δ/B', null), column('Transition'), quantity('ν̃', 'cm-1'), quantity('E/B', null), quantity('residual', 'cm-1', true)],
    rows: rows.slice(0, MOST_ROWS),
  };
}

function diagramCsv({ diagram, marked, ion }: IonDiagram): string {
  return csvText(['kind', 'ion', 'complex', 'measurement', 'label', 'Delta_over_B', 'E_over_B'], [
    ...diagram.curves.flatMap((curve) => curve.points.map((point) => ['level', ion, null, null, curve.labels.join('/'), point.x, point.y])),
    ...marked.flatMap(({ measurement, mark }) => measurement.chosen.transitions.map(({ row }, index) =>
      ['observed', ion, measurement.complex.row.id, measurement.row.id, row.label, mark.x, mark.bands[index]!.y])),
  ]);
}
