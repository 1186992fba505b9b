import type { CellResult } from "../../../shared/notebook/result";
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
  escapeSpread,
  scaleUnit,
  shownColumns,
  type EscapeColumn,
} from "./escapeColumns";
import { EscapeCaption } from "./EscapeCaption";
import { ExplainNumber } from "./ExplainNumber";
import { noteTarget } from "./noteTarget";
import { SpreadRemark } from "./SpreadRemark";
import { TableFrame } from "./TableFrame";
import { TableNotes } from "./TableNotes";
import type { EscapeTableProps, LetteredNote } from "./tableProps";
import { tableText } from "./tableText";
import { ValueList } from "./ValueList";

/** Under this width, px, gases become columns. */
const narrow = 560;
const mostColumns = 7;

/** What is said of all gases together, under the table. */
const sharedValues = ["energy_limited_mass_rate", "crossover_mass", "wind_mass_rate"];

function fullText(result: CellResult, gases: readonly string[]): string {
  if (shownColumns(result, gases, Infinity).length === 0) return sharedText(result);
  const keys = escapeColumns.map(({ key }) => key).flatMap((key) => [key, `log10_${key}`]);
  const present = [...keys, "mass_rate"].filter((key) => gases.some((gas) => result.values[`${gas}.${key}`]));
  const unitOf = (key: string) =>
    result.values[`${gases.find((gas) => result.values[`${gas}.${key}`]) ?? ""}.${key}`]?.unit ?? "1";
  return tableText([
    ["gas", ...present.map((key) => (unitOf(key) === "1" ? key : `${key} (${unitOf(key)})`))],
    ...gases.map((gas) => [gas, ...present.map((key) => result.values[`${gas}.${key}`]?.value ?? null)]),
  ]);
}

/** Without an exobase there is nothing to say of each gas. */
const sharedText = ({ values }: CellResult): string =>
  tableText(Object.entries(values).map(([name, { value, unit = "1" }]) => [name, value, unit]));

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
  convention,
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
    const spread = answer && escapeSpread(answer, key, scales.get(key)!);
    return (
      <td key={`${gas}${key}`} title={full?.replace(/ 1$/, "")}>
        {answer === null ? (
          <Rich text={text} />
        ) : (
          <ExplainNumber
            place={{ cell: result.name, name: `${gas}.${key}` }}
            spoken={plainText(spread ? [...text, " ", ...spread] : text)}
          >
            <Rich text={text} />
          </ExplainNumber>
        )}
        <Letters notes={at(gas, key)} />
        {spread && (
          <small className="table-spread">
            <Rich text={spread} />
          </small>
        )}
      </td>
    );
  };
  const unit = ({ key }: EscapeColumn) => (key === "supply_fraction" ? [] : scaleUnit(scales.get(key)!));

  return (
    <div ref={ref}>
      <TableFrame
        number={number}
        caption={caption ?? <EscapeCaption result={result} convention={convention} unitSystem={unitSystem} />}
        text={() => fullText(result, gases)}
        notes={
          <>
            <SpreadRemark
              values={result.values}
              names={[
                "exobase.altitude",
                ...columns.flatMap(({ key }) => gases.map((gas) => `${gas}.${key}`)),
              ]}
            />
            <ValueList result={result} unitSystem={unitSystem} names={sharedValues} isQuiet />
            <TableNotes notes={free} onRemedy={onRemedy} />
          </>
        }
      >
        {columns.length === 0 ? null : isTurned ? (
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
