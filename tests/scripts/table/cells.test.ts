import { describe, expect, it } from 'vitest';
import { cellFromTyped, pointFound, positionParts, typedFromCell, withoutUncertainty, withUncertainty } from '../../../scripts/table/cells.ts';
import { hazardsCell, hazardsFromCell, ligandsCell, ligandsFromCell, termsFromCell } from '../../../scripts/table/compound.ts';
import { readHeader } from '../../../scripts/table/headers.ts';

const point = { decimal: 'point' } as const;
const comma = { decimal: 'comma' } as const;

describe('a cell and the text of a record', () => {
  it.each([
    ['21550', 'energy', 'cm-1', point, '21550 cm-1'],
    ['21550(60)', 'energy', 'cm-1', point, '21550(60) cm-1'],
    ['21550 ± 120 (k = 2)', 'energy', 'cm-1', point, '21550 ± 120 cm-1 (k = 2)'],
    ['464,5', 'energy', 'nm', comma, '464.5 nm'],
    ['464,5 nm', 'energy', 'cm-1', comma, '464.5 nm'],
    ['17,4', 'energy', '10^3 cm-1', comma, '17.4 kK'],
    ['295', 'temperature', 'K', point, '295 K'],
    ['300-1100', 'range', 'nm', point, '300-1100 nm'],
    ['300 to 700; 750 to 1100', 'range', 'nm', point, '300 to 700; 750 to 1100 nm'],
    ['13,4', 'coefficient', null, comma, '13.4'],
    ['0,01', 'with-unit', 'mol/L', comma, '0.01 mol/L'],
    ['water, 2,5 m', 'text', null, comma, 'water, 2,5 m'],
  ] as const)('%s, %s in %s, is read and goes back', (cell, kind, unit, settings, typed) => {
    expect(typedFromCell(cell, kind, unit, settings)).toBe(typed);
    expect(cellFromTyped(typed, kind, unit, settings)).toBe(cell);
  });

  it.each([
    ['room', 'temperature', 'K', 'room'],
    ['⁴A₂g → ⁴T₂g', 'term', null, '4T2g'],
    ['4T2g <- 4A2g', 'term', null, '4T2g'],
    ['Cr3+', 'ion', null, 'Cr(III)'],
    ['Cr(III)', 'ion', null, 'Cr(III)'],
    ['Oh', 'geometry', null, 'octahedral'],
    ['HS', 'spin', null, 'high'],
  ] as const)('%s as %s is read as %4$s', (cell, kind, unit, typed) => {
    expect(typedFromCell(cell, kind, unit, point)).toBe(typed);
  });

  it('tells a point in a table of decimal commas', () => {
    expect(pointFound('17.500', 'energy', comma)).toEqual({ found: '17.500', mended: '17500' });
    expect(pointFound('464.5', 'energy', comma)?.mended).toBe('464,5');
    expect([pointFound('17.500', 'energy', point), pointFound('1.5', 'text', comma), pointFound('17500', 'energy', comma)]).toEqual([null, null, null]);
  });

  it.each([
    ['21550 cm-1', '60', '21550(60) cm-1', '60'],
    ['464.5 nm', '0.5', '464.5(5) nm', '0.5'],
    ['464.5 nm', '2', '464.5(20) nm', '2.0'],
    ['464 nm', '0.5', '464(0.5) nm', '0.5'],
    ['2.67 eV', '0.01', '2.67(1) eV', '0.01'],
  ])('%s with %s is %s', (position, u, joined, back) => {
    expect(withUncertainty(position, u)).toBe(joined);
    expect(withoutUncertainty(joined)).toEqual({ position, u: back });
  });

  it.each([
    ['28600 sh', 'uncertainty', { number: '28600', shoulder: true, epsilon: null }],
    ['28600 (sh)', 'uncertainty', { number: '28600', shoulder: true, epsilon: null }],
    ['21550(60)', 'uncertainty', { number: '21550(60)', shoulder: false, epsilon: null }],
    ['21550 (36)', 'epsilon', { number: '21550', shoulder: false, epsilon: '36' }],
    ['28600 sh (ε = 12)', 'epsilon', { number: '28600', shoulder: true, epsilon: '12' }],
    ['464 (36) nm', 'epsilon', { number: '464 nm', shoulder: false, epsilon: '36' }],
    ['28600 (sh)', 'epsilon', { number: '28600', shoulder: true, epsilon: null }],
  ] as const)('a position %s with brackets for the %s', (cell, brackets, parts) => {
    expect(positionParts(cell, brackets)).toEqual(parts);
  });
});

