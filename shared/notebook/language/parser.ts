import { parser } from "./cells.generated.js";

/** Reads a whole cell, for the editor: incremental, with highlighting tags. Made from cells.grammar. */
export const cellParser = parser;

/** Reads what stands right of one `=`. */
export const valueParser = parser.configure({ top: "Value" });
