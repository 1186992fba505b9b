import { contrast, hexFromOklch, oklabSeen, sights } from "./colour";
import { formatGas } from "./format";
import type { RichText } from "./richText";

/** How a gas is drawn wherever it appears: in entries, strip, curves and tables. */
export interface GasStyle {
  formula: string;
  name: RichText;
  /** CSS value of curves, names and dots. */
  colour: string;
  /** CSS value of the strip's tone. */
  tint: string;
  /** Stroke dashes in px; empty for a solid line. */
  dash: string;
  /** px */
  width: number;
}

interface Ink {
  light: string;
  dark: string;
}

/** The ten with a colour token of their own; the same values as in styles.css, kept here to measure distances. */
export const tokenInks: Record<string, Ink> = {
  H: { light: "#86196f", dark: "#ec7f9c" },
  H2: { light: "#4a33b0", dark: "#bbacff" },
  He: { light: "#6c5003", dark: "#f7f09d" },
  CH4: { light: "#b0560a", dark: "#e09868" },
  O: { light: "#2f7b45", dark: "#40e196" },
  N2: { light: "#2869d1", dark: "#7991ee" },
  CO: { light: "#2a73a0", dark: "#b1dcfa" },
  O2: { light: "#07483e", dark: "#9bf0d1" },
  Ar: { light: "#5d646f", dark: "#bcc2d0" },
  CO2: { light: "#72130d", dark: "#dd7429" },
};

const strokes: Record<string, { dash: string; width: number }> = {
  H: { dash: "1.2 3.2", width: 2.1 },
  H2: { dash: "7 3 1.2 3", width: 1.9 },
  He: { dash: "3 3", width: 1.8 },
  CH4: { dash: "12 4", width: 1.7 },
  O: { dash: "", width: 1.6 },
  N2: { dash: "16 3.5 3.5 3.5", width: 1.6 },
  CO: { dash: "5 2.5", width: 1.6 },
  O2: { dash: "9 3 3 3", width: 1.6 },
  Ar: { dash: "3.5 5", width: 1.5 },
  CO2: { dash: "", width: 2.5 },
};

/** Dashes that no gas of the ten uses, in the order they are given out. */
const freeDashes = [
  "2 2 7 2",
  "20 4",
  "1.2 6",
  "9 2 1.2 2 1.2 2",
  "14 3 1.2 3 1.2 3",
  "6 6",
  "3 2 3 6",
  "24 4 4 4",
];

export const papers: Ink = { light: "#f7f4ec", dark: "#0d1420" };
/** OKLab × 100: the least distance that the ten keep among themselves. */
const wantedDistance: Record<keyof Ink, number> = { light: 6.2, dark: 6.6 };
/** A name is set in its gas's colour, so it must be readable as text. */
const wantedContrast = 4.6;

/** Hue of a gas's family, degrees in OKLCH: what it shows in a glow, or embers for what is heavy. */
function familyHue(formula: string): number {
  if (/^(Ne|Kr|Xe)$/.test(formula)) return 100;
  if (/^(Na|K|Li|Mg|Ca|Fe|Si)/.test(formula)) return 75;
  if (/^C\d*H/.test(formula)) return 50;
  if (/S/.test(formula)) return 110;
  if (/N/.test(formula)) return 262;
  if (/O/.test(formula)) return 155;
  return /^[HD]/.test(formula) ? 340 : 30;
}

type Seen = readonly (readonly [number, number, number])[];
const seenBy = (hex: string): Seen => sights.map((sight) => oklabSeen(hex, sight));
const leastDistance = (a: Seen, b: Seen): number =>
  100 * Math.min(...a.map((x, i) => Math.hypot(x[0] - b[i]![0], x[1] - b[i]![1], x[2] - b[i]![2])));

/** The first hue, lightness and chroma of the family that stands far enough from all others, or the furthest. */
function distinctInk(formula: string, light: keyof Ink, others: readonly string[]): string {
  const paper = papers[light];
  const hue = familyHue(formula);
  const lightnesses = light === "light" ? [0.5, 0.4, 0.32, 0.45, 0.36, 0.27] : [0.78, 0.7, 0.86, 0.92, 0.65];
  const othersSeen = others.map(seenBy);
  let furthest = { hex: "", distance: -1 };
  for (const turn of [0, 14, -14, 28, -28]) {
    for (const chroma of [0.14, 0.09, 0.18]) {
      for (const lightness of lightnesses) {
        const hex = hexFromOklch(lightness, chroma, hue + turn);
        if (contrast(hex, paper) < wantedContrast) continue;
        const seen = seenBy(hex);
        const distance = Math.min(Infinity, ...othersSeen.map((other) => leastDistance(seen, other)));
        if (distance >= wantedDistance[light]) return hex;
        if (distance > furthest.distance) furthest = { hex, distance };
      }
    }
  }
  return furthest.hex;
}

const remembered = new Map<string, ReadonlyMap<string, GasStyle>>();

/**
 * Styles of gases that stand in one figure.
 *
 * The ten have their tokens. Any other takes a hue of its family, kept apart from the others of the list by
 * the same measured distance, and the next free dash; so the same list always gives the same styles. Give the
 * gases of the whole column, so that a gas keeps its style in every figure and table that rests on it.
 */
export function gasStyles(gases: readonly string[]): ReadonlyMap<string, GasStyle> {
  const key = gases.join(" ");
  const known = remembered.get(key);
  if (known) return known;
  const styles = new Map<string, GasStyle>();
  const taken = gases.flatMap((formula) => tokenInks[formula] ?? []);
  let newcomers = 0;
  for (const formula of gases) {
    if (styles.has(formula)) continue;
    const stroke = strokes[formula];
    if (stroke) {
      styles.set(formula, {
        formula,
        name: formatGas(formula),
        colour: `var(--g-${formula})`,
        tint: `var(--s-${formula})`,
        ...stroke,
      });
      continue;
    }
    const light = distinctInk(
      formula,
      "light",
      taken.map((ink) => ink.light),
    );
    const dark = distinctInk(
      formula,
      "dark",
      taken.map((ink) => ink.dark),
    );
    taken.push({ light, dark });
    styles.set(formula, {
      formula,
      name: formatGas(formula),
      colour: `light-dark(${light}, ${dark})`,
      tint: `light-dark(color-mix(in oklab, ${light} 80%, ${papers.light}), ${dark})`,
      dash: freeDashes[newcomers % freeDashes.length]!,
      width: 1.6,
    });
    newcomers += 1;
  }
  remembered.set(key, styles);
  return styles;
}

/** Style of one gas among the gases it stands with. */
export function gasStyle(formula: string, among: readonly string[] = [formula]): GasStyle {
  return gasStyles(among.includes(formula) ? among : [...among, formula]).get(formula)!;
}
