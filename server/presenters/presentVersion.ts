import type { VersionResponse, VersionSummary } from "../../shared/schemas/versions";
import type { VersionHeadRow, VersionRow } from "../db/reads/findVersion";

export function presentVersionSummary(row: VersionHeadRow): VersionSummary {
  return {
    number: row.number,
    message: row.message,
    keptAt: row.keptAt.toISOString(),
    keptBy: { id: row.keptById, name: row.keptByName },
    engine: row.engine,
    contentHash: row.contentHash,
  };
}

export function presentVersion(row: VersionRow): VersionResponse {
  return { ...presentVersionSummary(row), document: row.document, result: row.result };
}
