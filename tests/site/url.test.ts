import { expect, test } from 'vitest';
import { url } from '../../site/url.ts';

test('addresses stand under the base path, pages with a closing slash and files without', () => {
  expect(url('', '/bands/')).toBe('/bands/');
  expect(url('complexes/cr-am6', '/bands/')).toBe('/bands/complexes/cr-am6/');
  expect(url('/complexes/cr-am6/', '/bands')).toBe('/bands/complexes/cr-am6/');
  expect(url('figures/x.svg', '/')).toBe('/figures/x.svg');
  expect(url('complexes/cr-am6#aq-295', '/')).toBe('/complexes/cr-am6/#aq-295');
  expect(url('data/SHA256SUMS', '/b/')).toBe('/b/data/SHA256SUMS');
  expect(url('?q=Cr', '/b/')).toBe('/b/?q=Cr');
});
