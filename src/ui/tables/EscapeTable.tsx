import type { CellResult } from "../../../shared/notebook/result";
import { formatKilometres, formatFixed, formatQuantity, quantityRich, unitSpace } from "../../lib/format";
import { gasStyle } from "../../lib/gasStyle";
import { Rich } from "../../lib/Rich";
import { plainText } from "../../lib/richText";
import { useElementSize } from "../../lib/useElementSize";
import { GasMark } from "../plots/GasMark";
import {
  columnScale,
  escapeAnswer,
  escapeColumns,
  escapeNumber,
  scaleUnit,
  shownColumns,
  type EscapeColumn,
} from "./escapeColumns";
import { ExplainNumber } from "./ExplainNumber";
import { noteTarget } from "./noteTarget";
import { TableFrame } from "./TableFrame";
import { TableNotes } from "./TableNotes";
import type { EscapeTableProps, LetteredNote } from "./tableProps";
import { tableText } from "./tableText";

/** Under this width, px, gases become columns. */
const narrow = 560;
const mostColumns = 7;

const regimes: Record<string, string> = {
  jeans: "Jeans",
  jeans_estimate: "Jeans, as an estimate",
  transition: "between Jeans escape and a wind",
  wind: "a wind",
};

/** "Thermal escape. Exobase at 239 km, where T = 411 K and v_esc = 7.94 km s⁻¹. Regime …" */
function OwnCaption({ result, unitSystem }: Pick<EscapeTableProps, "result" | "unitSystem">) {
  const number = (name: string) => {
    const value = result.values[name]?.value;
    return typeof value === "number" ? value : null;
  };
  const [altitude, temperature] = [number("exobase.altitude"), number("exobase.temperature")];
  const [speed, bulk] = [number("exobase.escape_speed"), number("bulk_escape_parameter")];
  const regime = result.values.regime?.value;
  return (
    <>
      Thermal escape.
      {altitude !== null && temperature !== null && speed !== null && (
        <>
          {" "}
          Exobase at {formatKilometres(altitude)}
          {unitSpace}km, where <i>T</i> = {formatFixed(temperature)}
          {unitSpace}K and <i>v</i>
          <sub>esc</sub> ={" "}
          <Rich text={quantityRich(formatQuantity({ value: speed, unit: "m s^-1" }, unitSystem))} />.
        </>
      )}
      {typeof regime === "string" && bulk !== null && (
        <>
          {" "}
          Regime: {regimes[regime] ?? regime}; λ of the mean mass there is{" "}
          {formatFixed(bulk, bulk < 10 ? 2 : 0)}.
        </>
      )}
    </>
  );
}

function fullText(result: CellResult, gases: readonly string[]): string {
  const keys = escapeColumns.map(({ key }) => key).flatMap((key) => [key, `log10_${key}`]);
  const present = [...keys, "mass_rate"].filter((key) => gases.some((gas) => result.values[`${gas}.${key}`]));
  const unitOf = (key: string) =>
    result.values[`${gases.find((gas) => result.values[`${gas}.${key}`]) ?? ""}.${key}`]?.unit ?? "1";
  return tableText([
    ["gas", ...present.map((key) => (unitOf(key) === "1" ? key : `${key} (${unitOf(key)})`))],
    ...gases.map((gas) => [gas, ...present.map((key) => result.values[`${gas}.${key}`]?.value ?? null)]),
  ]);
}

/** A letter that leads to its note under the table. */
function Letters({ notes }: { notes: readonly LetteredNote[] }) {
  return notes.map(({ note, letter }) => (
    <sup key={note.code + note.message} className="table-letter" data-level={note.level} title={note.message}>
      {letter}
    </sup>
  ));
}

/** Thermal escape of each gas; where it is narrow, gases are columns. */
export function EscapeTable({
  result,
  gases,
  columnGases,
  unitSystem,
  number,
  caption,
  notes = [],
  onRemedy,
}: EscapeTableProps) {
  const { ref, size } = useElementSize<HTMLDivElement>({ width: 736, height: 200 });
  const isTurned = size.width < narrow;
  const columns = shownColumns(result, gases, isTurned ? Infinity : mostColumns);
  const free = notes.filter(
    ({ note }) => note.level === "remark" || (!note.range && note.line === undefined),
  );
  const lettered = free.filter(({ letter }) => letter !== null);
  const at = (gas: string, key: string | null) =>
    lettered.filter(({ note }) => {
      const target = noteTarget(note, gases);
      return target?.gas === gas && target.key === key;
    });
  const scales = new Map(columns.map(({ key }) => [key, columnScale(result, gases, key, unitSystem)]));
  const name = (gas: string) => (
    <>
      <Rich text={gasStyle(gas, columnGases).name} />
      <Letters notes={at(gas, null)} />
    </>
  );
  const cell = (gas: string, { key }: EscapeColumn) => {
    const answer = escapeAnswer(result, gas, key);
    const full = answer === null ? undefined : `${answer.value ?? `10^${answer.log10}`} ${answer.unit}`;
    const text = escapeNumber(answer, key, scales.get(key)!, isTurned ? 2 : 3);
    return (
      <td key={`${gas}${key}`} title={full?.replace(/ 1$/, "")}>
        {answer === null ? (
          <Rich text={text} />
        ) : (
          <ExplainNumber place={{ cell: result.name, name: `${gas}.${key}` }} spoken={plainText(text)}>
            <Rich text={text} />
          </ExplainNumber>
        )}
        <Letters notes={at(gas, key)} />
      </td>
    );
  };
  const unit = ({ key }: EscapeColumn) => (key === "supply_fraction" ? [] : scaleUnit(scales.get(key)!));

  return (
    <div ref={ref}>
      <TableFrame
        number={number}
        caption={caption ?? <OwnCaption result={result} unitSystem={unitSystem} />}
        text={() => fullText(result, gases)}
        notes={<TableNotes notes={free} onRemedy={onRemedy} />}
      >
        {isTurned ? (
          <table className="table" data-turned>
            <thead>
              <tr>
                <td />
                {gases.map((gas) => (
                  <th key={gas} scope="col">
                    {name(gas)}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {columns.map((column) => (
                <tr key={column.key}>
                  <th scope="row">
                    <Rich text={column.label} />
                    {unit(column).length > 0 && (
                      <>
                        , <Rich text={unit(column)} />
                      </>
                    )}
                  </th>
                  {gases.map((gas) => cell(gas, column))}
                </tr>
              ))}
            </tbody>
          </table>
        ) : (
          <table className="table">
            <thead>
              <tr>
                <th scope="col">Gas</th>
                {columns.map((column) => (
                  <th key={column.key} scope="col">
                    <span
                      className={column.head.some((piece) => typeof piece !== "string") ? "table-symbol" : ""}
                    >
                      <Rich text={column.head} />
                    </span>
                    <small>
                      <Rich text={unit(column)} />
                    </small>
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {gases.map((gas) => (
                <tr key={gas}>
                  <th scope="row">
                    <GasMark style={gasStyle(gas, columnGases)} />
                    {name(gas)}
                  </th>
                  {columns.map((column) => cell(gas, column))}
                </tr>
              ))}
            </tbody>
          </table>
        )}
      </TableFrame>
    </div>
  );
}
