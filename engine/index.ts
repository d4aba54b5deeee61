// Ions and free-ion sets
export { atomicLevelsSet, racahBOfTwoTerms } from './ions/atomicLevels.ts';
export { barycentre } from './ions/barycentre.ts';
export { fitTerms } from './ions/fitTerms.ts';
export { freeIon, freeIonSets, freeIonsIn } from './ions/freeIon.ts';
export { elementName, metalOf, metals } from './ions/metals.ts';
export { ionName, readRomanNumeral, romanNumeral } from './ions/oxidation.ts';
export { parseIon } from './ions/parseIon.ts';
export { readIonLoosely } from './ions/readIonLoosely.ts';
export { termEnergies, termFormulas } from './ions/termFormulas.ts';
export { termSource, termTables } from './ions/terms.ts';
export type { FreeIonSet } from './ions/freeIon.ts';
export type { Metal } from './ions/metals.ts';
export type { IonFault, ParsedIon } from './ions/parseIon.ts';
export type { FreeIon, FreeIonSetName, Geometry, Ion } from './ions/types.ts';
// The policy
export { defaultPolicy, policyId } from './policy/policy.ts';
export type { Estimate, FloorClass, Policy } from './policy/types.ts';
// Measurements: what goes in
export { bandUncertainty } from './measurement/defaultUncertainty.ts';
export { couldBeSeen } from './measurement/scanned.ts';
export type { Band, BandKind, BandRole, Measurement } from './measurement/types.ts';
export type { Range } from './quantity/range.ts';
// Cautions and words
export { cautionMeanings } from './cautions/catalogue.ts';
export { complexCautions } from './cautions/ofComplex.ts';
export { evidenceHeading, evidenceWords } from './words/ranking.ts';
export { partInFit } from './words/inFit.ts';
export { noStress, pairAlone, pairsCaption, stressTable } from './words/stress.ts';
export type { StressColumn } from './words/stress.ts';
export type { ComplexFacts, MeasurementFacts } from './cautions/ofComplex.ts';
export type { CautionMeaning, CautionSubject } from './cautions/catalogue.ts';
export type { Caution } from './cautions/types.ts';
export type { ParameterName, Standing, Verdict } from './words/types.ts';
// Readings: what comes out
export { readMeasurement, readWithRivals } from './readings/read.ts';
export { fitAssignment } from './readings/fit.ts';
export { isFit } from './readings/fitTypes.ts';
export { ratioFor } from './readings/ratioFor.ts';
export type { Assigned } from './readings/fitTypes.ts';
export type {
  Branch, DoubletOrder, Evidence, EvidenceCode, GroundState, HelpfulBand, Identifiability, LeftOut, PairAlone, Parameter, PredictedBand, RatioUsed,
  Reading, ReadingBand, ReadMeasurement, Stress,
} from './readings/types.ts';
export { auditQuoted, disagreesFrom } from './readings/audit.ts';
export { fewestSpare, floorFactor } from './readings/kappa.ts';
export { absorptivityLimits, evidenceWeights, usualAbsorptivities, usualBeta, widthLimits } from './readings/evidenceWeights.ts';
export { equalWithin, strainedBelow } from './readings/verdictLimits.ts';
export type { AuditRow, Quoted } from './readings/audit.ts';
export type { FloorFactor, ResidualRow } from './readings/kappa.ts';
// Series: what may be compared
export { aquaLigand, publishedFactor, publishedIonOf, publishedLigandOf } from './series/publishedMatch.ts';
export { byIon, ionSubject, ligandSubject, roomTemperature, selectComparable, temperatureReach, usualSeries, whyUnlike } from './series/comparable.ts';
export { difference, differenceBasis, distinguishableAbove } from './series/difference.ts';
export { complexKey, ionKey, ionWords, ligandSetKey, measurementId, onlyLigand, phaseClass, spinName } from './series/identity.ts';
export { indistinguishableGroups } from './series/groups.ts';
export { comparisonCautions, parametersByName, seriesResult, usedTransitions } from './series/summary.ts';
export { seriesParameters } from './series/types.ts';
export type { BoundLigand, ComplexIdentity, MeasurementId, PhaseClass, SeriesLigand, SeriesNumber, SeriesParameter, SeriesResult } from './series/types.ts';
export type { Comparable, Frame, NotCompared, Subject } from './series/comparable.ts';
export type { Difference, DifferenceBasis } from './series/difference.ts';
export type { IndistinguishableGroup } from './series/groups.ts';
// Series: factors
export { factorMap } from './series/factorMap.ts';
export { factorSeries } from './series/factorSeries.ts';
export { fitFactors } from './series/factors.ts';
export { isPrediction, predictFromFactors } from './series/predictFromFactors.ts';
export { publishedFactorsFromMemory, publishedFactorsSource, publishedIons, publishedLigands } from './series/published.ts';
export { conditionWords, leftOutWords, notDistinguishableSentence } from './words/series.ts';
export type { Unlike, UnlikeKind } from './words/series.ts';
export { scatterSentence } from './words/factors.ts';
export type { Factor, FactorComplex, FactorFit, FactorIsland, FactorKind, FactorPrediction, FactorScatter, FactorSolution } from './series/factorTypes.ts';
export type { FactorOrder } from './series/factors.ts';
export type { FactorMap, MapCell } from './series/factorMap.ts';
export type { FactorSeries } from './series/factorSeries.ts';
export type { Predicted } from './series/predictFromFactors.ts';
export type { PublishedIon, PublishedLigand } from './series/published.ts';
// Series: orders, trends, correlation
export { expectations, trendSteps } from './series/trends.ts';
export { averageFactor, inversions } from './series/inversions.ts';
export { kendallTauB, rankAgreement } from './series/rankAgreement.ts';
export { planeCorrelation, planePoints } from './series/correlation.ts';
export { seededRandom } from './series/random.ts';
export type { Expectation, TrendKind, TrendStep } from './series/trends.ts';
export type { Inversion } from './series/inversions.ts';
export type { PlaneCorrelation, PlanePoint } from './series/correlation.ts';
export type { RankAgreement, Ranked } from './series/rankAgreement.ts';
// Series: placing a complex
export { averageEnvironment, parentsOf } from './series/averageEnvironment.ts';
export { memberPlacements, reviewAbove } from './series/memberPlacement.ts';
export { placeResult, placingGround } from './series/place.ts';
export { frameConditions, placeWords } from './series/placeWords.ts';
export type { PlaceShown } from './series/placeWords.ts';
export type { Parents } from './series/averageEnvironment.ts';
export type { PlacedPrediction, PredictionMethod } from './series/memberPlacement.ts';
export type { NearComplex, NearestComplexes } from './series/nearest.ts';
export type { PlaceInSeries, SeriesNeighbour, Widened } from './series/placeInSeries.ts';
export type { ComparedCollection, EarlierMeasurement, Placement, PlacingCaution, PlacingGround } from './series/placeTypes.ts';
// Levels of a d^n ion in a cubic field
export { levels } from './levels/levels.ts';
export type { FieldIon, FieldParameters, Gradient, Level } from './levels/levels.ts';
export { degeneratePair, groundLabel, levelNames, parentOf, readLabel, shownLabel } from './levels/labels.ts';
export type { LabelContext, LabelFaultCode, LabelReading } from './levels/labels.ts';
export { groundCrossings, lowestLevel } from './levels/crossings.ts';
export type { GroundCrossing } from './levels/crossings.ts';
// Quantities
export { toFraction, toKelvin, toWavenumber, wavelength, wavelengthShown, widthToWavenumber } from './quantity/convert.ts';
export { parseQuantity } from './quantity/parse.ts';
export { concise, conciseParts, conciseTwoSided, plain, significant, uncertaintyPlace } from './quantity/print.ts';
export { parseRange, parseRanges } from './quantity/range.ts';
export { plainCharacters } from './quantity/spelling.ts';
export { unitShown, unitsFor } from './quantity/units.ts';
export type { Wavenumber } from './quantity/convert.ts';
export type { Allowance } from './quantity/parse.ts';
export type { ConciseParts, PrintForm } from './quantity/print.ts';
export type { Coverage, ParsedQuantity, Quantity, QuantityCode, QuantityFault, Unit, Wanted } from './quantity/types.ts';
// The text of a record
export { bandFields, complexFields, measurementFields, quotedFields } from './record/order.ts';
export { recordText } from './record/recordText.ts';
export { quotedText, typedText } from './record/quote.ts';
export { slug, suggestedId, suggestedMeasurementId } from './record/suggestedId.ts';
export type { RecordTextOptions } from './record/recordText.ts';
export type { Typed, TypedBand, TypedComplex, TypedLigandCount, TypedMeasurement, TypedOverride, TypedQuoted, TypedSource } from './record/types.ts';
// Hazard cautions
export { hazardCautions, hazardCodes, hazardFooter } from './cautions/hazards.ts';
export type { HazardCaution, HazardSubject } from './cautions/hazards.ts';
// Formulas
export { complexCharge, donorCount } from './formula/checks.ts';
export { compositionOf, containsComplex, elementCounts, entitiesOf, groupsOf } from './formula/composition.ts';
export { elementSymbols } from './formula/elements.ts';
export { formulaKeys } from './formula/keys.ts';
export { additiveName } from './formula/names.ts';
export { parseFormula } from './formula/parse.ts';
export { chargeShown, formulaParts, plainFormula } from './formula/print.ts';
export { normaliseQuery, searchMatch, searchScore } from './formula/search.ts';
export { spokenFormula } from './formula/spoken.ts';
export { spokenTerm, termParts } from './formula/terms.ts';
export type { Abbreviation, Composition } from './formula/composition.ts';
export type { FormulaKeys, SearchedComplex, SearchedLigand } from './formula/keys.ts';
export type { LigandName } from './formula/names.ts';
export type { FormulaOptions } from './formula/parse.ts';
export type { FormulaMatch, MatchKind, NormalisedQuery, QueryWord } from './formula/search.ts';
export { folded, nameWords, squeezed } from './formula/words.ts';
export type { Formula, FormulaCode, FormulaFault, FormulaNode, FormulaPart, TextPart } from './formula/types.ts';
// What the bench measures the engine's own speed by
export { symmetricEigen } from './linear/symmetricEigen.ts';
export { shellBlocks } from './shell/blocks.ts';
export type { Block } from './shell/blocks.ts';
