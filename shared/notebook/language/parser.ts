import type { Tree } from "@lezer/common";
import { parser } from "./cells.generated.js";

/** Reads a whole cell, for the editor: incremental, with highlighting tags. Made from cells.grammar. */
export const cellParser = parser;

/** Reads what stands right of one `=`; stops where that can't go on. */
const valueParser = parser.configure({ top: "Value", strict: true });

/** The tree of a value, or the place of the first token that can't stand where it does. */
export function parseValue(text: string): { tree: Tree } | { stoppedAt: number } {
  const parse = valueParser.startParse(text);
  try {
    for (;;) {
      const tree = parse.advance();
      if (tree) return { tree };
    }
  } catch (error) {
    if (error instanceof SyntaxError) return { stoppedAt: parse.parsedPos };
    throw error;
  }
}
