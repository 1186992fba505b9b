import { useMemo } from "react";
import type { Strip } from "../../../shared/notebook/summary";
import { formatFixed, formatKilometres, formatQuantity, quantityText, unitSpace } from "../../lib/format";
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

function OwnCaption({ strip }: { strip: Strip }) {
  return (
    <>
      Number density of each gas in <i>{strip.column}</i>, and the temperature it rests on.
      {strip.lower !== null && " Lines across part as the Knudsen number goes from 0.1 to 10."}
      {strip.homopauses.length > 0 && " Ticks at left inside mark homopauses."}
      {strip.exobase !== null && " Above the exobase the gases go on hydrostatically."}
    </>
  );
}

/** Number density of each gas against altitude, with the temperature beside it where there is room. */
export function DensityFigure({ profiles, strip, unitSystem, number, caption }: ColumnFigureProps) {
  const styles = gasStyles(strip.gases);
  const inkSources = useMemo(
    () => ({ ...inkValues, ...Object.fromEntries([...styles].map(([gas, style]) => [gas, style.colour])) }),
    [styles],
  );
  const figure = useColumnFigure(strip, "two panels", inkSources);
  const { ref, inks, room, altitudes, away, zoom, setZoom, hidden, toggle } = figure;
  const curves = useMemo(() => densityCurves(profiles, strip, unitSystem), [profiles, strip, unitSystem]);
  const input = useMemo(
    () => ({ profiles, strip, unitSystem, curves, styles, room, inks, hidden, zoom }),
    [profiles, strip, unitSystem, curves, styles, room, inks, hidden, zoom],
  );
  const plot = useMemo(() => densityPlot(input), [input]);

  const densityAt = (gas: string, altitude: number) => {
    const column = profiles[`${gas}.number_density`];
    if (!column) return null;
    const value = interpolateProfile(profiles.altitude!, column, altitude, true);
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
  return (
    <FigureFrame
      number={number}
      caption={caption ?? <OwnCaption strip={strip} />}
      fileName={`${strip.column}-number-density`}
      drawing={() => densityPlot({ ...input, ...away() })}
      columns={columns}
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
      <FigureTable label={densityLabel(strip, styles)} columns={columns()} unitSystem={unitSystem} />
    </FigureFrame>
  );
}
