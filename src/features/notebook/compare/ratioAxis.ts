/** The axis on which ratios of two states stand, from 1 outward. */
export interface RatioAxis {
  /** Decades from 1 to either end. */
  reach: number;
  ticks: number[];
}

const axes: readonly RatioAxis[] = [
  { reach: Math.log10(1.02), ticks: [0.98, 0.99, 1, 1.01, 1.02] },
  { reach: Math.log10(1.25), ticks: [0.8, 0.9, 1, 1.1, 1.25] },
  { reach: Math.log10(2.2), ticks: [0.5, 0.7, 1, 1.4, 2] },
  { reach: 1.05, ticks: [0.1, 0.5, 1, 2, 10] },
  { reach: 3.15, ticks: [0.001, 1, 1000] },
];

/** The closest axis on which at least three ratios in four find room; the others run off it. */
export function ratioAxis(log10Ratios: readonly number[]): RatioAxis {
  const sizes = log10Ratios.map(Math.abs).sort((a, b) => a - b);
  const typical = sizes[Math.ceil(0.75 * sizes.length) - 1] ?? 0;
  return axes.find(({ reach }) => reach >= typical) ?? axes.at(-1)!;
}

/** From 0 at the low end to 1 at the high one; beyond them for what runs off. */
export const ratioPlace = ({ reach }: RatioAxis, log10Ratio: number): number =>
  0.5 + log10Ratio / (2 * reach);