describe('cells of several texts', () => {
  it.each([
    ['5 ammine + 1 chlorido', { ammine: '5', chlorido: '1' }],
    ['2 oxalato (1 bound) + 4 aqua', { oxalato: { count: '2', bound: '1' }, aqua: '4' }],
  ])('%s are ligands', (cell, ligands) => {
    expect(ligandsFromCell(cell)).toEqual(ligands);
    expect(ligandsCell(ligands as Parameters<typeof ligandsCell>[0])).toBe(cell);
  });
  it.each(['ammine: 5, chlorido: 1', '{ ammine: 5, chlorido: 1 }', '5x ammine; chlorido'])('%s are the same', (cell) => {
    expect(ligandsFromCell(cell)).toEqual({ ammine: '5', chlorido: '1' });
  });
  it.each(['NH3 (5)', '5 ammine + 1 ammine', ''])('"%s" cannot be read so', (cell) => {
    expect(ligandsFromCell(cell)).toBeNull();
  });
  it('candidates for a term and hazard cautions', () => {
    expect(termsFromCell('4T1g(F) or CT')).toEqual(['4T1g(F)', 'CT']);
    expect(termsFromCell('4T2g')).toBe('4T2g');
    const hazards = { PERCHLORATE: 'never dry; never heated', AZIDE: 'not isolated' };
    expect(hazardsFromCell(hazardsCell(hazards))).toEqual(hazards);
    expect(hazardsFromCell('never dry')).toBeNull();
  });
});

describe('a header', () => {
  it.each([
    ['Complex', 'formula', null, null],
    ['λmax (nm)', 'position', 'nm', null],
    ['ν̃max / cm⁻¹', 'position', 'cm-1', null],
    ['ν̃₁ / 10³ cm⁻¹', 'position', 'kK', 1],
    ['v2 [cm^-1]', 'position', 'cm^-1', 2],
    ['E in eV', 'position', 'eV', null],
    ['T/K', 'temperature', 'K', null],
    ['Temp. (°C)', 'temperature', '°C', null],
    ['ε / (L mol⁻¹ cm⁻¹)', 'epsilon', null, null],
    ['ε1 (M-1 cm-1)', 'epsilon', null, 1],
    ['10Dq (cm-1)', 'quoted.Delta', 'cm-1', null],
    ['Dq', 'quoted.Dq', null, null],
    ['B / cm-1', 'quoted.B', 'cm-1', null],
    ['c (mol/L)', 'concentration', 'mol/L', null],
    ['C', 'quoted.C', null, null],
    ['Solvent', 'medium', null, null],
    ['source.notebook', 'source.notebook', null, null],
    ['band.notes 3', 'band.notes', null, 3],
    ['log ε', null, null, null],
    ['yield (%)', null, null, null],
    ['', null, null, null],
  ])('%s', (header, field, unit, number) => {
    expect(readHeader(header)).toMatchObject({ field, unit, number });
  });
  it('that is a term heads the positions of that band', () => {
    expect(readHeader('4T1g(F) / cm-1')).toMatchObject({ field: 'position', unit: 'cm-1', term: '4T1g(F)' });
  });
  it('that names the epsilon in brackets says what the brackets hold', () => {
    expect(readHeader('λ/nm (ε)')).toMatchObject({ field: 'position', unit: 'nm', brackets: 'epsilon' });
  });
});
