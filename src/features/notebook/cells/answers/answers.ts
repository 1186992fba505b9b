import type { ComponentType } from "react";
import type { CellKind } from "../../../../../shared/notebook/document";
import type { CellResult } from "../../../../../shared/notebook/result";
import type { AnswerProps } from "./answerProps";
import { ColumnAnswer } from "./ColumnAnswer";
import { CoronaAnswer } from "./CoronaAnswer";
import { EscapeAnswer } from "./EscapeAnswer";
import { hasSpreadAnswer, hasSweptAnswer } from "./longAnswers";
import { SpreadAnswer } from "./SpreadAnswer";
import { SweepAnswer } from "./SweepAnswer";
import { LossAnswer } from "./LossAnswer";
import { NonthermalAnswer } from "./NonthermalAnswer";

/** What draws the answer of each kind; the others answer by a list of their values. */
export const answers: Partial<Record<CellKind, ComponentType<AnswerProps>>> = {
  column: ColumnAnswer,
  escape: EscapeAnswer,
  spread: SpreadAnswer,
  sweep: SweepAnswer,
  corona: CoronaAnswer,
  nonthermal: NonthermalAnswer,
  loss: LossAnswer,
};

/** How many figures and tables a cell has, which numbers those of the cells below it. */
export function countResults(result: Pick<CellResult, "kind" | "values" | "tables">): {
  figures: number;
  tables: number;
} {
  const { kind, tables } = result;
  const countOf = (table: string) => ((tables[table]?.length ?? 0) > 0 ? 1 : 0);
  switch (kind) {
    case "column":
      return { figures: 2, tables: countOf("levels") };
    case "escape":
      return { figures: 0, tables: 1 };
    case "sweep":
      return { figures: hasSweptAnswer(result) ? 1 : 0, tables: 0 };
    case "spread":
      return hasSpreadAnswer(result) ? { figures: 1, tables: 1 } : { figures: 0, tables: 0 };
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
