import { useMemo } from "react";
import {
  formatFixed,
  formatKilometres,
  formatQuantity,
  quantityText,
  unitSpace,
  type UnitSystem,
} from "../../lib/format";
import { gasStyles } from "../../lib/gasStyle";
import { plainText } from "../../lib/richText";
import { interpolateProfile } from "./columnCurves";
import { commonStrip, comparisonPlot, type ComparedColumn } from "./comparisonPlot";
import type { CsvColumn } from "./figureCsv";
import { FigureFrame } from "./FigureFrame";
import { inkValues } from "./figureLayout";
import { FigureReader } from "./FigureReader";
import { FigureTable } from "./FigureTable";
import { PlotlyFigure } from "./PlotlyFigure";
import { useColumnFigure } from "./useColumnFigure";

interface ComparisonFigureProps {
  older: ComparedColumn;
  newer: ComparedColumn;
  olderName: string;
  newerName: string;
  unitSystem: UnitSystem;
  number: number;
}

/** Two states of a column in one figure. */
export function ComparisonFigure({
  older,
  newer,
  olderName,
  newerName,
  unitSystem,
  number,
}: ComparisonFigureProps) {
  const common = useMemo(() => commonStrip(older.strip, newer.strip), [older.strip, newer.strip]);
  const styles = gasStyles(common.gases);
  const inkSources = useMemo(
    () => ({ ...inkValues, ...Object.fromEntries([...styles].map(([gas, style]) => [gas, style.colour])) }),
    [styles],
  );
  const { ref, inks, room, altitudes, away, zoom, setZoom } = useColumnFigure(
    common,
    "two panels",
    inkSources,
  );
  const input = useMemo(
    () => ({ older, newer, unitSystem, styles, room, inks, zoom }),
    [older, newer, unitSystem, styles, room, inks, zoom],
  );
  const plot = useMemo(() => comparisonPlot(input), [input]);
  const at = ({ profiles }: ComparedColumn, key: string, altitude: number): number | null => {
    const [grid, column] = [profiles.altitude!, profiles[key]];
    if (!column || altitude < grid[0]! || altitude > grid.at(-1)!) return null;
    return interpolateProfile(grid, column, altitude, key !== "temperature");
  };
  const both = (key: string, unit: string, altitude: number): string =>
    [older, newer]
      .map((column) => {
        const value = at(column, key, altitude);
        if (value === null) return "–";
        return unit === "K"
          ? `${formatFixed(value)}${unitSpace}K`
          : quantityText(formatQuantity({ value, unit }, unitSystem, { digits: 2 }));
      })
      .join(", ");
  const rows = (altitude: number) => [
    { key: "T", symbol: "T", value: both("temperature", "K", altitude) },
    ...common.gases.map((gas) => ({
      key: gas,
      symbol: <b style={{ color: styles.get(gas)!.colour }}>{plainText(styles.get(gas)!.name)}</b>,
      value: both(`${gas}.number_density`, "m^-3", altitude),
    })),
  ];
  const spoken = (altitude: number) =>
    `${formatKilometres(altitude)} km, ${olderName} then ${newerName}: ${[
      `temperature ${both("temperature", "K", altitude)}`,
      ...common.gases.map((gas) => `${gas} ${both(`${gas}.number_density`, "m^-3", altitude)}`),
    ].join("; ")}`;
  const columnsOf = (column: ComparedColumn, name: string, grid: readonly number[]): CsvColumn[] =>
    ["temperature", ...common.gases.map((gas) => `${gas}.number_density`)].flatMap((key) =>
      column.profiles[key]
        ? [
            {
              head: `${name} ${key} (${key === "temperature" ? "K" : "m^-3"})`,
              values: grid.map((altitude) => at(column, key, altitude) ?? NaN),
            },
          ]
        : [],
    );
  const columns = (): CsvColumn[] => {
    const grid = newer.profiles.altitude!.filter((altitude) => altitude <= common.top);
    return [
      { head: "altitude (m)", values: grid },
      ...columnsOf(older, olderName, grid),
      ...columnsOf(newer, newerName, grid),
    ];
  };
  const label = `Number densities in ${newer.strip.column} as ${olderName} and as ${newerName} have them`;

  return (
    <FigureFrame
      number={number}
      caption={
        <>
          Densities in <i>{newer.strip.column}</i>: {olderName} thin, {newerName} bold; what lies between is
          tinted.{older.strip.exobase !== null && ` The dashed line is the exobase of ${olderName}.`}
        </>
      }
      fileName={`${newer.strip.column}-compared`}
      drawing={() => comparisonPlot({ ...input, ...away() })}
      columns={columns}
    >
      <div ref={ref}>
        <FigureReader
          room={room}
          altitudes={altitudes}
          start={newer.strip.exobase ?? common.base}
          label={`Altitude read in figure ${number}`}
          rows={rows}
          spoken={spoken}
        >
          <div role="img" aria-label={label}>
            <PlotlyFigure plot={plot} onZoom={setZoom} />
          </div>
        </FigureReader>
      </div>
      <FigureTable label={label} columns={columns()} unitSystem={unitSystem} />
    </FigureFrame>
  );
}
