import type { Annotation, Data, Shape } from "plotly.js";
import { formatNumber, formatUnit, unitSpace, type DisplayScale } from "../../lib/format";
import { figureText, plainText } from "../../lib/richText";
import type { FigureDrawing } from "./exportFigure";
import { baseLayout, decadeAxis, figureFonts, note, plainAxis, type FigureZoom } from "./figureLayout";
import type { FigureRoom } from "./figureRoom";
import { atAge, type LossCourse, type LossScales } from "./lossHistory";
import type { FigureInks } from "./useFigureInks";

export interface LossPlotInput {
  course: LossCourse;
  scales: LossScales;
  /** As the figure library takes it; the rate's once the light is no longer saturated. */
  dash: string;
  room: FigureRoom;
  /** `gas` is the colour of the gas. */
  inks: FigureInks;
  zoom: FigureZoom | null;
}

/** Two panels above each other on one age axis. */
export function lossRoom(width: number): FigureRoom {
  const [left, right, top, bottom, height] = [64, 10, 14, 46, 430];
  const tall = height - top - bottom;
  return { width, height, left, right, top, bottom, tall, panel: width - left - right, second: 0, gap: 0 };
}

/** Shares of the height, from below. */
const domains = { rate: [0.55, 1], lost: [0, 0.47] } as const;

export const ageText = (age: number, { factor, unit }: DisplayScale): string =>
  `${plainText(formatNumber(age * factor, 2))}${unitSpace}${unit}`;

/** The rate while the light is saturated, and from then on. */
function rateParts({ course, scales }: LossPlotInput) {
  const { age, rate, light } = course;
  const [x, y] = [
    age.map((value) => value * scales.age.factor),
    rate.map((value) => value * scales.rate.factor),
  ];
  const end = light.saturation;
  const first = end === null ? 0 : age.findIndex((value) => value > end);
  if (end === null || first === 0) return { saturated: { x: [], y: [] }, after: { x, y } };
  if (first < 0) return { saturated: { x, y }, after: { x: [], y: [] } };
  const meeting = { x: end * scales.age.factor, y: atAge(course, rate, end) * scales.rate.factor };
  return {
    saturated: { x: [...x.slice(0, first), meeting.x], y: [...y.slice(0, first), meeting.y] },
    after: { x: [meeting.x, ...x.slice(first)], y: [meeting.y, ...y.slice(first)] },
  };
}

function curves(input: LossPlotInput): Data[] {
  const { course, scales, dash, inks } = input;
  const { saturated, after } = rateParts(input);
  const line = (part: { x: number[]; y: number[] }, yaxis: "y" | "y2", look: object): Data => ({
    type: "scatter",
    mode: "lines",
    ...part,
    yaxis,
    line: look,
    hoverinfo: "skip",
  });
  const age = course.age.map((value) => value * scales.age.factor);
  const lost = course.lost.map((value) => value * scales.lost.factor);
  return [
    ...(saturated.x.length > 1
      ? [line(saturated, "y", { color: inks.gas!, width: 2.6, dash: "solid" })]
      : []),
    ...(after.x.length > 1
      ? [line(after, "y", { color: inks.gas!, width: 1.7, dash, simplify: false })]
      : []),
    line({ x: age, y: lost }, "y2", { color: inks.ink!, width: 1.6, simplify: false }),
  ];
}

/** A ring where half has gone. */
function halfRing({ course, scales, inks }: LossPlotInput): Data[] {
  if (course.half === null) return [];
  return [
    {
      type: "scatter",
      mode: "markers",
      x: [course.half * scales.age.factor],
      y: [(course.lost.at(-1)! / 2) * scales.lost.factor],
      yaxis: "y2",
      marker: { size: 8, color: inks.paper!, line: { color: inks.ink!, width: 1.6 } },
      hoverinfo: "skip",
    },
  ];
}

