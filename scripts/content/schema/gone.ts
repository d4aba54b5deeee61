// The file releases/gone.yaml: what became of published addresses that are no longer what they were.

import { z } from 'zod';
import { leaf, text } from './leaves.ts';

/** An address within the site: "complexes/cr-am6/", "complexes/cr-am6/#aq-295". */
const siteAddress = () =>
  leaf<string>((typed) => {
    const value = typed.trim().replace(/^\//, '');
    if (/^(?:[a-z0-9.-]+\/)*(?:[A-Za-z0-9.-]+)?(?:#[A-Za-z0-9._-]+)?$/.test(value) && value !== '') return { value };
    return { code: 'GONE_ADDRESS', found: typed, expected: 'an address within the site, e.g. complexes/cr-am6/', mend: 'copy the address as the message or the release file gives it, without the host' };
  });

export const goneSchema = z.strictObject({
  gone: z.array(z.strictObject({
    address: siteAddress().meta({ description: 'published address, from the site\'s root', examples: ['complexes/cr-old/'] }),
    reason: text().optional().meta({ description: 'why it was taken away: leaves a tombstone there', examples: ['"Measured on the wrong sample."'] }),
    successor: siteAddress().optional().meta({ description: 'address that replaces what was taken away', examples: ['complexes/cr-new/'] }),
    now: siteAddress().optional().meta({ description: 'new address of a renamed record: leaves a redirect', examples: ['complexes/cr-new/'] }),
    corrected: text().optional().meta({ description: 'the address stays, and what it is was typed wrongly before: how', examples: ['"The isomer is trans."'] }),
  })).max(1000).meta({ description: 'one item for each address', examples: ['[{ address: complexes/cr-old/, now: complexes/cr-new/ }]'] }),
});
