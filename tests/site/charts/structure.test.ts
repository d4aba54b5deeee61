import { parseHTML } from 'linkedom';
import { expect, test } from 'vitest';
import { readStructure } from '../../../scripts/structures/layout.ts';
import { structureFigure } from '../../../site/charts/structure.ts';

const drawn = (smiles: string) => {
  const read = readStructure(smiles);
  if (!read.ok) throw new Error(read.reason);
  const svg = structureFigure(read.structure, { id: 's', title: 'Structure', description: 'Drawn' });
  return { svg, document: parseHTML(`<!doctype html><html><body>${svg}</body></html>`).document };
};
const texts = (smiles: string) => [...drawn(smiles).document.querySelectorAll('text')].map((text) => text.textContent);

test('carbon atoms are corners; others carry their hydrogen atoms and charge on the free side', () => {
  expect(texts('NCCN').sort()).toEqual(['H2N', 'NH2']);
  expect(texts('O')).toEqual(['H2O']);
  expect(texts('N')).toEqual(['NH3']);
  expect(texts('[Cl-]')).toEqual(['Cl−']);
  expect(texts('c1ccncc1')).toEqual(['N']);
  expect(texts('NCC(=O)[O-]').sort()).toEqual(['NH2', 'O', '−O']);
});

test('figures of hydrogen are lowered and charges raised, with a real minus', () => {
  const { document, svg } = drawn('NCC(=O)[O-]');
  const shifted = [...document.querySelectorAll('tspan')].map((span) => [span.textContent, Math.sign(Number(span.getAttribute('dy')))]);
  expect(shifted).toContainEqual(['2', 1]);
  expect(shifted).toContainEqual(['−', -1]);
  expect(svg.replace(/d="[^"]*"|<(title|desc)[^>]*>[^<]*/g, '')).not.toMatch(/>[^<]*-[^<]*</);
});

test('the drawing has name and role, no style of its own and no number that is none', () => {
  for (const smiles of ['C[C@@H](N)CN', 'C[C@H](N)CN', '[2H]O[2H]', '[N-]=[N+]=[N-]', 'C', 'C[N+](C)(C)C', 'c1cc[n-]c1']) {
    const { svg, document } = drawn(smiles);
    expect(svg).not.toMatch(/<style| style=|NaN|undefined/);
    expect(document.querySelector('svg')!.getAttribute('role')).toBe('img');
    expect(document.querySelector('title')!.textContent).toBe('Structure');
  }
});

test('a triple bond is three lines, a wedge is filled, a bond away from the reader is rungs', () => {
  expect(drawn('CC#N').document.querySelector('.bond')!.getAttribute('d')!.match(/M/g)!.length).toBe(4);
  const [one, other] = ['C[C@@H](N)CN', 'C[C@H](N)CN'].map((smiles) => drawn(smiles).document.querySelectorAll('.wedge').length);
  expect([one, other].sort()).toEqual([0, 1]);
});
