import { describe, expect, test } from 'vitest';
import { plainValue } from '../../../scripts/content/node.ts';
import { readYaml } from '../../../scripts/content/yaml/read.ts';
import { scanTraps } from '../../../scripts/content/yaml/traps.ts';

/** Code and mended line of every trap in a text. */
const traps = (text: string) => scanTraps(text).traps.map(({ finding }) => [finding.code, finding.mend.replace(/^write {2}/, '')]);

describe('a trap is met and the line mended', () => {
  test.each([
    ['position: 24500 cm-1 #2', 'TEXT_LOST', 'position: "24500 cm-1 #2", or put a space behind # where a comment is meant'],
    ['formula: [Cr(CO)6]', 'UNQUOTED_FORMULA', 'formula: "[Cr(CO)6]"'],
    ['formula: [Cr(NH3)6]3+   # hexaammine', 'UNQUOTED_FORMULA', 'formula: "[Cr(NH3)6]3+"   # hexaammine'],
    ['notes: [Cr(NH3)6]3+ in water', 'UNQUOTED_FORMULA', 'notes: "[Cr(NH3)6]3+ in water"'],
    ['notes: as follows:', 'COLON_IN_TEXT', 'notes: "as follows:"'],
    ['notes: he said "so": thus', 'COLON_IN_TEXT', 'notes: "he said \\"so\\": thus"'],
    ['medium:water', 'NO_SPACE_AFTER_COLON', 'medium: water'],
    ['  - id:aq-295', 'NO_SPACE_AFTER_COLON', '- id: aq-295'],
    ['epsilon: >1000', 'SPECIAL_START', 'epsilon: ">1000"'],
    ['notes: !important', 'SPECIAL_START', 'notes: "!important"'],
    ['- *first', 'SPECIAL_START', '- "*first"'],
    ['a: { absent: 28,600 - 33300 cm-1 }', 'COMMA_IN_BRACES', 'a: { absent: 28600 - 33300 cm-1 }'],
    ['a: { temperature: 22,5 °C }', 'COMMA_IN_BRACES', 'a: { temperature: 22.5 °C }'],
    ['a: { position: 24,500(100) cm-1 }', 'COMMA_IN_BRACES', 'a: { position: 24500(100) cm-1 }'],
    ['a: { notes: red, broad, and weak }', 'COMMA_IN_BRACES', 'a: { notes: "red, broad, and weak" }'],
    ['a: { sample: K3[Cr(CN)6], phase: solid }', 'UNQUOTED_FORMULA', 'a: { sample: "K3[Cr(CN)6]", phase: solid }'],
    ['a: { where: page 2: left }', 'COLON_IN_TEXT', 'a: { where: "page 2: left" }'],
    ['\tmedium: water', 'TAB', 'medium: water'],
    ['medium:\t\twater', 'TAB', 'medium:  water'],
  ])('%s', (line, code, mended) => {
    expect(traps(line)).toEqual([[code, mended]]);
  });

  test('the mended text is read as it was meant', () => {
    const { root } = readYaml('a: { position: 24,500 cm-1, notebook: 17, p. 42 }\nformula: [Cr(NH3)6]3+\nion:Cr(III)\n');
    expect(plainValue(root!)).toEqual({ a: { position: '24500 cm-1', notebook: '17, p. 42' }, formula: '[Cr(NH3)6]3+', ion: 'Cr(III)' });
  });
});

describe('what is no trap is left alone', () => {
  test.each([
    'position: 21550(60) cm-1 # read by eye',
    'position: 21550(60) cm-1   #',
    '#position: 21550 cm-1',
    '  #- { position: 21550 cm-1 }',
    'formula: "[Cr(NH3)6]3+" #hexaammine',
    'ligands: { ammine: 6 } #six',
    'notes: "see also: the thesis, p. 3 #4"',
    "notes: 'it''s: fine #1'",
    "notes: it's the student's reading, not ours",
    'notes: at 12:30 h, ratio 3:1',
    'url: https://example.org/a,b#c',
    'doi: 10.5555/a:b#c',
    'smiles: C(=O)([O-])C(=O)[O-]',
    'smiles: N#N',
    'notes: K3[Cr(CN)6] in water, 0.1 mol/L',
    'term: [4T1g(F), CT]',
    'donors: [N, N]',
    'bands: [{ position: 21550 cm-1 }, { absent: 300 - 400 nm }]',
    'ligands: { oxalato: { count: 2, bound: 1 }, aqua: 4 }',
    'bands:\n  - { position: 21550 cm-1,\n      kind: line }',
    'notes: |\n  a: b: c\n  #one\n  [Cr]3+\n  \t tab\nname: x',
    'description: >-\n  two lines: with\n  > signs\nname: x',
    'notes: "over two\n  lines: with #1 and\ttab"\nname: x',
    'position: 21550 ± 60 cm-1',
    'a: { position: 21550 ± 120 cm-1 (k = 2), source: { notebook: "17, p. 42" } }',
    'C/B: { Cr(III): 4.5(5), general: 4.5(9) }',
    '- plain item, with a comma',
    'epsilon: -5',
    'name: hexa{ammine}',
  ])('%s', (text) => {
    expect(traps(text)).toEqual([]);
    expect(readYaml(text).faults).toEqual([]);
  });
});

describe('YAML is read as typed text', () => {
  test('numbers, dates, truth values, null and exponents stay text', () => {
    const { root } = readYaml('a: 36.0\nb: no\nc: 1E3\nd: 2024-03-11\ne: null\nf: ~\ng: 0x1F\nh: true\n');
    expect(plainValue(root!)).toEqual({ a: '36.0', b: 'no', c: '1E3', d: '2024-03-11', e: 'null', f: '~', g: '0x1F', h: 'true' });
  });

  test('lines and columns count from 1 and point at the value', () => {
    const { root } = readYaml('a: 1\nb:\n  - { c: "x" }\n');
    expect(root).toMatchObject({ kind: 'map', entries: [{ value: { line: 1, column: 4 } }, { keyPlace: { line: 2, column: 1 }, value: { items: [{ entries: [{ key: 'c', value: { line: 3, column: 10, quoted: true } }] }] } }] });
  });
});
