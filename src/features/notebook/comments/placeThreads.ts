/** One thing to be placed in the margin, in px. */
export interface MarginItem {
  id: string;
  /** Where it would stand if it were alone. */
  anchor: number;
  height: number;
  /** How much it counts that it stands there; the one in use counts far more than the rest. */
  weight: number;
}

/**
 * Tops for things that must not overlap, in the order given, none above `floor`: each as near to its anchor as the rest
 * allow. Minimises the weighted sum of squared displacements: things that meet are pooled and stand at their common
 * mean (the algorithm of pool adjacent violators; Barlow et al., Statistical Inference under Order Restrictions, 1972;
 * from memory).
 */
export function placeThreads(
  items: readonly MarginItem[],
  { floor, gap }: { floor: number; gap: number },
): Map<string, number> {
  interface Pool {
    weight: number;
    /** Weighted mean of where its first member would have to stand. */
    start: number;
    offsets: { id: string; offset: number }[];
  }
  const pools: Pool[] = [];
  let above = 0;
  for (const { id, anchor, height, weight } of items) {
    // Measured from where everything above, packed, would end, order is all that is left to keep.
    let pool: Pool = { weight, start: anchor - above, offsets: [{ id, offset: above }] };
    for (let last = pools.at(-1); last && last.start > pool.start; last = pools.at(-1)) {
      pools.pop();
      const both = last.weight + pool.weight;
      pool = {
        weight: both,
        start: (last.start * last.weight + pool.start * pool.weight) / both,
        offsets: [...last.offsets, ...pool.offsets],
      };
    }
    pools.push(pool);
    above += height + gap;
  }
  return new Map(
    pools.flatMap(({ start, offsets }) =>
      offsets.map(({ id, offset }): [string, number] => [id, Math.round(Math.max(start, floor) + offset)]),
    ),
  );
}
