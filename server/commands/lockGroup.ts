import { eq } from "drizzle-orm";
import type { Db } from "../db/client";
import { findMembership } from "../db/reads/findGroup";
import { groups } from "../db/tables/groups";
import { conflict, notFound } from "../errors";

/**
 * The group, with its row locked until the transaction ends, for a change by one of its leads: two leads come one
 * after the other, and the second acts only if they are a lead still.
 *
 * @throws AppError if the actor was a lead and has ceased to be one
 */
export async function lockGroup(
  tx: Db,
  { groupId, actorId }: { groupId: string; actorId: string },
): Promise<{ name: string }> {
  const group = await lockGroupRow(tx, groupId);
  if ((await findMembership(tx, groupId, actorId)) === "lead") return group;
  throw conflict("not_lead_any_more", "You are not a lead of this group any more. Ask one who is.");
}

/** The group with its row locked, for a change that does not ask who is lead. */
export async function lockGroupRow(tx: Db, groupId: string): Promise<{ name: string }> {
  const [group] = await tx
    .select({ name: groups.name })
    .from(groups)
    .where(eq(groups.id, groupId))
    .for("update");
  if (!group) throw notFound("group");
  return group;
}
