// Every code that a fault report may carry, with the sentence of the manual. Codes last: an old one is never given a new meaning.

import type { QuantityCode } from '#engine';

const quantityCodes: Readonly<Record<QuantityCode, string>> = {
  EMPTY: 'a number is wanted and nothing stands there',
  TOO_LONG: 'a number of more than 80 characters or 15 digits',
  NOT_A_NUMBER: 'a number is wanted and something else stands there',
  NOT_FINITE: 'NaN or infinity: missing is left out, never written as a number',
  EXPONENT: '1E3 or 2.4 x 10^4: numbers are written in full',
  THOUSANDS_COMMA: '24,500: no comma between thousands (a space may stand there)',
  DECIMAL_COMMA: '464,5: a point before decimals',
  NEGATIVE: 'a value below zero where none can be',
  ZERO: 'a value of zero where none can be',
  NO_UNIT: 'a number without its unit',
  UNKNOWN_UNIT: 'a unit that is not known',
  WRONG_UNIT: 'a unit of the wrong kind',
  BAD_UNCERTAINTY: 'an uncertainty that cannot be read',
  ZERO_UNCERTAINTY: 'an uncertainty of zero',
  UNCERTAINTY_SIGN: 'a two-sided uncertainty without one plus and one minus',
  BAD_COVERAGE: 'a coverage factor that cannot be read, or one without an uncertainty',
  NOT_A_COUNT: 'a whole number is wanted',
  BAD_RANGE: 'a range that cannot be read',
};

const fileCodes = {
  NO_CONTENT: 'the folder holds no content, or is not there',
  FILE_UNREADABLE: 'a file cannot be opened',
  FILE_TOO_LARGE: 'a file of more than 1 MB',
  FILE_EMPTY: 'a file without any field',
  NOT_UTF8: 'a file that is not UTF-8 text',
  FILE_NAME: 'a file whose name is no id, or does not end in .yaml',
  FILE_UNKNOWN: 'a YAML file or folder that nothing reads',
  DUPLICATE_ID: 'one id used twice, capitals aside',
  BAD_ID: 'an id that breaks the rule for ids',
  MORE_FAULTS: 'a file with more than 100 faults: only the first are shown',
} as const;

const yamlCodes = {
  TAB: 'a tab: YAML takes spaces only',
  COMMA_IN_BRACES: 'a comma inside { } that cuts a value in two',
  UNQUOTED_FORMULA: 'a formula or SMILES that starts with [ or holds [ inside { }, without quotes',
  COLON_IN_TEXT: 'a colon and a space inside text without quotes',
  NO_SPACE_AFTER_COLON: 'a field and its value without a space between',
  NO_SPACE_AFTER_DASH: 'a list item without a space behind its dash',
  TEXT_LOST: 'text behind " #", which YAML takes for a comment',
  SPECIAL_START: 'a value that starts with > | * & ! @ % or `, without quotes',
  DUPLICATE_KEY: 'one field typed twice',
  YAML_FEATURE: 'an anchor, alias, tag, merge key, directive or second document: not read here',
  YAML_SYNTAX: 'a line that YAML cannot read',
  TOO_DEEP: 'lists or braces nested more than 12 deep',
} as const;

const fieldCodes = {
  UNKNOWN_FIELD: 'a field that this kind of record has not',
  MISSING_FIELD: 'a required field that is not there',
  EMPTY_VALUE: 'a field without a value: missing is left out',
  WRONG_SHAPE: 'a list where a text is wanted, or the like',
  FIELD_NOT_HERE: 'a field that goes with another value only, such as side: without a shoulder',
  UNKNOWN_CHOICE: 'a word that is not on the list of its field',
  TEXT_TOO_LONG: 'a text of more than 4000 characters',
  CONTROL_CHARACTER: 'an invisible character in a text that controls a terminal or turns the direction of writing',
  BAD_COUNT: 'a whole number outside its limits',
  BAD_CHARGE: 'a charge that cannot be read',
  BAD_DATE: 'a date that is not year-month-day, or not in the calendar',
  BAD_ORCID: 'an ORCID identifier of wrong shape or check digit',
  BAD_DOI: 'a DOI of wrong shape',
  BAD_LICENCE: 'a licence that is no SPDX identifier by its shape',
  BAD_ADDRESS: 'a web address that cannot be read',
  BAD_HASH: 'a SHA-256 sum of wrong shape',
  TOO_MANY: 'more bands, measurements or other items than a record may hold',
} as const;

