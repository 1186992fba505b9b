import type { ChoosableMailKind } from "../../shared/schemas/mail";
import type { Db } from "../db/client";
import { mailChoices } from "../db/tables/mailChoices";

export async function setMailChoice(
  db: Db,
  choice: { userId: string; kind: ChoosableMailKind; isWanted: boolean },
): Promise<void> {
  const { isWanted } = choice;
  await db
    .insert(mailChoices)
    .values(choice)
    .onConflictDoUpdate({ target: [mailChoices.userId, mailChoices.kind], set: { isWanted } });
}
