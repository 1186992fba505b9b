import { useMemo } from "react";
import { formatQuantity, quantityRich, quantityText } from "../../lib/format";
import { gasStyles } from "../../lib/gasStyle";
import { plainText, type RichText } from "../../lib/richText";
import { Rich } from "../../lib/Rich";
import type { CsvColumn } from "./figureCsv";
import { FigureFrame } from "./FigureFrame";
import { inkValues } from "./figureLayout";
import { FigureTable } from "./FigureTable";
import { PlotlyFigure } from "./PlotlyFigure";
import { PointReader } from "./PointReader";
import type { SweepFigureProps } from "./sweepFigureProps";
import {
  curveName,
  nameWidth,
  sweepLabel,
  sweepPanels,
  sweepPlot,
  sweepScale,
  sweptRange,
} from "./sweepPlot";
import { steppedNumber, type SweepAxis, type SweepResult } from "./sweepResult";
import { sweepRoom } from "./sweepRoom";
import { sheetWidth, useFigure } from "./useFigure";

/** A watched result in words: once each, "exobase altitude and rates of H and H2" is left to the reader. */
function listed(texts: readonly RichText[]): RichText {
  return texts.flatMap((text, index): RichText => {
    const before = index === 0 ? "" : index === texts.length - 1 ? " and " : ", ";
    return before === "" ? text : [before, ...text];
  });
}

export const capital = ([first, ...rest]: RichText): RichText =>
  typeof first === "string" ? [first.charAt(0).toUpperCase() + first.slice(1), ...rest] : [first!, ...rest];

function AsWritten({ axis }: { axis: SweepAxis }) {
  if (axis.written === null) return null;
  const [low, high] = [Math.min(...axis.values), Math.max(...axis.values)];
  const isInside = axis.written >= low && axis.written <= high;
  return (
    <>
      {isInside ? " Line: as written" : " As written, "}
      {!isInside && (
        <>
          <Rich text={steppedNumber(axis.written, axis.scale)} />, it lies beyond what is drawn
        </>
      )}
      {axis.sigma
        ? isInside
          ? "; grey: one sigma of it."
          : "; grey: one sigma of it, as far as it reaches here."
        : "."}
    </>
  );
}

/** Every point of a sweep, as it leaves the page. */
export function sweepColumns({ axes, watched, reasons }: SweepResult): CsvColumn[] {
  const count = watched[0]?.values.length ?? 0;
  const points = Array.from({ length: count }, (_, index) => index);
  let stride = 1;
  const varied = axes.map(({ name, unit, values }): CsvColumn => {
    const own = stride;
    stride *= values.length;
    return {
      head: `${name} (${unit})`,
      values: points.map((index) => values[Math.floor(index / own) % values.length]!),
    };
  });
  const results = watched.map(({ name, unit, values }): CsvColumn => ({ head: `${name} (${unit})`, values }));
  const why = reasons.some((reason) => reason !== null) ? [{ head: "reason", values: reasons }] : [];
  return [...varied, ...results, ...why];
}

/** Watched results over one varied quantity, one above the other. */
export function SweepFigure({ sweep, columnGases, unitSystem, number, reasons }: SweepFigureProps) {
  const axis = sweep.axes[0]!;
  const styles = useMemo(
    () => gasStyles([...(columnGases ?? []), ...sweep.watched.flatMap(({ gas }) => gas ?? [])]),
    [columnGases, sweep],
  );
  const inkSources = useMemo(
    () => ({ ...inkValues, ...Object.fromEntries([...styles].map(([gas, style]) => [gas, style.colour])) }),
    [styles],
  );
  const { ref, width, inks, dayInks, zoom, setZoom } = useFigure(inkSources);
  const panels = useMemo(() => sweepPanels(sweep), [sweep]);
  const widest = Math.max(
    ...panels.flatMap((panel) =>
      panel.results.map((result) => nameWidth(curveName(panel, result, styles.get(result.gas ?? "")))),
    ),
  );
  const room = useMemo(() => sweepRoom(width, panels.length, widest), [width, panels.length, widest]);
  const input = useMemo(() => ({ sweep, styles, room, inks, zoom }), [sweep, styles, room, inks, zoom]);
  const plot = useMemo(() => sweepPlot(input), [input]);

  const scale = sweepScale(axis);
  const [from, to] = zoom?.x ?? sweptRange(axis);
  const across = axis.values.map((value) => ((scale.place(value) - from) / (to - from)) * room.panel);
  const valueOf = (index: number, result: SweepResult["watched"][number]) => {
    const value = result.values[index] ?? null;
    return value === null
      ? null
      : formatQuantity({ value, unit: result.unit }, unitSystem, { scale: result.scale });
  };
  const rows = ({ column }: { column: number }) => [
    {
      key: axis.name,
      symbol: <code>{axis.name}</code>,
      value: <Rich text={steppedNumber(axis.values[column]!, axis.scale)} />,
    },
    ...sweep.watched.map((result) => {
      const value = valueOf(column, result);
      return {
        key: result.name,
        symbol: <Rich text={result.label} />,
        value: value ? <Rich text={quantityRich(value)} /> : "no answer",
      };
    }),
  ];
  const spoken = ({ column }: { column: number }) =>
    [
      `${axis.name} ${plainText(steppedNumber(axis.values[column]!, axis.scale))}`,
      ...sweep.watched.map((result) => {
        const value = valueOf(column, result);
        return `${plainText(result.label)} ${value ? quantityText(value) : "no answer"}`;
      }),
    ].join(", ");
  const written = axis.written ?? axis.values[0]!;
  const start = axis.values.reduce(
    (best, value, index) =>
      Math.abs(value - written) < Math.abs(axis.values[best]! - written) ? index : best,
    0,
  );

  return (
    <FigureFrame
      number={number}
      caption={
        <>
          <Rich text={capital(listed(sweep.watched.map(({ label }) => label)))} /> over{" "}
          <code>{axis.name}</code>.
          <AsWritten axis={axis} />
        </>
      }
      fileName={sweep.name}
      drawing={() =>
        sweepPlot({
          ...input,
          room: sweepRoom(sheetWidth, panels.length, widest),
          inks: dayInks(),
          zoom: null,
        })
      }
      columns={() => sweepColumns(sweep)}
    >
      <div ref={ref}>
        <PointReader
          height={room.height}
          panel={{ left: room.left, top: room.top, width: room.panel, height: room.tall }}
          across={across}
          start={{ column: start, row: 0 }}
          label={`Points read in figure ${number}`}
          rows={rows}
          spoken={spoken}
        >
          <div role="img" aria-label={sweepLabel(sweep)}>
            <PlotlyFigure plot={plot} onZoom={setZoom} />
          </div>
        </PointReader>
      </div>
      {reasons}
      <FigureTable label={sweepLabel(sweep)} columns={sweepColumns(sweep)} unitSystem={unitSystem} />
    </FigureFrame>
  );
}
