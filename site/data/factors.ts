import { type FactorFit, publishedFactorsFromMemory, publishedFactorsSource, rankAgreement, scatterSentence } from '#engine';
import { type FactorsShown, factorFigures } from './factorFigures.ts';
import { FACTORS, factorLabel, printedBeside } from './factorNames.ts';
import { type LeftOutShown, leftOutShown } from './leftOut.ts';
import { ligandName } from './ligandNames.ts';
import { oncePerCollection } from './memo.ts';
import { factorFitOf, geometries, nodeOf } from './seriesFit.ts';
import { counted, listed, plainNumber } from './show.ts';
import { slanted } from './slanted.ts';
import type { CollectionTree } from './tree.ts';
import { type Parts, sentenceShown } from './typeset.ts';

/** The factors of one parameter in one geometry, as the page tells them. */
export interface FactorSection {
  readonly id: string;
  readonly heading: Parts;
  readonly sentences: readonly Parts[];
  readonly shown: readonly FactorsShown[];
  /** Factors that the complexes leave open, with the reason. */
  readonly without: readonly { readonly name: Parts; readonly reason: Parts }[];
  readonly leftOut: LeftOutShown | null;
}

export interface FactorsPage {
  readonly sections: readonly FactorSection[];
  readonly printedSource: string;
}

/** Fixed, so that every build draws the same numbers. */
const RESAMPLING = { seed: 1962, draws: 1000 } as const;

export const factorsPage = oncePerCollection((tree): FactorsPage => ({
  sections: geometries.flatMap((geometry) => (['Delta', 'beta'] as const).flatMap((parameter) => {
    const fit = factorFitOf(tree, parameter, geometry);
    return fit.complexes.length === 0 ? [] : [factorSection(tree, fit)];
  })),
  printedSource: `Printed factors: ${publishedFactorsSource}. ${publishedFactorsFromMemory[0]!.toUpperCase()}${publishedFactorsFromMemory.slice(1)}.`,
}));

function factorSection(tree: CollectionTree, fit: FactorFit): FactorSection {
  const { parameter, geometry, scatter } = fit;
  const figures = factorFigures(tree).filter((one) => one.parameter === parameter && one.geometry === geometry);
  return {
    id: `${parameter.toLowerCase()}-${geometry}`, heading: sentenceShown(`${parameter} of ${geometry} complexes`),
    sentences: [
      `${counted(fit.complexes.length, 'complex', 'complexes')}. ${scatterSentence(parameter, scatter.value, scatter.standing, scatter.spare)}`,
      ...gaugeSentences(tree, fit), ...agreementSentences(tree, fit),
    ].map((sentence) => slanted(sentence, 'fghk')),
    shown: figures,
    without: fit.factors.filter(({ value }) => value === null).map((factor) => ({ name: factorLabel(tree, factor, geometry), reason: sentenceShown(factor.reason!) })),
    leftOut: leftOutShown(fit.leftOut.map(({ result, kind, reason }) => ({ measurement: nodeOf(tree, result), kind, reason }))),
  };
}

/** Which ligand the factors are counted from, in each island. */
function gaugeSentences(tree: CollectionTree, { islands, parameter }: FactorFit): readonly string[] {
  const { letter } = FACTORS[parameter].ligand;
  const from = (gauge: string, gaugeIsAqua: boolean): string => `counted from ${ligandName(tree, gauge)}, ${letter} = 1${gaugeIsAqua ? '' : ': water is not among them, and this ligand is in most of the complexes, so that they do not compare with factors counted from water'}`;
  if (islands.length === 1) return [`Factors are ${from(islands[0]!.gauge, islands[0]!.gaugeIsAqua)}.`];
  return [
    `The collection falls into ${islands.length} islands that no complex links; factors of different islands cannot be compared.`,
    ...islands.map(({ number, gauge, gaugeIsAqua, complexes, ions }) =>
      `Island ${number}, ${counted(complexes, 'complex', 'complexes')} of ${ions.length > 4 ? counted(ions.length, 'ion') : listed(ions)}, ${from(gauge, gaugeIsAqua)}.`),
  ];
}

/** How far the group's orders agree with the printed ones. */
function agreementSentences(tree: CollectionTree, fit: FactorFit): readonly string[] {
  return (['ligand', 'ion'] as const).flatMap((kind) => {
    const pairs = fit.factors.filter((one) => one.kind === kind && one.value !== null).flatMap((factor) => {
      const printed = printedBeside(tree, fit, factor);
      return printed === null ? [] : [[{ value: factor.value!, u: factor.u! }, { value: printed, u: 0 }] as const];
    });
    const agreement = pairs.length < 4 ? null : rankAgreement(pairs, RESAMPLING);
    if (agreement === null) return [];
    const { tau, low, high } = agreement;
    const number = (value: number): string => plainNumber(value, 2);
    return [`Order of ${FACTORS[fit.parameter][kind].letter} against the printed order: Kendall’s τ-b ${number(tau)}, ${number(low)} to ${number(high)} for 95 of 100 orders drawn within the uncertainties, ${pairs.length} ${kind === 'ion' ? 'ions' : 'ligands'}.`];
  });
}
