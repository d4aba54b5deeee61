/**
 * The database's rows as the site reads them: one interface a table, columns under the database's own names.
 * `scripts/database/schema.sql` says what each holds.
 */
type Flag = 0 | 1;
interface OfMeasurement { readonly complex: string; readonly measurement: string }
interface OfReading extends OfMeasurement { readonly reading: number }

export interface MetaRow { readonly key: string; readonly value: string }
export interface PersonRow { readonly number: number; readonly name: string; readonly orcid: string | null; readonly initials: string | null }
export interface PolicyRow {
  readonly id: string; readonly name: string; readonly in_force: Flag;
  readonly C_over_B: number; readonly C_over_B_u: number; readonly C_over_B_per_ion: string; readonly C_fitted: Flag;
  readonly floor_general: number; readonly floor_spin_flip: number; readonly floor_two_electron: number;
  readonly ceiling_Delta: number; readonly ceiling_B: number; readonly ceiling_C: number;
  readonly differential_Delta: number; readonly differential_B: number;
  readonly free_ion_set: string; readonly rival_margin: number;
  readonly default_u_maximum: number; readonly default_u_line: number;
}
export interface IonRow { readonly name: string; readonly metal: string; readonly oxidation: number; readonly electrons: number; readonly shell: string }
export interface FreeIonRow { readonly set_name: string; readonly ion: string; readonly B0: number; readonly C0: number | null; readonly kind: string; readonly source: string }
export interface SourceRow {
  readonly id: string; readonly reference: string; readonly authors: string; readonly title: string | null; readonly journal: string | null;
  readonly year: string | null; readonly volume: string | null; readonly pages: string | null; readonly doi: string | null; readonly url: string | null;
}
export interface LigandRow {
  readonly id: string; readonly file: string; readonly name: string; readonly formula: string; readonly abbreviation: string | null;
  readonly synonyms: string; readonly charge: number; readonly denticity: number; readonly donors: string;
  readonly smiles: string | null; readonly notes: string | null;
}
export interface ComplexRow {
  readonly id: string; readonly file: string; readonly hash: string; readonly formula: string; readonly name: string | null;
  readonly charge: number; readonly ion: string; readonly geometry: string; readonly fitted: Flag; readonly isomer: string;
  readonly spin: string | null; readonly multiplicity: number | null; readonly spin_typed: string | null; readonly spin_assumed: Flag;
  readonly notes: string | null;
}
export interface ComplexLigandRow { readonly complex: string; readonly ligand: string; readonly number: number; readonly count: number; readonly bound: number }
export interface MeasurementRow {
  readonly complex: string; readonly id: string; readonly number: number; readonly sample: string | null; readonly phase: string;
  readonly medium: string | null; readonly host: string | null;
  readonly temperature_K: number | null; readonly temperature_u_K: number | null; readonly temperature_typed: string | null; readonly temperature_assumed: Flag;
  readonly technique: string | null; readonly scanned_typed: string | null; readonly notebook: string | null; readonly measured_by: string | null;
  readonly measured_on: string | null; readonly source: string | null; readonly source_place: string | null;
  readonly concentration: string | null; readonly path_length: string | null; readonly batch: string | null;
  readonly raw_file: string | null; readonly raw_hash: string | null; readonly magnetic_moment: string | null; readonly epr_g: string | null;
  readonly innocence_doubtful: Flag; readonly nuclearity: number; readonly policy: string; readonly policy_reason: string | null; readonly notes: string | null;
}
export interface ObservedRangeRow extends OfMeasurement { readonly kind: 'scanned' | 'absent'; readonly number: number; readonly low: number; readonly high: number }
export interface BandRow extends OfMeasurement {
  readonly number: number; readonly position_typed: string; readonly position: number;
  readonly u_minus: number | null; readonly u_plus: number | null; readonly half_digit: number; readonly coverage_not_stated: Flag;
  readonly kind: string; readonly side: 'higher' | 'lower' | null; readonly width_typed: string | null; readonly width: number | null;
  readonly epsilon: number | null; readonly strength: string | null; readonly degeneracy: number | null; readonly deconvoluted: Flag;
  readonly role: string; readonly terms: string; readonly left_out: string | null; readonly notes: string | null;
}
export interface QuotedRow extends OfMeasurement { readonly number: number; readonly parameter: string; readonly value: number; readonly typed: string; readonly source: string; readonly source_place: string | null }
export interface ReadingRow extends OfMeasurement {
  readonly number: number; readonly chosen: Flag; readonly verdict: string; readonly reason: string; readonly assignment: string;
  readonly geometry: string | null; readonly multiplicity: number | null; readonly ground: string | null;
  readonly Delta_over_B: number | null; readonly chi2: number | null; readonly bands_used: number; readonly spare_bands: number; readonly rms_residual: number | null;
  readonly C_over_B: number | null; readonly C_over_B_u: number | null; readonly C_over_B_origin: string | null;
  readonly free_ion_set: string; readonly policy: string; readonly measure_next: string | null;
  readonly score: number | null; readonly ranking: string | null; readonly combination: string | null; readonly rank: number | null;
  readonly remarks: string; readonly sentence: string;
}
export interface StressLeftOutRow extends OfReading { readonly number: number; readonly label: string; readonly Delta: number | null; readonly B: number | null; readonly C: number | null; readonly predicted: number | null; readonly z: number | null }
export interface StressPairRow extends OfReading { readonly first_number: number; readonly second_number: number; readonly first: string; readonly second: string; readonly Delta: number | null; readonly B: number | null }
export interface EvidenceRow extends OfReading { readonly number: number; readonly code: string; readonly label: string | null; readonly penalty: number; readonly text: string }
export interface HelpfulBandRow extends OfReading {
  readonly number: number; readonly parameter: 'Delta' | 'B' | 'C'; readonly label: string; readonly low: number; readonly high: number;
  readonly u_now: number | null; readonly u_then: number; readonly sentence: string;
}
export interface AuditRow extends OfMeasurement {
  readonly number: number; readonly parameter: 'Delta' | 'B' | 'C' | 'beta'; readonly quoted: number; readonly refitted: number | null;
  readonly u_total: number | null; readonly difference: number | null; readonly z: number | null; readonly cause: string | null;
}
export interface PlacementRow extends OfMeasurement {
  readonly parameter: 'Delta' | 'B' | 'beta'; readonly method: string; readonly predicted: number | null; readonly u: number | null;
  readonly z: number | null; readonly reason: string | null;
}
export interface FloorFactorRow { readonly ion: string; readonly geometry: string; readonly kappa: number; readonly u: number; readonly spare_bands: number }
export interface FrozenReleaseRow {
  readonly id: string; readonly number: number; readonly date: string; readonly who: string; readonly cause: string; readonly doi: string | null;
  readonly complexes: number; readonly measurements: number;
}
export interface FrozenValueRow extends OfMeasurement { readonly release: string; readonly parameter: 'Delta' | 'B' | 'C' | 'beta'; readonly value: number | null; readonly u_total: number | null }
export interface ChangeRow { readonly number: number; readonly release: string | null; readonly complex: string; readonly measurement: string | null; readonly cause: string; readonly text: string }
export interface GoneRow { readonly address: string; readonly kind: 'tombstone' | 'redirect' | 'corrected'; readonly target: string | null; readonly reason: string | null }
export interface ReviewRow extends OfMeasurement { readonly number: number; readonly kind: string; readonly text: string }
export interface ReadingBandRow extends OfReading {
  readonly number: number; readonly label: string; readonly observed: number; readonly u_minus: number; readonly u_plus: number;
  readonly u_assumed: Flag; readonly floor: number; readonly used: Flag; readonly calculated: number | null; readonly residual: number | null;
  readonly leverage: number | null; readonly gradient_Delta: number | null; readonly gradient_B: number | null; readonly gradient_C: number | null;
}
export interface ReadingBandMemberRow extends OfReading { readonly reading_band: number; readonly band: number }
export interface NotFittedRow extends OfReading { readonly band: number; readonly reason: string }
export interface BranchRow extends OfReading { readonly number: number; readonly Delta: number; readonly B: number; readonly C: number; readonly chi2: number; readonly chosen: Flag }
export interface ParameterRow extends OfReading {
  readonly name: 'Delta' | 'B' | 'C' | 'beta'; readonly value: number | null; readonly u: number | null; readonly u_total: number | null;
  readonly low: number | null; readonly high: number | null; readonly standing: string; readonly reason: string | null;
}
export interface CorrelationRow extends OfReading { readonly first: string; readonly second: string; readonly value: number }
export interface PredictedBandRow extends OfReading { readonly label: string; readonly position: number; readonly u: number; readonly spin_allowed: Flag; readonly looked: string }
export interface CautionRow {
  readonly complex: string; readonly number: number; readonly subject: 'hazard' | 'spectral'; readonly measurement: string | null; readonly reading: number | null;
  readonly code: string; readonly found_in: string | null; readonly text: string;
}
export interface HazardOverrideRow { readonly complex: string; readonly code: string; readonly reason: string }

