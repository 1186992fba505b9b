import { formatGas } from "../../lib/format";
import { Rich } from "../../lib/Rich";
import { LevelsTable } from "./LevelsTable";
import type { LevelColumn, LevelsTableProps } from "./tableProps";

const columns: readonly LevelColumn[] = [
  { key: "number_density", head: [{ italic: "n" }], unit: "m^-3" },
  { key: "ballistic", head: ["Ballistic"], unit: "m^-3" },
  { key: "satellite", head: ["Satellite"], unit: "m^-3" },
  { key: "escaping", head: ["Escaping"], unit: "m^-3" },
  { key: "limb_column", head: ["Along the limb"], unit: "m^-2" },
  { key: "overhead_column", head: ["Overhead"], unit: "m^-2" },
];

/** A corona at the altitudes asked for; a kind of orbit that nothing flies on is left out. */
export function CoronaLevels({
  result,
  gas,
  ...props
}: Omit<LevelsTableProps, "gases" | "caption" | "columns"> & { gas: string }) {
  const rows = result.tables.levels ?? [];
  const present = columns.filter(({ key }) => key !== "satellite" || rows.some((row) => row[key] !== 0));
  return (
    <LevelsTable
      {...props}
      result={result}
      gases={[]}
      columns={present}
      caption={
        <>
          <Rich text={formatGas(gas)} /> in <i>{result.name}</i>, from the highest down: its density in all
          and by kind of orbit, and its columns along the limb and overhead.
        </>
      }
    />
  );
}
