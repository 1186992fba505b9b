import { Router, type Request } from "express";
import { cautionText } from "../../shared/notebook/cautionText";
import { writeNotebookFile } from "../../shared/notebook/notebookFile";
import {
  describeReferenceBody,
  libraryQuery,
  suppliedQuery,
  withdrawReferenceBody,
  type ReferenceResponse,
} from "../../shared/schemas/references";
import { describeReference, withdrawReference } from "../commands/changeReference";
import type { Db } from "../db/client";
import { findNotebook } from "../db/reads/findNotebook";
import {
  findPinned,
  listBuiltUpon,
  listEditions,
  listReferences,
  type ReferenceRow,
} from "../db/reads/findReference";
import { forbidden, notFound } from "../errors";
import { requireActor, sessionOf } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { notebookPolicy } from "../policies/notebookPolicy";
import { referencePolicy } from "../policies/referencePolicy";
import { notebookFacts } from "../presenters/presentNotebook";
import {
  pinOfRow,
  presentReference,
  presentReferenceSummary,
  presentSupplied,
} from "../presenters/presentReference";
import { supplyPins } from "../references/supplyReferences";

/** Most pins that are answered at once. */
const mostPins = 100;

/** `/references/…`: library, one edition, what others take from it, exports, withdrawal. Open to strangers where public. */
export function referenceRoutes({ db }: { db: Db }): Router {
  const router = Router();
  const actorOf = (req: Request): Actor | null => sessionOf(req)?.actor ?? null;

  const load = async (req: Request, actor: Actor | null): Promise<ReferenceRow> => {
    const [row] = await findPinned(db, [String(req.params.pin)], actor?.id ?? null);
    if (!row || !referencePolicy.read(actor, row)) throw notFound("reference");
    return row;
  };

  const namesOf = async (row: ReferenceRow, actor: Actor | null) => {
    const may = (one: ReferenceRow | Awaited<ReturnType<typeof listBuiltUpon>>[number]) => referencePolicy.read(actor, one);
    const below = (await findPinned(db, row.restsOn, actor?.id ?? null)).filter(may);
    const titles = new Map(below.map((one) => [pinOfRow(one), one.title]));
    const upon = (await listBuiltUpon(db, pinOfRow(row), actor?.id ?? null)).filter(may);
    return {
      restsOn: row.restsOn.map((pin) => ({ pin, title: titles.get(pin) ?? null })),
      builtUpon: upon.map((one) => ({ pin: pinOfRow(one), title: one.title })),
    };
  };

  const present = async (row: ReferenceRow, actor: Actor | null): Promise<ReferenceResponse> => {
    const editions = await listEditions(db, row, actor?.id ?? null);
    const notebook = actor && (await findNotebook(db, row.notebookId, actor.id));
    return presentReference(
      row,
      {
        editions: editions.filter((edition) => referencePolicy.read(actor, edition)),
        ...(await namesOf(row, actor)),
        canOpenNotebook: Boolean(notebook && notebookPolicy.read(actor, notebookFacts(notebook))),
      },
      actor,
    );
  };

  const changeOf = (row: ReferenceRow, actor: Actor) => ({
    reference: { ...row, pin: pinOfRow(row) },
    actorId: actor.id,
    at: new Date(),
  });

  router.get("/references", async (req, res) => {
    const actor = actorOf(req);
    const { q, state, group } = libraryQuery.parse(req.query);
    const sought = q.trim().toLowerCase();
    const all = (await listReferences(db, actor?.id ?? null, group))
      .filter((row) => referencePolicy.read(actor, row))
      .map(presentReferenceSummary);
    const matches = all.filter(
      (one) =>
        (state === "any" || one.state === state) &&
        [one.title, one.summary, one.pin, `${one.group.code} ${one.number}`, ...one.authors].some((text) =>
          text.toLowerCase().includes(sought),
        ),
    );
    res.json(matches);
  });

  router.get("/references/supplied", async (req, res) => {
    const { pins } = suppliedQuery.parse(req.query);
    res.json(await supplyPins(db, pins.split(",").slice(0, mostPins), actorOf(req)?.id ?? null));
  });

  router.get("/references/:pin", async (req, res) => {
    const actor = actorOf(req);
    res.json(await present(await load(req, actor), actor));
  });

  router.get("/references/:pin/notebook.md", async (req, res) => {
    const row = await load(req, actorOf(req));
    const lead = `<!-- ${pinOfRow(row)}, engine ${row.engine}, content ${row.contentHash}. ${cautionText} -->`;
    res
      .attachment(`${pinOfRow(row)}.md`)
      .type("text/markdown; charset=utf-8")
      .send(`${writeNotebookFile(row.document)}\n${lead}\n`);
  });

  router.get("/references/:pin/results.json", async (req, res) => {
    const row = await load(req, actorOf(req));
    const supplied = presentSupplied(row);
    res
      .attachment(`${pinOfRow(row)}.json`)
      .json({ caution: cautionText, licence: row.licence, contentHash: row.contentHash, ...supplied, result: row.result });
  });

  router.post("/references/:pin/withdraw", async (req, res) => {
    const actor = requireActor(req);
    const { reason } = withdrawReferenceBody.parse(req.body);
    const row = await load(req, actor);
    if (!referencePolicy.withdraw(actor, row)) throw forbidden("withdraw this reference");
    await withdrawReference(db, { ...changeOf(row, actor), reason });
    res.json(await present(await load(req, actor), actor));
  });

  router.patch("/references/:pin", async (req, res) => {
    const actor = requireActor(req);
    const body = describeReferenceBody.parse(req.body);
    const row = await load(req, actor);
    if (!referencePolicy.describe(actor, row)) throw forbidden("change what is said of this reference");
    await describeReference(db, { ...changeOf(row, actor), ...body });
    res.json(await present(await load(req, actor), actor));
  });

  return router;
}
