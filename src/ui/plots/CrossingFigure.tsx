import { useMemo } from "react";
import type { Strip } from "../../../shared/notebook/summary";
import { formatKilometres, formatNumber, formatQuantity, quantityRich, quantityText } from "../../lib/format";
import { plainText } from "../../lib/richText";
import { Rich } from "../../lib/Rich";
import { interpolateProfile } from "./columnCurves";
import { crossingLabel, crossingPlot } from "./crossingPlot";
import type { CsvColumn } from "./figureCsv";
import { FigureFrame } from "./FigureFrame";
import { inkValues } from "./figureLayout";
import type { ColumnFigureProps } from "./figureProps";
import { FigureReader } from "./FigureReader";
import { FigureTable } from "./FigureTable";
import { PlotlyFigure } from "./PlotlyFigure";
import { useColumnFigure } from "./useColumnFigure";

function OwnCaption({ strip }: { strip: Strip }) {
  return (
    <>
      Mean free path <i>l</i> and scale height <i>H</i> of the whole gas in <i>{strip.column}</i>.{" "}
      {strip.exobase === null
        ? "They do not meet: the gas stays a fluid as far as it is computed."
        : "Where they cross, the Knudsen number is 1: above, a particle leaves more often than it collides."}
    </>
  );
}

/** Mean free path and scale height against altitude, crossing at the exobase. */
export function CrossingFigure({ profiles, strip, unitSystem, number, caption }: ColumnFigureProps) {
  const { ref, inks, room, altitudes, away, zoom, setZoom } = useColumnFigure(strip, "one panel", inkValues);
  const plot = useMemo(
    () => crossingPlot({ profiles, strip, room, inks, zoom }),
    [profiles, strip, room, inks, zoom],
  );
  const at = (key: string, altitude: number) =>
    interpolateProfile(profiles.altitude!, profiles[key]!, altitude, true);
  const length = (key: string, altitude: number) =>
    formatQuantity({ value: at(key, altitude), unit: "m" }, unitSystem, { digits: 2 });
  const rows = (altitude: number) => [
    { key: "l", symbol: "l", value: <Rich text={quantityRich(length("mean_free_path", altitude))} /> },
    { key: "H", symbol: "H", value: <Rich text={quantityRich(length("scale_height", altitude))} /> },
    { key: "Kn", symbol: "Kn", value: <Rich text={formatNumber(at("knudsen", altitude), 2)} /> },
  ];
  const spoken = (altitude: number) =>
    [
      `${formatKilometres(altitude)} km`,
      `mean free path ${quantityText(length("mean_free_path", altitude))}`,
      `scale height ${quantityText(length("scale_height", altitude))}`,
      `Knudsen number ${plainText(formatNumber(at("knudsen", altitude), 2))}`,
    ].join(", ");
  const columns = (): CsvColumn[] => [
    { head: "altitude (m)", values: profiles.altitude! },
    { head: "mean_free_path (m)", values: profiles.mean_free_path! },
    { head: "scale_height (m)", values: profiles.scale_height! },
    { head: "knudsen (1)", values: profiles.knudsen! },
  ];

  return (
    <FigureFrame
      number={number}
      caption={caption ?? <OwnCaption strip={strip} />}
      fileName={`${strip.column}-free-path`}
      drawing={() => crossingPlot({ profiles, strip, ...away() })}
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
          <div role="img" aria-label={crossingLabel(strip)}>
            <PlotlyFigure plot={plot} onZoom={setZoom} />
          </div>
        </FigureReader>
      </div>
      <FigureTable label={crossingLabel(strip)} columns={columns()} unitSystem={unitSystem} />
    </FigureFrame>
  );
}