/** A hairline at the age of now, where the loss is followed beyond or ends before it. */
function nowMark({ course, scales, inks }: LossPlotInput): {
  shapes: Partial<Shape>[];
  notes: Partial<Annotation>[];
} {
  const [from, to] = [course.age[0]!, course.age.at(-1)!];
  const { now } = course.light;
  if (now <= from || now > to * 0.99) return { shapes: [], notes: [] };
  const x = now * scales.age.factor;
  const line = { color: inks.ink2!, width: 0.8 };
  return {
    shapes: [{ type: "line", xref: "x", yref: "paper", x0: x, x1: x, y0: 0, y1: 1, line }],
    notes: [
      note(
        "now",
        { x, y: 1, yref: "paper", xanchor: "left", yanchor: "top", xshift: 4 },
        { family: figureFonts().sans, size: 12.5, color: inks.ink2! },
      ),
    ],
  };
}

function rateDecades({ rate }: LossCourse, factor: number): [number, number] {
  const present = rate.filter((value) => value > 0).map((value) => Math.log10(value * factor));
  if (present.length === 0) return [0, 1];
  const [low, high] = [Math.min(...present), Math.max(...present)];
  const margin = Math.max(0.12 * (high - low), 0.15);
  return [low - margin, high + 2.2 * margin];
}

/** The ages drawn, in the unit shown. */
export function agesDrawn({ age }: LossCourse, { factor }: DisplayScale): [number, number] {
  const [from, to] = [age[0]! * factor, age.at(-1)! * factor];
  const start = from < 0.15 * to ? 0 : from - 0.03 * (to - from);
  return [start, to + 0.015 * (to - start)];
}

/** Rate above and what has gone below, on one axis of age. */
export function lossPlot(input: LossPlotInput): FigureDrawing {
  const { course, scales, room, inks, zoom } = input;
  const ages = zoom?.x ?? agesDrawn(course, scales.age);
  const pixels = (domain: readonly [number, number]) => (domain[1] - domain[0]) * room.tall;
  const { sans } = figureFonts();
  const font = { family: sans, size: 12.5, color: inks.ink! };
  const { saturation } = course.light;
  const isShown = (age: number) => age * scales.age.factor >= ages[0] && age * scales.age.factor <= ages[1];
  const isLeft = (age: number) => age * scales.age.factor < (ages[0] + ages[1]) / 2;
  const notes: Partial<Annotation>[] = [];
  if (saturation !== null && isShown(saturation)) {
    notes.push(
      note(
        `light saturated before ${ageText(saturation, scales.age)}`,
        {
          x: saturation * scales.age.factor,
          y: Math.log10(course.rate[0]! * scales.rate.factor),
          xanchor: isLeft(saturation) ? "left" : "right",
          yanchor: "bottom",
          xshift: isLeft(saturation) ? 6 : -6,
          yshift: 1,
        },
        font,
      ),
    );
  }
  if (course.half !== null && isShown(course.half)) {
    notes.push(
      note(
        `half of it by ${ageText(course.half, scales.age)}`,
        {
          x: course.half * scales.age.factor,
          y: (course.lost.at(-1)! / 2) * scales.lost.factor,
          yref: "y2",
          xanchor: isLeft(course.half) ? "left" : "right",
          yanchor: "top",
          xshift: isLeft(course.half) ? 10 : -10,
          yshift: -3,
        },
        font,
      ),
    );
  }
  const now = nowMark(input);
  const most = course.lost.at(-1)! * scales.lost.factor || 1;
  const rateTitle = `rate, ${figureText(formatUnit(scales.rate.unit))}`;
  const lostTitle = `${course.measure.words}, ${figureText(formatUnit(scales.lost.unit))}`;
  return {
    data: [...curves(input), ...halfRing(input)],
    layout: {
      ...baseLayout(room),
      xaxis: { ...plainAxis(inks, `age, ${scales.age.unit}`, room.panel, ages), anchor: "y2" },
      yaxis: {
        ...decadeAxis(inks, rateTitle, pixels(domains.rate), rateDecades(course, scales.rate.factor)),
        domain: [...domains.rate],
        anchor: "x",
        fixedrange: true,
      },
      yaxis2: {
        ...plainAxis(inks, lostTitle, pixels(domains.lost), [0, 1.1 * most]),
        domain: [...domains.lost],
        anchor: "x",
        fixedrange: true,
      },
      shapes: now.shapes,
      annotations: [...notes, ...now.notes],
    },
  };
}
