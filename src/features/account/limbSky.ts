/**
 * Colours of the sky over a limb, from emission layers looked at edge on. Altitudes in km.
 * The planet is the demonstration's Ilmara; layer heights and depths follow the night and twilight glow of a
 * terrestrial planet, from memory; colours are chosen, not computed.
 */

export interface SkyStop {
  altitude: number;
  colour: string;
}

type Light = readonly [number, number, number];
type Emission = (altitude: number) => number;

/** Radius of Ilmara, km. */
const planetRadius = 4943;
/** The drawing's sky ends here. */
export const skyTop = 470;

/** A layer that is lit from above and shades itself: rises fast below its peak, decays above it. */
const chapmanLayer =
  (peak: number, depth: number): Emission =>
  (altitude) => {
    const x = (altitude - peak) / depth;
    return Math.exp(1 - x - Math.exp(-x));
  };

/** Air that thins evenly from the ground. */
const thinningLayer =
  (depth: number): Emission =>
  (altitude) =>
    altitude < 0 ? 0 : Math.exp(-altitude / depth);

/** Brightness along the line of sight that passes the planet at a tangent altitude: the layer's Abel integral. */
function limbBrightness(emission: Emission, tangent: number): number {
  const steps = 120;
  const reach = 3200;
  let sum = 0;
  for (let step = 0; step < steps; step += 1) {
    const u = (step + 0.5) / steps;
    const along = reach * u * u;
    const altitude = Math.hypot(planetRadius + tangent, along) - planetRadius;
    sum += (emission(altitude) * 2 * reach * u) / steps;
  }
  return sum;
}

/** The same, as a share of its brightest. */
function layer(emission: Emission, brightest: number): Emission {
  const most = limbBrightness(emission, brightest);
  return (altitude) => limbBrightness(emission, altitude) / most;
}

const greenLine = layer(chapmanLayer(96, 6.5), 93);
const sodiumLine = layer(chapmanLayer(89, 4), 87);
const redLine = layer(chapmanLayer(235, 44), 215);
const scatteredLight = layer(thinningLayer(9), 3);
const dust = layer(thinningLayer(4.2), 2);
const highScatter = layer(thinningLayer(26), 3);

/** sRGB to linear light and back. */
function linear(hex: string): Light {
  const channel = (at: number): number => {
    const value = parseInt(hex.slice(at, at + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return [channel(1), channel(3), channel(5)];
}

function hex(light: Light): string {
  const channel = (value: number): string => {
    const bounded = Math.min(1, Math.max(0, value));
    const encoded = bounded <= 0.0031308 ? bounded * 12.92 : 1.055 * bounded ** (1 / 2.4) - 0.055;
    return Math.round(encoded * 255)
      .toString(16)
      .padStart(2, "0");
  };
  return `#${light.map(channel).join("")}`;
}

/** At night the layers shine: light adds to light, and the brightest saturates as a film does. */
const glows: readonly [Emission, Light, number][] = [
  [(z) => greenLine(z) ** 3.2, linear("#a6e23c"), 0.66],
  [greenLine, linear("#7fc23a"), 0.1],
  [(z) => sodiumLine(z) ** 3, linear("#ffb04a"), 0.1],
  [(z) => redLine(z) ** 1.6, linear("#d8453c"), 0.05],
  [scatteredLight, linear("#3f74c8"), 0.2],
  [dust, linear("#ff7a26"), 0.62],
  [highScatter, linear("#2a5aa6"), 0.42],
];
const nightGround = linear("#0a101c");

function nightColour(altitude: number): string {
  const sum = [...nightGround] as [number, number, number];
  for (const [emission, colour, strength] of glows) {
    const brightness = emission(altitude) * strength;
    sum[0] += colour[0] * brightness;
    sum[1] += colour[1] * brightness;
    sum[2] += colour[2] * brightness;
  }
  const exposed = (value: number): number => 1 - Math.exp(-value * 1.15);
  return hex([exposed(sum[0]), exposed(sum[1]), exposed(sum[2])]);
}

/** At dusk the sky is bright: each layer is laid over what is behind it. */
const veils: readonly [Light, (altitude: number) => number][] = [
  [linear("#c3d2ec"), (z) => 0.92 * Math.exp(-((z / 250) ** 1.5))],
  [linear("#86a5d8"), (z) => 0.86 * Math.exp(-((z / 120) ** 2))],
  [linear("#f3dcc0"), (z) => 0.94 * Math.exp(-((z / 52) ** 1.7))],
  [linear("#f6b873"), (z) => 0.9 * Math.exp(-((z / 24) ** 1.4))],
  [linear("#d9562b"), (z) => 0.92 * Math.exp(-z / 8)],
  [linear("#e9f59a"), (z) => 0.8 * greenLine(z) ** 4.5],
  [linear("#f0a69a"), (z) => 0.12 * redLine(z) ** 2],
];
const duskGround = linear("#f4f1ea");

function duskColour(altitude: number): string {
  let colour: Light = duskGround;
  for (const [veil, share] of veils) {
    const opacity = share(altitude);
    colour = [
      colour[0] * (1 - opacity) + veil[0] * opacity,
      colour[1] * (1 - opacity) + veil[1] * opacity,
      colour[2] * (1 - opacity) + veil[2] * opacity,
    ];
  }
  return hex(colour);
}

/** Stops lie closer together near the ground, where the sky changes fastest. */
function stops(colourAt: (altitude: number) => string): SkyStop[] {
  const count = 110;
  return Array.from({ length: count + 1 }, (_, index) => {
    const altitude = (index / count) ** 1.6 * skyTop;
    return { altitude, colour: colourAt(altitude) };
  });
}

/** The sky from the ground up, for the light and for the dark page. */
export const sky = { dusk: stops(duskColour), night: stops(nightColour) } as const;
