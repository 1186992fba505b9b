import { shownValue } from "./evaluation/taskOutcomes";
import type { ResultRow } from "./result";
import type { TaskAnswer } from "./tasks";

/** Every draw of a spread: its number and the watched results; null where there is no answer, or only a log10 twin. */
export function drawRows({ done, watched }: TaskAnswer): ResultRow[] {
  return Array.from({ length: done }, (_, index) => ({
    draw: index,
    ...Object.fromEntries(watched.map(({ name, values }) => [name, shownValue(values[index])])),
  }));
}
