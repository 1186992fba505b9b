import { eq } from "drizzle-orm";
import { pino } from "pino";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { emptyBin } from "../../../server/commands/emptyBin";
import { publishedReferences } from "../../../server/db/tables/publishedReferences";
import { evaluateDocument } from "../../../server/jobs/evaluateDocument";
import { recomputeReferences } from "../../../server/jobs/recomputeReferences";
import { notebooks } from "../../../server/db/tables/notebooks";
import { engineVersion } from "../../../shared/notebook/engine";
import { libraryResponse, referenceResponse, suppliedResponse } from "../../../shared/schemas/references";
import { versionResponse } from "../../../shared/schemas/versions";
import { buildCell, buildDocument } from "../../factories/buildDocument";
import { buildGroup } from "../../factories/buildGroup";
import { buildNotebook } from "../../factories/buildNotebook";
import { buildUser } from "../../factories/buildUser";
import { startTestServer, type TestServer } from "../testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

const planet = buildDocument({
  title: "Ilmara, a body",
  cells: [
    buildCell({ id: "warmth", text: "T_quiet = 240 K # assumed" }),
    buildCell({
      id: "ball",
      kind: "body",
      name: "ilmara",
      text: "mass = 3e24 kg # assumed\nradius = 5000 km # assumed",
    }),
  ],
});

async function setUp() {
  const [lead, tamsin, pello] = await Promise.all([buildUser(server.db), buildUser(server.db), buildUser(server.db)]);
  const group = await buildGroup(server.db, {
    lead: lead!,
    members: [
      [tamsin!, "researcher"],
      [pello!, "guest"],
    ],
  });
  const agents = {
    lead: await server.as(lead!),
    tamsin: await server.as(tamsin!),
    pello: await server.as(pello!),
    stranger: await server.as(await buildUser(server.db)),
  };
  /** Publishes a document of Tamsin's through the routes; answers pin and notebook. */
  const publish = async (parts: { document?: typeof planet; editionOf?: number; isPublic?: boolean } = {}) => {
    const { document = planet, editionOf = null, isPublic = false } = parts;
    const { id } = await buildNotebook(server.db, { owner: tamsin!, groupId: group.id, document });
    const kept = await agents.tamsin.post(`/api/notebooks/${id}/versions`).send({ message: "Kept", revision: 1 });
    expect(kept.status).toBe(201);
    const asked = await agents.tamsin.post(`/api/notebooks/${id}/versions/1/vetting`).send({
      message: "Please",
      summary: "A planet.",
      authors: ["Tamsin Orevale", "Ishani Brandvold"],
      licence: "CC BY 4.0",
      editionOf,
    });
    expect(asked.status, JSON.stringify(asked.body)).toBe(201);
    const done = await agents.lead.post(`/api/vettings/${asked.body.id}/approve`).send({ isPublic });
    return { id, pin: done.body.pin as string, response: done };
  };
  return { ...agents, group, tamsinActor: tamsin!, publish };
}

