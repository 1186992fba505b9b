import { Router, type Request } from "express";
import {
  acceptAnswersBody,
  approveVettingBody,
  requestVettingBody,
  returnVettingBody,
} from "../../shared/schemas/vettings";
import { acceptAnswers, approveVetting, returnVetting, takeBackVetting } from "../commands/decideVetting";
import { ownShelf, requestVetting } from "../commands/requestVetting";
import type { Db } from "../db/client";
import { countOpenThreads } from "../db/reads/countOpenThreads";
import { findMembership } from "../db/reads/findGroup";
import { findNotebook } from "../db/reads/findNotebook";
import { listEditions } from "../db/reads/findReference";
import { findVersion } from "../db/reads/findVersion";
import {
  findVetting,
  findVettingFacts,
  listLeads,
  listNotebookVettings,
  listQueue,
  type VettingRow,
} from "../db/reads/findVetting";
import { conflict, evaluationFailed, forbidden, notFound } from "../errors";
import type { Evaluator } from "../jobs/evaluator";
import type { Post } from "../jobs/post";
import { vettingApproved, vettingRequested, vettingReturned } from "../mail/templates/vettingLetters";
import { requireActor } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { notebookPolicy } from "../policies/notebookPolicy";
import { notebookFacts } from "../presenters/presentNotebook";
import { pinOfRow } from "../presenters/presentReference";
import { presentVetting, presentVettingSummary } from "../presenters/presentVetting";
import { supplyReferences } from "../references/supplyReferences";
import { examine } from "../vetting/examine";
import { compareToTheBit } from "../vetting/recompute";
import { authorise } from "./authorise";
import { readId, readOrdinal } from "./ids";
import { loadNotebook } from "./loadNotebook";

interface Parts {
  db: Db;
  evaluator: Evaluator;
  post: Post;
  linkOrigin: () => string;
}

