import { describe, expect, test } from 'vitest';
import { recordText } from '#engine';
import { composedFormula } from '../../../site/client/page/composedFormula.ts';
import { type KnownCollection, readForm } from '../../../site/client/compare/readForm.ts';
import { type BandFields, type TypedForm, emptyBand, emptyForm, formOfQuery, formQuery, holdsForm, recordOfForm } from '../../../site/client/compare/typedForm.ts';
import { rangeText } from '../../../site/data/typedRecord.ts';

const known: KnownCollection = {
  parentRatios: { 'Cr(III)': 4.5 },
  ligands: [
    { id: 'ammine', name: 'ammine', formula: 'NH3', abbreviation: null, charge: 0, denticity: 1, donors: ['N'] },
    { id: 'chlorido', name: 'chlorido', formula: 'Cl-', abbreviation: null, charge: -1, denticity: 1, donors: ['Cl'] },
    { id: 'en', name: 'ethane-1,2-diamine', formula: 'C2H8N2', abbreviation: 'en', charge: 0, denticity: 2, donors: ['N', 'N'] },
  ],
};
const band = (changes: Partial<BandFields>): BandFields => ({ ...emptyBand, ...changes });
const form = (changes: Partial<TypedForm> = {}): TypedForm => ({
  ...emptyForm, ion: 'Cr(III)', ligands: [{ ligand: 'ammine', count: '6', bound: '' }], medium: 'water', temperature: 'room', scanned: '300 - 1100 nm',
  bands: [band({ position: '21550(60) cm-1', term: '4T2g', epsilon: '36', width: '3100 cm-1' }), band({ position: '351.0(8) nm', term: '4T1g(F), CT' }), emptyBand], ...changes,
});
const faultsOf = (changes: Partial<TypedForm>): readonly string[] => readForm(form(changes), known).faults.map(({ field, text }) => `${field}: ${text}`);

test('a form goes into an address and comes back, whatever is typed', () => {
  const hostile = form({ notebook: 'a|b & c=d # <b>', bands: [band({ position: '21550(60) cm-1', kind: 'shoulder', side: 'higher', leftOut: 'foot | of "CT" \\' }), band({ term: '2Eg' })] });
  const query = formQuery(hostile);
  expect(holdsForm(query)).toBe(true);
  expect(formOfQuery(new URLSearchParams(query.toString()))).toEqual({ ...hostile, bands: hostile.bands });
  expect(formQuery(emptyForm).size).toBe(0);
  expect(holdsForm(new URLSearchParams('otherwise=cr-am6/aq-295'))).toBe(false);
});

test('a whole form becomes the measurement and the complex that a record would give', () => {
  const { measurement, identity, faults, formula } = readForm(form(), known);
  expect(faults).toEqual([]);
  expect(formula).toBe('[Cr(NH3)6]3+');
  expect(measurement).toMatchObject({ geometry: 'octahedral', multiplicity: null, temperature: 295, phase: 'solution', absent: [] });
  expect(measurement!.bands.map(({ position, terms, epsilon }) => [Math.round(position), terms, epsilon])).toEqual([[21550, ['4T2g'], 36], [28490, ['4T1g(F)', 'CT'], null]]);
  expect(identity).toMatchObject({ multiplicity: 4, isomer: 'none', ligands: [{ ligand: 'ammine', count: 6, bound: 1 }] });
});

describe('a bad entry is explained beside its field', () => {
  test.each<readonly [string, Partial<TypedForm>, string]>([
    ['a position without unit', { bands: [band({ position: '21550' })] }, 'bands.0.position: expected'],
    ['a thousands comma', { bands: [band({ position: '24,500 cm-1' })] }, 'write 24500 cm-1'],
    ['nm typed as cm-1', { bands: [band({ position: '464 cm-1' })] }, 'check the unit'],
    ['a term that the ion has not', { bands: [band({ position: '21550 cm-1', term: '5Eg' })] }, 'bands.0.term: expected'],
    ['one level claimed twice', { bands: [band({ position: '21550 cm-1', term: '4T2g' }), band({ position: '22550 cm-1', term: '4T2g' })] }, 'bands.1.term: 4T2g is claimed by 2 bands'],
    ['components that are not whole', { bands: [band({ position: '18000 cm-1', kind: 'component', term: '4T2g', degeneracy: '1' })] }, 'bands.0.degeneracy: the components hold 1 states'],
    ['an ion in another spelling', { ion: 'Cr3+' }, 'ion: '],
    ['a spin that is needed', { ion: 'Fe(II)', bands: [band({ position: '10400 cm-1' })] }, 'spin: octahedral Fe(II), d6, is high or low spin'],
    ['a spin that cannot be', { spin: 'doublet' }, 'spin: '],
    ['too few donor atoms', { ligands: [{ ligand: 'ammine', count: '5', bound: '' }] }, 'ligands.0.count: these bind with 5 donor atoms; octahedral needs 6'],
    ['a charge that does not add up', { formula: '[Cr(NH3)6]2+' }, 'formula: ion and ligands make the charge +3, not +2'],
    ['an empty range over a band', { absent: '20000 - 22000 cm-1' }, 'absent: '],
    ['a band outside what was scanned', { scanned: '300 - 400 nm' }, 'bands.0.position: expected a position inside what was scanned'],
    ['a temperature without unit', { temperature: '295' }, 'temperature: expected'],
  ])('%s', (_, changes, wanted) => {
    expect(faultsOf(changes).join('\n')).toContain(wanted);
  });

  test('and nothing is said of what is right or still empty', () => {
    expect(faultsOf({})).toEqual([]);
    expect(readForm(emptyForm, known)).toEqual({ faults: [], measurement: null, identity: null, formula: null });
    expect(faultsOf({ bands: [band({ position: '18000 cm-1', kind: 'component', term: '4T2g' }), band({ position: '21000 cm-1', kind: 'component', term: '4T2g' })] })).toEqual([]);
  });
});

test('formulas are made of ion and ligands in alphabetical order', () => {
  const held = (id: string, count: number) => ({ ...known.ligands.find((ligand) => ligand.id === id)!, count });
  expect(composedFormula('Co', 3, [held('en', 2), held('chlorido', 2)])).toBe('[CoCl2(en)2]+');
  expect(composedFormula('Co', 3, [held('ammine', 3), held('chlorido', 3)])).toBe('[CoCl3(NH3)3]');
});

test('the record of a form holds what was typed, word for word', () => {
  const text = recordText(recordOfForm(form({ absent: '28600 - 33300 cm-1', notebook: '17, p. 42' }), '[Cr(NH3)6]3+', 'water-295'));
  for (const line of ['formula: "[Cr(NH3)6]3+"', 'ligands: { ammine: 6 }', 'position: 21550(60) cm-1', 'term: ["4T1g(F)", CT]', 'absent: 28600 - 33300 cm-1']) expect(text.replace('[4T1g(F), CT]', '["4T1g(F)", CT]')).toContain(line);
});

test.each([['28600 - 33300 cm-1', 28600, 33300], ['300 - 1100 nm', 1e7 / 1100, 1e7 / 300], ['28600.5 - 33300 cm-1', 28600.5, 33300]])('a stored range is typed as %s', (text, low, high) => {
  expect(rangeText({ low, high })).toBe(text);
});
