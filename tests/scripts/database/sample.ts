import { defaultPolicy, parseIon, policyId } from '#engine';
import type { Band, Ion, Measurement, Reading } from '#engine';
import type { Collection, ComplexRecord, LigandRecord, MeasurementRecord } from '../../../scripts/content/types.ts';

/** An invented collection built in code, for tests of the database that must not hang on the record reader. */

export function ion(name: string): Ion {
  const parsed = parseIon(name);
  if (parsed.ion === null) throw new Error(parsed.reason);
  return parsed.ion;
}

export function band(position: number, changes: Partial<Band> = {}): Band {
  return {
    position, uMinus: 60, uPlus: 60, halfDigit: 5, coverageNotStated: false, kind: 'maximum', side: null, width: 3000,
    epsilon: 30, strength: null, degeneracy: null, deconvoluted: false, role: 'transition', terms: [], leftOut: null, ...changes,
  };
}

export function measurement(bands: readonly Band[], changes: Partial<Measurement> = {}): Measurement {
  return {
    ion: ion('Cr(III)'), geometry: 'octahedral', geometryName: 'octahedral', multiplicity: 4, phase: 'solution', medium: null, temperature: 295,
    technique: 'absorption', bands, absent: [{ low: 28600, high: 33300 }], scanned: [{ low: 9091, high: 33333 }],
    innocenceDoubtful: false, nuclearity: 1, donors: null, ...changes,
  };
}

export function measurementRecord(id: string, engine: Measurement, changes: Partial<MeasurementRecord> = {}): MeasurementRecord {
  return {
    id, engine, bands: engine.bands.map(({ position }) => ({ positionTyped: `${position}(60) cm-1`, widthTyped: '3000 cm-1', notes: null })),
    absentNotes: engine.absent.map(() => null),
    sample: '[Cr(NH3)6](ClO4)3', medium: 'water', temperatureTyped: '295 K', temperatureU: null, temperatureAssumed: false,
    scannedTyped: '300 - 1100 nm', host: null, notebook: '17, p. 42', by: 'TL', date: '2024-03-11', cite: null, where: null,
    concentration: null, pathLength: null, batch: null, rawFile: null, rawHash: null, magneticMoment: null, eprG: null, notes: null,
    quoted: [{ Delta: 21600, Dq: null, B: 650, C: null, beta: null, cite: 'thesis', where: 'p. 12', typed: { Delta: '21600 cm-1', B: '650 cm-1' } }],
    policy: defaultPolicy, policyReason: null, ...changes,
  };
}

export const ammine: LigandRecord = {
  id: 'ammine', file: 'ligands/ammine.yaml', name: 'ammine', formula: 'NH3', abbreviation: null, synonyms: ['ammonia'], charge: 0,
  denticity: 1, donors: ['N'], smiles: 'N', notes: null,
};

export function complexRecord(id: string, measurements: readonly MeasurementRecord[], changes: Partial<ComplexRecord> = {}): ComplexRecord {
  return {
    id, file: `complexes/${id}.yaml`, hash: 'ab'.repeat(32), formula: '[Cr(NH3)6]3+', name: null, charge: 3, chargeNote: null, ion: ion('Cr(III)'),
    geometryName: 'octahedral', geometry: 'octahedral', isomer: 'none', ligands: [{ ligand: 'ammine', count: 6, bound: 1 }],
    spinTyped: 'quartet', multiplicity: 4, spinAssumed: false, notes: null, hazardOverrides: {}, measurements, ...changes,
  };
}

export function collection(complexes: readonly ComplexRecord[]): Collection {
  return {
    group: {
      title: 'Invented bands', name: 'An invented group', description: null, contact: null,
      people: [{ name: 'T. Lind', orcid: null, initials: 'TL' }], licence: 'CC-BY-4.0', url: 'https://example.org/bands/',
      release: '2026.1', started: '2006-09-01', doi: null, demonstration: true,
    },
    policy: defaultPolicy, policyId: policyId(defaultPolicy), ligands: [ammine],
    sources: [{
      id: 'thesis', file: 'sources/thesis.yaml', reference: 'An invented thesis', authors: ['T. Lind'], title: null, journal: null,
      year: '2010', volume: null, pages: null, doi: null, url: null,
    }],
    complexes,
  };
}

