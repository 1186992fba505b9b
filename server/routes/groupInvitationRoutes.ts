import { Router, type Request } from "express";
import { inviteToGroupBody, setInvitedGroupRoleBody } from "../../shared/schemas/invitations";
import type { GroupRole } from "../../shared/schemas/roles";
import { revokeInvitation, sendInvitationAgain, setInvitedRole } from "../commands/changeInvitation";
import { sendInvitation } from "../commands/sendInvitation";
import type { Db } from "../db/client";
import type { GroupRow } from "../db/reads/findGroup";
import { findOpenInvitation, listOpenInvitations } from "../db/reads/findInvitation";
import { findUserByEmail } from "../db/reads/findUser";
import { forbidden, notFound } from "../errors";
import type { Post } from "../jobs/post";
import { newInvitationToken } from "../mail/invitationToken";
import { groupInvitation } from "../mail/templates/groupInvitation";
import { requireActor } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { groupPolicy } from "../policies/groupPolicy";
import { presentGroupInvitation } from "../presenters/presentInvitation";
import { readId } from "./ids";
import { loadGroup } from "./loadGroup";

interface Parts {
  db: Db;
  post: Post;
  /** Where links in letters lead. */
  linkOrigin: () => string;
}

/** `/groups/…/invitations/…`: list, invite, send again, change the role, take back. */
export function groupInvitationRoutes({ db, post, linkOrigin }: Parts): Router {
  const router = Router();

  const compose = async (
    group: GroupRow,
    actor: Actor,
    { email, role }: { email: string; role: GroupRole },
  ) => {
    const { token, tokenHash } = newInvitationToken();
    const account = await findUserByEmail(db, email);
    const letter = groupInvitation(
      { address: email, userId: account?.id ?? null },
      { group: group.name, role, invitedBy: actor.name, href: `${linkOrigin()}/invitation#${token}` },
    );
    return { tokenHash, letter };
  };

  const loadInvitation = async (req: Request, group: GroupRow) => {
    const id = readId(req, "invitationId", "invitation");
    const invitation = await findOpenInvitation(db, id, { groupId: group.id });
    if (!invitation) throw notFound("invitation");
    return invitation;
  };

  const presentList = async ({ id }: GroupRow) => {
    const rows = await listOpenInvitations(db, { groupId: id });
    const now = new Date();
    return rows.map((row) => presentGroupInvitation(row, now));
  };

  router.get("/groups/:groupId/invitations", async (req, res) => {
    const actor = requireActor(req);
    const group = await loadGroup(db, req, actor);
    if (!groupPolicy.invite(actor, group)) throw forbidden("see this group's invitations");
    res.json(await presentList(group));
  });

  router.post("/groups/:groupId/invitations", async (req, res) => {
    const actor = requireActor(req);
    const { email, role } = inviteToGroupBody.parse(req.body);
    const group = await loadGroup(db, req, actor);
    if (!groupPolicy.invite(actor, group)) throw forbidden("invite people to this group");

    const to = { groupId: group.id, role };
    const composed = await compose(group, actor, { email, role });
    await sendInvitation(db, { to, email, ...composed, actorId: actor.id, at: new Date() });
    post.request();
    res.status(201).json(await presentList(group));
  });

  router.post("/groups/:groupId/invitations/:invitationId/send-again", async (req, res) => {
    const actor = requireActor(req);
    const group = await loadGroup(db, req, actor);
    if (!groupPolicy.invite(actor, group)) throw forbidden("invite people to this group");
    const invitation = await loadInvitation(req, group);

    const { email, role } = invitation;
    const composed = await compose(group, actor, { email, role: role as GroupRole });
    await sendInvitationAgain(db, { invitation, ...composed, actorId: actor.id, at: new Date() });
    post.request();
    res.json(await presentList(group));
  });

  router.patch("/groups/:groupId/invitations/:invitationId", async (req, res) => {
    const actor = requireActor(req);
    const { role } = setInvitedGroupRoleBody.parse(req.body);
    const group = await loadGroup(db, req, actor);
    if (!groupPolicy.invite(actor, group)) throw forbidden("invite people to this group");
    const invitation = await loadInvitation(req, group);

    await setInvitedRole(db, { invitation, role, actorId: actor.id, at: new Date() });
    res.json(await presentList(group));
  });

  router.delete("/groups/:groupId/invitations/:invitationId", async (req, res) => {
    const actor = requireActor(req);
    const group = await loadGroup(db, req, actor);
    if (!groupPolicy.revokeInvitation(actor, group)) throw forbidden("take back this group's invitations");
    const invitation = await loadInvitation(req, group);

    await revokeInvitation(db, { invitation, actorId: actor.id, at: new Date() });
    res.status(204).end();
  });

  return router;
}
