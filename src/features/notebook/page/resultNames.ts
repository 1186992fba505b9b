import type { CellEvaluation } from "../../../../shared/notebook/result";

/** Names by which results can be asked for, in the order of the notebook: `leak.exobase.altitude`, `T_quiet`. */
export function resultNames(answers: ReadonlyMap<string, CellEvaluation> | undefined): string[] {
  return [...(answers?.values() ?? [])].flatMap(({ result }) => {
    const keys = Object.keys(result.values);
    if (result.kind === "values") return keys;
    return result.name === "" ? [] : keys.map((key) => `${result.name}.${key}`);
  });
}
