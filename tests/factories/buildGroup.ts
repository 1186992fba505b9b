import { addMember } from "../../server/commands/addMember";
import { createGroup } from "../../server/commands/createGroup";
import type { Db } from "../../server/db/client";
import type { Actor } from "../../server/policies/actor";
import type { GroupRole } from "../../shared/schemas/roles";
import { buildUser } from "./buildUser";

let built = 0;

/** Codes count up through AAA, AAB, …, AAZ, ABA. */
function nextCode(): string {
  const letters = [Math.floor(built / 676) % 26, Math.floor(built / 26) % 26, built % 26];
  built += 1;
  return String.fromCharCode(...letters.map((letter) => 65 + letter));
}

export interface BuiltGroup {
  id: string;
  code: string;
  lead: Actor;
}

/** A group with its lead, and with members by their roles. */
export async function buildGroup(
  db: Db,
  parts: { name?: string; code?: string; lead?: Actor; members?: [Actor, GroupRole][] } = {},
): Promise<BuiltGroup> {
  const at = new Date("2026-10-02T08:00:00Z");
  const { name = "A group", code = nextCode(), lead = await buildUser(db), members = [] } = parts;
  const { id } = await createGroup(db, { name, code, founderId: lead.id, at });
  for (const [{ id: userId }, role] of members) await addMember(db, { groupId: id, userId, role, at });
  return { id, code, lead };
}
