import { formatNumber, formatUnit, unitSpace, type DisplayScale } from "../../lib/format";
import { Rich } from "../../lib/Rich";
import { plainText } from "../../lib/richText";
import { useElementSize } from "../../lib/useElementSize";
import {
  quantileNames,
  type QuantileName,
  type SpreadResult,
  type SpreadWatched,
} from "../plots/spreadResult";
import { ExplainNumber } from "./ExplainNumber";
import { TableFrame } from "./TableFrame";
import { tableText } from "./tableText";

interface SpreadTableProps {
  spread: SpreadResult;
  /** Number of the table in the notebook, from 1. */
  number: number;
}

/** Under this width, px, watched results become columns. */
const narrow = 560;

const heads: Record<QuantileName, string> = {
  q2_5: "2.5\u202f%",
  lower: "16\u202f%",
  median: "median",
  upper: "84\u202f%",
  q97_5: "97.5\u202f%",
};

function fullText({ watched }: SpreadResult): string {
  return tableText([
    ["result", "unit", ...quantileNames.flatMap((quantile) => [quantile, `${quantile}_error`])],
    ...watched.map(({ name, unit, quantiles }) => [
      name,
      unit,
      ...quantileNames.flatMap((quantile) => [quantiles[quantile].value, quantiles[quantile].error]),
    ]),
  ]);
}

/** A quantile, and under it its standard error. */
function Quantile({
  cell,
  watched,
  quantile,
}: {
  /** Name of the spread cell. */
  cell: string;
  watched: SpreadWatched;
  quantile: QuantileName;
}) {
  const { unit, scale, quantiles, name } = watched;
  const { value, error } = quantiles[quantile];
  if (value === null) return <td>–</td>;
  const full = `${value} ${unit}`.replace(/ 1$/, "");
  const text = formatNumber(value * scale.factor);
  return (
    <td title={error === null ? full : `${full}, standard error ${error}`}>
      <ExplainNumber place={{ cell, name: `${name}.${quantile}` }} spoken={plainText(text)}>
        <Rich text={text} />
      </ExplainNumber>
      {error !== null && (
        <small className="table-error">
          ±{unitSpace}
          <Rich text={formatNumber(error * scale.factor, 2)} />
        </small>
      )}
    </td>
  );
}

function Unit({ scale }: { scale: DisplayScale }) {
  const unit = formatUnit(scale.unit);
  if (unit.length === 0) return null;
  return (
    <small className="table-error">
      <Rich text={unit} />
    </small>
  );
}

/** Median and outer quantiles of each watched result, each with its standard error. */
export function SpreadTable({ spread, number }: SpreadTableProps) {
  const { ref, size } = useElementSize<HTMLDivElement>({ width: 736, height: 160 });
  const isTurned = size.width < narrow;
  const { watched } = spread;
  const name = (each: SpreadWatched) => (
    <>
      <Rich text={each.label} />
      <Unit scale={each.scale} />
    </>
  );
  return (
    <div ref={ref}>
      <TableFrame
        number={number}
        caption={
          <>
            Quantiles of what <i>{spread.name}</i> watches; under each its standard error, from eight
            independent parts of the draws.
          </>
        }
        text={() => fullText(spread)}
      >
        <table className="table" data-turned={isTurned || undefined} data-wide={!isTurned || undefined}>
          <thead>
            <tr>
              <td />
              {isTurned
                ? watched.map((each) => (
                    <th key={each.name} scope="col">
                      {name(each)}
                    </th>
                  ))
                : quantileNames.map((quantile) => (
                    <th key={quantile} scope="col">
                      {heads[quantile]}
                    </th>
                  ))}
            </tr>
          </thead>
          <tbody>
            {isTurned
              ? quantileNames.map((quantile) => (
                  <tr key={quantile}>
                    <th scope="row">{heads[quantile]}</th>
                    {watched.map((each) => (
                      <Quantile key={each.name} cell={spread.name} watched={each} quantile={quantile} />
                    ))}
                  </tr>
                ))
              : watched.map((each) => (
                  <tr key={each.name}>
                    <th scope="row">{name(each)}</th>
                    {quantileNames.map((quantile) => (
                      <Quantile key={quantile} cell={spread.name} watched={each} quantile={quantile} />
                    ))}
                  </tr>
                ))}
          </tbody>
        </table>
      </TableFrame>
    </div>
  );
}
