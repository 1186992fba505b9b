import type { Request } from "express";
import type { Db } from "../db/client";
import { findGroup, type GroupRow } from "../db/reads/findGroup";
import { notFound } from "../errors";
import type { Actor } from "../policies/actor";
import { groupPolicy } from "../policies/groupPolicy";
import { readId } from "./ids";

/** The group in the address, if the actor may see it. */
export async function loadGroup(db: Db, req: Request, actor: Actor): Promise<GroupRow> {
  const group = await findGroup(db, readId(req, "groupId", "group"), actor.id);
  if (!group || !groupPolicy.see(actor, group)) throw notFound("group");
  return group;
}
