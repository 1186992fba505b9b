import { and, eq } from "drizzle-orm";
import { choosableMailKinds, type ChoosableMailKind, type MailKind } from "../../shared/schemas/mail";
import type { Db } from "../db/client";
import { letters } from "../db/tables/letters";
import { mailChoices } from "../db/tables/mailChoices";

/** A letter as composed. */
export interface Letter {
  kind: MailKind;
  toAddress: string;
  /** null where the address has no account. */
  toUserId: string | null;
  subject: string;
  plain: string;
  html: string;
}

/**
 * Puts a letter in the post, unless its reader has switched its kind off; answers whether it was put there. Call it in
 * the transaction of what causes it: the letter goes out if that holds, and not otherwise.
 */
export async function postLetter(tx: Db, letter: Letter, at: Date): Promise<boolean> {
  if (letter.toUserId !== null && isChoosable(letter.kind)) {
    const [choice] = await tx
      .select({ isWanted: mailChoices.isWanted })
      .from(mailChoices)
      .where(and(eq(mailChoices.userId, letter.toUserId), eq(mailChoices.kind, letter.kind)));
    if (choice?.isWanted === false) return false;
  }
  await tx.insert(letters).values({ ...letter, createdAt: at, dueAt: at });
  return true;
}

const isChoosable = (kind: MailKind): kind is ChoosableMailKind =>
  (choosableMailKinds as readonly MailKind[]).includes(kind);