/** `/vettings/…`: ask for a version to be vetted, the lead's queue, the checks, accept answers, return, approve. */
export function vettingRoutes({ db, evaluator, post, linkOrigin }: Parts): Router {
  const router = Router();

  /** A request that the actor may see, with the facts that decide and the version it speaks of. */
  const load = async (req: Request, actor: Actor) => {
    const row = await findVetting(db, readId(req, "vettingId", "request"));
    const notebook = row && (await findNotebook(db, row.vetting.notebookId, actor.id));
    if (!row || !notebook) throw notFound("request");
    const { notebookId, groupId, versionNumber } = row.vetting;
    const vettingFacts = await findVettingFacts(db, notebookId, groupId);
    const isOpen = row.vetting.state === "requested" && notebook.groupId === groupId;
    const facts = { ...notebookFacts(notebook), vetting: isOpen ? vettingFacts : null };
    if (!notebookPolicy.readVersionInVetting(actor, facts)) throw notFound("request");
    const version = (await findVersion(db, notebookId, versionNumber))!;
    return { row, facts, vettingFacts, version };
  };
  type Loaded = Awaited<ReturnType<typeof load>>;

  const checksOf = async ({ row, vettingFacts, version }: Loaded, actor: Actor, recomputed = row.vetting.recomputed) =>
    examine({
      version,
      recomputed,
      accepted: row.vetting.accepted,
      openThreads: await countOpenThreads(db, row.vetting.notebookId),
      ...vettingFacts,
      ownerId: row.ownerId,
      ownerName: row.ownerName,
      leadId: actor.id,
    });

  const lastEditionOf = async ({ vetting }: VettingRow, actor: Actor): Promise<string | null> => {
    if (vetting.editionOf === null) return null;
    const editions = await listEditions(db, { groupId: vetting.groupId, number: vetting.editionOf }, actor.id);
    const [last] = editions.filter(({ actorGroupRole, isPublic }) => actorGroupRole !== null || isPublic);
    return last ? pinOfRow(last) : null;
  };

  const present = async (loaded: Loaded, actor: Actor) => {
    const { row, facts, version } = loaded;
    return presentVetting(row, {
      checks: row.vetting.checks ?? (await checksOf(loaded, actor)),
      version,
      lastEdition: await lastEditionOf(row, actor),
      abilities: {
        vet: notebookPolicy.vet(actor, facts),
        takeBack: row.vetting.state === "requested" && notebookPolicy.requestVetting(actor, facts),
      },
    });
  };

  /** @throws AppError if the actor is not a lead who may vet this */
  const loadToDecide = async (req: Request, actor: Actor) => {
    await tellIfDecided(req, actor);
    const loaded = await load(req, actor);
    const { facts, vettingFacts } = loaded;
    if (!notebookPolicy.vet(actor, facts)) {
      const isOwn = facts.actorGroupRole === "lead" && vettingFacts.isOwnersAlone;
      throw forbidden(isOwn ? "vet what is your own work alone" : "vet versions of this notebook");
    }
    return loaded;
  };

  /** A lead of the group is told who was first; to others a request that is over is as before. */
  const tellIfDecided = async (req: Request, actor: Actor): Promise<void> => {
    const row = await findVetting(db, readId(req, "vettingId", "request"));
    if (!row || row.vetting.state === "requested") return;
    const { vetting, deciderName } = row;
    if ((await findMembership(db, vetting.groupId, actor.id)) !== "lead") return;
    const did = { approved: "approved it", returned: "returned it", taken_back: "took it back", requested: "" };
    throw conflict("vetting_over", `${deciderName ?? "Someone"} ${did[vetting.state]} already.`);
  };

  const decisionOf = ({ row }: Loaded, actor: Actor) => ({
    vettingId: row.vetting.id,
    groupId: row.vetting.groupId,
    actorId: actor.id,
    at: new Date(),
  });

  const recompute = async (loaded: Pick<Loaded, "version">, actorId: string) => {
    const { document, result } = loaded.version;
    const references = await supplyReferences(db, document, actorId);
    const answer = await evaluator.evaluate(document, { isKept: true, references });
    return { answer, recomputed: compareToTheBit(result, answer) };
  };

  router.get("/vettings", async (req, res) => {
    const actor = requireActor(req);
    res.json((await listQueue(db, actor.id)).map(presentVettingSummary));
  });

  router.get("/notebooks/:notebookId/vettings", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, readId(req, "notebookId", "notebook"), actor);
    res.json((await listNotebookVettings(db, notebook.id)).map(presentVettingSummary));
  });

  router.post("/notebooks/:notebookId/versions/:number/vetting", async (req, res) => {
    const actor = requireActor(req);
    const body = requestVettingBody.parse(req.body);
    const notebook = await loadNotebook(db, readId(req, "notebookId", "notebook"), actor);
    const version = await findVersion(db, notebook.id, readOrdinal(req, "number", "version"));
    if (!version) throw notFound("version");
    authorise(actor, notebook, "requestVetting", "ask for this notebook to be vetted");
    if (notebook.groupId === null) throw ownShelf();

    const { recomputed } = await recompute({ version }, actor.id);
    const { title } = version.document;
    const leads = (await listLeads(db, notebook.groupId)).filter(({ id }) => id !== actor.id);
    const letters = leads.map(({ id, email }) =>
      vettingRequested(
        { address: email, userId: id },
        {
          title,
          group: notebook.groupName!,
          message: body.message,
          requestedBy: actor.name,
          href: `${linkOrigin()}/vetting`,
        },
      ),
    );
    const { id } = await requestVetting(db, {
      ...body,
      notebookId: notebook.id,
      versionNumber: version.number,
      recomputed,
      letters,
      actorId: actor.id,
      at: new Date(),
    });
    post.request();
    res.status(201).json(presentVettingSummary((await findVetting(db, id))!));
  });

  router.get("/vettings/:vettingId", async (req, res) => {
    const actor = requireActor(req);
    res.json(await present(await load(req, actor), actor));
  });

  router.put("/vettings/:vettingId/accepted", async (req, res) => {
    const actor = requireActor(req);
    const { accepted } = acceptAnswersBody.parse(req.body);
    const loaded = await loadToDecide(req, actor);
    await acceptAnswers(db, { ...decisionOf(loaded, actor), accepted });
    res.json(await present(await load(req, actor), actor));
  });

  router.post("/vettings/:vettingId/return", async (req, res) => {
    const actor = requireActor(req);
    const { remarks } = returnVettingBody.parse(req.body);
    const loaded = await loadToDecide(req, actor);
    const { vetting, title, requesterEmail } = loaded.row;
    const href = `${linkOrigin()}/notebooks/${vetting.notebookId}`;
    const to = { address: requesterEmail, userId: vetting.requestedBy };
    const letters = [vettingReturned(to, { title: title.title, remarks, by: actor.name, href })];
    await returnVetting(db, { ...decisionOf(loaded, actor), remarks, letters });
    post.request();
    res.status(204).end();
  });

  router.post("/vettings/:vettingId/approve", async (req, res) => {
    const actor = requireActor(req);
    const { isPublic, doi } = approveVettingBody.parse(req.body);
    const loaded = await loadToDecide(req, actor);
    const { vetting, title, requesterEmail } = loaded.row;
    // By what the requester may see: the lead may see more, or less.
    const { answer, recomputed } = await recompute(loaded, vetting.requestedBy);
    if (!answer.ok) throw evaluationFailed(`It was not published. ${answer.reason}`);
    const checks = await checksOf(loaded, actor, recomputed);
    if (checks.some(({ verdict }) => verdict !== "holds"))
      throw conflict("checks_open", "Not every check holds. Accept the answers to cautions, or return it with remarks.");
    const to = { address: requesterEmail, userId: vetting.requestedBy };
    const { pin } = await approveVetting(db, {
      ...decisionOf(loaded, actor),
      checks,
      accepted: vetting.accepted,
      bodies: answer.outcome.bodies,
      isPublic,
      doi,
      letters: (published) => [
        vettingApproved(to, {
          title: title.title,
          pin: published,
          by: actor.name,
          href: `${linkOrigin()}/references/${published}`,
        }),
      ],
    });
    post.request();
    res.status(201).json({ pin });
  });

  router.post("/vettings/:vettingId/take-back", async (req, res) => {
    const actor = requireActor(req);
    const { row, facts } = await load(req, actor);
    if (!notebookPolicy.requestVetting(actor, facts)) throw forbidden("take this request back");
    await takeBackVetting(db, { vettingId: row.vetting.id, actorId: actor.id, at: new Date() });
    res.status(204).end();
  });

  return router;
}
