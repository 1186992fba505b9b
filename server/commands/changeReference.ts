import { and, eq, isNull } from "drizzle-orm";
import type { DescribeReferenceBody, Drift } from "../../shared/schemas/references";
import type { Db } from "../db/client";
import { publishedReferences } from "../db/tables/publishedReferences";
import { conflict } from "../errors";
import { lockGroup } from "./lockGroup";
import { recordAct } from "./recordAct";

interface Change {
  reference: { id: string; groupId: string; notebookId: string; title: string; pin: string };
  actorId: string;
  at: Date;
}

/** Withdraws an edition for good; its page stays, with the reason. */
export async function withdrawReference(db: Db, { reason, ...change }: Change & { reason: string }): Promise<void> {
  const { reference, actorId, at } = change;
  await db.transaction(async (tx) => {
    await lockGroup(tx, { groupId: reference.groupId, actorId });
    const withdrawn = await tx
      .update(publishedReferences)
      .set({ withdrawnAt: at, withdrawnReason: reason })
      .where(and(eq(publishedReferences.id, reference.id), isNull(publishedReferences.withdrawnAt)))
      .returning({ id: publishedReferences.id });
    if (withdrawn.length === 0) throw conflict("withdrawn", `${reference.pin} was withdrawn already.`);
    await tell(tx, change, "reference_withdrawn");
  });
}

/** Sets what may change of an edition: whether it is read without an account, and its DOI. */
export async function describeReference(
  db: Db,
  { isPublic, doi, ...change }: Change & DescribeReferenceBody,
): Promise<void> {
  const { reference, actorId } = change;
  if (isPublic === undefined && doi === undefined) return;
  await db.transaction(async (tx) => {
    await lockGroup(tx, { groupId: reference.groupId, actorId });
    await tx
      .update(publishedReferences)
      .set({ ...(isPublic === undefined ? {} : { isPublic }), ...(doi === undefined ? {} : { doi }) })
      .where(eq(publishedReferences.id, reference.id));
    await tell(tx, change, "reference_described");
  });
}

function tell(
  tx: Db,
  { reference, actorId, at }: Change,
  act: "reference_withdrawn" | "reference_described",
): Promise<void> {
  return recordAct(tx, {
    at,
    groupId: reference.groupId,
    actorId,
    act,
    subject: "notebook",
    subjectId: reference.notebookId,
    subjectName: reference.title,
    details: { with: reference.pin },
  });
}

/** Stores what recomputing an edition with a newer engine found. */
export async function storeDrift(
  db: Db,
  { id, engine, drift, at }: { id: string; engine: string; drift: Drift; at: Date },
): Promise<void> {
  await db
    .update(publishedReferences)
    .set({ recomputedAt: at, recomputedEngine: engine, drift })
    .where(eq(publishedReferences.id, id));
}
