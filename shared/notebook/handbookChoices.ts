import { codata2022, findGas, handbookBodies, handbookGases, iau } from "../physics";
import { constantCell, gasCell, pairCells, referringBodyCell, type HandbookCell } from "./handbookCells";
import { collisionPairs } from "./handbookPairs";

/** A row of the handbook to choose, and the cells that it may become: the first that there is room for. */
export interface HandbookChoice {
  group: "bodies" | "gases" | "collision parameters" | "constants";
  name: string;
  /** What it is, beside its name. */
  words: string;
  choices: readonly HandbookCell[];
}

/** All rows that make a cell; of pairs those that were measured. */
export function handbookChoices(): HandbookChoice[] {
  const nameOf = (formula: string) => findGas(formula)?.name ?? formula;
  return [
    ...handbookBodies.map((body): HandbookChoice => ({
      group: "bodies",
      name: body.name,
      words: body.primary ? `${body.kind}, of ${body.primary.name}` : body.kind,
      choices: [referringBodyCell(body)],
    })),
    ...handbookGases.map((gas): HandbookChoice => ({
      group: "gases",
      name: gas.formula,
      words: gas.name,
      choices: [gasCell(gas)],
    })),
    ...collisionPairs(handbookGases)
      .filter(({ row }) => row !== undefined)
      .map((pair): HandbookChoice => ({
        group: "collision parameters",
        name: pair.gases.join(" in "),
        words: pair.gases.map(nameOf).join(" in "),
        choices: pairCells(pair),
      })),
    ...[...codata2022, ...iau].map((constant): HandbookChoice => ({
      group: "constants",
      name: constant.name,
      words: constant.symbol,
      choices: [constantCell(constant)],
    })),
  ];
}
