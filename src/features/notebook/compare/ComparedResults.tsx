import { useState } from "react";
import { formatCount, formatNumber, formatQuantity, resultScale, type UnitSystem } from "../../../lib/format";
import { formatMessage } from "../../../lib/formatMessage";
import { Rich } from "../../../lib/Rich";
import type { RichText } from "../../../lib/richText";
import { TableFrame } from "../../../ui/tables/TableFrame";
import { tableText } from "../../../ui/tables/tableText";
import { TextButton } from "../../../ui/TextButton";
import type { Magnitude, ResultComparison, ResultDifference } from "./compareResults";
import { capital, isMagnitude } from "./comparisonWords";
import { ratioAxis, ratioPlace, type RatioAxis } from "./ratioAxis";

interface ComparedResultsProps {
  comparison: ResultComparison;
  olderName: string;
  newerName: string;
  unitSystem: UnitSystem;
}

/** Width of the drawn ratios, px, and room at its ends for what runs off. */
const wide = 124;
const end = 8;

/** Results that differ, with both values, their difference and their ratio. */
export function ComparedResults({ comparison, olderName, newerName, unitSystem }: ComparedResultsProps) {
  const [isWhole, setWhole] = useState(false);
  const { differing, same } = comparison;
  if (differing.length === 0) {
    return (
      <p className="compare-none">
        {same === 0 ? "Neither gives results." : `${capital(formatCount(same, "result"))} equal in both.`}
      </p>
    );
  }
  const main = differing.filter(({ isMain }) => isMain);
  const isCut = main.length > 0 && main.length < differing.length;
  const shown = isCut && !isWhole ? main : differing;
  const axis = ratioAxis(shown.flatMap(({ log10Ratio }) => log10Ratio ?? []));
  return (
    <TableFrame
      number={1}
      caption={
        <>
          Results that differ. A dot stands at the ratio of the newer to the older, on a logarithmic axis from
          1.{same > 0 && ` ${capital(formatCount(same, "result"))} equal in both.`}
        </>
      }
      text={() => fullText(differing)}
      notes={
        isCut && (
          <TextButton data-print="never" aria-expanded={isWhole} onClick={() => setWhole(!isWhole)}>
            {isWhole ? "Show what tells most" : `Show all ${differing.length} that differ`}
          </TextButton>
        )
      }
    >
      <table className="table compare-table">
        <thead>
          <tr>
            <th scope="col">Result</th>
            <th scope="col">{olderName}</th>
            <th scope="col">{newerName}</th>
            <th scope="col">Difference</th>
            <th scope="col">Ratio</th>
            <td className="compare-axis">
              <RatioTicks axis={axis} />
            </td>
          </tr>
        </thead>
        <tbody>
          {shown.map((row) => (
            <ResultRow key={row.name} row={row} axis={axis} unitSystem={unitSystem} />
          ))}
        </tbody>
      </table>
    </TableFrame>
  );
}

function ResultRow({
  row,
  axis,
  unitSystem,
}: {
  row: ResultDifference;
  axis: RatioAxis;
  unitSystem: UnitSystem;
}) {
  const { name, words, older, newer, unit, log10Ratio } = row;
  const scale = resultScale(name, unit, unitSystem, largestOf(older, newer));
  const shown = (value: Magnitude) => formatQuantity({ ...value, unit }, unitSystem, { digits: 4, scale });
  const text = (value: Magnitude | string | null): RichText => {
    if (value === null) return ["–"];
    return isMagnitude(value) ? shown(value).number : [value.replace(/_/g, " ")];
  };
  const both = isMagnitude(older) && isMagnitude(newer);
  const difference = both && older.value !== null && newer.value !== null ? newer.value - older.value : null;
  return (
    <tr>
      <th scope="row" title={name}>
        <Rich text={formatMessage(words)} />
      </th>
      <td className="compare-older">
        <Rich text={text(older)} />
      </td>
      <td className="compare-newer">
        <Rich text={text(newer)} />
        <small>
          <Rich text={formatQuantity({ value: 1, unit }, unitSystem, { scale }).unit} />
        </small>
      </td>
      <td>
        <Rich text={difference === null ? ["–"] : formatNumber(difference * scale.factor, 3)} />
      </td>
      <td>
        <Rich text={ratioText(log10Ratio)} />
      </td>
      <td className="compare-axis">
        {log10Ratio !== null && <RatioDot axis={axis} log10Ratio={log10Ratio} />}
      </td>
    </tr>
  );
}

const largestOf = (...values: (Magnitude | string | null)[]): number =>
  Math.max(0, ...values.map((value) => (isMagnitude(value) ? Math.abs(value.value ?? 0) : 0)));

function ratioText(log10Ratio: number | null): RichText {
  if (log10Ratio === null) return ["–"];
  return Math.abs(log10Ratio) > 4
    ? ["10", { sup: log10Ratio.toFixed(1).replace("-", "−") }]
    : formatNumber(10 ** log10Ratio, 4);
}

const across = (axis: RatioAxis, log10Ratio: number): number =>
  end + ratioPlace(axis, log10Ratio) * (wide - 2 * end);

function RatioTicks({ axis }: { axis: RatioAxis }) {
  return (
    <svg width={wide} height="26" aria-hidden="true">
      {axis.ticks.map((tick) => {
        const x = across(axis, Math.log10(tick));
        return (
          <g key={tick}>
            <text x={x} y="13" textAnchor="middle" className="compare-tick">
              {tick}
            </text>
            <path d={`M${x.toFixed(1)} 19v5`} className="compare-axis-line" />
          </g>
        );
      })}
    </svg>
  );
}

/** A dot at the ratio, with a line from 1; an arrow where it runs off the axis. */
function RatioDot({ axis, log10Ratio }: { axis: RatioAxis; log10Ratio: number }) {
  const isOff = Math.abs(log10Ratio) > axis.reach;
  const to = across(axis, isOff ? Math.sign(log10Ratio) * axis.reach : log10Ratio);
  const from = across(axis, 0);
  const way = Math.sign(log10Ratio);
  return (
    <svg width={wide} height="20" aria-hidden="true">
      <path d={`M${from} 3v14`} className="compare-axis-line" />
      <path d={`M${from} 10H${(to + (isOff ? way * 6 : 0)).toFixed(1)}`} className="compare-ratio" />
      {isOff ? (
        <path d={`M${to + way * 1} 6l${way * 5} 4l${-way * 5} 4`} className="compare-ratio" />
      ) : (
        <circle cx={to} cy="10" r="3" className="compare-dot" />
      )}
    </svg>
  );
}

function fullText(rows: readonly ResultDifference[]): string {
  const value = (side: Magnitude | string | null) =>
    isMagnitude(side) ? (side.value ?? (side.log10 === null ? null : `10^${side.log10}`)) : side;
  return tableText([
    ["result", "unit", "older", "newer", "ratio"],
    ...rows.map(({ name, unit, older, newer, log10Ratio }) => [
      name,
      unit,
      value(older),
      value(newer),
      log10Ratio === null ? null : 10 ** log10Ratio,
    ]),
  ]);
}
