-- The collection's database. One file holds what was read, what was fitted, and what may be said of it.
--
-- Conventions
--   Energies are in cm-1. `u` is one standard uncertainty. Temperatures are in K.
--   NULL means not recorded, or withheld with the reason in the same row. It never stands for 0.
--   `..._typed` is the text as the group typed it; the column beside it is the parsed number.
--   The comment behind a column is its entry in the data dictionary: [unit, range] where it holds a number, then the meaning.
--   Units are UCUM codes; two with a stroke between depend on the row. A column without a comment takes that of the column it refers to.
--   Flags are 0 or 1. Lists are JSON arrays in the order typed. Bands are counted from 1 in the order typed.
--   Nothing here is a time of day or a path of a machine: the same content gives the same bytes.
--   Kept to what SQLite 3.37 can read.

-- Facts about the file itself and the group that keeps the collection, by key:
-- schema, software, engine, and group.title, group.name, group.description, group.contact, group.licence,
-- group.url, group.release, group.started, group.doi, group.demonstration ("true" or "false").
-- A key without a value has no row.
CREATE TABLE meta (
  key   TEXT NOT NULL PRIMARY KEY,                  -- name of the fact
  value TEXT NOT NULL                               -- the fact, as text
) STRICT, WITHOUT ROWID;

-- The people of the group, in the order typed.
CREATE TABLE person (
  number   INTEGER NOT NULL PRIMARY KEY,            -- [>= 1] place in the order typed
  name     TEXT NOT NULL,                           -- name as typed
  orcid    TEXT,                                    -- ORCID identifier, without its address
  initials TEXT                                     -- initials by which measurements name the person
) STRICT, WITHOUT ROWID;

-- A declared set of fitting choices. The one of policy.yaml is in force; others are values that a measurement overrides.
CREATE TABLE policy (
  id                    TEXT NOT NULL PRIMARY KEY,  -- name and eight hex digits of its content
  name                  TEXT NOT NULL,              -- name as typed
  in_force              INTEGER NOT NULL CHECK (in_force IN (0, 1)),   -- 1: the policy of policy.yaml; 0: a copy with values that a measurement overrides
  C_over_B              REAL NOT NULL,              -- [1, > 0] C/B assumed where C is not fitted
  C_over_B_u            REAL NOT NULL,              -- [1, >= 0] standard uncertainty of the assumed C/B
  C_over_B_per_ion      TEXT NOT NULL CHECK (json_valid(C_over_B_per_ion)),   -- C/B of single ions, which win over the general one: {"Cr(III)": {"value": 4.5, "u": 0.5}}
  C_fitted              INTEGER NOT NULL CHECK (C_fitted IN (0, 1)),   -- 1: C is fitted where spin-flip bands determine it
  floor_general         REAL NOT NULL,              -- [cm-1, >= 0] model floor of transitions that change neither spin nor two electrons
  floor_spin_flip       REAL NOT NULL,              -- [cm-1, >= 0] model floor of spin-flip transitions
  floor_two_electron    REAL NOT NULL,              -- [cm-1, >= 0] model floor of two-electron transitions
  ceiling_Delta         REAL NOT NULL,              -- [1, > 0] Delta is published only where u_total/value is below this fraction
  ceiling_B             REAL NOT NULL,              -- [1, > 0] B and beta are published only where u_total/value is below this fraction
  ceiling_C             REAL NOT NULL,              -- [1, > 0] C is published only where u_total/value is below this fraction
  differential_Delta    REAL NOT NULL,              -- [cm-1, >= 0] floor on differences of Delta between like results
  differential_B        REAL NOT NULL,              -- [1, >= 0] floor on differences of B, as a fraction of B
  free_ion_set          TEXT NOT NULL,              -- named set that B0 is taken from
  rival_margin          REAL NOT NULL,              -- [1, >= 0] a rival reading is near where its score is within this of the chosen one
  default_u_maximum     REAL NOT NULL,              -- [cm-1, > 0] u taken for a broad band typed without one
  default_u_line        REAL NOT NULL               -- [cm-1, > 0] u taken for a line typed without one
) STRICT, WITHOUT ROWID;

-- The metal ions of the collection.
CREATE TABLE ion (
  name      TEXT NOT NULL PRIMARY KEY,              -- metal and oxidation state, "Cr(III)"
  metal     TEXT NOT NULL,                          -- element symbol
  oxidation INTEGER NOT NULL,                       -- oxidation state
  electrons INTEGER NOT NULL CHECK (electrons BETWEEN 0 AND 10),   -- number of d electrons
  shell     TEXT NOT NULL CHECK (shell IN ('3d', '4d', '5d'))   -- shell of the d electrons
) STRICT, WITHOUT ROWID;

-- Racah parameters of the free ions, by named set. An ion without a row in a set has no beta under it.
CREATE TABLE free_ion (
  set_name TEXT NOT NULL CHECK (set_name IN ('published', 'atomic-levels')),   -- name of the set
  ion      TEXT NOT NULL REFERENCES ion (name),
  B0       REAL NOT NULL,                           -- [cm-1, > 0] Racah B of the free ion
  C0       REAL,                                    -- [cm-1, > 0] Racah C of the free ion
  kind     TEXT NOT NULL,                           -- how B0 was obtained
  source   TEXT NOT NULL,                           -- where B0 and C0 come from
  PRIMARY KEY (set_name, ion)
) STRICT, WITHOUT ROWID;

