import { Router, type Request } from "express";
import { addMemberBody, createGroupBody, setMemberRoleBody } from "../../shared/schemas/groups";
import { addMember } from "../commands/addMember";
import { createGroup } from "../commands/createGroup";
import { removeMember } from "../commands/removeMember";
import { setMemberRole } from "../commands/setMemberRole";
import type { Db } from "../db/client";
import {
  findGroup,
  findMembership,
  listGroupMembers,
  listGroups,
  type GroupRow,
} from "../db/reads/findGroup";
import { conflict, forbidden, notFound } from "../errors";
import { requireActor } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { groupPolicy } from "../policies/groupPolicy";
import { presentGroup, presentGroupSummary } from "../presenters/presentGroup";
import { readId } from "./ids";

/** `/groups/…`: list, found, see; add, set the role of and remove members; leave. */
export function groupRoutes({ db }: { db: Db }): Router {
  const router = Router();

  /** The group in the address, if the actor may see it. */
  const loadGroup = async (req: Request, actor: Actor): Promise<GroupRow> => {
    const group = await findGroup(db, readId(req, "groupId", "group"), actor.id);
    if (!group || !groupPolicy.see(actor, group)) throw notFound("group");
    return group;
  };

  const presentFresh = async (groupId: string, actor: Actor) => {
    const group = await findGroup(db, groupId, actor.id);
    return presentGroup(group!, await listGroupMembers(db, groupId), actor);
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
    const group = await loadGroup(req, actor);
    res.json(presentGroup(group, await listGroupMembers(db, group.id), actor));
  });

  router.post("/groups/:groupId/members", async (req, res) => {
    const actor = requireActor(req);
    const { email, role } = addMemberBody.parse(req.body);
    const group = await loadGroup(req, actor);
    if (!groupPolicy.addMember(actor, group)) throw forbidden("add people to this group");

    await addMember(db, { groupId: group.id, email, role, at: new Date() });
    res.status(201).json(await presentFresh(group.id, actor));
  });

  router.patch("/groups/:groupId/members/:userId", async (req, res) => {
    const actor = requireActor(req);
    const { role } = setMemberRoleBody.parse(req.body);
    const group = await loadGroup(req, actor);
    const userId = readId(req, "userId", "member");
    if (!groupPolicy.setRole(actor, group)) throw forbidden("set roles in this group");

    await setMemberRole(db, { groupId: group.id, userId, role });
    res.json(await presentFresh(group.id, actor));
  });

  router.delete("/groups/:groupId/members/:userId", async (req, res) => {
    const actor = requireActor(req);
    const group = await loadGroup(req, actor);
    const userId = readId(req, "userId", "member");
    if (userId === actor.id) {
      if (!groupPolicy.leave(actor, group))
        throw conflict("last_lead", "A group keeps at least one lead. Make someone else a lead first.");
    } else {
      if (!(await findMembership(db, group.id, userId))) throw notFound("member");
      if (!groupPolicy.removeMember(actor, group)) throw forbidden("remove people from this group");
    }

    await removeMember(db, { groupId: group.id, userId });
    res.status(204).end();
  });

  return router;
}