const chemistryCodes = {
  BAD_FORMULA: 'a formula that cannot be read',
  ION_UNKNOWN: 'an ion that is not of the d block, or not written like Cr(III)',
  ION_D_COUNT: 'an oxidation state that leaves no possible d count',
  UNKNOWN_LIGAND: 'a ligand without a record in ligands/',
  UNKNOWN_SOURCE: 'a source without a record in sources/',
  CHARGE_SUM: 'the charges of ion and ligands do not add up to that of the formula',
  DONOR_COUNT: 'the donor atoms do not add up to the coordination number',
  BOUND_COUNT: 'more donor atoms bound than the ligand has',
  FORMULA_CONTENT: 'the formula and the ion with its ligands hold different atoms',
  SAMPLE_CONTENT: 'the sample does not contain the complex',
  LIGAND_DONORS: 'the donors of a ligand differ in number from its denticity, or are not in its formula',
  LIGAND_SMILES: 'a SMILES that cannot be read, or whose atoms other than hydrogen are not those of the formula',
  SPIN_MISSING: 'octahedral d4 to d7 without a spin',
  SPIN_IMPOSSIBLE: 'a spin that the ion cannot have',
  BAND_RANGE: 'a band outside 1000 to 100 000 cm-1, often nm typed as cm-1',
  BAND_WIDTH: 'a width that is not smaller than the position',
  ABSENT_OVERLAP: 'a band inside a range that is declared absent',
  BAND_UNIT: 'a band outside what was scanned, whose number would lie inside in the other unit, nm or cm-1; or one below 2500 cm-1 that is typed neither as vibration nor inside what was scanned',
  BAND_NOT_SCANNED: 'a band to be fitted that lies outside what was scanned',
  NO_SOURCE: 'a measurement with neither notebook nor cite',
  TERM_UNREADABLE: 'a term label that cannot be read',
  TERM_UNKNOWN: 'a term that the ion has not',
  TERM_IS_GROUND: 'the ground level typed as a transition',
  TERM_AMBIGUOUS: 'a term label that names no single level',
  TERM_TWICE: 'two bands that claim one term and are not components',
  DIP_TERM: 'a dip with the term of a spin-allowed transition',
  DEGENERACY_MISSING: 'one component of a term with a degeneracy and another without',
  DEGENERACY_SUM: 'components whose degeneracies do not add up to the states of their term',
  SPIN_EVIDENCE: 'a spin that the magnetic moment, the EPR spectrum or the terms of the bands contradict',
  HAZARD_UNKNOWN: 'an override of a hazard caution that does not exist',
  POLICY_VALUE: 'a policy value outside its limits',
  POLICY_OVERRIDE: 'an override of the policy without one value and its reason',
} as const;

const releaseCodes = {
  RELEASE_FILE: 'a file of releases/ that is no frozen release',
  GONE_ADDRESS: 'an entry of gone.yaml that cannot be read, names no published address, or leads nowhere',
  ADDRESS_VANISHED: 'a published record, measurement or page that is no longer there',
  ID_REUSED: 'an id that was taken away and is used again',
  IDENTITY_CHANGED: 'an id that no longer means the complex that was published under it',
} as const;

/** The manual's sections, in its order. */
export const codeGroups = [
  { title: 'Files', codes: fileCodes },
  { title: 'YAML', codes: yamlCodes },
  { title: 'Fields', codes: fieldCodes },
  { title: 'Numbers', codes: quantityCodes },
  { title: 'Chemistry', codes: chemistryCodes },
  { title: 'Releases', codes: releaseCodes },
] as const;

export type FaultCode = QuantityCode | keyof typeof fileCodes | keyof typeof yamlCodes | keyof typeof fieldCodes | keyof typeof chemistryCodes | keyof typeof releaseCodes;
