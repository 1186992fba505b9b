import type { ResultRow } from "../../../shared/notebook/result";
import { displayScale, formatKilometres, formatNumber, formatUnit, type UnitSystem } from "../../lib/format";
import { gasStyle } from "../../lib/gasStyle";
import { Rich } from "../../lib/Rich";
import { plainText } from "../../lib/richText";
import { ExplainNumber } from "./ExplainNumber";
import { TableFrame } from "./TableFrame";
import type { LevelColumn, LevelsTableProps } from "./tableProps";
import { tableText } from "./tableText";

const bulkColumns: readonly LevelColumn[] = [
  { key: "temperature", head: [{ italic: "T" }], unit: "K" },
  { key: "pressure", head: [{ italic: "p" }], unit: "Pa" },
  { key: "number_density", head: [{ italic: "n" }], unit: "m^-3" },
  { key: "scale_height", head: [{ italic: "H" }], unit: "m" },
  { key: "mean_free_path", head: [{ italic: "l" }], unit: "m" },
  { key: "knudsen", head: ["Kn"], unit: "1" },
];

/** Units of every column that a level may have, for copying. */
const units: Readonly<Record<string, string>> = {
  altitude: "m",
  temperature: "K",
  pressure: "Pa",
  mass_density: "kg m^-3",
  number_density: "m^-3",
  mean_mass: "kg",
  gravity: "m s^-2",
  scale_height: "m",
  mean_free_path: "m",
  knudsen: "1",
  mole_fraction: "1",
  radius: "m",
  ballistic: "m^-3",
  satellite: "m^-3",
  escaping: "m^-3",
  limb_column: "m^-2",
  overhead_column: "m^-2",
};

const unitOf = (key: string): string => units[key.split(".").at(-1)!] ?? "1";

function fullText(rows: readonly ResultRow[]): string {
  const keys = Object.keys(rows[0] ?? {});
  return tableText([
    keys.map((key) => (unitOf(key) === "1" ? key : `${key} (${unitOf(key)})`)),
    ...rows.map((row) => keys.map((key) => row[key] ?? null)),
  ]);
}

const numberOf = (value: ResultRow[string] | undefined): number | null =>
  typeof value === "number" ? value : null;

function scaleOf(rows: readonly ResultRow[], { key, unit }: LevelColumn, unitSystem: UnitSystem) {
  return displayScale(unit, unitSystem, Math.max(0, ...rows.map((row) => Math.abs(numberOf(row[key]) ?? 0))));
}

/** The column at the altitudes asked for, the highest on top as altitude has it; then densities of each gas. */
export function LevelsTable({
  result,
  gases,
  columns: own = bulkColumns,
  unitSystem,
  isAtRest = false,
  number,
  caption,
}: LevelsTableProps) {
  const rows = [...(result.tables.levels ?? [])].sort(
    (a, b) => (numberOf(b.altitude) ?? 0) - (numberOf(a.altitude) ?? 0),
  );
  if (rows.length === 0) return null;
  const gasColumns = gases.map((gas): LevelColumn => {
    const { name } = gasStyle(gas, gases);
    return { key: `${gas}.number_density`, head: [{ italic: "n" }, " ", ...name], unit: "m^-3" };
  });
  const columns = [...own, ...gasColumns].filter(({ key }) => rows.some((row) => key in row));
  const scales = new Map(columns.map((column) => [column.key, scaleOf(rows, column, unitSystem)]));
  return (
    <TableFrame
      number={number}
      caption={
        caption ?? (
          <>
            Levels of <i>{result.name}</i>
            {isAtRest && " with no gas leaving"}, from the highest down.
          </>
        )
      }
      text={() => fullText(rows)}
    >
      <table className="table" data-wide>
        <thead>
          <tr>
            <th scope="col">
              <span className="table-symbol">
                <i>z</i>
              </span>
              <small>km</small>
            </th>
            {columns.map(({ key, head }) => (
              <th key={key} scope="col">
                <span className="table-symbol">
                  <Rich text={head} />
                </span>
                <small>
                  <Rich text={formatUnit(scales.get(key)!.unit)} />
                </small>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((level) => {
            const altitude = numberOf(level.altitude) ?? 0;
            return (
              <tr key={String(level.altitude)}>
                <th scope="row">{formatKilometres(altitude)}</th>
                {columns.map(({ key, unit }) => {
                  const value = numberOf(level[key]);
                  if (value === null) return <td key={key}>–</td>;
                  const text = formatNumber(value * scales.get(key)!.factor);
                  const row = { column: "altitude", value: altitude };
                  return (
                    <td key={key} title={`${value} ${unit}`.replace(/ 1$/, "")}>
                      <ExplainNumber
                        place={{ cell: result.name, name: `levels.${key}`, row }}
                        spoken={plainText(text)}
                      >
                        <Rich text={text} />
                      </ExplainNumber>
                    </td>
                  );
                })}
              </tr>
            );
          })}
        </tbody>
      </table>
    </TableFrame>
  );
}
