/**
 * Shares of a Maxwellian by kind of orbit from the orbits themselves: the direct integral over speed and direction,
 * with energy and angular momentum kept. Speeds in √(2kT/m). Nothing of it is in the code that it checks.
 */
export function maxwellianByOrbit(exobaseEscapeParameter: number, radiusRatio: number) {
  const lambdaC = exobaseEscapeParameter;
  const lambda = lambdaC / radiusRatio;
  /** Share of directions, of both signs, from which an orbit of speed v crosses the exobase. */
  const crossing = (v: number): number => {
    const sineSquared = (1 + (lambdaC - lambda) / (v * v)) / radiusRatio ** 2;
    return sineSquared >= 1 ? 1 : 1 - Math.sqrt(1 - sineSquared);
  };
  const speeds = (v: number): number => (4 / Math.sqrt(Math.PI)) * v * v * Math.exp(-v * v);
  const alwaysBelow = radiusRatio === 1 ? Infinity : Math.sqrt((lambdaC - lambda) / (radiusRatio ** 2 - 1));
  const escape = Math.sqrt(lambda);
  const fastest = Math.max(escape, 0) + 7;
  return {
    ballistic: integrate((v) => speeds(v) * crossing(v), 0, escape, alwaysBelow),
    satellite: integrate((v) => speeds(v) * (1 - crossing(v)), 0, escape, alwaysBelow),
    escaping: integrate((v) => 0.5 * speeds(v) * crossing(v), escape, fastest, alwaysBelow),
  };
}

/** Midpoint rule in an angle, which roots at the ends of a piece do not disturb; cut where the integrand has a corner. */
function integrate(f: (v: number) => number, from: number, to: number, corner: number): number {
  const ends = corner > from && corner < to ? [from, corner, to] : [from, to];
  const parts = 4000;
  let sum = 0;
  for (let piece = 1; piece < ends.length; piece += 1) {
    const [a, b] = [ends[piece - 1], ends[piece]];
    for (let i = 0; i < parts; i += 1) {
      const angle = (Math.PI * (i + 0.5)) / parts;
      sum +=
        f(a + ((b - a) * (1 - Math.cos(angle))) / 2) * Math.sin(angle) * ((b - a) / 2) * (Math.PI / parts);
    }
  }
  return sum;
}
