import { elementaryCharge, recombiningIons, type RecombiningIon } from "../../../../shared/physics";
import { formatGas } from "../../../lib/format";
import type { RichText } from "../../../lib/richText";
import type { HandbookSection, HandbookTable, TableRow } from "../handbookTable";

const ionHead = (formula: string): RichText => [...formatGas(formula.replace("+", "")), { sup: "+" }];

const rates: HandbookTable = {
  id: "recombination-rates",
  caption: "Rate coefficients",
  rowHead: "Ion",
  columns: [
    { key: "A", head: [{ italic: "A" }], unit: "m^3 s^-1", digits: 4, leastDigits: 3 },
    { key: "T0", head: [{ italic: "T" }, { sub: "0" }], unit: "K", digits: 5 },
    { key: "s", head: [{ italic: "s" }], unit: "1", digits: 3 },
    { key: "holds", head: ["Electrons"], unit: "", digits: 1 },
  ],
  rows: recombiningIons.flatMap(({ formula, rate }) =>
    rate.pieces.map((piece, index): TableRow => {
      const from = rate.pieces[index - 1]?.upTo;
      const to = Number.isFinite(piece.upTo) ? piece.upTo : undefined;
      return {
        key: `${formula} ${index}`,
        name: formula,
        head: ionHead(formula),
        words: formula.replace("+", ""),
        values: {
          A: { value: piece.coefficient },
          T0: { value: piece.referenceTemperature },
          s: { value: piece.exponent },
          holds: { value: to ? `up to ${to} K` : from ? `above ${from} K` : "any temperature" },
        },
        sources: [rate.provenance],
      };
    }),
  ),
};

function channelRows({ formula, channels, otherBranchings }: RecombiningIon): TableRow[] {
  return channels.map(({ products, states, energy, branching, provenance }, index) => {
    const way = products.map((product, place) => `${product}(${states[place]})`).join(" + ");
    const [other] = otherBranchings;
    return {
      key: `${formula} ${way}`,
      name: `${formula} to ${way}`,
      head: [
        ...ionHead(formula),
        " → ",
        ...products.flatMap((product, place): RichText => [
          ...(place === 0 ? [] : [" + "]),
          ...formatGas(product),
          "(",
          ...stateTerm(states[place]!),
          ")",
        ]),
      ],
      words: `${formula.replace("+", "")} ${products.join(" ")}`,
      values: {
        energy: { value: energy, sources: [provenance.energy] },
        branching: { value: branching, sources: provenance.branching ? [provenance.branching] : [] },
        other_branching: {
          value: other?.branchings[index] ?? null,
          sources: other ? [other.provenance] : [],
        },
      },
    };
  });
}

/** ³P from "3P": the multiplicity of a term is raised. */
function stateTerm(state: string): RichText {
  const parts = /^(\D*)(\d)(.+)$/.exec(state);
  if (!parts) return [state];
  const [, letter = "", multiplicity = "", rest = ""] = parts;
  const [term = "", sign = ""] = rest.split(/(?=[+-]$)/);
  return [letter, { sup: multiplicity }, term, ...(sign ? [{ sup: sign }] : [])].filter(
    (part) => part !== "",
  );
}

const channels: HandbookTable = {
  id: "recombination-channels",
  caption: "Channels, for ions in their lowest vibrational state and slow electrons",
  rowHead: "Channel",
  columns: [
    {
      key: "energy",
      head: ["Energy"],
      unit: "J",
      scale: { per: elementaryCharge.value, unit: "eV" },
      digits: 4,
      leastDigits: 2,
    },
    { key: "branching", head: ["Share"], unit: "1", digits: 3 },
    { key: "other_branching", head: ["Share, elsewhere"], unit: "1", digits: 3 },
  ],
  rows: recombiningIons.flatMap(channelRows),
};

export const recombinationSection: HandbookSection = {
  id: "recombination",
  title: "Recombination",
  about: [
    "Molecular ions whose recombination makes fast atoms. The rate coefficient is ",
    { italic: "A" },
    " (",
    { italic: "T" },
    { sub: "0" },
    "/",
    { italic: "T" },
    { sub: "e" },
    ")",
    { sup: "s" },
    "; the energy is shared by the two fragments of an ion in its lowest vibrational state. A ",
    { code: "nonthermal" },
    " cell takes all of it by the formula of the ion.",
  ],
  tables: [rates, channels],
};
