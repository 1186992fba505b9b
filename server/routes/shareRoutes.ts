import { Router, type Request } from "express";
import { setInvitedShareRoleBody } from "../../shared/schemas/invitations";
import type { ShareRole } from "../../shared/schemas/roles";
import { setGroupShareBody, setShareRoleBody, shareBody, toPersonBody } from "../../shared/schemas/shares";
import { revokeInvitation, sendInvitationAgain, setInvitedRole } from "../commands/changeInvitation";
import { giveUpShare, setShareRole, takeBackShare } from "../commands/changeShare";
import { handOverNotebook } from "../commands/handOverNotebook";
import { sendInvitation } from "../commands/sendInvitation";
import { shareWithGroup } from "../commands/shareWithGroup";
import { shareWithPerson } from "../commands/shareWithPerson";
import type { Db } from "../db/client";
import { findOpenInvitation, listOpenInvitations } from "../db/reads/findInvitation";
import type { NotebookRow } from "../db/reads/findNotebook";
import { findUserByEmail } from "../db/reads/findUser";
import { countMembers, listShares } from "../db/reads/listShares";
import { conflict, notFound } from "../errors";
import type { Post } from "../jobs/post";
import { newInvitationToken } from "../mail/invitationToken";
import { notebookInvitation } from "../mail/templates/notebookInvitation";
import { notebookShared } from "../mail/templates/notebookShared";
import { requireActor } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { notebookPolicy } from "../policies/notebookPolicy";
import { notebookFacts, presentNotebook } from "../presenters/presentNotebook";
import { presentShares } from "../presenters/presentShares";
import { authorise } from "./authorise";
import { readId } from "./ids";
import { loadNotebook } from "./loadNotebook";

interface Parts {
  db: Db;
  post: Post;
  /** Where links in letters lead. */
  linkOrigin: () => string;
}

const shareIt = "share this notebook";

/** `/notebooks/…/shares/…`: who may see it; share with a person, an address, the group; take back; hand over. */
export function shareRoutes({ db, post, linkOrigin }: Parts): Router {
  const router = Router();

  const presentFresh = async (id: string, actor: Actor) => {
    const notebook = await loadNotebook(db, id, actor);
    const canShare = notebookPolicy.share(actor, notebookFacts(notebook));
    return presentShares(notebook, {
      shares: await listShares(db, notebook.id),
      invitations: canShare ? await listOpenInvitations(db, { notebookId: notebook.id }) : [],
      members: notebook.groupId === null ? null : await countMembers(db, notebook.groupId),
      now: new Date(),
    });
  };

  const composeInvitation = (notebook: NotebookRow, actor: Actor, email: string, role: ShareRole) => {
    const { token, tokenHash } = newInvitationToken();
    const href = `${linkOrigin()}/invitation#${token}`;
    const letter = notebookInvitation(email, { title: notebook.title, role, invitedBy: actor.name, href });
    return { tokenHash, letter };
  };

  const loadInvitation = async (req: Request, notebook: NotebookRow) => {
    const id = readId(req, "invitationId", "invitation");
    const invitation = await findOpenInvitation(db, id, { notebookId: notebook.id });
    if (!invitation) throw notFound("invitation");
    return invitation;
  };

  router.get("/notebooks/:notebookId/shares", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "seeShares", "see who else sees this notebook");
    res.json(await presentFresh(notebook.id, actor));
  });

  router.post("/notebooks/:notebookId/shares", async (req, res) => {
    const actor = requireActor(req);
    const { email, role } = shareBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "share", shareIt);
    if (email === actor.email) throw ownNotebook();

    const user = await findUserByEmail(db, email);
    const at = new Date();
    if (user) {
      const { title } = notebook;
      const href = `${linkOrigin()}/notebooks/${notebook.id}`;
      const to = { address: user.email, userId: user.id };
      const letter = notebookShared(to, { title, role, sharedBy: actor.name, href });
      await shareWithPerson(db, { notebookId: notebook.id, user, role, letter, actorId: actor.id, at });
    } else {
      const to = { notebookId: notebook.id, role };
      const composed = composeInvitation(notebook, actor, email, role);
      await sendInvitation(db, { to, email, ...composed, actorId: actor.id, at });
    }
    post.request();
    res.status(201).json(await presentFresh(notebook.id, actor));
  });

  router.patch("/notebooks/:notebookId/shares/:userId", async (req, res) => {
    const actor = requireActor(req);
    const { role } = setShareRoleBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const userId = readId(req, "userId", "share");
    authorise(actor, notebook, "share", shareIt);

    await setShareRole(db, { notebookId: notebook.id, userId, role, actorId: actor.id, at: new Date() });
    res.json(await presentFresh(notebook.id, actor));
  });

  router.delete("/notebooks/:notebookId/shares/:userId", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const userId = readId(req, "userId", "share");
    const change = { notebookId: notebook.id, actorId: actor.id, at: new Date() };
    if (userId === actor.id) {
      authorise(actor, notebook, "leave", "give this notebook up: it is not shared with you in person");
      await giveUpShare(db, change);
    } else {
      authorise(actor, notebook, "share", shareIt);
      await takeBackShare(db, { ...change, userId });
    }
    res.status(204).end();
  });

  router.put("/notebooks/:notebookId/group-share", async (req, res) => {
    const actor = requireActor(req);
    const { role } = setGroupShareBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "share", shareIt);

    await shareWithGroup(db, { notebookId: notebook.id, role, actorId: actor.id, at: new Date() });
    res.json(await presentFresh(notebook.id, actor));
  });

  router.post("/notebooks/:notebookId/invitations/:invitationId/send-again", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "share", shareIt);
    const invitation = await loadInvitation(req, notebook);

    const composed = composeInvitation(notebook, actor, invitation.email, invitation.role as ShareRole);
    await sendInvitationAgain(db, { invitation, ...composed, actorId: actor.id, at: new Date() });
    post.request();
    res.json(await presentFresh(notebook.id, actor));
  });

  router.patch("/notebooks/:notebookId/invitations/:invitationId", async (req, res) => {
    const actor = requireActor(req);
    const { role } = setInvitedShareRoleBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "share", shareIt);
    const invitation = await loadInvitation(req, notebook);

    await setInvitedRole(db, { invitation, role, actorId: actor.id, at: new Date() });
    res.json(await presentFresh(notebook.id, actor));
  });

  router.delete("/notebooks/:notebookId/invitations/:invitationId", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "share", shareIt);
    const invitation = await loadInvitation(req, notebook);

    await revokeInvitation(db, { invitation, actorId: actor.id, at: new Date() });
    res.status(204).end();
  });

  router.post("/notebooks/:notebookId/hand-over", async (req, res) => {
    const actor = requireActor(req);
    const { userId } = toPersonBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "handOver", "hand this notebook over");

    await handOverNotebook(db, { notebookId: notebook.id, userId, actorId: actor.id, at: new Date() });
    res.json(presentNotebook(await loadNotebook(db, notebook.id, actor), actor));
  });

  return router;
}

const notebookId = (req: Request): string => readId(req, "notebookId", "notebook");

const ownNotebook = () => {
  const message = "This notebook is yours already. Share it with someone else’s address.";
  return conflict("own_notebook", message, [{ path: "email", message, code: "own_notebook" }]);
};