-- Publications cited by records.
CREATE TABLE source (
  id        TEXT NOT NULL PRIMARY KEY,              -- permanent id, the record's file name
  file      TEXT NOT NULL,                          -- record file within the content folder
  reference TEXT NOT NULL,                          -- the reference as it is printed
  authors   TEXT NOT NULL CHECK (json_valid(authors)),   -- authors in order, a list of texts
  title     TEXT,                                   -- title
  journal   TEXT,                                   -- journal or publisher
  year      TEXT,                                   -- year
  volume    TEXT,                                   -- volume
  pages     TEXT,                                   -- pages or article number
  doi       TEXT,                                   -- DOI, without its resolver
  url       TEXT                                    -- web address where there is no DOI
) STRICT, WITHOUT ROWID;

-- Ligands, one row for each way of binding.
CREATE TABLE ligand (
  id           TEXT NOT NULL PRIMARY KEY,           -- permanent id, the record's file name
  file         TEXT NOT NULL,                       -- record file within the content folder
  name         TEXT NOT NULL,                       -- name in a complex
  formula      TEXT NOT NULL,                       -- formula as typed
  abbreviation TEXT,                                -- abbreviation that may stand for it in formulas
  synonyms     TEXT NOT NULL CHECK (json_valid(synonyms)),   -- other names, a list of texts
  charge       INTEGER NOT NULL,                    -- charge of one free ligand
  denticity    INTEGER NOT NULL CHECK (denticity > 0),   -- donor atoms that one ligand binds
  donors       TEXT NOT NULL CHECK (json_valid(donors)),   -- element symbols of the donor atoms, as many as denticity
  smiles       TEXT,                                -- SMILES of the free ligand
  notes        TEXT                                 -- remarks as typed
) STRICT, WITHOUT ROWID;

-- A complex: its formula, ion, geometry, isomer and spin are its identity.
CREATE TABLE complex (
  id            TEXT NOT NULL PRIMARY KEY,          -- permanent id, the record's file name
  file          TEXT NOT NULL,                      -- record file within the content folder
  hash          TEXT NOT NULL,                      -- sha256 of the record's bytes, hex
  formula       TEXT NOT NULL,                      -- formula as typed, with its charge
  name          TEXT,                               -- name as typed
  charge        INTEGER NOT NULL,                   -- charge of the complex
  charge_note   TEXT,                               -- remark on how the charge was assigned
  ion           TEXT NOT NULL REFERENCES ion (name),
  geometry      TEXT NOT NULL,                      -- geometry as typed, of the closed list
  fitted        INTEGER NOT NULL CHECK (fitted IN (0, 1)),   -- 1: octahedral or tetrahedral; 0: a geometry that is stored and drawn, not fitted
  isomer        TEXT NOT NULL,                      -- cis, trans, fac, mer or none
  spin          TEXT,                               -- multiplicity of the ground level as a word, "quartet"
  multiplicity  INTEGER,                            -- [1, 1 to 6] multiplicity of the ground level, 2S+1
  spin_typed    TEXT,                               -- spin as typed: high, low, intermediate or a multiplicity
  spin_assumed  INTEGER NOT NULL CHECK (spin_assumed IN (0, 1)),   -- 1: high spin was assumed, none was typed
  notes         TEXT                                -- remarks as typed
) STRICT, WITHOUT ROWID;
CREATE INDEX complex_by_ion ON complex (ion, geometry);

-- The ligands of a complex.
CREATE TABLE complex_ligand (
  complex TEXT NOT NULL REFERENCES complex (id),
  ligand  TEXT NOT NULL REFERENCES ligand (id),
  number  INTEGER NOT NULL,                         -- [>= 1] place in the order typed
  count   INTEGER NOT NULL CHECK (count > 0),       -- how many of this ligand
  bound   INTEGER NOT NULL CHECK (bound > 0),       -- donor atoms bound by each of them
  PRIMARY KEY (complex, ligand)
) STRICT, WITHOUT ROWID;
CREATE INDEX complex_ligand_by_ligand ON complex_ligand (ligand);

-- One spectrum of one sample under one set of conditions.
CREATE TABLE measurement (
  complex             TEXT NOT NULL REFERENCES complex (id),
  id                  TEXT NOT NULL,                -- id within the complex; the full id is complex/measurement
  number              INTEGER NOT NULL,             -- [>= 1] place in the record
  sample              TEXT,                         -- what was weighed, as a formula
  phase               TEXT NOT NULL CHECK (phase IN ('solution', 'solid', 'crystal', 'glass', 'film')),   -- phase of the sample
  medium              TEXT,                         -- solvent or matrix
  host                TEXT,                         -- host of a doped crystal
  temperature_K       REAL,                         -- [K, > 0] temperature
  temperature_u_K     REAL,                         -- [K, >= 0] standard uncertainty of the temperature
  temperature_typed   TEXT,                         -- temperature as typed
  temperature_assumed INTEGER NOT NULL CHECK (temperature_assumed IN (0, 1)),   -- 1: a word such as "room" was typed and a value taken for it
  technique           TEXT CHECK (technique IN ('absorption', 'diffuse reflectance', 'excitation', 'emission', 'MCD')),   -- how the spectrum was taken
  scanned_typed       TEXT,                         -- scanned range as typed
  notebook            TEXT,                         -- notebook and page
  measured_by         TEXT,                         -- initials of who measured, see person
  measured_on         TEXT,                         -- ISO date of the measurement
  source              TEXT REFERENCES source (id),  -- publication that the readings come from
  source_place        TEXT,                         -- place in that publication, "Table 2"
  concentration       TEXT,                         -- concentration as typed
  path_length         TEXT,                         -- path length as typed
  batch               TEXT,                         -- batch of the sample
  raw_file            TEXT,                         -- name of the file with the spectrum
  raw_hash            TEXT,                         -- sha256 of that file, hex
  magnetic_moment     TEXT,                         -- magnetic moment as typed
  epr_g               TEXT,                         -- EPR g as typed
  innocence_doubtful  INTEGER NOT NULL CHECK (innocence_doubtful IN (0, 1)),   -- 1: the oxidation state is doubtful, beta is withheld
  nuclearity          INTEGER NOT NULL CHECK (nuclearity > 0),   -- [1, > 0] metal ions in the complex
  policy              TEXT NOT NULL REFERENCES policy (id),   -- policy under which it was fitted
  policy_reason       TEXT,                         -- why this measurement overrides the policy in force
  notes               TEXT,                         -- remarks as typed
  PRIMARY KEY (complex, id)
) STRICT, WITHOUT ROWID;

