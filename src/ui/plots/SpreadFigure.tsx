import { Fragment, useMemo } from "react";
import { formatFixed, formatPercent, type UnitSystem } from "../../lib/format";
import { plainText } from "../../lib/richText";
import { Rich } from "../../lib/Rich";
import type { CsvColumn } from "./figureCsv";
import { FigureFrame } from "./FigureFrame";
import { inkValues } from "./figureLayout";
import { FigureTable } from "./FigureTable";
import { PlotlyFigure } from "./PlotlyFigure";
import { roomOfSpread, spreadLabel, spreadPlot } from "./spreadPlot";
import type { SpreadResult, SpreadWatched } from "./spreadResult";
import { shownNumber } from "./sweepResult";
import { sheetWidth, useFigure } from "./useFigure";

interface SpreadFigureProps {
  spread: SpreadResult;
  unitSystem: UnitSystem;
  /** Number of the figure in the notebook, from 1. */
  number: number;
}

/** Of more results than this, the ranges are left to the table. */
const mostTold = 2;

/** "4.6 × 10²⁵ to 1.6 × 10²⁶ s⁻¹" */
function Middle({ watched: { quantiles, scale } }: { watched: SpreadWatched }) {
  const { lower, upper } = quantiles;
  if (lower.value === null || upper.value === null) return "unknown";
  return (
    <>
      <Rich text={shownNumber(lower.value, { ...scale, unit: "1" })} /> to{" "}
      <Rich text={shownNumber(upper.value, scale)} />
    </>
  );
}

function Joined({ parts }: { parts: React.ReactNode[] }) {
  return parts.map((part, index) => (
    <Fragment key={index}>
      {index > 0 && (index === parts.length - 1 ? " and " : ", ")}
      {part}
    </Fragment>
  ));
}

function Caption({ spread }: { spread: SpreadResult }) {
  const { draws, watched, faultedShare } = spread;
  const shown = watched.filter(({ bins }) => bins.length > 0);
  const logarithmic = watched.filter(({ isLog }) => isLog);
  return (
    <>
      {formatFixed(draws)} draws
      {faultedShare > 0 && (
        <>
          , of which <Rich text={formatPercent(faultedShare)} /> have no answer and are left out
        </>
      )}
      .{" "}
      {shown.length > 0 && (
        <>
          Grey and thick line: the middle 68{"\u202f"}%
          {shown.length <= mostTold && (
            <>
              ,{" "}
              <Joined
                parts={shown.map((each) => (
                  <Middle key={each.name} watched={each} />
                ))}
              />
            </>
          )}
          ; thin: 95{"\u202f"}%; tick: median. Below,
        </>
      )}{" "}
      {shown.length > 0 ? "first-order" : "First-order"} share of the variance by entry
      {logarithmic.length > 0 && (
        <>
          , of the logarithm for{" "}
          <Joined
            parts={logarithmic.map(({ name, label }) => (
              <Rich key={name} text={label} />
            ))}
          />
        </>
      )}
      . What no entry explains alone is shared between them.
    </>
  );
}

function spreadColumns({ watched, inputs }: SpreadResult): CsvColumn[] {
  return [
    ...watched.flatMap(({ name, unit, bins }): CsvColumn[] => [
      { head: `${name} from (${unit})`, values: bins.map(({ from }) => from) },
      { head: `${name} to (${unit})`, values: bins.map(({ to }) => to) },
      { head: `${name} draws`, values: bins.map(({ count }) => count) },
    ]),
    ...shareColumns({ watched, inputs }),
  ];
}

function shareColumns({ watched, inputs }: Pick<SpreadResult, "watched" | "inputs">): CsvColumn[] {
  return [
    { head: "entry", values: inputs },
    ...watched.flatMap(({ name, shares }): CsvColumn[] => [
      {
        head: `share of variance of ${name}`,
        values: inputs.map((input) => shares.get(input)?.share ?? null),
      },
      {
        head: `its standard error, ${name}`,
        values: inputs.map((input) => shares.get(input)?.error ?? null),
      },
    ]),
  ];
}

/** How watched results scatter, and which uncertain entry drives them. */
export function SpreadFigure({ spread, unitSystem, number }: SpreadFigureProps) {
  const { ref, width, inks, dayInks } = useFigure(inkValues);
  const room = useMemo(() => roomOfSpread(width, spread), [width, spread]);
  const plot = useMemo(() => spreadPlot({ spread, room, inks }), [spread, room, inks]);
  const label = spreadLabel(spread);
  return (
    <FigureFrame
      number={number}
      caption={<Caption spread={spread} />}
      fileName={spread.name}
      drawing={() => spreadPlot({ spread, room: roomOfSpread(sheetWidth, spread), inks: dayInks() })}
      columns={() => spreadColumns(spread)}
    >
      <div ref={ref}>
        <div className="figure-stage" style={{ height: room.height }} role="img" aria-label={label}>
          <PlotlyFigure plot={plot} onZoom={noZoom} />
        </div>
      </div>
      <FigureTable
        label={`Share of the variance of ${spread.watched.map(({ label: words }) => plainText(words)).join(", ")} that each entry alone explains`}
        columns={shareColumns(spread)}
        unitSystem={unitSystem}
      />
    </FigureFrame>
  );
}

/** There is nothing to draw closer: every draw is in sight. */
const noZoom = (): void => undefined;
