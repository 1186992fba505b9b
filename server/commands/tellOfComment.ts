import type { NoticeKind } from "../../shared/schemas/notices";
import type { Db } from "../db/client";
import { notices } from "../db/tables/notices";
import { postLetter, type Letter } from "./postLetter";

/** Someone to be told of a comment, in the page and, if they want such letters, by one. */
export interface CommentNotice {
  userId: string;
  kind: NoticeKind;
  letter: Letter | null;
}

/** Tells people of a comment. Call it in the transaction that writes it. */
export async function tellOfComment(
  tx: Db,
  { commentId, told, at }: { commentId: string; told: readonly CommentNotice[]; at: Date },
): Promise<void> {
  for (const { userId, kind, letter } of told) {
    await tx.insert(notices).values({ userId, kind, commentId, createdAt: at });
    if (letter) await postLetter(tx, letter, at);
  }
}
