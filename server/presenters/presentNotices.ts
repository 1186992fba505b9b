import type { NoticesResponse } from "../../shared/schemas/notices";
import type { NoticeRow } from "../db/reads/listNotices";

/** How much of a comment a notice repeats, in characters. */
const excerptLength = 160;

/** Notices of what one may still see: the caller has asked the policy. */
export function presentNotices(rows: NoticeRow[]): NoticesResponse {
  return {
    notices: rows.map((row) => ({
      id: row.id,
      kind: row.kind,
      by: { id: row.byId, name: row.byName },
      at: row.createdAt.toISOString(),
      isRead: row.readAt !== null,
      notebook: { id: row.notebook.id, title: row.notebook.title },
      thread: { id: row.threadId, version: row.version, cellName: row.cellName || row.cellKind },
      excerpt: excerptOf(row.text),
    })),
    unread: rows.filter(({ readAt }) => readAt === null).length,
  };
}

function excerptOf(text: string): string {
  const characters = Array.from(text.replace(/\s+/g, " ").trim());
  if (characters.length <= excerptLength) return characters.join("");
  return `${characters.slice(0, excerptLength).join("").trimEnd()} …`;
}
