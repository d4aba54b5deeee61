/**
 * What is to be said of a transition's part in a fit; "" where it simply took part.
 *
 * @param calculated whether the reading has a fit that puts the transition somewhere
 * @param merged how many bands stand behind it
 */
export function partInFit(used: boolean, calculated: boolean, merged: number): string {
  const part = used ? [] : [calculated ? 'compared only' : 'not fitted'];
  return [...part, ...(merged > 1 ? [`barycentre of ${merged} components`] : [])].join(', ');
}
