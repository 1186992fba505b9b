import type { ResultRow } from "../../../shared/notebook/result";
import { formatCount } from "../../lib/format";
import { formatMessage } from "../../lib/formatMessage";
import { plainText } from "../../lib/richText";
import { Rich } from "../../lib/Rich";
import { steppedNumber, type SweepAxis, type SweepResult } from "./sweepResult";

/** Stretches of points told before the rest is left to the CSV file. */
const toldStretches = 12;

/** Why points of a sweep have no answer, and which they are: opened on demand. */
export function MissingPoints({ sweep }: { sweep: SweepResult }) {
  const missing = sweep.reasons.filter((reason) => reason !== null).length;
  if (missing === 0) return null;
  return (
    <details className="figure-reasons" data-print="never">
      <summary>The reasons, point by point: {formatCount(missing, "point")} without an answer</summary>
      <dl>
        {sweep.outcomes.map((outcome) => (
          <Reason key={`${outcome.cell} ${outcome.code}`} outcome={outcome} sweep={sweep} />
        ))}
      </dl>
    </details>
  );
}

function Reason({ outcome, sweep }: { outcome: ResultRow; sweep: SweepResult }) {
  const places = stretches(sweep, String(outcome.code));
  const left = places.length - toldStretches;
  return (
    <div>
      <dt>
        <Rich text={formatMessage(String(outcome.message))} />
      </dt>
      <dd>
        {formatCount(Number(outcome.count), "point")} of <i>{String(outcome.cell)}</i>, as said at the first.
        <ul>
          {places.slice(0, toldStretches).map((place) => (
            <li key={place}>{place}</li>
          ))}
          {left > 0 && (
            <li>And {formatCount(left, "stretch", "stretches")} more; the CSV file has every point.</li>
          )}
        </ul>
      </dd>
    </div>
  );
}

/** Where a reason holds, row by row of the second quantity: "K_base 10 m² s⁻¹: T_quiet 300 K to 340 K". */
export function stretches({ axes, reasons }: SweepResult, code: string): string[] {
  const [first, second] = axes;
  const width = first!.values.length;
  const found: string[] = [];
  for (let row = 0; row * width < reasons.length; row++) {
    const line = reasons.slice(row * width, (row + 1) * width);
    for (let from = 0; from < line.length; from++) {
      if (line[from] !== code) continue;
      let to = from;
      while (line[to + 1] === code) to += 1;
      const across = `${first!.name} ${ends(first!, from, to)}`;
      found.push(second ? `${second.name} ${at(second, row)}: ${across}` : across);
      from = to;
    }
  }
  return found;
}

const at = ({ values, scale }: SweepAxis, index: number): string =>
  plainText(steppedNumber(values[index]!, scale));

const ends = (axis: SweepAxis, from: number, to: number): string =>
  from === to ? at(axis, from) : `${at(axis, from)} to ${at(axis, to)}`;
