import { desc, eq } from "drizzle-orm";
import type { Db } from "../client";
import { keptMail } from "../tables/keptMail";
import { mailChoices } from "../tables/mailChoices";

/** What a person has said about kinds of mail; what they have not spoken of is left out. */
export async function listMailChoices(db: Db, userId: string) {
  return db
    .select({ kind: mailChoices.kind, isWanted: mailChoices.isWanted })
    .from(mailChoices)
    .where(eq(mailChoices.userId, userId));
}

export type MailChoiceRow = Awaited<ReturnType<typeof listMailChoices>>[number];

/** The last hundred, latest first. */
export async function listKeptMail(db: Db) {
  return db.select().from(keptMail).orderBy(desc(keptMail.takenAt), desc(keptMail.id)).limit(100);
}

export type KeptMailRow = Awaited<ReturnType<typeof listKeptMail>>[number];
