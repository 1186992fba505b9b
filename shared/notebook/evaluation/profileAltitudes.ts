import { logarithm, type Column } from "../../physics";

/** Evenly spaced altitudes of a profile, before what curves need. */
const even = 200;

/** Altitudes added at most where curves are steep. */
const added = 120;

/** The total density changes by no more than this factor's logarithm from one altitude to the next, while `added` lasts. */
const largestStep = 0.35;

/**
 * Altitudes at which a column is tabulated for figures: evenly from base to top, closer where the density falls
 * fast, and exactly at the exobase, the ends of its band and each homopause.
 */
export function profileAltitudes(column: Column): Float64Array {
  const { input, topAltitude: top, exobase, homopauses } = column;
  const base = input.baseAltitude;
  const marks = homopauses.flatMap((homopause) => (homopause.found ? [homopause.altitude] : []));
  if (exobase.found) {
    marks.push(exobase.level.altitude);
    for (const end of [exobase.lower, exobase.upper]) if (end !== null) marks.push(end);
  }
  const spaced = Array.from({ length: even }, (_, index) => base + ((top - base) * index) / (even - 1));
  spaced[even - 1] = top;
  const coarse = ascending([...spaced, ...marks.filter((mark) => mark > base && mark < top)]);

  const { numberDensity } = column.profilesAt(coarse);
  const refined = Array.from(coarse);
  let left = added;
  for (let i = 1; i < coarse.length && left > 0; i += 1) {
    const fall = Math.abs(logarithm(numberDensity[i]) - logarithm(numberDensity[i - 1]));
    const pieces = Number.isFinite(fall) ? Math.min(Math.ceil(fall / largestStep), left + 1) : 1;
    for (let piece = 1; piece < pieces; piece += 1) {
      refined.push(coarse[i - 1] + ((coarse[i] - coarse[i - 1]) * piece) / pieces);
    }
    left -= Math.max(0, pieces - 1);
  }
  return ascending(refined);
}

function ascending(altitudes: number[]): Float64Array {
  const sorted = Float64Array.from(altitudes).sort();
  return sorted.filter((altitude, index) => index === 0 || altitude > sorted[index - 1]);
}
