/** The parser that `npm run grammar` makes from cells.grammar. */
declare module "*/cells.generated.js" {
  import type { LRParser } from "@lezer/lr";
  export const parser: LRParser;
}

declare module "*/cells.generated.terms.js" {
  export const Charge: number;
  export const Close: number;
  export const Comma: number;
  export const Join: number;
  export const Open: number;
  export const Over: number;
  export const Per: number;
  export const Remark: number;
  export const continuation: number;
  export const newline: number;
  export const space: number;
}
