import type { Db } from "../db/client";
import { keptMail } from "../db/tables/keptMail";

/** Keeps what would have been sent, where there is no mail server. */
export async function keepMail(
  db: Db,
  mail: { id: string; toAddress: string; subject: string; plain: string; html: string; takenAt: Date },
): Promise<void> {
  await db.insert(keptMail).values(mail).onConflictDoNothing();
}
