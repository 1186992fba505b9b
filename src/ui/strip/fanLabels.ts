/** A label that wants to stand at `wanted` and takes `height` px along the axis, centred there. */
export interface LabelWish {
  wanted: number;
  height: number;
  /** How hard it is to push aside: 1 for a homopause, more for base and exobase. */
  weight: number;
}

/**
 * Places for labels in a column so that none touches another, each as near its wish as the others let it be
 * (least weighted squares, by pooling neighbours that would overlap).
 *
 * @param wishes  in ascending order of `wanted`
 * @param bounds  px between which the labels must stay; where they cannot, the last ones run past the upper bound
 * @returns       centres, ascending, in the order of the wishes
 */
export function fanLabels(wishes: readonly LabelWish[], bounds: { from: number; to: number }): number[] {
  // Distances of each centre from the first one when all labels stand packed.
  const offsets: number[] = [];
  wishes.forEach((wish, i) => {
    const before = wishes[i - 1];
    offsets.push(before ? offsets[i - 1]! + (before.height + wish.height) / 2 : 0);
  });
  const pools: { mean: number; weight: number; count: number }[] = [];
  wishes.forEach((wish, i) => {
    pools.push({ mean: wish.wanted - offsets[i]!, weight: wish.weight, count: 1 });
    while (pools.length > 1 && pools.at(-2)!.mean > pools.at(-1)!.mean) {
      const upper = pools.pop()!;
      const lower = pools.pop()!;
      const weight = lower.weight + upper.weight;
      pools.push({
        mean: (lower.mean * lower.weight + upper.mean * upper.weight) / weight,
        weight,
        count: lower.count + upper.count,
      });
    }
  });
  const first = wishes[0];
  const last = wishes.at(-1);
  if (!first || !last) return [];
  const lowest = bounds.from + first.height / 2;
  const highest = bounds.to - last.height / 2 - offsets.at(-1)!;
  const packedAt = pools.flatMap(({ mean, count }) => Array<number>(count).fill(mean));
  return packedAt.map((mean, i) => Math.max(lowest, Math.min(highest, mean)) + offsets[i]!);
}
