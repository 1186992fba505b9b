import type { ComponentType } from "react";
import type { CellKind } from "../../../../../shared/notebook/document";
import type { CellResult } from "../../../../../shared/notebook/result";
import type { AnswerProps } from "./answerProps";
import { ColumnAnswer } from "./ColumnAnswer";
import { EscapeAnswer } from "./EscapeAnswer";
import { hasSpreadAnswer, hasSweptAnswer } from "./longAnswers";
import { SpreadAnswer } from "./SpreadAnswer";
import { SweepAnswer } from "./SweepAnswer";

/** What draws the answer of each kind; the others answer by a list of their values. */
export const answers: Partial<Record<CellKind, ComponentType<AnswerProps>>> = {
  column: ColumnAnswer,
  escape: EscapeAnswer,
  spread: SpreadAnswer,
  sweep: SweepAnswer,
};

/** How many figures and tables a cell has, which numbers those of the cells below it. */
export function countResults(result: Pick<CellResult, "kind" | "values" | "tables">): {
  figures: number;
  tables: number;
} {
  const { kind, tables } = result;
  const hasLevels = (tables.levels?.length ?? 0) > 0;
  switch (kind) {
    case "column":
      return { figures: 2, tables: hasLevels ? 1 : 0 };
    case "escape":
      return { figures: 0, tables: 1 };
    case "sweep":
      return { figures: hasSweptAnswer(result) ? 1 : 0, tables: 0 };
    case "spread":
      return hasSpreadAnswer(result) ? { figures: 1, tables: 1 } : { figures: 0, tables: 0 };
    default:
      return { figures: 0, tables: 0 };
  }
}
