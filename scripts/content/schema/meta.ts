// What a field's schema says of itself: description, examples.

import { z } from 'zod';

/** Description and examples of a field; what the wrapper of an optional field leaves unsaid its inner schema says. */
export function metaOf(schema: z.core.$ZodType): z.core.GlobalMeta {
  const own = z.globalRegistry.get(schema) ?? {};
  return schema instanceof z.ZodOptional ? { ...metaOf(schema.unwrap()), ...own } : own;
}
