/** Where the site will stand: origin and base path, as the page builder and the preview want them. */
export interface Address {
  /** "https://example.org" */
  readonly origin: string;
  /** "/" or "/bands/" */
  readonly base: string;
}

/** Parts of the site URL of group.yaml, "https://example.org/bands/". Throws TypeError where it is no URL; the record check says so first. */
export function addressOf(url: string): Address {
  const { origin, pathname } = new URL(url);
  return { origin, base: pathname.endsWith('/') ? pathname : `${pathname}/` };
}
