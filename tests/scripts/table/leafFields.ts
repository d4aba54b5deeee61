import { z } from 'zod';

/** Every text that a complex record may hold, as "level path": "measurement source notebook", "band position". */
export function leafFields(schema: z.ZodObject): string[] {
  return [...new Set(Object.entries(schema.shape).flatMap(([name, field]) => leaves(field as z.core.$ZodType, 'complex', [name])))];
}

const levels: Readonly<Record<string, string>> = { measurements: 'measurement', bands: 'band', quoted: 'quoted' };

function leaves(schema: z.core.$ZodType, level: string, path: readonly string[]): string[] {
  if (schema instanceof z.ZodOptional) return leaves(schema.unwrap(), level, path);
  const deeper = levels[path[0]!];
  if (schema instanceof z.ZodArray && deeper !== undefined && path.length === 1) return inside(schema.element, deeper, []);
  if (schema instanceof z.ZodObject) return inside(schema, level, path);
  return [[level, ...path].join(' ')];
}

function inside(schema: z.core.$ZodType, level: string, path: readonly string[]): string[] {
  if (schema instanceof z.ZodUnion) return schema.options.flatMap((option) => inside(option, level, path));
  return schema instanceof z.ZodObject ? Object.entries(schema.shape).flatMap(([name, field]) => leaves(field as z.core.$ZodType, level, [...path, name])) : [];
}
