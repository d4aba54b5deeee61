-- The collection's database. One file holds what was read, what was fitted, and what may be said of it.
--
-- Conventions
--   Energies are in cm-1. `u` is one standard uncertainty. Temperatures are in K.
--   NULL means not recorded, or withheld with the reason in the same row. It never stands for 0.
--   `..._typed` is the text as the group typed it; the column beside it is the parsed number.
--   Flags are 0 or 1. Lists are JSON arrays in the order typed. Bands are counted from 1 in the order typed.
--   Nothing here is a time of day or a path of a machine: the same content gives the same bytes.
--   Kept to what SQLite 3.37 can read.

-- Facts about the file itself and the group that keeps the collection, by key:
-- schema, software, engine, and group.title, group.name, group.description, group.contact, group.licence,
-- group.url, group.release, group.started, group.doi, group.demonstration ("true" or "false").
-- A key without a value has no row.
CREATE TABLE meta (
  key   TEXT NOT NULL PRIMARY KEY,
  value TEXT NOT NULL
) STRICT, WITHOUT ROWID;

-- The people of the group, in the order typed.
CREATE TABLE person (
  number   INTEGER NOT NULL PRIMARY KEY,
  name     TEXT NOT NULL,
  orcid    TEXT,
  initials TEXT
) STRICT, WITHOUT ROWID;

-- A declared set of fitting choices. The one of policy.yaml is in force; others are values that a measurement overrides.
CREATE TABLE policy (
  id                    TEXT NOT NULL PRIMARY KEY,   -- name and eight hex digits of its content
  name                  TEXT NOT NULL,
  in_force              INTEGER NOT NULL CHECK (in_force IN (0, 1)),
  C_over_B              REAL NOT NULL,
  C_over_B_u            REAL NOT NULL,
  C_over_B_per_ion      TEXT NOT NULL CHECK (json_valid(C_over_B_per_ion)),   -- {"Cr(III)": {"value": 4.5, "u": 0.5}}
  C_fitted              INTEGER NOT NULL CHECK (C_fitted IN (0, 1)),   -- 1: C is fitted where spin-flip bands determine it
  floor_general         REAL NOT NULL,
  floor_spin_flip       REAL NOT NULL,
  floor_two_electron    REAL NOT NULL,
  ceiling_Delta         REAL NOT NULL,               -- fraction: published only where u(total)/value is below
  ceiling_B             REAL NOT NULL,
  ceiling_C             REAL NOT NULL,
  differential_Delta    REAL NOT NULL,               -- cm-1
  differential_B        REAL NOT NULL,               -- fraction of B
  free_ion_set          TEXT NOT NULL,
  rival_margin          REAL NOT NULL,
  default_u_maximum     REAL NOT NULL,
  default_u_line        REAL NOT NULL
) STRICT, WITHOUT ROWID;

-- The metal ions of the collection.
CREATE TABLE ion (
  name      TEXT NOT NULL PRIMARY KEY,               -- "Cr(III)"
  metal     TEXT NOT NULL,
  oxidation INTEGER NOT NULL,
  electrons INTEGER NOT NULL CHECK (electrons BETWEEN 0 AND 10),
  shell     TEXT NOT NULL CHECK (shell IN ('3d', '4d', '5d'))
) STRICT, WITHOUT ROWID;

-- Racah parameters of the free ions, by named set. An ion without a row in a set has no beta under it.
CREATE TABLE free_ion (
  set_name TEXT NOT NULL CHECK (set_name IN ('published', 'atomic-levels')),
  ion      TEXT NOT NULL REFERENCES ion (name),
  B0       REAL NOT NULL,
  C0       REAL,
  kind     TEXT NOT NULL,                            -- how B0 was obtained
  source   TEXT NOT NULL,
  PRIMARY KEY (set_name, ion)
) STRICT, WITHOUT ROWID;

-- Publications cited by records.
CREATE TABLE source (
  id        TEXT NOT NULL PRIMARY KEY,
  file      TEXT NOT NULL,
  reference TEXT NOT NULL,
  authors   TEXT NOT NULL CHECK (json_valid(authors)),
  title     TEXT,
  journal   TEXT,
  year      TEXT,
  volume    TEXT,
  pages     TEXT,
  doi       TEXT,
  url       TEXT
) STRICT, WITHOUT ROWID;

