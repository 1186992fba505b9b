import type { Strip } from "../../../shared/notebook/summary";
import {
  formatFixed,
  formatKilometres,
  formatNumber,
  formatPercent,
  formatQuantity,
  quantityText,
  unitSpace,
  type UnitSystem,
} from "../../lib/format";
import { formatSpread, type NumberSpread } from "../../lib/formatSpread";
import { plainText } from "../../lib/richText";
import { leadingGas, sampleStrip } from "./stripSample";

const altitudeText = (metres: number): string => `${formatKilometres(metres)}${unitSpace}km`;

/** "239 ± 26 km" where a spread watches it. */
export function exobaseText(exobase: number, spread: NumberSpread | null = null): string {
  if (spread === null) return altitudeText(exobase);
  const { whole } = formatSpread(exobase / 1000, { lower: spread.lower / 1000, upper: spread.upper / 1000 });
  return `${plainText(whole)}${unitSpace}km`;
}

/** The strip in one line, for those who do not see it. */
export function stripLabel(strip: Strip, spread: NumberSpread | null = null): string {
  const exobase = strip.exobase === null ? "no exobase" : `exobase at ${exobaseText(strip.exobase, spread)}`;
  return `Altitude strip of ${strip.column}: base at ${altitudeText(strip.base)}, ${exobase}`;
}

/** Every mark of the strip as a sentence, from the base up. */
export function stripSentences(strip: Strip, spread: NumberSpread | null = null): string[] {
  const marks: [altitude: number, sentence: string][] = strip.homopauses.map(({ gas, altitude }) => [
    altitude,
    `${gas} parts from the mixture at its homopause, ${altitudeText(altitude)}.`,
  ]);
  marks.push([strip.base, `The column begins at its base, ${altitudeText(strip.base)}.`]);
  if (strip.lower !== null)
    marks.push([strip.lower, `The Knudsen number is 0.1 at ${altitudeText(strip.lower)}.`]);
  if (strip.exobase !== null) {
    const { temperature } = sampleStrip(strip, strip.exobase);
    const warmth = `${formatFixed(temperature)}${unitSpace}K`;
    marks.push([
      strip.exobase,
      `The exobase is at ${exobaseText(strip.exobase, spread)}, where it is ${warmth}.`,
    ]);
  }
  if (strip.upper !== null)
    marks.push([strip.upper, `The Knudsen number is 10 at ${altitudeText(strip.upper)}.`]);
  const end = strip.exobase === null ? "There is no exobase below" : "The strip ends at";
  marks.push([strip.top, `${end} ${altitudeText(strip.top)}.`]);
  return marks.sort(([a], [b]) => a - b).map(([, sentence]) => sentence);
}

/** What the strip reads at one altitude. */
export interface StripReading {
  altitude: string;
  temperature: string;
  density: ReturnType<typeof formatQuantity>;
  gas: string;
  share: string;
  knudsen: ReturnType<typeof formatNumber>;
  /** All of it in one line, to be heard. */
  spoken: string;
}

export function readStrip(strip: Strip, altitude: number, unitSystem: UnitSystem): StripReading {
  const sample = sampleStrip(strip, altitude);
  const leader = leadingGas(sample);
  const density = formatQuantity({ value: 10 ** sample.log10NumberDensity, unit: "m^-3" }, unitSystem, {
    digits: 2,
  });
  const knudsen = formatNumber(10 ** sample.log10Knudsen, 2);
  const reading = {
    altitude: altitudeText(altitude),
    temperature: `${formatFixed(sample.temperature)}${unitSpace}K`,
    density,
    gas: strip.gases[leader] ?? "",
    share: plainText(formatPercent(sample.moleFractions[leader] ?? 0)),
    knudsen,
  };
  const spoken = [
    reading.altitude,
    reading.temperature,
    quantityText(density),
    `mostly ${reading.gas}, ${reading.share}`,
    `Knudsen number ${plainText(knudsen)}`,
  ].join(", ");
  return { ...reading, spoken };
}