/** A reading made by hand: it has every kind of row. Its numbers are not a fit. */
export const handMadeReading: Reading = {
  verdict: 'untested', reason: 'No band is spare.', assignment: 'typed', geometry: 'octahedral', multiplicity: 4, ground: 'a4A2g',
  bands: [
    { bands: [0], label: 'a4T2g', observed: 21550, uMinus: 60, uPlus: 60, uAssumed: false, floor: 150, used: true, calculated: 21550, residual: 0, leverage: 1, gradient: { delta: 1, racahB: 0, racahC: 0 } },
    { bands: [1, 2], label: 'a4T1g', observed: 28490, uMinus: 60, uPlus: 80, uAssumed: true, floor: 150, used: true, calculated: 28490.5, residual: -0.5, leverage: 1, gradient: { delta: 1.2, racahB: 5.1, racahC: 0 } },
  ],
  notFitted: [{ band: 3, reason: 'charge transfer' }],
  branches: [{ delta: 21550, racahB: 650.25, racahC: 2926, chi2: 0, chosen: true }, { delta: 21550, racahB: 1650, racahC: 7425, chi2: 0, chosen: false }],
  parameters: [
    { name: 'Delta', value: 21550, u: 60, uTotal: 161.5, limits: null, standing: 'fitted', reason: null },
    { name: 'B', value: 650.25, u: 12, uTotal: 33, limits: { low: 618, high: 685 }, standing: 'fitted', reason: null },
    { name: 'C', value: null, u: null, uTotal: null, limits: null, standing: 'withheld', reason: 'C is assumed from C/B and never published.' },
    { name: 'beta', value: 0.708, u: 0.013, uTotal: 0.036, limits: null, standing: 'fitted', reason: null },
  ],
  correlations: [{ first: 'B', second: 'Delta', value: -0.62 }],
  deltaOverB: 33.14, chi2: 0, bandsUsed: 2, spareBands: 0, rmsResidual: 0.35, ratio: { value: 4.5, u: 0.9, origin: 'policy' },
  predicted: [{ label: 'b4T1g', position: 44600, u: 700, spinAllowed: true, looked: 'outside' }],
  cautions: [{ code: 'NO_SPARE', text: 'No test is possible.' }],
  measureNext: 'nu3, expected near 44 600',
  helpfulBands: [{ label: 'b4T1g', low: 43200, high: 46000, gains: [{ parameter: 'B', uNow: 33, uThen: 20 }], sentence: 'nu3, expected near 44 600' }],
  score: 4, evidence: [{ code: 'parameters', penalty: 4, label: '', value: null }], ranking: null,
  identifiability: { singularValues: [140, 12], rank: 2, combination: null },
  stress: {
    pairs: [{ bands: [0, 1], labels: ['a4T2g', 'a4T1g'], at: { delta: 21550, racahB: 650.25, racahC: 2926 } }],
    leftOut: [{ label: 'a4T1g', band: 0, at: null, predicted: null, z: null }],
  },
  groundState: { crossing: null, stabilisationInDelta: -1.2, stabilisation: -25860 }, doubletOrder: null,
  remarks: ['The ground level is stabilised by 1.2 Delta.'], sentence: 'Delta 21550(160) cm-1, B 650(33) cm-1; no test possible.',
};

/** Four bands that the hand-made reading speaks of. */
export const handMadeMeasurement: Measurement = measurement([
  band(21550), band(28400, { kind: 'component', degeneracy: 2 }), band(28670, { kind: 'component', degeneracy: 1 }), band(41000, { role: 'CT' }),
]);
