import { Router } from "express";
import {
  createGroupBody,
  type MemberNotebooks,
  renameGroupBody,
  setMemberRoleBody,
} from "../../shared/schemas/groups";
import { toPersonBody } from "../../shared/schemas/shares";
import { createGroup } from "../commands/createGroup";
import { handOverLead } from "../commands/handOverLead";
import { removeMember } from "../commands/removeMember";
import { renameGroup } from "../commands/renameGroup";
import { setMemberRole } from "../commands/setMemberRole";
import type { Db } from "../db/client";
import {
  findGroup,
  findMembership,
  listGroupMembers,
  listGroups,
  type GroupRow,
} from "../db/reads/findGroup";
import { countMembersNotebooks, findHeir } from "../db/reads/membersNotebooks";
import { conflict, forbidden, notFound } from "../errors";
import { requireActor } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { groupPolicy } from "../policies/groupPolicy";
import { presentGroup, presentGroupSummary } from "../presenters/presentGroup";
import { readId } from "./ids";
import { loadGroup } from "./loadGroup";

/** `/groups/…`: list, found, see, rename; set the role of and remove members; hand over; leave. */
export function groupRoutes({ db }: { db: Db }): Router {
  const router = Router();

  const presentFresh = async (groupId: string, actor: Actor) => {
    const group = await findGroup(db, groupId, actor.id);
    return presentGroup(group!, await listGroupMembers(db, groupId), actor);
  };

  /** The member, if the actor may take them out of the group: oneself, or another. */
  const authoriseLeaving = async (group: GroupRow, userId: string, actor: Actor): Promise<string> => {
    if (userId === actor.id) {
      if (!groupPolicy.leave(actor, group))
        throw conflict("last_lead", "A group keeps at least one lead. Make someone else a lead first.");
    } else {
      if (!(await findMembership(db, group.id, userId))) throw notFound("member");
      if (!groupPolicy.removeMember(actor, group)) throw forbidden("remove people from this group");
    }
    return userId;
  };

  router.get("/groups", async (req, res) => {
    const actor = requireActor(req);
    const groups = await listGroups(db, actor.id);
    res.json(groups.map((group) => presentGroupSummary(group, actor)));
  });

  router.post("/groups", async (req, res) => {
    const actor = requireActor(req);
    const { name, code } = createGroupBody.parse(req.body);
    const { id } = await createGroup(db, { name, code, founderId: actor.id, at: new Date() });
    res.status(201).json(await presentFresh(id, actor));
  });

  router.get("/groups/:groupId", async (req, res) => {
    const actor = requireActor(req);
    const group = await loadGroup(db, req, actor);
    res.json(presentGroup(group, await listGroupMembers(db, group.id), actor));
  });

  router.patch("/groups/:groupId", async (req, res) => {
    const actor = requireActor(req);
    const { name } = renameGroupBody.parse(req.body);
    const group = await loadGroup(db, req, actor);
    if (!groupPolicy.rename(actor, group)) throw forbidden("rename this group");

    await renameGroup(db, { groupId: group.id, name, actorId: actor.id, at: new Date() });
    res.json(await presentFresh(group.id, actor));
  });

  router.post("/groups/:groupId/hand-over", async (req, res) => {
    const actor = requireActor(req);
    const { userId } = toPersonBody.parse(req.body);
    const group = await loadGroup(db, req, actor);
    if (!groupPolicy.handOver(actor, group)) throw forbidden("hand this group over");

    await handOverLead(db, { groupId: group.id, userId, actorId: actor.id, at: new Date() });
    res.json(await presentFresh(group.id, actor));
  });

  router.patch("/groups/:groupId/members/:userId", async (req, res) => {
    const actor = requireActor(req);
    const { role } = setMemberRoleBody.parse(req.body);
    const group = await loadGroup(db, req, actor);
    const userId = readId(req, "userId", "member");
    if (!groupPolicy.setRole(actor, group)) throw forbidden("set roles in this group");

    await setMemberRole(db, { groupId: group.id, userId, role, actorId: actor.id, at: new Date() });
    res.json(await presentFresh(group.id, actor));
  });

  router.get("/groups/:groupId/members/:userId/notebooks", async (req, res) => {
    const actor = requireActor(req);
    const group = await loadGroup(db, req, actor);
    const userId = await authoriseLeaving(group, readId(req, "userId", "member"), actor);

    const notebooks = await countMembersNotebooks(db, group.id, userId);
    const goTo = await findHeir(db, { groupId: group.id, userId, actorId: actor.id });
    const told: MemberNotebooks = { notebooks, goTo };
    res.json(told);
  });

  router.delete("/groups/:groupId/members/:userId", async (req, res) => {
    const actor = requireActor(req);
    const group = await loadGroup(db, req, actor);
    const userId = await authoriseLeaving(group, readId(req, "userId", "member"), actor);

    await removeMember(db, { groupId: group.id, userId, actorId: actor.id, at: new Date() });
    res.status(204).end();
  });

  return router;
}
