import { pairCells } from "../../../../shared/notebook/handbookCells";
import { collisionPairs, lumpedRows, type CollisionPair } from "../../../../shared/notebook/handbookPairs";
import { collisionRows, findGas, handbookGases, type CollisionRow } from "../../../../shared/physics";
import { formatGas } from "../../../lib/format";
import type { RichText } from "../../../lib/richText";
import type {
  HandbookSection,
  HandbookTable,
  Sourcing,
  Standing,
  TableColumn,
  TableRow,
} from "../handbookTable";

const columns: readonly TableColumn[] = [
  { key: "A", head: [{ italic: "A" }], unit: "m^-1 s^-1", digits: 5, leastDigits: 3 },
  { key: "s", head: [{ italic: "s" }], unit: "1", digits: 4 },
  { key: "b_200K", head: [{ italic: "b" }, " at 200 K"], unit: "m^-1 s^-1", digits: 3, leastDigits: 3 },
  { key: "b_1000K", head: [{ italic: "b" }, " at 1000 K"], unit: "m^-1 s^-1", digits: 3, leastDigits: 3 },
  { key: "valid", head: ["Holds for"], unit: "", digits: 1 },
];

const standings: Record<CollisionRow["basis"], Standing> = {
  measured: { shape: "filled", word: "measured" },
  fitted: { shape: "half", word: "fitted to a table" },
  estimated: { shape: "hollow", word: "estimated there" },
};
const ownEstimate: Standing = { shape: "hollow", word: "estimated" };
const estimate: Sourcing = { source: "BanksKockarts1973", note: "eq. 15.29, the estimate from the masses" };

function lawValues({ coefficient, exponent }: Pick<CollisionRow, "coefficient" | "exponent">, valid: string) {
  const at = (temperature: number) => ({ value: coefficient * temperature ** exponent });
  return {
    A: { value: coefficient },
    s: { value: exponent },
    b_200K: at(200),
    b_1000K: at(1000),
    valid: { value: valid === "" ? null : valid },
  };
}

function pairHead(first: string, second: string): RichText {
  const gas = (formula: string): RichText => (/^[A-Z]/.test(formula) ? formatGas(formula) : [formula]);
  return [...gas(first), " in ", ...gas(second)];
}

const namesOf = (formulas: readonly string[]): string =>
  formulas.map((formula) => `${formula} ${findGas(formula)?.name ?? ""}`).join(" ");

/** "200–673 K" where the source says for which temperatures its law was found. */
function validRange({ validTemperatures: range }: CollisionRow): string {
  return range ? `${range.from}–${range.to}\u00a0K` : "";
}

function publishedRow(row: CollisionRow, isAlternative: boolean): TableRow {
  const [first, second] = row.gases;
  const name = `${first} in ${second}`;
  return {
    key: `${collisionRows.indexOf(row)}`,
    name,
    head: pairHead(first, second),
    isAlternative,
    acts: false,
    words: namesOf(row.gases),
    values: lawValues(row, validRange(row)),
    standing: standings[row.basis],
    sources: [row.provenance],
  };
}

function pairRows(pair: CollisionPair): TableRow[] {
  const [first, second] = pair.gases;
  const acting: TableRow = {
    ...(pair.row
      ? publishedRow(pair.row, false)
      : { standing: ownEstimate, sources: [estimate], values: lawValues(pair.acting, "") }),
    key: `${first} ${second}`,
    acts: true,
    name: `${first} in ${second}`,
    head: pairHead(first, second),
    words: namesOf(pair.gases),
    forms: [{ label: "in a gas cell", choices: pairCells(pair) }],
  };
  return [acting, ...pair.others.map((row) => publishedRow(row, true))];
}

const pairs = collisionPairs(handbookGases);
const withMeasurement = pairs.filter(({ row }) => row !== undefined);
export const pairCounts = { measured: withMeasurement.length, all: pairs.length };

/** Pairs of which a measurement acts; all others only where they are asked for. */
export function collisionsSection(hasAllPairs: boolean): HandbookSection {
  const measured: HandbookTable = {
    id: "collisions",
    caption: "Pairs with a measured law",
    rowHead: "Pair",
    columns,
    rows: withMeasurement.flatMap(pairRows),
  };
  const estimated: HandbookTable = {
    ...measured,
    id: "estimated-collisions",
    caption: "Pairs without one, estimated from the masses",
    rows: pairs.filter(({ row }) => row === undefined).flatMap(pairRows),
  };
  const lumped: HandbookTable = {
    ...measured,
    id: "lumped-collisions",
    caption: "Published for a gas in air or in several others together; acts for no pair",
    rows: lumpedRows(handbookGases).map((row) => publishedRow(row, false)),
  };
  return {
    id: "collisions",
    title: "Collision parameters",
    about: [
      { italic: "b" },
      " = ",
      { italic: "A" },
      " (",
      { italic: "T" },
      "/1 K)",
      { sup: "s" },
      `: the first measured law of each pair acts, and the others stand under it for comparison. A pair without one is estimated from the masses, and each result that rests on it says so. A measured law acts for ${pairCounts.measured} of ${pairCounts.all} pairs.`,
    ],
    tables: hasAllPairs ? [measured, estimated, lumped] : [measured],
  };
}