describe("a reference's page", () => {
  it("is read by the group, and by strangers only where the lead lets it", async () => {
    const { lead, pello, stranger, publish } = await setUp();
    const { pin } = await publish();
    const path = `/api/references/${pin}`;
    expect((await pello.get(path)).status).toBe(200);
    for (const agent of [stranger, server.signedOut]) {
      expect((await agent.get(path)).status).toBe(404);
      expect((await agent.get(`${path}/results.json`)).status).toBe(404);
      expect((await agent.get(`/api/references/supplied?pins=${pin}`)).body).toEqual([]);
    }
    expect((await server.signedOut.patch(path).send({ isPublic: true })).status).toBe(401);
    expect((await stranger.patch(path).send({ isPublic: true })).status).toBe(404);
    expect((await pello.patch(path).send({ isPublic: true })).status).toBe(403);
    expect((await lead.patch(path).send({ isPublic: true, doi: "10.5555/ilmara" })).status).toBe(200);
    const page = referenceResponse.parse((await server.signedOut.get(path)).body);
    expect(page).toMatchObject({ doi: "10.5555/ilmara", state: "current", notebookId: null });
  });

  it.each(["ABC9.9", "CAR9.1", "nothing", "CAR4", "%00"])("of %s is not found", async (pin) => {
    expect((await server.signedOut.get(`/api/references/${pin}`)).status).toBe(404);
  });

  it("cites it in four forms, authors in order", async () => {
    const { publish } = await setUp();
    const { pin } = await publish({ isPublic: true });
    const { citations, group, number } = (await server.signedOut.get(`/api/references/${pin}`)).body;
    expect(citations.bibtex).toContain("author = {Orevale, Tamsin and Brandvold, Ishani}");
    expect(citations.ris).toMatch(/AU {2}- Orevale, Tamsin\nAU {2}- Brandvold, Ishani/);
    expect(JSON.parse(citations.csl)[0]).toMatchObject({ title: planet.title, license: "CC BY 4.0" });
    expect(citations.text).toContain("Orevale, T.");
    expect(citations.text).toContain(`${group.code} ${number}`);
  });

  it("exports carry the caution", async () => {
    const { publish } = await setUp();
    const { pin } = await publish({ isPublic: true });
    for (const file of ["notebook.md", "results.json"]) {
      const { text } = await server.signedOut.get(`/api/references/${pin}/${file}`);
      expect(text).toContain("not for decisions on satellite drag");
    }
  });

  it("never changes, even for one who writes to the database", async () => {
    const { publish } = await setUp();
    const { id } = await publish();
    const rows = eq(publishedReferences.notebookId, id);
    const tamper = server.db.update(publishedReferences).set({ summary: "Tampered" }).where(rows);
    await expect(tamper).rejects.toMatchObject({ cause: { message: "a published reference never changes" } });
    const remove = server.db.delete(publishedReferences).where(rows);
    await expect(remove).rejects.toMatchObject({ cause: { message: "a published reference is never removed" } });
  });

  it("keeps what it was published from out of the bin's emptying", async () => {
    const { tamsin, publish } = await setUp();
    const { id, pin } = await publish({ isPublic: true });
    await tamsin.delete(`/api/notebooks/${id}`);
    await emptyBin(server.db, { at: new Date("2099-01-01T00:00:00Z") });
    expect(await server.db.select().from(notebooks).where(eq(notebooks.id, id))).toHaveLength(1);
    expect((await server.signedOut.get(`/api/references/${pin}`)).status).toBe(200);
  });
});

describe("editions", () => {
  it("a new one supersedes; a withdrawn one keeps its page, with the reason", async () => {
    const { lead, tamsin, publish, group } = await setUp();
    const first = await publish();
    const second = await publish({ editionOf: 1 });
    expect(second.pin).toBe(`${group.code}1.2`);
    expect((await tamsin.get(`/api/references/${first.pin}`)).body.state).toBe("superseded");

    const withdraw = `/api/references/${second.pin}/withdraw`;
    expect((await tamsin.post(withdraw).send({ reason: "Wrong mass." })).status).toBe(403);
    expect((await lead.post(withdraw).send({ reason: " " })).status).toBe(422);
    expect((await lead.post(withdraw).send({ reason: "Wrong mass." })).status).toBe(200);
    expect((await lead.post(withdraw).send({ reason: "Again." })).status).toBe(409);
    const page = (await tamsin.get(`/api/references/${second.pin}`)).body;
    expect(page).toMatchObject({ state: "withdrawn", withdrawn: { reason: "Wrong mass." } });
    expect((await tamsin.get(`/api/references/${first.pin}`)).body.state).toBe("current");
  });

  it("are listed in the library by words and state, each to whom may read it", async () => {
    const { tamsin, stranger, publish, group } = await setUp();
    await publish({ isPublic: true });
    await publish({ editionOf: 1 });
    const list = async (agent: typeof tamsin, query: string) =>
      libraryResponse
        .parse((await agent.get(`/api/references?group=${group.id}&${query}`)).body)
        .map(({ edition }) => edition);
    expect(await list(tamsin, "state=any")).toEqual([2, 1]);
    expect(await list(tamsin, "state=current&q=brandvold")).toEqual([2]);
    expect(await list(tamsin, "state=any&q=nothing-like-it")).toEqual([]);
    expect(await list(stranger, "state=any")).toEqual([1]);
    expect((await tamsin.get("/api/references?state=odd")).status).toBe(422);
  });
});

