import { useMemo, useState } from "react";
import { formatQuantity, quantityRich, quantityText } from "../../lib/format";
import { plainText } from "../../lib/richText";
import { Rich } from "../../lib/Rich";
import { RadioLine } from "../RadioLine";
import { FigureFrame } from "./FigureFrame";
import { FigureTable } from "./FigureTable";
import { mapGrid } from "./mapGrid";
import { contourWords, mapInks, mapLabel, mapPlot, mapScale } from "./mapPlot";
import { mapRoom } from "./mapRoom";
import { PlotlyFigure } from "./PlotlyFigure";
import { PointReader, type ReadPoint } from "./PointReader";
import { capital, sweepColumns } from "./SweepFigure";
import type { SweepFigureProps } from "./sweepFigureProps";
import { sweepScale, sweptRange } from "./sweepPlot";
import { steppedNumber, type SweepResult, type SweptResult } from "./sweepResult";
import { sheetWidth, useFigure } from "./useFigure";

function Caption({ sweep, shown }: { sweep: SweepResult; shown: SweptResult }) {
  const [first, second] = sweep.axes;
  const isInside = sweep.axes.every(
    ({ written, values }) =>
      written !== null && written >= Math.min(...values) && written <= Math.max(...values),
  );
  const isPartial = shown.values.some((value) => value === null);
  return (
    <>
      <Rich text={capital(shown.label)} /> over <code>{first!.name}</code> and <code>{second!.name}</code>.{" "}
      {contourWords(shown, sweep)}.{" "}
      {isInside ? "The cross is the notebook as written." : "The notebook as written lies beyond the map."}
      {isPartial && " Hatched: no answer."}
    </>
  );
}

/** Index of the point nearest to the notebook as written. */
function nearestTo(values: readonly number[], written: number | null): number {
  const wanted = written ?? values[0]!;
  return values.reduce(
    (best, value, index) => (Math.abs(value - wanted) < Math.abs(values[best]! - wanted) ? index : best),
    0,
  );
}

/** A watched quantity over two varied ones; where several are watched, one is chosen. */
export function MapFigure({ sweep, unitSystem, number, reasons }: SweepFigureProps) {
  const [chosen, setChosen] = useState(sweep.watched[0]!.name);
  const shown = sweep.watched.find(({ name }) => name === chosen) ?? sweep.watched[0]!;
  const { ref, width, inks, dayInks, zoom, setZoom } = useFigure(mapInks);
  const room = useMemo(() => mapRoom(width), [width]);
  const input = useMemo(() => ({ sweep, shown, room, inks, zoom }), [sweep, shown, room, inks, zoom]);
  const plot = useMemo(() => mapPlot(input), [input]);

  const [first, second] = sweep.axes as [SweepResult["axes"][number], SweepResult["axes"][number]];
  const grid = useMemo(() => mapGrid(sweep.axes, shown.values, mapScale(shown)), [sweep, shown]);
  const ranges = zoom ?? { x: sweptRange(first), y: sweptRange(second) };
  const share = (place: number, [from, to]: [number, number]) => (place - from) / (to - from);
  const across = grid.x.map((place) => share(place, ranges.x) * room.panel);
  const down = grid.y.map((place) => (1 - share(place, ranges.y)) * room.tall);
  const valueAt = ({ column, row }: ReadPoint) => {
    const value = shown.values[grid.index[row]![column]!] ?? null;
    return value === null
      ? null
      : formatQuantity({ value, unit: shown.unit }, unitSystem, { scale: shown.scale });
  };
  const along = ({ column, row }: ReadPoint) => [
    { name: first.name, text: steppedNumber(sweepScale(first).valueAt(grid.x[column]!), first.scale) },
    { name: second.name, text: steppedNumber(sweepScale(second).valueAt(grid.y[row]!), second.scale) },
  ];
  const rows = (point: ReadPoint) => {
    const value = valueAt(point);
    return [
      ...along(point).map(({ name, text }) => ({
        key: name,
        symbol: <code>{name}</code>,
        value: <Rich text={text} />,
      })),
      {
        key: shown.name,
        symbol: <Rich text={shown.label} />,
        value: value ? <Rich text={quantityRich(value)} /> : "no answer",
      },
    ];
  };
  const spoken = (point: ReadPoint) => {
    const value = valueAt(point);
    return [
      ...along(point).map(({ name, text }) => `${name} ${plainText(text)}`),
      `${plainText(shown.label)} ${value ? quantityText(value) : "no answer"}`,
    ].join(", ");
  };
  const start = {
    column: grid.x.indexOf(sweepScale(first).place(first.values[nearestTo(first.values, first.written)]!)),
    row: grid.y.indexOf(sweepScale(second).place(second.values[nearestTo(second.values, second.written)]!)),
  };
  const label = mapLabel(sweep, shown);

  return (
    <FigureFrame
      number={number}
      caption={<Caption sweep={sweep} shown={shown} />}
      fileName={sweep.watched.length > 1 ? `${sweep.name}-${shown.name.replace(/\./g, "-")}` : sweep.name}
      drawing={() => mapPlot({ ...input, room: mapRoom(sheetWidth), inks: dayInks(), zoom: null })}
      columns={() => sweepColumns(sweep)}
    >
      {sweep.watched.length > 1 && (
        <div className="figure-choice" data-print="never">
          <RadioLine
            label={`Result that figure ${number} shows`}
            value={shown.name}
            options={sweep.watched.map((result) => ({ value: result.name, label: plainText(result.label) }))}
            onChange={setChosen}
          />
        </div>
      )}
      <div ref={ref}>
        <PointReader
          height={room.height}
          panel={{ left: room.left, top: room.top, width: room.panel, height: room.tall }}
          across={across}
          down={down}
          start={start}
          label={`Points read in figure ${number}`}
          rows={rows}
          spoken={spoken}
        >
          <div role="img" aria-label={label}>
            <PlotlyFigure plot={plot} onZoom={setZoom} />
          </div>
        </PointReader>
      </div>
      {reasons}
      <FigureTable label={label} columns={sweepColumns(sweep)} unitSystem={unitSystem} />
    </FigureFrame>
  );
}
