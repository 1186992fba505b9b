/** Steps of a map: even bands between round levels, ten at most. */
export interface MapBands {
  /** Between two levels, in places along the scale of the quantity: decades where it is logarithmic. */
  step: number;
  /** Borders of the bands from the lowest to the highest, one more than there are bands. */
  edges: number[];
}

const mostBands = 10;

/** Quarters of a decade, then coarser. */
const decadeSteps = [0.25, 0.5, 1, 2, 5, 10, 20, 50, 100];

/**
 * @param low   lowest place on the map
 * @param high  highest
 */
export function mapBands(low: number, high: number, isLog: boolean): MapBands {
  if (!(high > low)) return { step: 0, edges: [low, low] };
  const steps = isLog ? decadeSteps : evenSteps(high - low);
  const step = steps.find((candidate) => count(low, high, candidate) <= mostBands) ?? high - low;
  const first = Math.floor(low / step + 1e-9);
  const edges = Array.from({ length: count(low, high, step) + 1 }, (_, index) => (first + index) * step);
  return { step, edges };
}

const count = (low: number, high: number, step: number): number =>
  Math.max(1, Math.ceil(high / step - 1e-9) - Math.floor(low / step + 1e-9));

/** 1, 2 and 5 times powers of ten, from a hundredth of the span up. */
function evenSteps(span: number): number[] {
  const decade = 10 ** Math.floor(Math.log10(span / 100));
  return [1, 10, 100].flatMap((power) => [1, 2, 5].map((factor) => factor * power * decade));
}

/** Levels between the bands, at which contours run. */
export const levelsOf = ({ edges }: MapBands): number[] => edges.slice(1, -1);

/** Which of the ten steps of the palette a band takes, so that the whole of it is used. */
export function paletteStep(band: number, { edges }: MapBands): number {
  const bands = edges.length - 1;
  return bands === 1 ? 5 : Math.round((band * 9) / (bands - 1));
}

/** The band in which a place lies. */
export function bandAt(place: number, { step, edges }: MapBands): number {
  if (step === 0) return 0;
  return Math.min(edges.length - 2, Math.max(0, Math.floor((place - edges[0]!) / step + 1e-9)));
}