describe("ref(…) in a notebook", () => {
  const using = (pin: string) =>
    buildDocument({
      title: "Uses it",
      cells: [buildCell({ id: "taken", text: `T_taken = ref(${pin}, T_quiet)\nR = ref(${pin}, ilmara.radius)` })],
    });

  async function keptValues(agent: Awaited<ReturnType<TestServer["as"]>>, owner: { id: string }, pin: string) {
    const actor = { ...owner, name: "", email: "" };
    const { id } = await buildNotebook(server.db, { owner: actor, document: using(pin) });
    await agent.post(`/api/notebooks/${id}/versions`).send({ message: "Kept", revision: 1 });
    return versionResponse.parse((await agent.get(`/api/notebooks/${id}/versions/1`)).body).result.cells[0]!;
  }

  it("gives what was published, to whom may see it; to others it is a fault", async () => {
    const { tamsin, tamsinActor, publish } = await setUp();
    const { pin } = await publish();
    const own = await keptValues(tamsin, tamsinActor, pin);
    expect(own.values).toMatchObject({ T_taken: { value: 240, unit: "K" }, R: { value: 5e6, unit: "m" } });
    const other = await buildUser(server.db);
    const unseen = await keptValues(await server.as(other), other, pin);
    expect(unseen.status).toBe("fault");
    expect(unseen.values).toEqual({});
    expect(unseen.notes[0]!.message).toContain("or you may not see it");
  });

  it("is supplied with its body and its newest edition", async () => {
    const { tamsin, publish } = await setUp();
    const { pin } = await publish();
    await publish({ editionOf: 1 });
    const [supplied] = suppliedResponse.parse((await tamsin.get(`/api/references/supplied?pins=${pin},ZZZ1.1`)).body);
    expect(supplied).toMatchObject({ pin, newest: 2, withdrawn: null, bodies: { ilmara: { radius: 5e6 } } });
  });

  it("a reference that leads back to itself through another is refused", async () => {
    const { tamsin, tamsinActor, group, publish } = await setUp();
    const first = await publish();
    const second = await publish({ document: using(first.pin) });
    expect((await tamsin.get(`/api/references/${second.pin}`)).body.restsOn).toMatchObject([{ pin: first.pin }]);
    expect((await tamsin.get(`/api/references/${first.pin}`)).body.builtUpon).toMatchObject([{ pin: second.pin }]);

    const circle = buildDocument({
      cells: [buildCell({ id: "again", text: `T_again = ref(${second.pin}, T_taken)` })],
    });
    
    const { id } = await buildNotebook(server.db, { owner: tamsinActor, groupId: group.id, document: circle });
    await tamsin.post(`/api/notebooks/${id}/versions`).send({ message: "Kept", revision: 1 });
    const asked = await tamsin.post(`/api/notebooks/${id}/versions/1/vetting`).send({
      message: "Please",
      summary: "A circle.",
      authors: ["Tamsin Orevale"],
      licence: "CC BY 4.0",
      editionOf: 1,
    });
    expect([asked.status, asked.body.code]).toEqual([409, "rests_on_itself"]);
  });
});

describe("recomputing with a newer engine", () => {
  it("tells how far numbers drift and leaves what was published", async () => {
    const { tamsin, publish } = await setUp();
    const { pin } = await publish();
    const evaluator = {
      evaluate: async (document: typeof planet) => {
        const outcome = evaluateDocument(document);
        const { T_quiet } = outcome.result.cells[0]!.values;
        if (T_quiet) T_quiet.value = 242.4;
        return { ok: true as const, outcome };
      },
      close: async () => undefined,
    };
    const logger = pino({ level: "silent" });
    await recomputeReferences({ db: server.db, evaluator, logger });
    expect((await tamsin.get(`/api/references/${pin}`)).body.recomputed).toBeNull();

    await recomputeReferences({ db: server.db, evaluator, logger, engine: "99.0.0" });
    const page = referenceResponse.parse((await tamsin.get(`/api/references/${pin}`)).body);
    expect(page.recomputed).toMatchObject({ engine: "99.0.0", drift: { name: "warmth.T_quiet", changed: 0 } });
    expect(page.recomputed!.drift.largest).toBeCloseTo(0.01, 10);
    expect(page.engine).toBe(engineVersion);
    expect(page.result.cells[0]!.values.T_quiet!.value).toBe(240);
  });
});
