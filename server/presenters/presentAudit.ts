import type { AuditLine } from "../../shared/schemas/audit";
import type { ActRow } from "../db/reads/listActs";

/** `visible` holds the ids of the notebooks that the reader of the trail may see; of others only the act is told. */
export function presentAct(row: ActRow, visible: ReadonlySet<string>): AuditLine {
  const isShown = row.subject !== "notebook" || visible.has(row.subjectId);
  return {
    id: row.id,
    at: row.at.toISOString(),
    by: row.actorId !== null && row.actorName !== null ? { id: row.actorId, name: row.actorName } : null,
    act: row.act,
    subject: isShown ? { kind: row.subject, id: row.subjectId, name: row.subjectName } : null,
    details: isShown ? row.details : {},
  };
}

const columns: [head: string, cell: (line: AuditLine) => string | number | undefined][] = [
  ["when", ({ at }) => at],
  ["who", ({ by }) => by?.name],
  ["act", ({ act }) => act],
  ["subject", ({ subject }) => subject?.kind],
  ["name", ({ subject }) => subject?.name],
  ["with", ({ details }) => details.with],
  ["role", ({ details }) => details.role],
  ["before", ({ details }) => details.before],
  ["notebooks", ({ details }) => details.notebooks],
];

/** The trail as comma-separated values (RFC 4180). */
export function presentAuditTable(lines: AuditLine[]): string {
  const rows = [columns.map(([head]) => head), ...lines.map((line) => columns.map(([, cell]) => cell(line)))];
  return rows.map((row) => `${row.map(quoted).join(",")}\r\n`).join("");
}

/** A text that a spreadsheet would take for a formula gets an apostrophe, so that it stays text. */
function quoted(value: string | number | undefined): string {
  if (value === undefined) return "";
  const text = String(value);
  const safe = /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}