-- Ligands, one row for each way of binding.
CREATE TABLE ligand (
  id           TEXT NOT NULL PRIMARY KEY,
  file         TEXT NOT NULL,
  name         TEXT NOT NULL,
  formula      TEXT NOT NULL,
  abbreviation TEXT,
  synonyms     TEXT NOT NULL CHECK (json_valid(synonyms)),
  charge       INTEGER NOT NULL,
  denticity    INTEGER NOT NULL CHECK (denticity > 0),
  donors       TEXT NOT NULL CHECK (json_valid(donors)),   -- element symbols, as many as denticity
  smiles       TEXT,
  notes        TEXT
) STRICT, WITHOUT ROWID;

-- A complex: its formula, ion, geometry, isomer and spin are its identity.
CREATE TABLE complex (
  id            TEXT NOT NULL PRIMARY KEY,
  file          TEXT NOT NULL,
  hash          TEXT NOT NULL,                       -- sha256 of the record's bytes, hex
  formula       TEXT NOT NULL,
  name          TEXT,
  charge        INTEGER NOT NULL,
  charge_note   TEXT,                                -- remark on how the charge was assigned
  ion           TEXT NOT NULL REFERENCES ion (name),
  geometry      TEXT NOT NULL,                       -- as typed, of the closed list
  fitted        INTEGER NOT NULL CHECK (fitted IN (0, 1)),   -- 0: a geometry that is stored and drawn, not fitted
  isomer        TEXT NOT NULL,
  spin          TEXT,                                -- declared multiplicity as a word, "quartet"
  multiplicity  INTEGER,
  spin_typed    TEXT,
  spin_assumed  INTEGER NOT NULL CHECK (spin_assumed IN (0, 1)),
  notes         TEXT
) STRICT, WITHOUT ROWID;
CREATE INDEX complex_by_ion ON complex (ion, geometry);

-- The ligands of a complex.
CREATE TABLE complex_ligand (
  complex TEXT NOT NULL REFERENCES complex (id),
  ligand  TEXT NOT NULL REFERENCES ligand (id),
  number  INTEGER NOT NULL,                          -- place in the order typed, from 1
  count   INTEGER NOT NULL CHECK (count > 0),        -- how many of this ligand
  bound   INTEGER NOT NULL CHECK (bound > 0),        -- donor atoms bound by each of them
  PRIMARY KEY (complex, ligand)
) STRICT, WITHOUT ROWID;
CREATE INDEX complex_ligand_by_ligand ON complex_ligand (ligand);

-- One spectrum of one sample under one set of conditions.
CREATE TABLE measurement (
  complex             TEXT NOT NULL REFERENCES complex (id),
  id                  TEXT NOT NULL,
  number              INTEGER NOT NULL,              -- place in the record, from 1
  sample              TEXT,
  phase               TEXT NOT NULL CHECK (phase IN ('solution', 'solid', 'crystal', 'glass', 'film')),
  medium              TEXT,
  host                TEXT,
  temperature_K       REAL,
  temperature_u_K     REAL,
  temperature_typed   TEXT,
  temperature_assumed INTEGER NOT NULL CHECK (temperature_assumed IN (0, 1)),
  technique           TEXT CHECK (technique IN ('absorption', 'diffuse reflectance', 'excitation', 'emission', 'MCD')),
  scanned_typed       TEXT,
  notebook            TEXT,
  measured_by         TEXT,
  measured_on         TEXT,                          -- ISO date
  source              TEXT REFERENCES source (id),
  source_place        TEXT,                          -- "Table 2"
  concentration       TEXT,
  path_length         TEXT,
  batch               TEXT,
  raw_file            TEXT,
  raw_hash            TEXT,
  magnetic_moment     TEXT,
  epr_g               TEXT,
  innocence_doubtful  INTEGER NOT NULL CHECK (innocence_doubtful IN (0, 1)),
  nuclearity          INTEGER NOT NULL CHECK (nuclearity > 0),
  policy              TEXT NOT NULL REFERENCES policy (id),
  policy_reason       TEXT,                          -- why this measurement overrides the policy in force
  notes               TEXT,
  PRIMARY KEY (complex, id)
) STRICT, WITHOUT ROWID;

