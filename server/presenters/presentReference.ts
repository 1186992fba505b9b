import { publishedValues } from "../../shared/notebook/publishedParts";
import { pinOf } from "../../shared/notebook/language/readPin";
import type { SuppliedReference } from "../../shared/notebook/references";
import type { ReferenceResponse, ReferenceState, ReferenceSummary } from "../../shared/schemas/references";
import type { ReferenceHeadRow, ReferenceRow } from "../db/reads/findReference";
import type { Actor } from "../policies/actor";
import { referencePolicy } from "../policies/referencePolicy";
import { presentCitations } from "./presentCitations";

type Place = Pick<ReferenceHeadRow, "groupCode" | "number" | "edition">;

export const pinOfRow = ({ groupCode, number, edition }: Place): string =>
  pinOf({ code: groupCode, number, edition });

export function referenceState({
  withdrawnAt,
  newest,
  edition,
}: Pick<ReferenceHeadRow, "withdrawnAt" | "newest" | "edition">): ReferenceState {
  if (withdrawnAt !== null) return "withdrawn";
  return newest > edition ? "superseded" : "current";
}

export function presentReferenceSummary(row: ReferenceHeadRow): ReferenceSummary {
  return {
    pin: pinOfRow(row),
    group: { id: row.groupId, name: row.groupName, code: row.groupCode },
    number: row.number,
    edition: row.edition,
    title: row.title,
    summary: row.summary,
    authors: row.authors,
    state: referenceState(row),
    publishedAt: row.publishedAt.toISOString(),
    isPublic: row.isPublic,
  };
}

export function presentReference(
  row: ReferenceRow,
  beside: {
    editions: ReferenceHeadRow[];
    /** Pins that it rests on, each with its title where the reader may see it. */
    restsOn: ReferenceResponse["restsOn"];
    builtUpon: ReferenceResponse["builtUpon"];
    canOpenNotebook: boolean;
  },
  actor: Actor | null,
): ReferenceResponse {
  const head = presentReferenceSummary(row);
  return {
    ...head,
    licence: row.licence,
    doi: row.doi,
    document: row.document,
    result: row.result,
    engine: row.engine,
    contentHash: row.contentHash,
    checks: row.checks,
    vettedBy: row.publishedByName,
    isVettedByOwner: row.isVettedByOwner,
    withdrawn:
      row.withdrawnAt === null
        ? null
        : { at: row.withdrawnAt.toISOString(), reason: row.withdrawnReason ?? "" },
    recomputed:
      row.recomputedAt === null || row.recomputedEngine === null || row.drift === null
        ? null
        : { at: row.recomputedAt.toISOString(), engine: row.recomputedEngine, drift: row.drift },
    editions: beside.editions.map((edition) => ({
      pin: pinOfRow(edition),
      edition: edition.edition,
      publishedAt: edition.publishedAt.toISOString(),
      state: referenceState(edition),
    })),
    restsOn: beside.restsOn,
    builtUpon: beside.builtUpon,
    citations: presentCitations({ ...row, pin: head.pin, group: head.group }),
    notebookId: beside.canOpenNotebook ? row.notebookId : null,
    abilities: {
      withdraw: row.withdrawnAt === null && referencePolicy.withdraw(actor, row),
      describe: referencePolicy.describe(actor, row),
    },
  };
}

export function presentSupplied(row: ReferenceRow): SuppliedReference {
  return {
    pin: pinOfRow(row),
    values: publishedValues(row.result.cells),
    bodies: row.bodies,
    newest: row.newest,
    withdrawn: row.withdrawnAt === null ? null : (row.withdrawnReason ?? ""),
  };
}
