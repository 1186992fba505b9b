import type { CellResult, ResultRow } from "../../../shared/notebook/result";
import {
  displayScale,
  formatGas,
  formatIon,
  formatNumber,
  formatPercent,
  formatUnit,
  type UnitSystem,
} from "../../lib/format";
import { Rich } from "../../lib/Rich";
import { plainText, type RichText } from "../../lib/richText";
import { ExplainNumber } from "./ExplainNumber";
import { TableFrame } from "./TableFrame";
import { tableText } from "./tableText";

interface ChannelsTableProps {
  /** A nonthermal cell whose `channels` table is shown. */
  result: CellResult;
  ion: string;
  unitSystem: UnitSystem;
  number: number;
}

/** "O(3P) + CO(X1Σ+)" with the multiplicity and the sign of each state raised. */
export function productsRich(products: string): RichText {
  return products.split(" + ").flatMap((fragment, index): RichText => {
    const [, formula = fragment, state = ""] = /^([^(]+)\(([^)]*)\)$/.exec(fragment) ?? [];
    const [, level = "", multiplicity = "", term = "", sign = ""] =
      /^(\D*)(\d*)([^+-]*)([+-]?)$/.exec(state) ?? [];
    const pieces: RichText = [
      ...formatGas(formula),
      `(${level}`,
      { sup: multiplicity },
      term,
      { sup: sign },
      ")",
    ];
    const shown = pieces.filter(
      (piece) => typeof piece === "string" || !("sup" in piece) || piece.sup !== "",
    );
    return [...(index > 0 ? [" + "] : []), ...(state === "" ? formatGas(formula) : shown)];
  });
}

const numberOf = (value: ResultRow[string] | undefined): number | null =>
  typeof value === "number" ? value : null;

const formulaOf = (fragment: ResultRow): string => String(fragment.fragment).replace(/\(.*$/, "");

/** The fragments of a channel; two of one gas get the same and are told once. */
function fragmentsOf(result: CellResult, products: ResultRow[string] | undefined): ResultRow[] {
  const own = (result.tables.fragments ?? []).filter((row) => row.products === products);
  return own.filter((row, index) => own.findIndex((other) => formulaOf(other) === formulaOf(row)) === index);
}

const leaves = (fragment: ResultRow): boolean =>
  (numberOf(fragment.energy) ?? 0) > (numberOf(fragment.escape_energy) ?? Infinity);

/** Which of the two can leave. */
function escapingWords(row: ResultRow, fragments: readonly ResultRow[]): RichText {
  if (row.escapes === 2) return ["both"];
  if (row.escapes === 0) return ["none"];
  const fast = fragments.find(leaves);
  return fast ? [...formatGas(formulaOf(fast)), " only"] : ["one"];
}

function fullText({ tables }: CellResult): string {
  const rows = (tables.fragments ?? []).map((fragment) => {
    const channel = tables.channels?.find(({ products }) => products === fragment.products);
    const { energy = null, branching = null, escapes = null } = channel ?? {};
    return [
      fragment.products!,
      energy,
      branching,
      escapes,
      fragment.fragment!,
      fragment.energy!,
      fragment.escape_energy!,
    ];
  });
  const heads = [
    "products",
    "energy (J)",
    "branching",
    "escapes",
    "fragment",
    "its energy (J)",
    "escape energy (J)",
  ];
  return tableText([heads, ...rows]);
}

/** Ways in which an ion recombines, what each gives its fragments, and whether that is enough to leave. */
export function ChannelsTable({ result, ion, unitSystem, number }: ChannelsTableProps) {
  const rows = result.tables.channels ?? [];
  if (rows.length === 0) return null;
  const scale = displayScale("J", unitSystem, Math.max(...rows.map(({ energy }) => numberOf(energy) ?? 0)));
  const energyText = (value: number | null): RichText =>
    value === null ? ["–"] : formatNumber(value * scale.factor);
  const explained = (row: ResultRow, key: string, text: RichText) => (
    <ExplainNumber
      place={{
        cell: result.name,
        name: `channels.${key}`,
        row: { column: "products", value: row.products! },
      }}
      spoken={plainText(text)}
    >
      <Rich text={text} />
    </ExplainNumber>
  );
  const unit = <Rich text={formatUnit(scale.unit)} />;
  return (
    <TableFrame
      number={number}
      caption={
        <>
          Recombination of <Rich text={formatIon(ion)} /> in <i>{result.name}</i>: the energy each channel
          sets free, what a fragment gets of it, and what it needs to leave from the exobase.
        </>
      }
      text={() => fullText(result)}
    >
      <table className="table channels">
        <thead>
          <tr>
            <th scope="col">Products</th>
            <th scope="col">
              Energy<small>{unit}</small>
            </th>
            <th scope="col">
              Branching
              <small />
            </th>
            <th scope="col">
              Fragment gets<small>{unit}</small>
            </th>
            <th scope="col">
              needs<small>{unit}</small>
            </th>
            <th scope="col">
              Leave
              <small />
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => {
            const fragments = fragmentsOf(result, row.products);
            const branching = numberOf(row.branching);
            const escaping = escapingWords(row, fragments);
            return (
              <tr key={String(row.products)}>
                <th scope="row">
                  <Rich text={productsRich(String(row.products))} />
                </th>
                <td>{explained(row, "energy", energyText(numberOf(row.energy)))}</td>
                <td>{branching === null ? "–" : explained(row, "branching", formatPercent(branching))}</td>
                <td>
                  <Fragments of={fragments} energy={({ energy }) => energyText(numberOf(energy))} />
                </td>
                <td>
                  <Fragments of={fragments} energy={(each) => energyText(numberOf(each.escape_energy))} />
                </td>
                <td>{explained(row, "escapes", escaping)}</td>
              </tr>
            );
          })}
        </tbody>
      </table>
    </TableFrame>
  );
}

/** One line a gas; its formula where there are two. */
function Fragments({ of, energy }: { of: readonly ResultRow[]; energy: (fragment: ResultRow) => RichText }) {
  return of.map((fragment) => (
    <span key={String(fragment.fragment)} className="channels-fragment">
      {of.length > 1 && (
        <>
          <Rich text={formatGas(formulaOf(fragment))} />{" "}
        </>
      )}
      <Rich text={energy(fragment)} />
    </span>
  ));
}