-- Ranges that were scanned, and ranges in which the group looked and saw no band.
CREATE TABLE observed_range (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  kind        TEXT NOT NULL CHECK (kind IN ('scanned', 'absent')),
  number      INTEGER NOT NULL,
  low         REAL NOT NULL,
  high        REAL NOT NULL,
  notes       TEXT,
  PRIMARY KEY (complex, measurement, kind, number),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- The bands as they were read.
CREATE TABLE band (
  complex             TEXT NOT NULL,
  measurement         TEXT NOT NULL,
  number              INTEGER NOT NULL,
  position_typed      TEXT NOT NULL,
  position            REAL NOT NULL,
  u_minus             REAL,                          -- NULL: none typed; the reading then uses the policy's default
  u_plus              REAL,
  half_digit          REAL NOT NULL,                 -- half of the last typed digit
  coverage_not_stated INTEGER NOT NULL CHECK (coverage_not_stated IN (0, 1)),
  kind                TEXT NOT NULL CHECK (kind IN ('maximum', 'shoulder', 'line', 'zero-phonon', 'dip', 'centroid', 'component', 'envelope')),
  side                TEXT CHECK (side IN ('higher', 'lower')),   -- of a shoulder: where the stronger band lies
  width_typed         TEXT,
  width               REAL,                          -- full width at half height
  epsilon             REAL,                          -- molar absorption coefficient, L mol-1 cm-1
  strength            TEXT CHECK (strength IN ('strong', 'medium', 'weak')),
  degeneracy          INTEGER,
  deconvoluted        INTEGER NOT NULL CHECK (deconvoluted IN (0, 1)),
  role                TEXT NOT NULL CHECK (role IN ('transition', 'CT', 'ligand', 'vibration', 'impurity')),
  terms               TEXT NOT NULL CHECK (json_valid(terms)),   -- candidates as typed
  left_out            TEXT,                          -- the typed reason why the band is kept and not fitted
  notes               TEXT,
  PRIMARY KEY (complex, measurement, number),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- Parameters as printed elsewhere. Audited, never fitted. One row a parameter.
CREATE TABLE quoted (
  complex      TEXT NOT NULL,
  measurement  TEXT NOT NULL,
  number       INTEGER NOT NULL,                     -- place in the record, from 1
  parameter    TEXT NOT NULL CHECK (parameter IN ('Delta', 'Dq', 'B', 'C', 'beta')),
  value        REAL NOT NULL,
  typed        TEXT NOT NULL,
  source       TEXT NOT NULL REFERENCES source (id),
  source_place TEXT,
  PRIMARY KEY (complex, measurement, number, parameter),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- One assignment of a measurement's bands with its fit. Exactly one reading of a measurement is chosen.
CREATE TABLE reading (
  complex         TEXT NOT NULL,
  measurement     TEXT NOT NULL,
  number          INTEGER NOT NULL,                  -- 1 is the chosen reading, rivals follow
  chosen          INTEGER NOT NULL CHECK (chosen IN (0, 1)),
  verdict         TEXT NOT NULL CHECK (verdict IN ('refused', 'not determinable', 'strained', 'assumed', 'untested', 'tested')),
  reason          TEXT NOT NULL,                     -- one sentence: why this verdict
  assignment      TEXT NOT NULL CHECK (assignment IN ('typed', 'proposed', 'none')),
  geometry        TEXT CHECK (geometry IN ('octahedral', 'tetrahedral')),
  multiplicity    INTEGER,
  ground          TEXT,                              -- letter form
  Delta_over_B    REAL,
  chi2            REAL,
  bands_used      INTEGER NOT NULL,
  spare_bands     INTEGER NOT NULL,
  rms_residual    REAL,
  C_over_B        REAL,
  C_over_B_u      REAL,
  C_over_B_origin TEXT CHECK (C_over_B_origin IN ('policy', 'policy for this ion', 'fitted')),
  free_ion_set    TEXT NOT NULL,
  policy          TEXT NOT NULL REFERENCES policy (id),
  measure_next    TEXT,                              -- what would help most, in words
  score           REAL,                              -- chi2 + 2 x free parameters + evidence; lower is better
  ranking         TEXT,                              -- of a rival: why it ranks where it does
  combination     TEXT,                              -- the combination that is fixed where single numbers are not
  rank            INTEGER,                           -- how many parameters the bands fix
  singular_values TEXT CHECK (json_valid(singular_values)),   -- of the weighted Jacobian, descending
  spin_crossing   REAL,                              -- Delta/B at which the ground spin changes
  remarks         TEXT NOT NULL CHECK (json_valid(remarks)),  -- sentences on ground level and order of levels
  sentence        TEXT NOT NULL,                     -- one sentence for a thesis
  PRIMARY KEY (complex, measurement, number),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;
CREATE UNIQUE INDEX reading_chosen ON reading (complex, measurement) WHERE chosen = 1;

-- One transition of a reading. The band or merged bands behind it are in reading_band_member.
CREATE TABLE reading_band (
  complex         TEXT NOT NULL,
  measurement     TEXT NOT NULL,
  reading         INTEGER NOT NULL,
  number          INTEGER NOT NULL,
  label           TEXT NOT NULL,                     -- letter form, "b4T1g"
  observed        REAL NOT NULL,
  u_minus         REAL NOT NULL,
  u_plus          REAL NOT NULL,
  u_assumed       INTEGER NOT NULL CHECK (u_assumed IN (0, 1)),
  floor           REAL NOT NULL,                     -- model floor tau of the transition
  used            INTEGER NOT NULL CHECK (used IN (0, 1)),   -- 0: only compared with a prediction
  calculated      REAL,
  residual        REAL,                              -- observed - calculated
  leverage        REAL,                              -- how much of the fit hangs on it, 0 to 1
  gradient_Delta  REAL,                              -- d(transition energy)/d(parameter) at the fit
  gradient_B      REAL,
  gradient_C      REAL,
  PRIMARY KEY (complex, measurement, reading, number),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- The bands behind a transition; more than one where components were merged to their weighted barycentre.
CREATE TABLE reading_band_member (
  complex      TEXT NOT NULL,
  measurement  TEXT NOT NULL,
  reading      INTEGER NOT NULL,
  reading_band INTEGER NOT NULL,
  band         INTEGER NOT NULL,
  PRIMARY KEY (complex, measurement, reading, reading_band, band),
  FOREIGN KEY (complex, measurement, reading, reading_band) REFERENCES reading_band (complex, measurement, reading, number),
  FOREIGN KEY (complex, measurement, band) REFERENCES band (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- Bands that take no part in a reading, with the reason.
CREATE TABLE not_fitted (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  band        INTEGER NOT NULL,
  reason      TEXT NOT NULL,
  PRIMARY KEY (complex, measurement, reading, band),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number),
  FOREIGN KEY (complex, measurement, band) REFERENCES band (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- The local solutions of a reading.
CREATE TABLE branch (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  number      INTEGER NOT NULL,
  Delta       REAL NOT NULL,
  B           REAL NOT NULL,
  C           REAL NOT NULL,
  chi2        REAL NOT NULL,
  chosen      INTEGER NOT NULL CHECK (chosen IN (0, 1)),
  PRIMARY KEY (complex, measurement, reading, number),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- Delta, B, C and beta of a reading: always four rows. A withheld one has no number and says why.
CREATE TABLE parameter (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  name        TEXT NOT NULL CHECK (name IN ('Delta', 'B', 'C', 'beta')),
  value       REAL,
  u           REAL,                                  -- from the readings alone
  u_total     REAL,                                  -- with the model floor and an assumed C/B
  low         REAL,                                  -- limits of one standard uncertainty from the chi2 profile,
  high        REAL,                                  --   where the curve is not parabolic
  standing    TEXT NOT NULL CHECK (standing IN ('measured', 'fitted', 'assumed', 'predicted', 'quoted', 'withheld')),
  reason      TEXT,
  PRIMARY KEY (complex, measurement, reading, name),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number),
  CHECK ((value IS NULL) = (standing = 'withheld')),
  CHECK (value IS NOT NULL OR (u IS NULL AND u_total IS NULL AND reason IS NOT NULL))
) STRICT, WITHOUT ROWID;

-- Correlations of fitted parameters, from the total covariance.
CREATE TABLE correlation (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  first       TEXT NOT NULL,
  second      TEXT NOT NULL,
  value       REAL NOT NULL CHECK (value BETWEEN -1 AND 1),
  PRIMARY KEY (complex, measurement, reading, first, second),
  FOREIGN KEY (complex, measurement, reading, first) REFERENCES parameter (complex, measurement, reading, name),
  FOREIGN KEY (complex, measurement, reading, second) REFERENCES parameter (complex, measurement, reading, name)
) STRICT, WITHOUT ROWID;

-- Transitions to which no band was assigned, where the fit puts them.
CREATE TABLE predicted_band (
  complex      TEXT NOT NULL,
  measurement  TEXT NOT NULL,
  reading      INTEGER NOT NULL,
  label        TEXT NOT NULL,
  position     REAL NOT NULL,
  u            REAL NOT NULL,
  spin_allowed INTEGER NOT NULL CHECK (spin_allowed IN (0, 1)),
  looked       TEXT NOT NULL CHECK (looked IN ('inside', 'outside', 'not recorded')),   -- against what was scanned
  PRIMARY KEY (complex, measurement, reading, label),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- What speaks against a reading, on the scale of chi2. The sum is its score.
CREATE TABLE evidence (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  number      INTEGER NOT NULL,
  code        TEXT NOT NULL,
  label       TEXT,                                  -- the transition it concerns, letter form
  penalty     REAL NOT NULL,
  text        TEXT NOT NULL,
  PRIMARY KEY (complex, measurement, reading, number),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- Bands worth looking for, most helpful first, one row for each number they would help.
CREATE TABLE helpful_band (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  number      INTEGER NOT NULL,
  parameter   TEXT NOT NULL CHECK (parameter IN ('Delta', 'B', 'C')),
  label       TEXT NOT NULL,
  low         REAL NOT NULL,                         -- expected range, two standard uncertainties either way
  high        REAL NOT NULL,
  u_now       REAL,                                  -- NULL: not fixed at all
  u_then      REAL NOT NULL,
  sentence    TEXT NOT NULL,
  PRIMARY KEY (complex, measurement, reading, number, parameter),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- Each pair of bands alone: Delta and B, or NULL where the pair has no solution.
CREATE TABLE stress_pair (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  first_number  INTEGER NOT NULL,                    -- of the reading_band
  second_number INTEGER NOT NULL,
  first       TEXT NOT NULL,
  second      TEXT NOT NULL,
  Delta       REAL,
  B           REAL,
  PRIMARY KEY (complex, measurement, reading, first_number, second_number),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- Each band left out: what the others give, and where they put it.
CREATE TABLE stress_left_out (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  number      INTEGER NOT NULL,                      -- of the reading_band
  label       TEXT NOT NULL,
  Delta       REAL,
  B           REAL,
  C           REAL,
  predicted   REAL,
  z           REAL,                                  -- (observed - predicted) / combined u
  PRIMARY KEY (complex, measurement, reading, number),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- Quoted numbers against the refitted ones.
CREATE TABLE audit (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  number      INTEGER NOT NULL,                      -- place of the quoted entry in the record
  parameter   TEXT NOT NULL CHECK (parameter IN ('Delta', 'B', 'C', 'beta')),
  quoted      REAL NOT NULL,
  refitted    REAL,                                  -- NULL where withheld
  u_total     REAL,
  difference  REAL,                                  -- quoted - refitted
  z           REAL,
  cause       TEXT,                                  -- a likely cause found by trying
  PRIMARY KEY (complex, measurement, number, parameter),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- The factor on an ion's model floors that its own records suggest. Shown beside the policy, never applied.
CREATE TABLE floor_factor (
  ion         TEXT NOT NULL REFERENCES ion (name),
  geometry    TEXT NOT NULL CHECK (geometry IN ('octahedral', 'tetrahedral')),
  kappa       REAL NOT NULL,
  u           REAL NOT NULL,
  spare_bands INTEGER NOT NULL,
  PRIMARY KEY (ion, geometry)
) STRICT, WITHOUT ROWID;

-- What needs a person, most pressing first: the review page and command print this list.
CREATE TABLE review (
  number      INTEGER NOT NULL PRIMARY KEY,
  kind        TEXT NOT NULL CHECK (kind IN ('refused', 'strained', 'better rival', 'near rival', 'quoted value', 'repeats disagree')),
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  text        TEXT NOT NULL,
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- Coded warnings. A hazard belongs to the complex, a spectral caution to a reading.
CREATE TABLE caution (
  complex      TEXT NOT NULL REFERENCES complex (id),
  number       INTEGER NOT NULL,
  subject      TEXT NOT NULL CHECK (subject IN ('hazard', 'spectral')),
  measurement  TEXT,                                 -- NULL for a hazard
  reading      INTEGER,                              -- NULL for a hazard
  code         TEXT NOT NULL,
  found_in     TEXT,                                 -- of a hazard: what raised it, "ClO4 in the sample of aq-295"
  text         TEXT NOT NULL,
  PRIMARY KEY (complex, number),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number),
  CHECK ((subject = 'hazard') = (measurement IS NULL)),
  CHECK ((measurement IS NULL) = (reading IS NULL))
) STRICT, WITHOUT ROWID;
CREATE UNIQUE INDEX caution_hazard ON caution (complex, code) WHERE subject = 'hazard';
CREATE UNIQUE INDEX caution_spectral ON caution (complex, measurement, reading, code) WHERE subject = 'spectral';

-- Hazard cautions that the group declared not to apply, with the reason. Shown in their place.
CREATE TABLE hazard_override (
  complex TEXT NOT NULL REFERENCES complex (id),
  code    TEXT NOT NULL,
  reason  TEXT NOT NULL,
  PRIMARY KEY (complex, code)
) STRICT, WITHOUT ROWID;

-- Fits of factors to the whole collection: Delta = g * average of f, beta = 1 - k * average of h, averages over donor atoms.
-- Octahedral and tetrahedral complexes apart. A geometry without complexes has no row.
CREATE TABLE factor_fit (
  parameter        TEXT NOT NULL CHECK (parameter IN ('Delta', 'beta')),
  geometry         TEXT NOT NULL CHECK (geometry IN ('octahedral', 'tetrahedral')),
  complexes        INTEGER NOT NULL,
  scatter          REAL NOT NULL,                    -- residual scatter s: of ln Delta, or of beta
  scatter_standing TEXT NOT NULL CHECK (scatter_standing IN ('fitted', 'assumed')),
  spare_complexes  INTEGER NOT NULL,                 -- beyond what the unknowns need, over all islands
  PRIMARY KEY (parameter, geometry)
) STRICT, WITHOUT ROWID;

-- Parts of the collection in which complexes link ions and ligands. Nothing links one island to another.
CREATE TABLE factor_island (
  parameter       TEXT NOT NULL,
  geometry        TEXT NOT NULL,
  number          INTEGER NOT NULL,
  gauge           TEXT NOT NULL REFERENCES ligand (id),   -- the ligand whose factor is set to 1
  gauge_is_aqua   INTEGER NOT NULL CHECK (gauge_is_aqua IN (0, 1)),
  complexes       INTEGER NOT NULL,
  rank            INTEGER NOT NULL,                  -- independent combinations that the complexes fix
  spare_complexes INTEGER NOT NULL,
  PRIMARY KEY (parameter, geometry, number),
  FOREIGN KEY (parameter, geometry) REFERENCES factor_fit (parameter, geometry)
) STRICT, WITHOUT ROWID;

-- Factors of ions (g in cm-1, k) and ligands (f, h). A factor that the complexes do not fix has no value and says so.
CREATE TABLE factor (
  parameter TEXT NOT NULL CHECK (parameter IN ('Delta', 'beta')),
  geometry  TEXT NOT NULL,
  kind      TEXT NOT NULL CHECK (kind IN ('ion', 'ligand')),
  name      TEXT NOT NULL,                           -- ligand id, or ion, geometry and spin: "Cr(III) octahedral quartet"
  value     REAL,
  u         REAL,                                    -- 0 for the ligand that is set to 1
  complexes INTEGER NOT NULL,                        -- how many complexes stand behind it
  island    INTEGER NOT NULL,                        -- factors of different islands cannot be compared
  gauge     INTEGER NOT NULL CHECK (gauge IN (0, 1)),
  tested    INTEGER NOT NULL CHECK (tested IN (0, 1)),    -- 0: every complex behind it is needed to find it
  reason    TEXT,                                    -- why there is no value, or no test
  PRIMARY KEY (parameter, geometry, kind, name),
  FOREIGN KEY (parameter, geometry, island) REFERENCES factor_island (parameter, geometry, number),
  CHECK ((value IS NULL) = (u IS NULL)),
  CHECK (value IS NOT NULL OR reason IS NOT NULL)
) STRICT, WITHOUT ROWID;

-- The measurement that stands for each complex in a factor fit, and what the fit makes of it.
CREATE TABLE factor_complex (
  parameter   TEXT NOT NULL,
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  geometry    TEXT NOT NULL,
  island      INTEGER NOT NULL,
  fitted      REAL NOT NULL,
  residual    REAL NOT NULL,                         -- ln(found/fitted) of Delta, found - fitted of beta
  leverage    REAL NOT NULL CHECK (leverage BETWEEN 0 AND 1),   -- 1: it alone decides its fitted value
  PRIMARY KEY (parameter, complex),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id),
  FOREIGN KEY (parameter, geometry, island) REFERENCES factor_island (parameter, geometry, number)
) STRICT, WITHOUT ROWID;

-- Measurements of a fitted geometry that stand in no factor fit, and why.
CREATE TABLE factor_left_out (
  parameter   TEXT NOT NULL,
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reason      TEXT NOT NULL,
  PRIMARY KEY (parameter, complex, measurement),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- Where a measurement stands against predictions from the rest of the collection, its complex's own data taken out.
-- A method that predicts nothing says why.
CREATE TABLE placement (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  parameter   TEXT NOT NULL CHECK (parameter IN ('Delta', 'B', 'beta')),
  method      TEXT NOT NULL CHECK (method IN ('average environment', 'factors')),
  predicted   REAL,
  u           REAL,
  z           REAL,                                  -- (found - predicted) / combined u, as a normal deviate; of Delta in its logarithm
  reason      TEXT,                                  -- why nothing is predicted
  PRIMARY KEY (complex, measurement, parameter, method),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id),
  CHECK ((predicted IS NULL) = (u IS NULL)),
  CHECK ((predicted IS NULL) = (reason IS NOT NULL)),
  CHECK (predicted IS NOT NULL OR z IS NULL)
) STRICT, WITHOUT ROWID;

-- Releases of the collection.
CREATE TABLE release (
  id           TEXT NOT NULL PRIMARY KEY,
  doi          TEXT,                                 -- NULL: not yet assigned
  licence      TEXT NOT NULL,                        -- SPDX identifier
  policy       TEXT NOT NULL REFERENCES policy (id),
  complexes    INTEGER NOT NULL,
  measurements INTEGER NOT NULL
) STRICT, WITHOUT ROWID;

-- One row for each measurement's chosen reading. A withheld number is NULL and its standing says so.
-- `cautions` holds the codes, hazards first, separated by one space.
CREATE VIEW result AS
SELECT
  r.complex                AS complex,
  r.measurement            AS measurement,
  c.ion                    AS ion,
  c.geometry               AS geometry,
  c.spin                   AS spin,
  m.phase                  AS phase,
  m.temperature_K          AS temperature_K,
  r.verdict                AS verdict,
  d.value                  AS Delta,
  d.u                      AS Delta_u,
  d.u_total                AS Delta_u_total,
  d.standing               AS Delta_standing,
  b.value                  AS B,
  b.u                      AS B_u,
  b.u_total                AS B_u_total,
  b.standing               AS B_standing,
  k.value                  AS C,
  k.u                      AS C_u,
  k.u_total                AS C_u_total,
  k.standing               AS C_standing,
  n.value                  AS beta,
  n.u_total                AS beta_u_total,
  n.standing               AS beta_standing,
  x.value                  AS corr_Delta_B,
  r.Delta_over_B           AS Delta_over_B,
  r.bands_used             AS bands_used,
  r.spare_bands            AS spare_bands,
  r.rms_residual           AS rms_residual,
  r.free_ion_set           AS free_ion_set,
  r.policy                 AS policy,
  coalesce((
    SELECT group_concat(code, ' ') FROM (
      SELECT code FROM caution q
      WHERE q.complex = r.complex
        AND (q.subject = 'hazard' OR (q.measurement = r.measurement AND q.reading = r.number))
      ORDER BY q.subject, q.code
    )
  ), '')                   AS cautions
FROM reading r
JOIN complex c     ON c.id = r.complex
JOIN measurement m ON m.complex = r.complex AND m.id = r.measurement
JOIN parameter d   ON d.complex = r.complex AND d.measurement = r.measurement AND d.reading = r.number AND d.name = 'Delta'
JOIN parameter b   ON b.complex = r.complex AND b.measurement = r.measurement AND b.reading = r.number AND b.name = 'B'
JOIN parameter k   ON k.complex = r.complex AND k.measurement = r.measurement AND k.reading = r.number AND k.name = 'C'
JOIN parameter n   ON n.complex = r.complex AND n.measurement = r.measurement AND n.reading = r.number AND n.name = 'beta'
LEFT JOIN correlation x
  ON x.complex = r.complex AND x.measurement = r.measurement AND x.reading = r.number AND x.first = 'Delta' AND x.second = 'B'
WHERE r.chosen = 1;
