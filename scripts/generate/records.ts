// The text of record files.

import type { LigandEntry } from './ligands.ts';
import { formulaOf } from './recipes.ts';
import type { Recipe } from './recipes.ts';
import type { Setting } from './settings.ts';
import type { SeenBand } from './spectrum.ts';
import { typedEpsilon, typedPosition, typedTerm, typedWidth } from './typing.ts';
import { blockLines, blockText, flowList, flowMap, flowText } from './yaml.ts';
import type { Fields } from './yaml.ts';

/** Where a measurement is written down. */
export interface Provenance {
  readonly notebook: string;
  readonly by: string;
  readonly date: string;
}

export interface DraftMeasurement {
  readonly setting: Setting;
  readonly bands: readonly SeenBand[];
  readonly provenance: Provenance;
  /** Parameters printed before, one set of fields each. */
  readonly quoted: readonly Fields[];
}

/** A whole complex record. */
export function complexText(recipe: Recipe, measurements: readonly DraftMeasurement[]): string {
  const head = blockLines([
    ['formula', blockText(formulaOf(recipe))],
    ['ion', recipe.ion],
    ['geometry', recipe.geometry],
    ['isomer', recipe.isomer === 'none' ? null : recipe.isomer],
    ['ligands', flowMap(recipe.ligands.map(([id, count]) => [id, String(count)]))],
    ['spin', recipe.spin],
  ]);
  return [...head, 'measurements:', ...measurements.flatMap((one) => measurementLines(one, recipe)), ''].join('\n');
}

function measurementLines({ setting, bands, provenance, quoted }: DraftMeasurement, recipe: Recipe): string[] {
  const fields: Fields = [
    ['sample', setting.sample && blockText(setting.sample)],
    ['phase', setting.phase],
    ['medium', setting.medium && blockText(setting.medium)],
    ['host', setting.host && blockText(setting.host)],
    ['temperature', setting.temperature === null ? null : setting.temperature === 'room' ? 'room' : `${setting.temperature} K`],
    ['technique', setting.technique],
    ['scanned', setting.scan?.typed ?? null],
    ['source', flowMap([['notebook', flowText(provenance.notebook)], ['by', provenance.by], ['date', provenance.date]])],
  ];
  return [
    `  - id: ${setting.id}`,
    ...blockLines(fields, '    '),
    '    bands:',
    ...bands.map((band) => `      - ${bandText(band, setting, recipe)}`),
    ...(quoted.length === 0 ? [] : ['    quoted:', ...quoted.map((one) => `      - ${flowMap(one)}`)]),
  ];
}

function bandText(band: SeenBand, { habits, phase }: Setting, recipe: Recipe): string {
  return flowMap([
    ['position', typedPosition(band, habits)],
    ['kind', band.kind],
    ['side', band.side],
    ['degeneracy', band.degeneracy === null ? null : String(band.degeneracy)],
    ['epsilon', habits.typesEpsilon && phase === 'solution' ? typedEpsilon(band.epsilon) : null],
    ['width', habits.typesWidth && band.kind !== 'shoulder' && band.label !== null ? typedWidth(band, habits) : null],
    ['term', band.label === null ? 'CT' : habits.typesTerms || band.kind === 'component' ? typedTerm(band.label, recipe) : null],
  ]);
}

/** A whole ligand record. */
export function ligandText(ligand: LigandEntry): string {
  return [
    ...blockLines([
      ['name', blockText(ligand.name)],
      ['formula', blockText(ligand.formula)],
      ['abbreviation', ligand.abbreviation],
      ['synonyms', ligand.synonyms.length === 0 ? null : flowList(ligand.synonyms)],
      ['charge', String(ligand.charge)],
      ['denticity', String(ligand.donors.length)],
      ['donors', flowList(ligand.donors)],
      ['smiles', `"${ligand.smiles}"`],
    ]),
    '',
  ].join('\n');
}
