/** What is said of the points of a task that have no answer, or a doubtful one. */
import type { JoinedParts } from "../finishTask";
import { formatPlainNumber } from "../language/formatQuantity";
import type { CellResult, ResultRow } from "../result";
import { aboveMagnitude, belowMagnitude, type TaskAnswer } from "../tasks";

/** null where there is no answer, or where only a log10 twin carries it. */
export function shownValue(value: number): number | null {
  return Number.isNaN(value) || value === belowMagnitude || value === aboveMagnitude ? null : value;
}

/** The table `outcomes`, left out where all is well. */
export function outcomeRows({ outcomes, done }: JoinedParts): CellResult["tables"] {
  if (outcomes.length === 0) return {};
  return {
    outcomes: outcomes.map(({ level, cell, code, message, points }): ResultRow => {
      return {
        level,
        cell,
        code,
        count: points.length,
        share: points.length / done,
        first: points[0],
        message,
      };
    }),
  };
}

/** Faults as a caution of the cell, cautions as a remark: what the share of each is, and what it says. */
export function outcomeNotes({ outcomes, done }: JoinedParts, what: "points" | "draws"): TaskAnswer["notes"] {
  return outcomes.map(({ level, code, cell, message, points }) => {
    const share = shareInWords(points.length, done, what);
    return level === "fault"
      ? {
          level: "caution",
          code: "without_answer",
          message: `${share} have no answer (${code} of *${cell}*). The first: ${message}`,
        }
      : {
          level: "remark",
          code: "doubtful",
          message: `In ${share} a caution stands (${code} of *${cell}*). The first: ${message}`,
        };
  });
}

function shareInWords(count: number, done: number, what: "points" | "draws"): string {
  const percent = formatPlainNumber((100 * count) / done, 2);
  return count === done ? `all ${done} ${what}` : `${count} of ${done} ${what} (${percent} %)`;
}
