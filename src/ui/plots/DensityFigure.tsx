import { useMemo } from "react";
import { coronaDensityAt, type ColumnCorona } from "../../lib/columnCorona";
import {
  formatFixed,
  formatGas,
  formatKilometres,
  formatPercent,
  formatQuantity,
  quantityText,
  unitSpace,
} from "../../lib/format";
import { gasStyles } from "../../lib/gasStyle";
import { Rich } from "../../lib/Rich";
import { densityCurves, interpolateProfile } from "./columnCurves";
import { densityLabel, densityPlot } from "./densityPlot";
import type { CsvColumn } from "./figureCsv";
import { FigureFrame } from "./FigureFrame";
import { inkValues } from "./figureLayout";
import { FigureNames } from "./FigureNames";
import type { ColumnFigureProps } from "./figureProps";
import { FigureReader } from "./FigureReader";
import { FigureTable } from "./FigureTable";
import { PlotlyFigure } from "./PlotlyFigure";
import { useColumnFigure } from "./useColumnFigure";

const noCoronae: readonly ColumnCorona[] = [];

/** Which gas goes on as a corona, and by how much it steps down. */
function CoronaSentence({ corona }: { corona: ColumnCorona }) {
  const { gas, cell, share } = corona;
  return (
    <>
      {" "}
      <Rich text={formatGas(gas)} /> goes on as its corona <i>{cell}</i>, dashed; its step at the exobase,
      down by <Rich text={formatPercent(1 - share)} />, is drawn to scale between two short bars.
    </>
  );
}

function OwnCaption({
  strip,
  coronae,
  escape,
}: Required<Pick<ColumnFigureProps, "strip" | "coronae" | "escape">>) {
  const present = coronae.filter(({ gas }) => strip.gases.includes(gas));
  return (
    <>
      Number density of each gas in <i>{strip.column}</i>
      {escape !== null && (
        <>
          , less what escapes in <i>{escape}</i>
        </>
      )}
      , and the temperature it rests on.
      {strip.lower !== null && " Lines across part as the Knudsen number goes from 0.1 to 10."}
      {strip.homopauses.length > 0 && " Ticks at left inside mark homopauses."}
      {strip.exobase !== null &&
        ` Above the exobase the ${present.length > 0 ? "other " : ""}gases go on hydrostatically.`}
      {present.map((corona) => (
        <CoronaSentence key={corona.gas} corona={corona} />
      ))}
    </>
  );
}

/** Number density of each gas against altitude, with the temperature beside it where there is room. */
export function DensityFigure({
  profiles,
  strip,
  coronae = noCoronae,
  escape = null,
  unitSystem,
  number,
  caption,
}: ColumnFigureProps) {
  const styles = gasStyles(strip.gases);
  const inkSources = useMemo(
    () => ({ ...inkValues, ...Object.fromEntries([...styles].map(([gas, style]) => [gas, style.colour])) }),
    [styles],
  );
  const figure = useColumnFigure(strip, "two panels", inkSources);
  const { ref, inks, room, altitudes, away, zoom, setZoom, hidden, toggle } = figure;
  const curves = useMemo(
    () => densityCurves(profiles, strip, unitSystem, coronae),
    [profiles, strip, unitSystem, coronae],
  );
  const input = useMemo(
    () => ({ profiles, strip, unitSystem, curves, styles, room, inks, hidden, zoom }),
    [profiles, strip, unitSystem, curves, styles, room, inks, hidden, zoom],
  );
  const plot = useMemo(() => densityPlot(input), [input]);

  const densityAt = (gas: string, altitude: number) => {
    const column = profiles[`${gas}.number_density`];
    if (!column) return null;
    const corona = coronae.find((each) => each.gas === gas);
    const value =
      (corona && coronaDensityAt(corona, altitude)) ??
      interpolateProfile(profiles.altitude!, column, altitude, true);
    return formatQuantity({ value, unit: "m^-3" }, unitSystem, { digits: 2 });
  };
  const temperatureAt = (altitude: number) =>
    `${formatFixed(interpolateProfile(profiles.altitude!, profiles.temperature!, altitude, false))}${unitSpace}K`;
  const rows = (altitude: number) => [
    { key: "T", symbol: "T", value: temperatureAt(altitude) },
    ...strip.gases.flatMap((gas) => {
      const density = densityAt(gas, altitude);
      if (!density || hidden.has(gas)) return [];
      const { colour, name } = styles.get(gas)!;
      const symbol = (
        <b style={{ color: colour }}>
          <Rich text={name} />
        </b>
      );
      return [{ key: gas, symbol, value: <Rich text={[...density.number, unitSpace, ...density.unit]} /> }];
    }),
  ];
  const spoken = (altitude: number) =>
    [
      `${formatKilometres(altitude)} km`,
      temperatureAt(altitude),
      ...strip.gases.flatMap((gas) => {
        const density = densityAt(gas, altitude);
        return density && !hidden.has(gas) ? `${gas} ${quantityText(density)}` : [];
      }),
    ].join(", ");
  const columns = (): CsvColumn[] => [
    { head: "altitude (m)", values: profiles.altitude! },
    { head: "temperature (K)", values: profiles.temperature! },
    ...strip.gases.flatMap((gas) => {
      const values = profiles[`${gas}.number_density`];
      return values ? [{ head: `${gas}.number_density (m^-3)`, values }] : [];
    }),
  ];
  const drawnColumns = () =>
    columns().map(({ head, values }) => {
      const corona = coronae.find(({ gas }) => head.startsWith(`${gas}.number_density `));
      if (!corona) return { head, values };
      const drawn = values.map((value, row) => coronaDensityAt(corona, profiles.altitude![row]!) ?? value);
      return { head, values: drawn };
    });
  const coronaColumns = (): CsvColumn[] =>
    coronae.flatMap(({ cell, gas, altitude, numberDensity }) => [
      { head: `${cell}.altitude (m)`, values: altitude },
      { head: `${cell}.${gas}.number_density (m^-3)`, values: numberDensity },
    ]);
  return (
    <FigureFrame
      number={number}
      caption={caption ?? <OwnCaption strip={strip} coronae={coronae} escape={escape} />}
      fileName={`${strip.column}-number-density`}
      drawing={() => densityPlot({ ...input, ...away() })}
      columns={() => [...columns(), ...coronaColumns()]}
    >
      <div ref={ref}>
        <FigureReader
          room={room}
          altitudes={altitudes}
          start={strip.exobase ?? strip.base}
          label={`Altitude read in figure ${number}`}
          rows={rows}
          spoken={spoken}
        >
          <div role="img" aria-label={densityLabel(strip, styles)}>
            <PlotlyFigure
              plot={plot}
              onZoom={setZoom}
              onNamePress={(index) => {
                const gas = plot.named[index];
                if (gas !== undefined) toggle(gas);
              }}
            />
          </div>
        </FigureReader>
      </div>
      <FigureNames
        gases={strip.gases}
        styles={styles}
        hidden={hidden}
        onToggle={toggle}
        unnamed={plot.unnamed}
      />
      <FigureTable label={densityLabel(strip, styles)} columns={drawnColumns()} unitSystem={unitSystem} />
    </FigureFrame>
  );
}
