import type { VettingCheck, VettingResponse, VettingSummary } from "../../shared/schemas/vettings";
import type { VersionRow } from "../db/reads/findVersion";
import type { VettingRow } from "../db/reads/findVetting";
import { presentVersion } from "./presentVersion";

export function presentVettingSummary(row: VettingRow): VettingSummary {
  const { vetting } = row;
  return {
    id: vetting.id,
    notebookId: vetting.notebookId,
    versionNumber: vetting.versionNumber,
    title: row.title.title,
    owner: { id: row.ownerId, name: row.ownerName },
    group: { id: vetting.groupId, name: row.groupName, code: row.groupCode },
    message: vetting.message,
    requestedBy: { id: vetting.requestedBy, name: row.requesterName },
    requestedAt: vetting.requestedAt.toISOString(),
    state: vetting.state,
    wouldBecome:
      vetting.editionOf === null
        ? `a new reference of ${row.groupCode}`
        : `the next edition of ${row.groupCode} ${vetting.editionOf}`,
    remarks: vetting.remarks,
    decidedBy:
      vetting.decidedBy !== null && row.deciderName !== null
        ? { id: vetting.decidedBy, name: row.deciderName }
        : null,
    decidedAt: vetting.decidedAt?.toISOString() ?? null,
  };
}

export function presentVetting(
  row: VettingRow,
  beside: {
    checks: VettingCheck[];
    version: VersionRow;
    lastEdition: string | null;
    abilities: VettingResponse["abilities"];
  },
): VettingResponse {
  const { summary, authors, licence } = row.vetting;
  const { checks, version, lastEdition, abilities } = beside;
  return {
    ...presentVettingSummary(row),
    summary,
    authors,
    licence,
    checks,
    version: presentVersion(version),
    lastEdition,
    abilities,
  };
}
