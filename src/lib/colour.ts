/** Colour as eyes of three kinds see it: distances in OKLab × 100, contrast by WCAG 2. */

export const sights = ["full", "deuteranopia", "protanopia"] as const;
export type Sight = (typeof sights)[number];
type Triple = readonly [number, number, number];

/**
 * What a dichromat sees, on linear sRGB.
 *
 * @source Machado, Oliveira & Fernandes 2009, severity 1.0
 */
const simulation: Record<Exclude<Sight, "full">, readonly Triple[]> = {
  deuteranopia: [
    [0.367322, 0.860646, -0.227968],
    [0.280085, 0.672501, 0.047413],
    [-0.01182, 0.04294, 0.968881],
  ],
  protanopia: [
    [0.152286, 1.052583, -0.204868],
    [0.114503, 0.786281, 0.099216],
    [-0.003882, -0.048116, 1.051998],
  ],
};

const apply = (matrix: readonly Triple[], v: Triple): Triple =>
  matrix.map((row) => row[0] * v[0] + row[1] * v[1] + row[2] * v[2]) as unknown as Triple;

const toLinear = (channel: number): number =>
  channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
const fromLinear = (channel: number): number =>
  channel <= 0.0031308 ? 12.92 * channel : 1.055 * channel ** (1 / 2.4) - 0.055;

/** Linear sRGB of "#rrggbb". */
export function linearFromHex(hex: string): Triple {
  const channels = [1, 3, 5].map((start) => toLinear(parseInt(hex.slice(start, start + 2), 16) / 255));
  return channels as unknown as Triple;
}

const oklabRows: { lms: readonly Triple[]; lab: readonly Triple[] } = {
  lms: [
    [0.4122214708, 0.5363325363, 0.0514459929],
    [0.2119034982, 0.6806995451, 0.1073969566],
    [0.0883024619, 0.2817188376, 0.6299787005],
  ],
  lab: [
    [0.2104542553, 0.793617785, -0.0040720468],
    [1.9779984951, -2.428592205, 0.4505937099],
    [0.0259040371, 0.7827717662, -0.808675766],
  ],
};

/** @source Ottosson 2020, "A perceptual color space for image processing" */
export function oklabFromLinear(rgb: Triple): Triple {
  const [l, m, s] = apply(oklabRows.lms, rgb).map(Math.cbrt) as unknown as Triple;
  return apply(oklabRows.lab, [l, m, s]);
}

/** OKLab as seen with the given sight. */
export function oklabSeen(hex: string, sight: Sight): Triple {
  const rgb = linearFromHex(hex);
  if (sight === "full") return oklabFromLinear(rgb);
  const seen = apply(simulation[sight], rgb).map((channel) => Math.min(1, Math.max(0, channel)));
  return oklabFromLinear(seen as unknown as Triple);
}

/** Distance of two colours in OKLab × 100. */
export function colourDistance(a: string, b: string, sight: Sight): number {
  const [x, y] = [oklabSeen(a, sight), oklabSeen(b, sight)];
  return 100 * Math.hypot(x[0] - y[0], x[1] - y[1], x[2] - y[2]);
}

const luminance = (hex: string): number => {
  const [r, g, b] = linearFromHex(hex);
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
};

/** Contrast of two colours, 1 to 21. */
export function contrast(a: string, b: string): number {
  const [bright, dim] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (bright + 0.05) / (dim + 0.05);
}

/**
 * "#rrggbb" of an OKLCH colour, hue in degrees; chroma gives way where the screen has no such colour.
 */
export function hexFromOklch(lightness: number, chroma: number, hue: number): string {
  const angle = (hue * Math.PI) / 180;
  for (let c = chroma; ; c -= 0.004) {
    const used = Math.max(0, c);
    const [a, b] = [used * Math.cos(angle), used * Math.sin(angle)];
    const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
    const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
    const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
    const rgb = [
      4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s,
      -1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s,
      -0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s,
    ];
    if (used > 0 && rgb.some((channel) => channel < -0.0005 || channel > 1.0005)) continue;
    const bytes = rgb.map((channel) => Math.round(255 * fromLinear(Math.min(1, Math.max(0, channel)))));
    return `#${bytes.map((byte) => byte.toString(16).padStart(2, "0")).join("")}`;
  }
}
