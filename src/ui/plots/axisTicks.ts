import type { Layout } from "plotly.js";
import { formatFixed, formatNumber, formatPower } from "../../lib/format";
import { figureText } from "../../lib/richText";
import { tickSteps } from "../strip/stripScale";
import { axis } from "./figureLayout";
import type { FigureInks } from "./useFigureInks";

/**
 * How a quantity runs along an axis. Places along it are counted in the shown unit, or in decades of it, so that what is
 * drawn between two points runs straight on either kind.
 */
export interface AxisScale {
  isLog: boolean;
  /** Shown = SI × factor. */
  factor: number;
  /** From SI to a place along the axis. */
  place: (value: number) => number;
  /** Back to SI. */
  valueAt: (place: number) => number;
}

export function axisScale(isLog: boolean, factor: number): AxisScale {
  return {
    isLog,
    factor,
    place: (value) => (isLog ? Math.log10(value * factor) : value * factor),
    valueAt: (place) => (isLog ? 10 ** place : place) / factor,
  };
}

/** A factor over which what is positive is drawn on decades. */
const wideFactor = 10;

/** Whether numbers are better told apart by decades: all positive, and over more than a factor 10. */
export function spansDecades(values: readonly number[]): boolean {
  return (
    values.length > 0 && Math.min(...values) > 0 && Math.max(...values) > wideFactor * Math.min(...values)
  );
}

/** The range of places that holds them all, with a little air; some room where they are all one. */
export function airyRange(places: readonly number[], air = 0.05): [number, number] {
  const [low, high] = [Math.min(...places), Math.max(...places)];
  const margin = high > low ? air * (high - low) : Math.max(0.05 * Math.abs(high), 1e-9);
  return [low - margin, high + margin];
}

export interface AxisTicks {
  places: number[];
  texts: string[];
  minor: number[];
}

/** Ticks at round numbers, named where there is room for it. */
export function axisTicks(
  { isLog }: Pick<AxisScale, "isLog">,
  [from, to]: readonly [number, number],
  pixels: number,
  apart: number,
): AxisTicks {
  return isLog ? decadeTicks(from, to, pixels, apart) : evenTicks(from, to, pixels, apart);
}

/** Multiples of a step within a range, with what rounding blurs at its ends. */
function multiples(step: number, from: number, to: number): number[] {
  const found: number[] = [];
  for (let k = Math.ceil(from / step - 1e-6); k * step <= to + 1e-6 * step; k++) found.push(k * step);
  return found;
}

function evenTicks(from: number, to: number, pixels: number, apart: number): AxisTicks {
  const { major, minor } = tickSteps(((to - from) / pixels) * apart);
  const places = multiples(major, from, to);
  const decimals = Math.max(0, -Math.floor(Math.log10(major) + 1e-9));
  const isPlain = Math.max(Math.abs(from), Math.abs(to)) < 1e6 && decimals <= 4;
  const text = (place: number) =>
    isPlain ? formatFixed(place, decimals) : figureText(formatNumber(place, significant(place, major)));
  return { places, texts: places.map(text), minor: multiples(minor, from, to) };
}

/** Digits that tell a tick from its neighbours. */
function significant(place: number, step: number): number {
  if (place === 0) return 1;
  return Math.max(1, Math.round(Math.log10(Math.abs(place)) - Math.log10(step) + 0.5) + 1);
}

function decadeTicks(from: number, to: number, pixels: number, apart: number): AxisTicks {
  const decade = pixels / (to - from);
  const within = multiples(1, from, to);
  const between = (factors: readonly number[]) =>
    multiples(1, Math.floor(from), to).flatMap((power) =>
      factors.map((factor) => power + Math.log10(factor)).filter((place) => place >= from && place <= to),
    );
  if (within.length >= 2 || decade > 4 * apart) {
    const every = [1, 2, 5, 10, 20, 50, 100].find((step) => decade * step >= apart) ?? 200;
    const places = within.filter((power) => Math.round(power) % every === 0);
    if (places.length >= 2) {
      const minor = every === 1 ? between([2, 3, 4, 5, 6, 7, 8, 9]) : within;
      return { places, texts: places.map((power) => powerText(power)), minor: decade < 40 ? within : minor };
    }
  }
  const factors = [[1, 2, 3, 5, 7], [1, 2, 5], [1, 3], [1]].find((some) =>
    gaps(between(some)).every((gap) => gap * decade >= apart),
  );
  const places = between(factors ?? [1]);
  return {
    places,
    texts: places.map((place) => figureText(formatNumber(10 ** place, 1))),
    minor: between([1, 2, 3, 4, 5, 6, 7, 8, 9]),
  };
}

const gaps = (places: readonly number[]): number[] => places.slice(1).map((place, i) => place - places[i]!);

/** Numbers near one are written out, as they are read. */
const powerText = (power: number): string =>
  Math.abs(power) <= 3
    ? formatFixed(10 ** power, Math.max(0, -Math.round(power)))
    : figureText(formatPower(power, 0));

/** An axis in the house's ink with these ticks. */
export function tickedAxis(
  inks: FigureInks,
  title: string,
  range: readonly [number, number],
  { places, texts, minor }: AxisTicks,
): Partial<NonNullable<Layout["xaxis"]>> {
  return {
    ...axis(inks, title),
    type: "linear",
    range: [...range],
    tickmode: "array",
    tickvals: places,
    ticktext: texts,
    minor: {
      ticks: "outside",
      ticklen: 4,
      tickwidth: 0.8,
      tickcolor: inks.ink2!,
      tickmode: "array",
      tickvals: minor,
    },
  };
}
