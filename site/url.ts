/** The base path of the site; the build puts it in. */
declare const SITE_BASE: string | undefined;
const siteBase = typeof SITE_BASE === 'undefined' ? '/' : SITE_BASE;

/**
 * Address of a page or file of this site under its base path. A path that ends in a name without a dot or capital is a page
 * and gets its closing slash.
 * @param path from the site's root, with or without a leading slash: "complexes/cr-am6", "data/results.csv"
 */
export function url(path: string, base: string = siteBase): string {
  const root = base.endsWith('/') ? base : `${base}/`;
  const inner = path.replace(/^\/+/, '');
  if (inner === '') return root;
  const [, address = '', rest = ''] = /^([^?#]*)(.*)$/.exec(inner) ?? [];
  const last = address.split('/').at(-1) ?? '';
  const closed = address === '' || address.endsWith('/') || last.includes('.') || /[A-Z]/.test(last) ? address : `${address}/`;
  return `${root}${closed}${rest}`;
}