-- Ranges that were scanned, and ranges in which the group looked and saw no band.
CREATE TABLE observed_range (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  kind        TEXT NOT NULL CHECK (kind IN ('scanned', 'absent')),   -- scanned: looked at; absent: looked at, and no band seen
  number      INTEGER NOT NULL,                     -- [>= 1] place in the order typed, each kind by itself
  low         REAL NOT NULL,                        -- [cm-1, > 0] lower end
  high        REAL NOT NULL,                        -- [cm-1, > 0] upper end
  notes       TEXT,                                 -- remarks as typed
  PRIMARY KEY (complex, measurement, kind, number),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- The bands as they were read.
CREATE TABLE band (
  complex             TEXT NOT NULL,
  measurement         TEXT NOT NULL,
  number              INTEGER NOT NULL,             -- [>= 1] place in the order typed
  position_typed      TEXT NOT NULL,                -- position as typed, with its unit
  position            REAL NOT NULL,                -- [cm-1, 1000 to 100000] position
  u_minus             REAL,                         -- [cm-1, > 0] standard uncertainty towards lower wavenumber; absent: none typed, the policy's default applies
  u_plus              REAL,                         -- [cm-1, > 0] standard uncertainty towards higher wavenumber
  half_digit          REAL NOT NULL,                -- [cm-1, > 0] half of the last typed digit
  coverage_not_stated INTEGER NOT NULL CHECK (coverage_not_stated IN (0, 1)),   -- 1: the uncertainty was typed as a plain plus-minus
  kind                TEXT NOT NULL CHECK (kind IN ('maximum', 'shoulder', 'line', 'zero-phonon', 'dip', 'centroid', 'component', 'envelope')),   -- how the position was read
  side                TEXT CHECK (side IN ('higher', 'lower')),   -- of a shoulder: where the stronger band lies
  width_typed         TEXT,                         -- full width at half height as typed
  width               REAL,                         -- [cm-1, > 0] full width at half height
  epsilon             REAL,                         -- [L.mol-1.cm-1, > 0] molar absorption coefficient
  strength            TEXT CHECK (strength IN ('strong', 'medium', 'weak')),   -- strength in words where there is no coefficient
  degeneracy          INTEGER,                      -- [1, >= 1] of a component: degeneracy of its level
  deconvoluted        INTEGER NOT NULL CHECK (deconvoluted IN (0, 1)),   -- 1: the position comes from a deconvolution
  role                TEXT NOT NULL CHECK (role IN ('transition', 'CT', 'ligand', 'vibration', 'impurity')),   -- what the band is; only transitions are fitted
  terms               TEXT NOT NULL CHECK (json_valid(terms)),   -- candidate terms as typed, a list of labels
  left_out            TEXT,                         -- typed reason why the band is kept and not fitted
  notes               TEXT,                         -- remarks as typed
  PRIMARY KEY (complex, measurement, number),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- Parameters as printed elsewhere. Audited, never fitted. One row a parameter.
CREATE TABLE quoted (
  complex      TEXT NOT NULL,
  measurement  TEXT NOT NULL,
  number       INTEGER NOT NULL,                    -- [>= 1] place in the record
  parameter    TEXT NOT NULL CHECK (parameter IN ('Delta', 'Dq', 'B', 'C', 'beta')),   -- which parameter was printed
  value        REAL NOT NULL,                       -- [cm-1|1, > 0] printed value: cm-1, or 1 for beta
  typed        TEXT NOT NULL,                       -- value as typed
  source       TEXT NOT NULL REFERENCES source (id),   -- publication that printed it
  source_place TEXT,                                -- place in that publication
  PRIMARY KEY (complex, measurement, number, parameter),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- One assignment of a measurement's bands with its fit. Exactly one reading of a measurement is chosen.
CREATE TABLE reading (
  complex         TEXT NOT NULL,
  measurement     TEXT NOT NULL,
  number          INTEGER NOT NULL,                 -- [>= 1] 1 is the chosen reading, rivals follow
  chosen          INTEGER NOT NULL CHECK (chosen IN (0, 1)),   -- 1: the chosen reading of its measurement
  verdict         TEXT NOT NULL CHECK (verdict IN ('refused', 'not determinable', 'strained', 'assumed', 'untested', 'tested')),   -- what the reading is worth
  reason          TEXT NOT NULL,                    -- one sentence: why this verdict
  assignment      TEXT NOT NULL CHECK (assignment IN ('typed', 'proposed', 'none')),   -- typed by the group, proposed by the engine, or none
  geometry        TEXT CHECK (geometry IN ('octahedral', 'tetrahedral')),   -- geometry of the model; absent: not fitted
  multiplicity    INTEGER,                          -- [1, 1 to 6] multiplicity of the ground level, 2S+1
  ground          TEXT,                             -- ground level, letter form "a4A2g"
  Delta_over_B    REAL,                             -- [1, >= 0] Delta over B at the fit
  chi2            REAL,                             -- [1, >= 0] sum of squared weighted residuals
  bands_used      INTEGER NOT NULL,                 -- [1, >= 0] bands that the fit used
  spare_bands     INTEGER NOT NULL,                 -- [1, >= 0] bands used beyond the number of free parameters
  rms_residual    REAL,                             -- [cm-1, >= 0] root mean square of observed minus calculated
  C_over_B        REAL,                             -- [1, > 0] C/B of the fit
  C_over_B_u      REAL,                             -- [1, >= 0] standard uncertainty of C/B
  C_over_B_origin TEXT CHECK (C_over_B_origin IN ('policy', 'policy for this ion', 'fitted')),   -- where C/B comes from
  free_ion_set    TEXT NOT NULL,                    -- named set that B0 is taken from
  policy          TEXT NOT NULL REFERENCES policy (id),   -- policy of the fit
  measure_next    TEXT,                             -- what would help most, in words
  score           REAL,                             -- [1] chi2 + 2 x free parameters + evidence; lower is better
  ranking         TEXT,                             -- of a rival: why it ranks where it does
  combination     TEXT,                             -- combination that is fixed where single numbers are not
  rank            INTEGER,                          -- [1, >= 0] how many parameters the bands fix
  singular_values TEXT CHECK (json_valid(singular_values)),   -- singular values of the weighted Jacobian, descending, a list of numbers
  spin_crossing   REAL,                             -- [1, > 0] Delta/B at which the ground spin changes
  remarks         TEXT NOT NULL CHECK (json_valid(remarks)),   -- sentences on ground level and order of levels, a list of texts
  sentence        TEXT NOT NULL,                    -- one sentence for a thesis
  PRIMARY KEY (complex, measurement, number),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;
CREATE UNIQUE INDEX reading_chosen ON reading (complex, measurement) WHERE chosen = 1;

-- One transition of a reading. The band or merged bands behind it are in reading_band_member.
CREATE TABLE reading_band (
  complex         TEXT NOT NULL,
  measurement     TEXT NOT NULL,
  reading         INTEGER NOT NULL,
  number          INTEGER NOT NULL,                 -- [>= 1] place in the reading
  label           TEXT NOT NULL,                    -- transition, letter form of the upper level: "b4T1g"
  observed        REAL NOT NULL,                    -- [cm-1, > 0] position of the band, or weighted barycentre of merged components
  u_minus         REAL NOT NULL,                    -- [cm-1, > 0] standard uncertainty towards lower wavenumber
  u_plus          REAL NOT NULL,                    -- [cm-1, > 0] standard uncertainty towards higher wavenumber
  u_assumed       INTEGER NOT NULL CHECK (u_assumed IN (0, 1)),   -- 1: the uncertainty is the policy's default
  floor           REAL NOT NULL,                    -- [cm-1, >= 0] model floor tau of the transition
  used            INTEGER NOT NULL CHECK (used IN (0, 1)),   -- 0: only compared with a prediction
  calculated      REAL,                             -- [cm-1, >= 0] transition energy at the fit
  residual        REAL,                             -- [cm-1] observed - calculated
  leverage        REAL,                             -- [1, >= 0] how much of the fit hangs on it: from 0 to 1, but for rounding
  gradient_Delta  REAL,                             -- [1] d(transition energy)/d(Delta) at the fit
  gradient_B      REAL,                             -- [1] d(transition energy)/d(B) at the fit
  gradient_C      REAL,                             -- [1] d(transition energy)/d(C) at the fit
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
  reason      TEXT NOT NULL,                        -- why the band takes no part
  PRIMARY KEY (complex, measurement, reading, band),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number),
  FOREIGN KEY (complex, measurement, band) REFERENCES band (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- The local solutions of a reading.
CREATE TABLE branch (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  number      INTEGER NOT NULL,                     -- [>= 1] place in the reading
  Delta       REAL NOT NULL,                        -- [cm-1, >= 0] Delta of the solution
  B           REAL NOT NULL,                        -- [cm-1, >= 0] Racah B of the solution; 0 where it does not enter, with one d electron or hole
  C           REAL NOT NULL,                        -- [cm-1, >= 0] Racah C of the solution; 0 where it does not enter
  chi2        REAL NOT NULL,                        -- [1, >= 0] sum of squared weighted residuals
  chosen      INTEGER NOT NULL CHECK (chosen IN (0, 1)),   -- 1: the solution that the reading reports
  PRIMARY KEY (complex, measurement, reading, number),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- Delta, B, C and beta of a reading: always four rows. A withheld one has no number and says why.
CREATE TABLE parameter (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  name        TEXT NOT NULL CHECK (name IN ('Delta', 'B', 'C', 'beta')),   -- name of the parameter
  value       REAL,                                 -- [cm-1|1] value: cm-1, or 1 for beta; absent: withheld
  u           REAL,                                 -- [cm-1|1, >= 0] standard uncertainty from the readings alone
  u_total     REAL,                                 -- [cm-1|1, >= 0] standard uncertainty with the model floor and an assumed C/B
  low         REAL,                                 -- [cm-1|1] lower limit of one standard uncertainty from the chi2 profile, where the curve is not parabolic
  high        REAL,                                 -- [cm-1|1] upper limit, likewise
  standing    TEXT NOT NULL CHECK (standing IN ('measured', 'fitted', 'assumed', 'predicted', 'quoted', 'withheld')),   -- what the number is
  reason      TEXT,                                 -- why it is withheld or assumed
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
  first       TEXT NOT NULL,                        -- first parameter
  second      TEXT NOT NULL,                        -- second parameter
  value       REAL NOT NULL CHECK (value BETWEEN -1 AND 1),   -- [1, -1 to 1] correlation from the total covariance
  PRIMARY KEY (complex, measurement, reading, first, second),
  FOREIGN KEY (complex, measurement, reading, first) REFERENCES parameter (complex, measurement, reading, name),
  FOREIGN KEY (complex, measurement, reading, second) REFERENCES parameter (complex, measurement, reading, name)
) STRICT, WITHOUT ROWID;

-- Transitions to which no band was assigned, where the fit puts them.
CREATE TABLE predicted_band (
  complex      TEXT NOT NULL,
  measurement  TEXT NOT NULL,
  reading      INTEGER NOT NULL,
  label        TEXT NOT NULL,                       -- transition, letter form of the upper level
  position     REAL NOT NULL,                       -- [cm-1, >= 0] where the fit puts it
  u            REAL NOT NULL,                       -- [cm-1, >= 0] standard uncertainty of the prediction
  spin_allowed INTEGER NOT NULL CHECK (spin_allowed IN (0, 1)),   -- 1: the upper level has the spin of the ground level
  looked       TEXT NOT NULL CHECK (looked IN ('inside', 'outside', 'not recorded')),   -- where it lies against what was scanned
  PRIMARY KEY (complex, measurement, reading, label),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- What speaks against a reading, on the scale of chi2. The sum is its score.
CREATE TABLE evidence (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  number      INTEGER NOT NULL,                     -- [>= 1] place in the reading
  code        TEXT NOT NULL,                        -- kind of evidence
  label       TEXT,                                 -- the transition it concerns, letter form
  penalty     REAL NOT NULL,                        -- [1] what it adds to the score
  text        TEXT NOT NULL,                        -- the evidence in words
  PRIMARY KEY (complex, measurement, reading, number),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- Bands worth looking for, most helpful first, one row for each number they would help.
CREATE TABLE helpful_band (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  number      INTEGER NOT NULL,                     -- [>= 1] place in the order of help
  parameter   TEXT NOT NULL CHECK (parameter IN ('Delta', 'B', 'C')),   -- the number it would help
  label       TEXT NOT NULL,                        -- transition, letter form of the upper level
  low         REAL NOT NULL,                        -- [cm-1] lower end of the expected range, two standard uncertainties down
  high        REAL NOT NULL,                        -- [cm-1] upper end, two standard uncertainties up
  u_now       REAL,                                 -- [cm-1, >= 0] total standard uncertainty of the parameter now; absent: not fixed at all
  u_then      REAL NOT NULL,                        -- [cm-1, >= 0] total standard uncertainty of the parameter once the band is read
  sentence    TEXT NOT NULL,                        -- the advice in words
  PRIMARY KEY (complex, measurement, reading, number, parameter),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- Each pair of bands alone: Delta and B, or NULL where the pair has no solution.
CREATE TABLE stress_pair (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  first_number  INTEGER NOT NULL,                   -- [>= 1] first transition, number of the reading_band
  second_number INTEGER NOT NULL,                   -- [>= 1] second transition, number of the reading_band
  first       TEXT NOT NULL,                        -- first transition, letter form
  second      TEXT NOT NULL,                        -- second transition, letter form
  Delta       REAL,                                 -- [cm-1, >= 0] Delta from the pair alone; absent: no solution
  B           REAL,                                 -- [cm-1] B from the pair alone; absent: no solution
  PRIMARY KEY (complex, measurement, reading, first_number, second_number),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- Each band left out: what the others give, and where they put it.
CREATE TABLE stress_left_out (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reading     INTEGER NOT NULL,
  number      INTEGER NOT NULL,                     -- [>= 1] the transition left out, number of the reading_band
  label       TEXT NOT NULL,                        -- the transition left out, letter form
  Delta       REAL,                                 -- [cm-1, >= 0] Delta from the others; absent: no solution
  B           REAL,                                 -- [cm-1] B from the others
  C           REAL,                                 -- [cm-1] C from the others
  predicted   REAL,                                 -- [cm-1] where the others put the band
  z           REAL,                                 -- [1] (observed - predicted) / combined u
  PRIMARY KEY (complex, measurement, reading, number),
  FOREIGN KEY (complex, measurement, reading) REFERENCES reading (complex, measurement, number)
) STRICT, WITHOUT ROWID;

-- Quoted numbers against the refitted ones.
CREATE TABLE audit (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  number      INTEGER NOT NULL,                     -- [>= 1] place of the quoted entry in the record
  parameter   TEXT NOT NULL CHECK (parameter IN ('Delta', 'B', 'C', 'beta')),   -- which parameter
  quoted      REAL NOT NULL,                        -- [cm-1|1] printed value: cm-1, or 1 for beta; Dq is turned into Delta
  refitted    REAL,                                 -- [cm-1|1] value of the chosen reading; absent: withheld
  u_total     REAL,                                 -- [cm-1|1, >= 0] its total standard uncertainty
  difference  REAL,                                 -- [cm-1|1] quoted - refitted
  z           REAL,                                 -- [1] difference over its standard uncertainty
  cause       TEXT,                                 -- a likely cause found by trying
  PRIMARY KEY (complex, measurement, number, parameter),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- The factor on an ion's model floors that its own records suggest. Shown beside the policy, never applied.
CREATE TABLE floor_factor (
  ion         TEXT NOT NULL REFERENCES ion (name),
  geometry    TEXT NOT NULL CHECK (geometry IN ('octahedral', 'tetrahedral')),   -- geometry of the complexes behind it
  kappa       REAL NOT NULL,                        -- [1, >= 0] factor on the model floors that makes spare bands agree
  u           REAL NOT NULL,                        -- [1, >= 0] standard uncertainty of kappa
  spare_bands INTEGER NOT NULL,                     -- [1, >= 0] spare bands behind it
  PRIMARY KEY (ion, geometry)
) STRICT, WITHOUT ROWID;

-- What needs a person, most pressing first: the review page and command print this list.
CREATE TABLE review (
  number      INTEGER NOT NULL PRIMARY KEY,         -- [>= 1] place in the list, most pressing first
  kind        TEXT NOT NULL CHECK (kind IN ('refused', 'strained', 'better rival', 'near rival', 'quoted value', 'repeats disagree')),   -- why a person is needed
  complex     TEXT NOT NULL,                        -- complex it concerns
  measurement TEXT NOT NULL,                        -- measurement it concerns
  text        TEXT NOT NULL,                        -- the reason in words
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- Coded warnings. A hazard belongs to the complex, a spectral caution to a reading.
CREATE TABLE caution (
  complex      TEXT NOT NULL REFERENCES complex (id),
  number       INTEGER NOT NULL,                    -- [>= 1] place among the cautions of the complex
  subject      TEXT NOT NULL CHECK (subject IN ('hazard', 'spectral')),   -- hazard: of the substance; spectral: of a reading
  measurement  TEXT,                                -- measurement it concerns; absent for a hazard
  reading      INTEGER,                             -- [>= 1] reading it concerns; absent for a hazard
  code         TEXT NOT NULL,                       -- lasting code
  found_in     TEXT,                                -- of a hazard: what raised it, "ClO4 in the sample of aq-295"
  text         TEXT NOT NULL,                       -- the caution in words
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
  code    TEXT NOT NULL,                            -- code of the hazard caution that does not apply
  reason  TEXT NOT NULL,                            -- why, as typed
  PRIMARY KEY (complex, code)
) STRICT, WITHOUT ROWID;

-- Fits of factors to the whole collection: Delta = g * average of f, beta = 1 - k * average of h, averages over donor atoms.
-- Octahedral and tetrahedral complexes apart. A geometry without complexes has no row.
CREATE TABLE factor_fit (
  parameter        TEXT NOT NULL CHECK (parameter IN ('Delta', 'beta')),   -- which parameter was fitted
  geometry         TEXT NOT NULL CHECK (geometry IN ('octahedral', 'tetrahedral')),   -- geometry of the complexes
  complexes        INTEGER NOT NULL,                -- [1, >= 0] complexes in the fit
  scatter          REAL NOT NULL,                   -- [1, >= 0] residual scatter: of ln Delta, or of beta
  scatter_standing TEXT NOT NULL CHECK (scatter_standing IN ('fitted', 'assumed')),   -- fitted from spare complexes, or assumed
  spare_complexes  INTEGER NOT NULL,                -- [1, >= 0] complexes beyond what the unknowns need, over all islands
  PRIMARY KEY (parameter, geometry)
) STRICT, WITHOUT ROWID;

-- Parts of the collection in which complexes link ions and ligands. Nothing links one island to another.
CREATE TABLE factor_island (
  parameter       TEXT NOT NULL,
  geometry        TEXT NOT NULL,
  number          INTEGER NOT NULL,                 -- [>= 1] number of the island
  gauge           TEXT NOT NULL REFERENCES ligand (id),   -- ligand whose factor is set to 1
  gauge_is_aqua   INTEGER NOT NULL CHECK (gauge_is_aqua IN (0, 1)),   -- 1: that ligand is water
  complexes       INTEGER NOT NULL,                 -- [1, >= 0] complexes in the island
  rank            INTEGER NOT NULL,                 -- [1, >= 0] independent combinations that the complexes fix
  spare_complexes INTEGER NOT NULL,                 -- [1, >= 0] complexes beyond the rank
  PRIMARY KEY (parameter, geometry, number),
  FOREIGN KEY (parameter, geometry) REFERENCES factor_fit (parameter, geometry)
) STRICT, WITHOUT ROWID;

-- Factors of ions (g in cm-1, k) and ligands (f, h). A factor that the complexes do not fix has no value and says so.
CREATE TABLE factor (
  parameter TEXT NOT NULL CHECK (parameter IN ('Delta', 'beta')),   -- which parameter
  geometry  TEXT NOT NULL,                          -- geometry of the complexes
  kind      TEXT NOT NULL CHECK (kind IN ('ion', 'ligand')),   -- factor of an ion (g in cm-1, k) or of a ligand (f, h)
  name      TEXT NOT NULL,                          -- ligand id, or ion, geometry and spin: "Cr(III) octahedral quartet"
  value     REAL,                                   -- [cm-1|1] value: cm-1 for g, 1 for k, f and h; absent: the complexes do not fix it
  u         REAL,                                   -- [cm-1|1, >= 0] standard uncertainty; 0 for the ligand that is set to 1
  complexes INTEGER NOT NULL,                       -- [1, >= 0] complexes behind it
  island    INTEGER NOT NULL,                       -- [>= 1] factors of different islands cannot be compared
  gauge     INTEGER NOT NULL CHECK (gauge IN (0, 1)),   -- 1: the factor that is set to 1
  tested    INTEGER NOT NULL CHECK (tested IN (0, 1)),   -- 0: every complex behind it is needed to find it
  reason    TEXT,                                   -- why there is no value, or no test
  PRIMARY KEY (parameter, geometry, kind, name),
  FOREIGN KEY (parameter, geometry, island) REFERENCES factor_island (parameter, geometry, number),
  CHECK ((value IS NULL) = (u IS NULL)),
  CHECK (value IS NOT NULL OR reason IS NOT NULL)
) STRICT, WITHOUT ROWID;

-- The measurement that stands for each complex in a factor fit, and what the fit makes of it.
CREATE TABLE factor_complex (
  parameter   TEXT NOT NULL,                        -- which parameter
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  geometry    TEXT NOT NULL,                        -- geometry of the complex
  island      INTEGER NOT NULL,                     -- [>= 1] island that the complex belongs to
  fitted      REAL NOT NULL,                        -- [cm-1|1] what the fit gives: Delta in cm-1, beta as 1
  residual    REAL NOT NULL,                        -- [1] ln(found/fitted) of Delta, found - fitted of beta
  leverage    REAL NOT NULL CHECK (leverage BETWEEN 0 AND 1),   -- [1, 0 to 1] 1: it alone decides its fitted value
  PRIMARY KEY (parameter, complex),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id),
  FOREIGN KEY (parameter, geometry, island) REFERENCES factor_island (parameter, geometry, number)
) STRICT, WITHOUT ROWID;

-- Measurements of a fitted geometry that stand in no factor fit, and why.
CREATE TABLE factor_left_out (
  parameter   TEXT NOT NULL,                        -- which parameter
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  reason      TEXT NOT NULL,                        -- why the measurement stands in no fit
  PRIMARY KEY (parameter, complex, measurement),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id)
) STRICT, WITHOUT ROWID;

-- Where a measurement stands against predictions from the rest of the collection, its complex's own data taken out.
-- A method that predicts nothing says why.
CREATE TABLE placement (
  complex     TEXT NOT NULL,
  measurement TEXT NOT NULL,
  parameter   TEXT NOT NULL CHECK (parameter IN ('Delta', 'B', 'beta')),   -- which parameter
  method      TEXT NOT NULL CHECK (method IN ('average environment', 'factors')),   -- what predicts it
  predicted   REAL,                                 -- [cm-1|1] predicted value: cm-1, or 1 for beta
  u           REAL,                                 -- [cm-1|1, >= 0] standard uncertainty of the prediction
  z           REAL,                                 -- [1] (found - predicted) / combined u, as a normal deviate; of Delta in its logarithm
  reason      TEXT,                                 -- why nothing is predicted
  PRIMARY KEY (complex, measurement, parameter, method),
  FOREIGN KEY (complex, measurement) REFERENCES measurement (complex, id),
  CHECK ((predicted IS NULL) = (u IS NULL)),
  CHECK ((predicted IS NULL) = (reason IS NOT NULL)),
  CHECK (predicted IS NOT NULL OR z IS NULL)
) STRICT, WITHOUT ROWID;

-- Releases of the collection.
CREATE TABLE release (
  id           TEXT NOT NULL PRIMARY KEY,           -- name of the release, as group.yaml gives it
  doi          TEXT,                                -- DOI of the set; absent: not yet assigned
  licence      TEXT NOT NULL,                       -- SPDX identifier of the content's licence
  policy       TEXT NOT NULL REFERENCES policy (id),   -- policy in force
  complexes    INTEGER NOT NULL,                    -- [1, >= 0] complexes in the collection
  measurements INTEGER NOT NULL                     -- [1, >= 0] measurements in the collection
) STRICT, WITHOUT ROWID;

-- Releases that were frozen, oldest first. Their dates are the only dates of publication that the collection has.
CREATE TABLE frozen_release (
  id           TEXT NOT NULL PRIMARY KEY,           -- name of the release
  number       INTEGER NOT NULL,                    -- [>= 1] place in the order of release
  date         TEXT NOT NULL,                       -- ISO date
  who          TEXT NOT NULL,                       -- who released it
  cause        TEXT NOT NULL,                       -- why, in one sentence
  code_version TEXT,                                -- revision of the files under version control; absent: not recorded
  software     TEXT NOT NULL,                       -- name and version of the software
  engine       TEXT NOT NULL,                       -- sha256 of the engine's sources, hex
  licence      TEXT NOT NULL,                       -- SPDX identifier of the content's licence
  doi          TEXT,                                -- DOI of the release; absent: not yet assigned
  complexes    INTEGER NOT NULL,                    -- [1, >= 0] complexes in it
  measurements INTEGER NOT NULL                     -- [1, >= 0] measurements in it
) STRICT, WITHOUT ROWID;

-- What a frozen release held of each complex: enough to tell whether the id still means the same complex.
-- No foreign key leads to complex: a record may be gone by now.
CREATE TABLE frozen_complex (
  release  TEXT NOT NULL REFERENCES frozen_release (id),   -- the frozen release
  complex  TEXT NOT NULL,                           -- id of the complex
  formula  TEXT NOT NULL,                           -- formula as it was typed
  ion      TEXT NOT NULL,                           -- metal ion
  geometry TEXT NOT NULL,                           -- geometry
  isomer   TEXT NOT NULL,                           -- cis, trans, fac, mer or none
  PRIMARY KEY (release, complex)
) STRICT, WITHOUT ROWID;

-- What a frozen release held of each measurement, and hashes of what its numbers hang on.
CREATE TABLE frozen_measurement (
  release     TEXT NOT NULL,                        -- the frozen release
  complex     TEXT NOT NULL,                        -- id of the complex
  measurement TEXT NOT NULL,                        -- id of the measurement within the complex
  verdict     TEXT NOT NULL,                        -- verdict on the chosen reading
  readings    TEXT NOT NULL,                        -- sha256 of what was typed and enters the fit, hex
  policy      TEXT NOT NULL,                        -- policy of the fit
  free_ion    TEXT NOT NULL,                        -- set, B0 and C0 in cm-1: "published 918 3850"; "published" alone: the set has no such ion
  PRIMARY KEY (release, complex, measurement),
  FOREIGN KEY (release, complex) REFERENCES frozen_complex (release, complex)
) STRICT, WITHOUT ROWID;

-- The numbers of frozen releases. They stay readable when the collection moves on.
CREATE TABLE frozen_value (
  release     TEXT NOT NULL,                        -- the frozen release
  complex     TEXT NOT NULL,                        -- id of the complex
  measurement TEXT NOT NULL,                        -- id of the measurement within the complex
  parameter   TEXT NOT NULL CHECK (parameter IN ('Delta', 'B', 'C', 'beta')),   -- which parameter
  value       REAL,                                 -- [cm-1|1] value: cm-1, or 1 for beta; absent: withheld
  u           REAL,                                 -- [cm-1|1, >= 0] standard uncertainty from the readings alone
  u_total     REAL,                                 -- [cm-1|1, >= 0] standard uncertainty with the model floor and an assumed C/B
  standing    TEXT NOT NULL,                        -- what the number was
  PRIMARY KEY (release, complex, measurement, parameter),
  FOREIGN KEY (release, complex, measurement) REFERENCES frozen_measurement (release, complex, measurement)
) STRICT, WITHOUT ROWID;

-- Addresses that a frozen release published, each with the first release that had it. They are kept, or stand in `gone`.
CREATE TABLE published_address (
  address TEXT NOT NULL PRIMARY KEY,                -- path within the site, "complexes/cr-am6/"; with # for a place on a page
  release TEXT NOT NULL REFERENCES frozen_release (id)   -- first release that had it
) STRICT, WITHOUT ROWID;

-- What became of published addresses and ids that are no longer what they were, as the group declares it.
CREATE TABLE gone (
  address TEXT NOT NULL PRIMARY KEY,                -- path within the site
  kind    TEXT NOT NULL CHECK (kind IN ('tombstone', 'redirect', 'corrected')),   -- tombstone: taken away; redirect: renamed; corrected: kept, and its identity was typed wrongly before
  target  TEXT,                                     -- path of the successor, or of the new name
  reason  TEXT                                      -- why, as typed
) STRICT, WITHOUT ROWID;

-- What changed from one release to the next, and since the last. Numbers count as changed where they differ by more than 1e-9 of themselves.
CREATE TABLE change (
  number      INTEGER NOT NULL PRIMARY KEY,         -- [>= 1] place in the list: by release, complex, measurement, parameter
  release     TEXT REFERENCES frozen_release (id),  -- release that brought the change; absent: made since the last release
  kind        TEXT NOT NULL CHECK (kind IN ('complex added', 'complex removed', 'measurement added', 'measurement removed', 'verdict', 'number')),   -- what changed
  complex     TEXT NOT NULL,                        -- id of the complex
  measurement TEXT,                                 -- id of the measurement; absent: the whole complex
  parameter   TEXT CHECK (parameter IN ('Delta', 'B', 'C', 'beta')),   -- of a number: which parameter
  before      REAL,                                 -- [cm-1|1] of a number: value before; absent: withheld or none
  before_u    REAL,                                 -- [cm-1|1, >= 0] its total standard uncertainty
  after       REAL,                                 -- [cm-1|1] of a number: value after; absent: withheld or none
  after_u     REAL,                                 -- [cm-1|1, >= 0] its total standard uncertainty
  cause       TEXT NOT NULL,                        -- what brought it: readings, policy, free-ion set, engine, record; several with commas
  text        TEXT NOT NULL,                        -- the change in words
  CHECK ((kind = 'number') = (parameter IS NOT NULL))
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
