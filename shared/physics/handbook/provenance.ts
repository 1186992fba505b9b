/** Where a number of the handbook comes from. */
export interface Provenance {
  /** A key of `references`. */
  source: string;
  /**
   * How it was taken: read there, read in a later work or file that quotes it, written from memory, or put in by
   * analogy where nothing is published.
   */
  mark: "read" | "secondary" | "from memory" | "by analogy";
  note?: string;
}
