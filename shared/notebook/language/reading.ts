import type { Note } from "../result";

/** What was read, with remarks and cautions; or the faults that prevented it. No notes where they were given before. */
export type Reading<Value> = { ok: true; value: Value; notes: Note[] } | { ok: false; notes: Note[] };
