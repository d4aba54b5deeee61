import { type CautionSubject, cautionMeanings, hazardFooter } from '#engine';
import { conditions } from './conditions.ts';
import { oncePerCollection } from './memo.ts';
import { pageLinks, rowsOfPage } from './paging.ts';
import { cautionPath, complexPath } from './paths.ts';
import { counted, ratio } from './show.ts';
import { type Cell, type Table, longColumn, quantity, rowColumn, soft, words } from './table.ts';
import type { CollectionTree, ComplexNode, MeasurementNode } from './tree.ts';
import { type Parts, sentenceShown } from './typeset.ts';

/** A record that carries a caution; a hazard belongs to the complex, so it names no measurement. */
interface Carrier { readonly complex: ComplexNode; readonly measurement: MeasurementNode | null; readonly text: string; readonly foundIn: string | null }

/** Who carries each code, in the order of the collection's records. */
const carriers = oncePerCollection((tree): ReadonlyMap<string, readonly Carrier[]> => {
  const found = new Map<string, Carrier[]>(cautionMeanings.map(({ code }) => [code, []]));
  const add = (code: string, carrier: Carrier): void => { found.set(code, [...(found.get(code) ?? []), carrier]); };
  for (const complex of tree.complexes) {
    for (const { code, text, found_in: foundIn } of complex.hazards) add(code, { complex, measurement: null, text, foundIn });
    for (const measurement of complex.measurements) for (const { code, text } of measurement.chosen.cautions) add(code, { complex, measurement, text, foundIn: null });
  }
  return found;
});

const HEADING: Readonly<Record<CautionSubject, { readonly title: string; readonly about: string }>> = {
  hazard: { title: 'Hazards', about: `Of the substance; they stand above the data of every complex that raises them. The table of triggers is common practice, written from memory, without a source; the group’s own chemist should review it. ${hazardFooter}` },
  reading: { title: 'Of a reading', about: 'Decided from one measurement, its chosen reading and the policy.' },
  complex: { title: 'Of a complex', about: 'These need the ligands, the quoted values or all measurements of one complex.' },
  comparison: { title: 'Of a comparison', about: 'Raised while a new complex is placed against the collection; no record carries them.' },
};

export interface CautionIndex {
  readonly sections: readonly { readonly id: CautionSubject; readonly title: string; readonly about: string; readonly table: Table }[];
}

/** Every caution that the engine may raise, with its meaning and how many carry it. */
export function cautionIndex(tree: CollectionTree): CautionIndex {
  return {
    sections: (['hazard', 'reading', 'complex', 'comparison'] as const).map((id) => ({
      id, ...HEADING[id],
      table: {
        caption: HEADING[id].title,
        columns: [rowColumn('Code'), longColumn('Meaning'), ...(id === 'comparison' ? [] : [quantity(id === 'hazard' ? 'complexes' : 'measurements', null, true)])],
        rows: cautionMeanings.filter(({ subject }) => subject === id).map(({ code, meaning }): readonly Cell[] => [
          id === 'comparison' ? { parts: words(code) } : { parts: words(code), path: cautionPath(code) }, { parts: sentenceShown(meaning) },
          ...(id === 'comparison' ? [] : [count(carriers(tree).get(code)!.length)]),
        ]),
      },
    })),
  };
}

const count = (number: number): Cell => number === 0 ? soft('none') : ratio(number, 0);

/** Codes that have a page: all that a record may carry, whether one does today or not, so that addresses last. */
export const pagedCautions = (tree: CollectionTree): readonly { readonly code: string; readonly carried: number }[] => [
  ...cautionMeanings.filter(({ subject }) => subject !== 'comparison').map(({ code }) => code),
].map((code) => ({ code, carried: carriers(tree).get(code)!.length }));

export interface CautionPage {
  readonly code: string;
  readonly meaning: Parts;
  readonly sentence: string;
  readonly table: Table | null;
  readonly number: number;
  readonly pages: readonly { readonly number: number; readonly path: string }[];
}

/** One caution with the records that carry it. */
export function cautionPage(tree: CollectionTree, code: string, number: number): CautionPage {
  const { subject, meaning } = cautionMeanings.find((one) => one.code === code)!;
  const all = carriers(tree).get(code)!;
  const hazard = subject === 'hazard';
  return {
    code, meaning: sentenceShown(meaning),
    sentence: all.length === 0 ? 'No record of the collection carries it.' : `${counted(all.length, hazard ? 'complex carries' : 'measurement carries', hazard ? 'complexes carry' : 'measurements carry')} it.`,
    table: all.length === 0 ? null : {
      caption: 'Records that carry it',
      columns: [rowColumn('Complex'), ...(hazard ? [longColumn('Found in')] : [longColumn('Measurement'), longColumn('In its words')])],
      rows: rowsOfPage(all, number).map((carrier): readonly Cell[] => [
        { parts: carrier.complex.formula.parts, path: `${complexPath(carrier.complex.row.id)}${carrier.measurement === null ? '' : `#${carrier.measurement.row.id}`}` },
        ...(carrier.measurement === null ? [carrier.foundIn ?? soft('not recorded')] : [`${carrier.measurement.row.id}: ${conditions(carrier.measurement)}`, { parts: sentenceShown(carrier.text) }]),
      ]),
    },
    number, pages: pageLinks(all.length, (page) => cautionPath(code, page)),
  };
}
