/** A letter's way through the post. Each step is one statement: it holds, or it did not happen. */
import { and, asc, eq, inArray, lte, sql } from "drizzle-orm";
import type { Db } from "../db/client";
import { letters } from "../db/tables/letters";

/** Pauses before the second and later tries, in ms. After the last one a letter has failed. Common practice. */
const pauses = [1, 5, 30, 120, 720].map((minutes) => minutes * 60_000);

const emptied = { plain: "", html: "" };

/**
 * Takes the next letter that is due and marks it as being sent, before it is. Two servers on one database never take
 * the same one.
 */
export async function claimLetter(db: Db, at: Date) {
  const due = db
    .select({ id: letters.id })
    .from(letters)
    .where(and(eq(letters.state, "waiting"), lte(letters.dueAt, at)))
    .orderBy(asc(letters.dueAt), asc(letters.createdAt), asc(letters.id))
    .limit(1)
    .for("update", { skipLocked: true });
  const [letter] = await db
    .update(letters)
    .set({ state: "sending", dueAt: at, tries: sql`${letters.tries} + 1` })
    .where(inArray(letters.id, due))
    .returning();
  return letter;
}

export type ClaimedLetter = NonNullable<Awaited<ReturnType<typeof claimLetter>>>;

/** The mail server has it. What it said is forgotten here. */
export async function markSent(db: Db, { id }: ClaimedLetter, at: Date): Promise<void> {
  await db
    .update(letters)
    .set({ state: "sent", sentAt: at, failure: null, ...emptied })
    .where(eq(letters.id, id));
}

/** The mail server took nothing, for now: the letter waits for its next try, or has failed after the last. */
export async function putBack(
  db: Db,
  { id, tries }: ClaimedLetter,
  { failure, at }: { failure: string; at: Date },
): Promise<void> {
  const pause = pauses[tries - 1];
  await db
    .update(letters)
    .set(
      pause === undefined
        ? { state: "failed", failure }
        : { state: "waiting", failure, dueAt: new Date(at.getTime() + pause) },
    )
    .where(eq(letters.id, id));
}

/** It can never be sent, or nobody knows whether it was: it is not tried again. */
export async function giveUp(db: Db, { id }: ClaimedLetter, failure: string): Promise<void> {
  await db.update(letters).set({ state: "failed", failure }).where(eq(letters.id, id));
}

/** How long sending one letter may take, in ms, before nobody is sending it any more. */
const longestSending = 10 * 60_000;

/**
 * Closes the letters that a server left half sent when it stopped: they may have gone out, so they are not sent again.
 * Answers how many.
 */
export async function closeHalfSent(db: Db, at: Date): Promise<number> {
  const failure = "The server stopped while it was being sent; it may have arrived.";
  const closed = await db
    .update(letters)
    .set({ state: "failed", failure })
    .where(and(eq(letters.state, "sending"), lte(letters.dueAt, new Date(at.getTime() - longestSending))))
    .returning({ id: letters.id });
  return closed.length;
}
