import { useMemo } from "react";
import type { CellResult, CoronaBeginning } from "../../../shared/notebook/result";
import {
  displayScale,
  formatGas,
  formatKilometres,
  formatNumber,
  formatQuantity,
  quantityRich,
  quantityText,
  type UnitSystem,
} from "../../lib/format";
import { gasStyle } from "../../lib/gasStyle";
import { Rich } from "../../lib/Rich";
import { plainText } from "../../lib/richText";
import { useElementSize } from "../../lib/useElementSize";
import { interpolateProfile } from "./columnCurves";
import { orbitCurves, sightCurves } from "./coronaCurves";
import { coronaAltitudes, coronaPlot } from "./coronaPlot";
import { coronaRoom, firstPanel } from "./coronaRoom";
import type { CsvColumn } from "./figureCsv";
import { FigureFrame } from "./FigureFrame";
import { inkValues } from "./figureLayout";
import { FigureReader } from "./FigureReader";
import { FigureTable } from "./FigureTable";
import { PlotlyFigure } from "./PlotlyFigure";
import { resolveInks, useThemeRevision } from "./useFigureInks";
import { useFigureState } from "./useFigureState";

interface CoronaFigureProps {
  /** A corona cell, with profiles. */
  result: CellResult;
  corona: CoronaBeginning;
  gas: string;
  /** Gases of the column it rests on, so that the colour agrees. */
  columnGases: readonly string[] | undefined;
  unitSystem: UnitSystem;
  number: number;
}

/** "with the satellite orbits empty", "with half of …" in numbers. */
function satelliteWords(satellites: number): string {
  if (satellites === 0) return "satellite orbits empty (s = 0)";
  if (satellites === 1) return "satellite orbits filled as in the gas below (s = 1)";
  return `a share s = ${plainText(formatNumber(satellites, 2))} of the satellite orbits filled`;
}

function OwnCaption({ result, corona, gas, isStacked }: CoronaFigureProps & { isStacked: boolean }) {
  const { satellites, escapeParameter, share } = corona;
  return (
    <>
      <Rich text={formatGas(gas)} /> above the exobase by kind of orbit in <i>{result.name}</i>, with{" "}
      {satelliteWords(satellites)} and λ = <Rich text={formatNumber(escapeParameter)} /> at the exobase. There
      the corona has ½[1 + <i>P</i>(3/2, λ)] = <Rich text={formatNumber(share, 4)} /> of the column’s density,
      the step drawn to scale between two short bars. {isStacked ? "Below" : "Right"}: its column along the
      limb and overhead.
    </>
  );
}

const orbitKeys = ["number_density", "ballistic", "satellite", "escaping"] as const;

/** A corona by kind of orbit, and its columns along lines of sight. */
export function CoronaFigure(props: CoronaFigureProps) {
  const { result, corona, gas, columnGases, unitSystem, number } = props;
  const { ref, size } = useElementSize<HTMLDivElement>({ width: 736, height: 396 });
  const { zoom, setZoom } = useFigureState();
  const theme = useThemeRevision();
  const { colour } = gasStyle(gas, columnGases);
  const inkSources = useMemo(() => ({ ...inkValues, gas: colour }), [colour]);
  // eslint-disable-next-line react-hooks/exhaustive-deps -- the theme changes what the same values resolve to
  const inks = useMemo(() => resolveInks(inkSources, "page"), [inkSources, theme]);
  const room = useMemo(() => coronaRoom(size.width), [size.width]);

  const profiles = result.profiles!;
  const exobase = profiles.altitude![0]!;
  const drawn = useMemo(() => {
    const density = displayScale("m^-3", unitSystem, 1);
    const column = displayScale("m^-2", unitSystem, 1);
    const rows = result.tables.lines_of_sight ?? [];
    const below = Number(result.values["exobase.number_density"]?.value ?? 0) * density.factor;
    return {
      orbits: orbitCurves(result.profiles!, density.factor),
      sights: sightCurves(result.profiles!, rows, column.factor),
      density,
      column,
      exobase: result.profiles!.altitude![0]!,
      step: { from: below, to: below * corona.share },
    };
  }, [result, corona, unitSystem]);
  const plot = useMemo(() => coronaPlot({ ...drawn, room, inks, zoom }), [drawn, room, inks, zoom]);

  const logs = zoom?.y ?? coronaAltitudes(drawn.orbits, exobase);
  const present = orbitKeys.filter((key) => profiles[key]!.some((density) => density > 0));
  const densityAt = (key: string, altitude: number) =>
    formatQuantity(
      { value: interpolateProfile(profiles.altitude!, profiles[key]!, altitude, true), unit: "m^-3" },
      unitSystem,
      { digits: 2 },
    );
  const words: Record<string, string> = {
    number_density: "all",
    ballistic: "ballistic",
    satellite: "satellite",
    escaping: "escaping",
  };
  const rows = (altitude: number) =>
    present.map((key) => ({
      key,
      symbol: words[key],
      value: <Rich text={quantityRich(densityAt(key, altitude))} />,
    }));
  const spoken = (altitude: number) =>
    [
      `${formatKilometres(altitude)} km`,
      ...present.map((key) => `${words[key]} ${quantityText(densityAt(key, altitude))}`),
    ].join(", ");
  const columns = (): CsvColumn[] => [
    { head: "altitude (m)", values: profiles.altitude! },
    ...orbitKeys.map((key) => ({ head: `${key} (m^-3)`, values: profiles[key]! })),
  ];
  const sightColumns = (): CsvColumn[] => {
    const rows = result.tables.lines_of_sight ?? [];
    const values = (key: string) => rows.map((row) => Number(row[key] ?? 0));
    return [
      { head: "lines_of_sight.altitude (m)", values: values("altitude") },
      { head: "limb_column (m^-2)", values: values("limb_column") },
      { head: "overhead_column (m^-2)", values: values("overhead_column") },
    ];
  };
  const label = `Corona of ${gas} in ${result.name}: number density by kind of orbit, and columns along the limb and overhead, against altitude from ${formatKilometres(exobase)} to ${formatKilometres(profiles.altitude!.at(-1)!)} km`;

  return (
    <FigureFrame
      number={number}
      caption={<OwnCaption {...props} isStacked={room.isStacked} />}
      fileName={`${result.name}-corona`}
      drawing={() =>
        coronaPlot({ ...drawn, room: coronaRoom(736), inks: resolveInks(inkSources, "day"), zoom: null })
      }
      columns={() => [...columns(), ...sightColumns()]}
    >
      <div ref={ref}>
        <FigureReader
          room={firstPanel(room)}
          altitudes={[10 ** logs[0], 10 ** logs[1]]}
          isLog
          start={exobase}
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
      <FigureTable
        label="Columns along the limb and overhead"
        columns={sightTable(sightColumns())}
        unitSystem={unitSystem}
      />
    </FigureFrame>
  );
}

/** Told by plain altitude. */
const sightTable = ([altitude, ...others]: CsvColumn[]): CsvColumn[] => [
  { ...altitude!, head: "altitude (m)" },
  ...others,
];
