import { useMemo } from "react";
import type { CellResult, LightHistory } from "../../../shared/notebook/result";
import { formatGas, formatQuantity, quantityRich, quantityText, type UnitSystem } from "../../lib/format";
import { gasStyle } from "../../lib/gasStyle";
import { Rich } from "../../lib/Rich";
import { useElementSize } from "../../lib/useElementSize";
import { AcrossReader } from "./AcrossReader";
import { dashList } from "./figureLayout";
import type { CsvColumn } from "./figureCsv";
import { FigureFrame } from "./FigureFrame";
import { inkValues } from "./figureLayout";
import { FigureTable } from "./FigureTable";
import { atAge, lossCourse, lossScales, type LossCourse } from "./lossHistory";
import { agesDrawn, ageText, lossPlot, lossRoom } from "./lossPlot";
import { PlotlyFigure } from "./PlotlyFigure";
import { resolveInks, useThemeRevision } from "./useFigureInks";
import { useFigureState } from "./useFigureState";

interface LossFigureProps {
  /** A loss cell. */
  result: CellResult;
  light: LightHistory;
  gas: string;
  unitSystem: UnitSystem;
  number: number;
}

/** How a gas was lost as the star aged; nothing where there is no history. */
export function LossFigure(props: LossFigureProps) {
  const { result, light } = props;
  const course = useMemo(() => lossCourse(result, light), [result, light]);
  return course && <CourseFigure {...props} course={course} />;
}

function OwnCaption({ gas, course, unitSystem }: LossFigureProps & { course: LossCourse }) {
  const { half, light, measure } = course;
  const scale = lossScales(course, unitSystem).age;
  return (
    <>
      Rate at which <Rich text={formatGas(gas)} /> was lost as the star aged, and what has gone
      {measure.unit === "m" && ", as a layer of water"}.
      {light.saturation !== null &&
        ` Solid and thick: the light was saturated, up to ${ageText(light.saturation, scale)}.`}
      {half !== null && ` The ring marks where half of it had gone, at ${ageText(half, scale)}.`}
    </>
  );
}

function CourseFigure(props: LossFigureProps & { course: LossCourse }) {
  const { result, gas, course, unitSystem, number } = props;
  const { ref, size } = useElementSize<HTMLDivElement>({ width: 736, height: 430 });
  const { zoom, setZoom } = useFigureState();
  const theme = useThemeRevision();
  const style = gasStyle(gas);
  const inkSources = useMemo(() => ({ ...inkValues, gas: style.colour }), [style.colour]);
  // eslint-disable-next-line react-hooks/exhaustive-deps -- the theme changes what the same values resolve to
  const inks = useMemo(() => resolveInks(inkSources, "page"), [inkSources, theme]);
  const room = useMemo(() => lossRoom(size.width), [size.width]);
  const scales = useMemo(() => lossScales(course, unitSystem), [course, unitSystem]);
  const dash = dashList(style.dash);
  const plot = useMemo(
    () => lossPlot({ course, scales, dash, room, inks, zoom }),
    [course, scales, dash, room, inks, zoom],
  );

  const rateAt = (age: number) =>
    formatQuantity({ value: atAge(course, course.rate, age), unit: "s^-1" }, unitSystem, { digits: 2 });
  const lostAt = (age: number) =>
    formatQuantity({ value: atAge(course, course.lost, age), unit: course.measure.unit }, unitSystem, {
      digits: 2,
      scale: scales.lost,
    });
  const ageOf = (place: number) => {
    const age = place / scales.age.factor;
    return Math.min(course.age.at(-1)!, Math.max(course.age[0]!, age));
  };
  const rows = (place: number) => [
    { key: "age", symbol: "age", value: ageText(ageOf(place), scales.age) },
    { key: "rate", symbol: "rate", value: <Rich text={quantityRich(rateAt(ageOf(place)))} /> },
    { key: "lost", symbol: "lost", value: <Rich text={quantityRich(lostAt(ageOf(place)))} /> },
  ];
  const spoken = (place: number) =>
    [
      `age ${ageText(ageOf(place), scales.age)}`,
      `rate ${quantityText(rateAt(ageOf(place)))}`,
      `lost ${quantityText(lostAt(ageOf(place)))}`,
    ].join(", ");
  const columns = (): CsvColumn[] => [
    { head: "age (s)", values: course.age },
    { head: "rate (s^-1)", values: course.rate },
    { head: `lost (${course.measure.unit})`, values: course.lost },
  ];
  const [from, to] = [course.age[0]!, course.age.at(-1)!];
  const label = `Rate of ${gas} and what has gone, against the age of the star from ${ageText(from, scales.age)} to ${ageText(to, scales.age)}`;

  return (
    <FigureFrame
      number={number}
      caption={<OwnCaption {...props} />}
      fileName={`${result.name}-loss`}
      drawing={() =>
        lossPlot({
          course,
          scales,
          dash,
          room: lossRoom(736),
          inks: resolveInks(inkSources, "day"),
          zoom: null,
        })
      }
      columns={columns}
    >
      <div ref={ref}>
        <AcrossReader
          room={room}
          range={zoom?.x ?? agesDrawn(course, scales.age)}
          start={(course.half ?? from) * scales.age.factor}
          label={`Age read in figure ${number}`}
          rows={rows}
          spoken={spoken}
        >
          <div role="img" aria-label={label}>
            <PlotlyFigure plot={plot} onZoom={setZoom} />
          </div>
        </AcrossReader>
      </div>
      <FigureTable label={label} columns={columns()} unitSystem={unitSystem} />
    </FigureFrame>
  );
}
