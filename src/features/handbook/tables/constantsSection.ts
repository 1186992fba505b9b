import { constantCell } from "../../../../shared/notebook/handbookCells";
import { unitFactors } from "../../../../shared/notebook/unitFactors";
import { codata2022, iau, type PhysicalConstant } from "../../../../shared/physics";
import type { RichText } from "../../../lib/richText";
import type { HandbookSection, TableRow } from "../handbookTable";

/** "N_A" and "(GM)_S" as set; units stand upright. */
function setSymbol(symbol: string): RichText {
  const [letters = "", index] = symbol.split("_");
  const isUnit = symbol === "yr" || symbol === "au";
  return [isUnit ? letters : { italic: letters }, ...(index ? [{ sub: index }] : [])];
}

function constantRow(constant: PhysicalConstant): TableRow {
  const { symbol, name, value, uncertainty, source, unit } = constant;
  const plainUnit = unitFactors(unit)
    .map((factor) => (factor.exponent === 1 ? factor.symbol : `${factor.symbol}^${factor.exponent}`))
    .join(" ");
  return {
    key: name,
    name,
    head: [name],
    words: symbol,
    values: {
      symbol: { value: symbol, rich: setSymbol(symbol) },
      value: { value, uncertainty, unit: plainUnit },
    },
    standing: { shape: "filled", word: uncertainty === 0 ? "exact" : "measured" },
    sources: [{ source }],
    forms: [{ label: "in a values cell", choices: [constantCell(constant)] }],
  };
}

export const constantsSection: HandbookSection = {
  id: "constants",
  title: "Constants",
  about: [
    "The recommended values of 2022, with their uncertainty in the last digits in brackets, and what the International Astronomical Union has fixed: nominal values are conversion factors, exact by definition. Cells know ",
    { code: "k_B" },
    ", ",
    { code: "G" },
    " and ",
    { code: "N_A" },
    " by name.",
  ],
  tables: [
    {
      id: "constants",
      caption: "Constants",
      rowHead: "Constant",
      columns: [
        { key: "symbol", head: ["Symbol"], unit: "", digits: 1 },
        { key: "value", head: ["Value"], unit: "", digits: 15 },
      ],
      rows: [...codata2022, ...iau].map(constantRow),
    },
  ],
};
