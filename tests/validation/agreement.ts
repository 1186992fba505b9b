/** One comparison of ours with a number from outside: what a test asserts and what the page of checks tells. */
import path from "node:path";

export const sections = [
  "constants",
  "handbook",
  "conversion",
  "body",
  "temperature",
  "column",
  "exobase",
  "escape",
  "coupling",
  "corona",
  "limits",
  "loss",
  "nonthermal",
  "spread",
  "numerics",
  "notebook",
  "magnitude",
] as const;
export type Section = (typeof sections)[number];

/** How the outside number reached the test. */
export type Mark =
  /** Read in the source. */
  | "published"
  /** Read in a later work that cites the source. */
  | "secondary"
  /** Published, and written down here from memory. */
  | "from memory"
  /** By another program, or by hand, from the inputs named and a formula of the source. */
  | "computed independently";

export interface OutsideNumber {
  /** The quantity and its circumstances; rows of one `what`, unit and source are told together, by the worst. */
  what: string;
  /** As it is written after the number; "1" for none. */
  unit: string;
  /** A key of the references, or of the sources of the checks. */
  source: string;
  mark: Mark;
  /** The room of the test file if left out. */
  section?: Section;
}

export interface SingleNumber extends OutsideNumber {
  published: number;
  /** |ours − published| ≤ relative |published| + absolute. */
  within: { relative?: number; absolute?: number };
}

export interface NumberRange extends OutsideNumber {
  within: { range: readonly [lowest: number, highest: number] };
}

/** An outside number beside ours without a demand: an order of magnitude. */
export interface ComparedNumber extends OutsideNumber {
  published: number | readonly [lowest: number, highest: number];
  /** Why they differ as they do. */
  why: string;
}

export type Agreement = (SingleNumber | NumberRange | ComparedNumber) & { ours: number };

declare module "vitest" {
  interface TaskMeta {
    agreements?: Agreement[];
  }
}

/** Distance in units of what is allowed: 1 and less agrees. */
export function strain({ ours, published, within }: SingleNumber & { ours: number }): number {
  const error = Math.abs(ours - published);
  if (error === 0) return 0;
  return error / ((within.relative ?? 0) * Math.abs(published) + (within.absolute ?? 0));
}

export const isRange = (row: Agreement): row is NumberRange & { ours: number } =>
  "within" in row && "range" in row.within;

export const isCompared = (row: Agreement): row is ComparedNumber & { ours: number } => "why" in row;

/** The room a test file stands in, as the page's section. */
export function sectionOf(file: string): Section {
  const rooms = path.dirname(file).split(path.sep);
  const section = sections.find((name) => name === rooms.at(-1));
  return section ?? "notebook";
}
