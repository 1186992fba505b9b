import type { Notice } from "../../../shared/schemas/notices";
import { formatCount } from "../../lib/format";

/** What a notice tells, before the name of the notebook. */
export function noticeWords({ kind, by, thread }: Notice): string {
  const where = thread.version === null ? thread.cellName : `${thread.cellName}, version ${thread.version}`;
  return kind === "mention" ? `${by.name} mentions you on ${where}` : `${by.name} replies on ${where}`;
}

export const noticeAddress = ({ notebook, thread }: Notice): string =>
  `/notebooks/${notebook.id}${thread.version === null ? "" : `/versions/${thread.version}`}#thread-${thread.id}`;

/** "Notices", or "Notices, two new". */
export const countWords = (unread: number): string =>
  unread === 0 ? "Notices" : `Notices, ${formatCount(unread, "new", "new")}`;
