/**
 * Places labels along a line so that no two overlap and each stays as near to its wish as the others allow.
 * Labels keep the order of their wishes (ties: order given). Least squares by pooling neighbours that touch
 * (pool adjacent violators).
 * @param wishes wanted centre of each label
 * @param extents length that each label takes along the line, gap included
 * @param range the line's ends; where the labels do not fit they run past the upper end
 * @returns the centre of each label, in the order given
 */
export function spreadLabels(
  wishes: readonly number[], extents: readonly number[], range: readonly [number, number],
): readonly number[] {
  if (wishes.length !== extents.length) throw new RangeError('one extent for each label');
  const order = wishes.map((_, index) => index).sort((a, b) => (wishes[a]! - wishes[b]!) || a - b);
  interface Pool { members: number[]; offsets: number[]; length: number; start: number; sum: number }
  const pools: Pool[] = [];
  const total = extents.reduce((sum, extent) => sum + extent, 0);
  const settle = (pool: Pool): void => {
    const free = pool.sum / pool.members.length;
    pool.start = Math.max(range[0], Math.min(free, range[1] - pool.length));
  };
  for (const index of order) {
    const extent = extents[index]!;
    const pool: Pool = { members: [index], offsets: [extent / 2], length: extent, start: 0, sum: wishes[index]! - extent / 2 };
    settle(pool);
    pools.push(pool);
    while (pools.length > 1) {
      const upper = pools.at(-1)!;
      const lower = pools.at(-2)!;
      if (lower.start + lower.length <= upper.start + 1e-9) break;
      for (const [position, member] of upper.members.entries()) {
        lower.members.push(member);
        lower.offsets.push(lower.length + upper.offsets[position]!);
      }
      lower.sum += upper.sum - upper.members.length * lower.length;
      lower.length += upper.length;
      pools.pop();
      settle(lower);
    }
  }
  // Where there is too little room the labels start at the lower end and stay in order.
  if (total > range[1] - range[0]) {
    let start = range[0];
    const packed: number[] = new Array(wishes.length).fill(0);
    for (const index of order) {
      packed[index] = start + extents[index]! / 2;
      start += extents[index]!;
    }
    return packed;
  }
  const centres: number[] = new Array(wishes.length).fill(0);
  for (const pool of pools) pool.members.forEach((member, position) => { centres[member] = pool.start + pool.offsets[position]!; });
  return centres;
}