/** All rows, each table in the order of its key. */
export interface Rows {
  readonly meta: readonly MetaRow[];
  readonly person: readonly PersonRow[];
  readonly policy: readonly PolicyRow[];
  readonly ion: readonly IonRow[];
  readonly free_ion: readonly FreeIonRow[];
  readonly source: readonly SourceRow[];
  readonly ligand: readonly LigandRow[];
  readonly complex: readonly ComplexRow[];
  readonly complex_ligand: readonly ComplexLigandRow[];
  readonly measurement: readonly MeasurementRow[];
  readonly observed_range: readonly ObservedRangeRow[];
  readonly band: readonly BandRow[];
  readonly quoted: readonly QuotedRow[];
  readonly reading: readonly ReadingRow[];
  readonly reading_band: readonly ReadingBandRow[];
  readonly reading_band_member: readonly ReadingBandMemberRow[];
  readonly not_fitted: readonly NotFittedRow[];
  readonly branch: readonly BranchRow[];
  readonly stress_left_out: readonly StressLeftOutRow[];
  readonly stress_pair: readonly StressPairRow[];
  readonly evidence: readonly EvidenceRow[];
  readonly helpful_band: readonly HelpfulBandRow[];
  readonly parameter: readonly ParameterRow[];
  readonly correlation: readonly CorrelationRow[];
  readonly predicted_band: readonly PredictedBandRow[];
  readonly caution: readonly CautionRow[];
  readonly hazard_override: readonly HazardOverrideRow[];
  readonly audit: readonly AuditRow[];
  readonly placement: readonly PlacementRow[];
  readonly floor_factor: readonly FloorFactorRow[];
  readonly review: readonly ReviewRow[];
  readonly frozen_release: readonly FrozenReleaseRow[];
  readonly frozen_value: readonly FrozenValueRow[];
  readonly change: readonly ChangeRow[];
  readonly gone: readonly GoneRow[];
}
