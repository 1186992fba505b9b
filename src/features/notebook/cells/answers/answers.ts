import type { ComponentType } from "react";
import type { CellKind } from "../../../../../shared/notebook/document";
import type { CellResult } from "../../../../../shared/notebook/result";
import type { AnswerProps } from "./answerProps";
import { ColumnAnswer } from "./ColumnAnswer";
import { CoronaAnswer } from "./CoronaAnswer";
import { EscapeAnswer } from "./EscapeAnswer";
import { LossAnswer } from "./LossAnswer";
import { NonthermalAnswer } from "./NonthermalAnswer";

/** What draws the answer of each kind; the others answer by a list of their values. */
export const answers: Partial<Record<CellKind, ComponentType<AnswerProps>>> = {
  column: ColumnAnswer,
  escape: EscapeAnswer,
  corona: CoronaAnswer,
  nonthermal: NonthermalAnswer,
  loss: LossAnswer,
};

/** How many figures and tables a cell has, which numbers those of the cells below it. */
export function countResults({ kind, tables }: Pick<CellResult, "kind" | "tables">): {
  figures: number;
  tables: number;
} {
  const countOf = (table: string) => ((tables[table]?.length ?? 0) > 0 ? 1 : 0);
  switch (kind) {
    case "column":
      return { figures: 2, tables: countOf("levels") };
    case "escape":
      return { figures: 0, tables: 1 };
    case "corona":
      return { figures: countOf("lines_of_sight"), tables: countOf("levels") };
    case "nonthermal":
      return { figures: 0, tables: countOf("channels") };
    case "loss":
      return { figures: countOf("history"), tables: 0 };
    default:
      return { figures: 0, tables: 0 };
  }
}
