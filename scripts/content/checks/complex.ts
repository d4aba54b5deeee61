// What must fit together within the record of a complex, and between it and the rest of the collection.

import { hazardCodes } from '#engine';
import type { Draft } from '../draft.ts';
import { nearNames, orList } from '../nearest.ts';
import { typedText } from '../report.ts';
import type { Reporter } from '../report.ts';
import type { complexSchema } from '../schema/complex.ts';
import { hasSpinChoice, fittedGeometry, lowSpinMultiplicity, possibleMultiplicities, resolvedSpin } from '../spin.ts';
import type { LigandRecord } from '../types.ts';
import { checkBands } from './bands.ts';
import { checkEvidence } from './evidence.ts';
import { checkFormula, checkSample } from './formula.ts';
import { checkLigands } from './ligands.ts';
import { checkTerms } from './terms.ts';

/** The other records, as far as they are needed. The sets of ids hold records with faults too. */
export interface KnownRecords {
  readonly ligands: ReadonlyMap<string, LigandRecord>;
  readonly ligandIds: ReadonlySet<string>;
  readonly sourceIds: ReadonlySet<string>;
}

export type ComplexDraft = NonNullable<Draft<typeof complexSchema>>;
export type MeasurementDraft = NonNullable<NonNullable<ComplexDraft['measurements']>[number]>;

/** Checks all that could be read; what could not be read was reported before and is passed over. */
export function checkComplex(complex: Draft<typeof complexSchema>, report: Reporter, known: KnownRecords): void {
  if (complex === undefined) return;
  const ligands = checkLigands(complex, report, known);
  const formula = checkFormula(complex, ligands, report, known);
  const multiplicity = checkSpin(complex, report);
  checkHazards(complex, report);
  const ids = new Map<string, number>();
  complex.measurements?.forEach((measurement, index) => {
    if (measurement === undefined) return;
    const path = ['measurements', index] as const;
    if (measurement.id !== undefined) {
      const earlier = ids.get(measurement.id);
      if (earlier !== undefined) {
        report.at([...path, 'id'], { code: 'DUPLICATE_ID', found: typedText(measurement.id), expected: `an id of its own; measurement ${earlier + 1} of this record has it already`, mend: 'give one of the two another id' });
      } else ids.set(measurement.id, index);
    }
    checkSources(measurement, path, report, known);
    checkOverride(measurement, path, report);
    checkSample(measurement, path, complex.formula, formula, report, known);
    checkBands(measurement, path, report);
    if (multiplicity === 'unknown') return;
    checkTerms(complex, measurement, path, multiplicity, report);
    checkEvidence(complex, measurement, path, multiplicity, report);
  });
}

/** Reports a spin that is missing or impossible. Returns the multiplicity for reading terms, or "unknown" where nothing can be said. */
function checkSpin(complex: ComplexDraft, report: Reporter): number | null | 'unknown' {
  const { ion, geometry, spin } = complex;
  if (ion === undefined || geometry === undefined) return 'unknown';
  // A spin that could not be read was reported already.
  if (spin === undefined && Object.hasOwn(complex, 'spin')) return 'unknown';
  const { electrons } = ion;
  const fitted = fittedGeometry(geometry);
  if (spin === undefined) {
    if (fitted !== 'octahedral' || !hasSpinChoice(electrons, fitted)) return null;
    const [high, low] = [possibleMultiplicities(electrons)[0]!, lowSpinMultiplicity(electrons, fitted)!];
    report.at(['ion'], {
      code: 'SPIN_MISSING', found: 'no "spin"', expected: `the spin of octahedral ${ion.name}, d${electrons}: high (multiplicity ${high}) or low (${low})`,
      mend: 'add a line  spin: high  or  spin: low',
    }, ['spin']);
    return 'unknown';
  }
  const resolved = resolvedSpin(electrons, geometry, spin);
  if (resolved.multiplicity !== null) return resolved.multiplicity;
  report.at(['spin'], {
    code: 'SPIN_IMPOSSIBLE', found: typedText(spin), expected: `a spin of ${geometry} ${ion.name}, d${electrons}: ${orList(resolved.possible)}`,
    mend: resolved.possible.length <= 2 ? `write ${orList(resolved.possible)}, leave spin out, or check the ion` : 'write one of these, or check the ion',
  });
  return 'unknown';
}

function checkHazards({ hazards }: ComplexDraft, report: Reporter): void {
  for (const code of Object.keys(hazards ?? {})) {
    if (hazardCodes.includes(code)) continue;
    const near = nearNames(code, hazardCodes, 2);
    report.at(['hazards', code], { code: 'HAZARD_UNKNOWN', found: typedText(code), expected: `a code of a hazard caution: ${hazardCodes.join(', ')}`, mend: near.length > 0 ? `write ${orList(near)}` : 'copy the code from the caution on the page of the complex' });
  }
}

function checkSources(measurement: MeasurementDraft, path: readonly (string | number)[], report: Reporter, known: KnownRecords): void {
  const { source } = measurement;
  if (source !== undefined && source.notebook === undefined && source.cite === undefined && !report.faults.some((fault) => fault.field.startsWith(`measurements[${path[1]}].source`))) {
    report.at([...path, 'source'], { code: 'NO_SOURCE', found: 'neither notebook nor cite', expected: 'where the readings come from', mend: 'add  notebook: "17, p. 42"  or  cite: author-1999' });
  }
  const cites = [{ cite: source?.cite, at: [...path, 'source', 'cite'] }, ...(measurement.quoted ?? []).map((quoted, index) => ({ cite: quoted?.cite, at: [...path, 'quoted', index, 'cite'] }))];
  for (const { cite, at } of cites) {
    if (cite === undefined || known.sourceIds.has(cite)) continue;
    const near = nearNames(cite, known.sourceIds);
    report.at(at, { code: 'UNKNOWN_SOURCE', found: typedText(cite), expected: 'the id of a record in sources/', mend: near.length > 0 ? `write ${orList(near)}` : `make the file sources/${cite}.yaml` });
  }
}

function checkOverride({ policy }: MeasurementDraft, path: readonly (string | number)[], report: Reporter): void {
  if (policy === undefined) return;
  const named = Object.entries(policy).filter(([name, value]) => name !== 'because' && value !== undefined).map(([name]) => name);
  if (named.length === 1 || report.faults.some((fault) => fault.field.startsWith(`measurements[${path[1]}].policy`))) return;
  report.at([...path, 'policy'], {
    code: 'POLICY_OVERRIDE', found: named.length === 0 ? 'a reason without a value' : named.join(' and '), expected: 'one policy value and the reason, e.g. { C/B: 4.0(3), because: "..." }',
    mend: named.length === 0 ? 'add the value, or delete policy' : 'keep one of them; where more should change, change policy.yaml',
  });
}
