import type { Cell } from "../../../../shared/notebook/document";

/** A cell in words, for messages and labels: "Column dayside", "Prose". */
export function cellTitle({ kind, name }: Pick<Cell, "kind" | "name">): string {
  const word = kind[0]!.toUpperCase() + kind.slice(1);
  return name === "" ? word : `${word} ${name}`;
}
