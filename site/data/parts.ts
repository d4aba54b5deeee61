/** A list cut into parts of at most `size`, each with the place of its first row. An empty list has one empty part. */
export function inParts<Row>(list: readonly Row[], size: number): readonly { readonly rows: readonly Row[]; readonly start: number }[] {
  return Array.from({ length: Math.max(1, Math.ceil(list.length / size)) }, (_, index) => ({ rows: list.slice(index * size, (index + 1) * size), start: index * size }));
}
