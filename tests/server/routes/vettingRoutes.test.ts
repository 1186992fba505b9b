import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { letters } from "../../../server/db/tables/letters";
import { notebooks } from "../../../server/db/tables/notebooks";
import { publishedReferences } from "../../../server/db/tables/publishedReferences";
import type { Actor } from "../../../server/policies/actor";
import type { NotebookDocument } from "../../../shared/notebook/document";
import { referenceResponse } from "../../../shared/schemas/references";
import { vettingListResponse, vettingResponse } from "../../../shared/schemas/vettings";
import { buildCell, buildDocument } from "../../factories/buildDocument";
import { buildGroup } from "../../factories/buildGroup";
import { buildNotebook } from "../../factories/buildNotebook";
import { buildUser } from "../../factories/buildUser";
import { startTestServer, type TestServer } from "../testServer";

const nobody = "00000000-0000-4000-8000-000000000000";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

const asked = {
  message: "Please look at the temperature.",
  summary: "How cold Nirel is.",
  authors: ["Tamsin Orevale", "Wiremu Castellane"],
  licence: "CC BY 4.0",
  editionOf: null as number | null,
};

/** A group of two leads, Jorun and Ishani; Tamsin's notebook with Wiremu as co-author and Pello as reader. */
async function setUp({ document = buildDocument() }: { document?: NotebookDocument } = {}) {
  const [tamsin, wiremu, pello, ishani] = (await Promise.all(
    ["Tamsin", "Wiremu", "Pello", "Ishani"].map((name) => buildUser(server.db, { name })),
  )) as [Actor, Actor, Actor, Actor];
  const group = await buildGroup(server.db, {
    lead: await buildUser(server.db, { name: "Jorun" }),
    members: [
      [tamsin, "researcher"],
      [wiremu, "researcher"],
      [pello, "guest"],
      [ishani, "lead"],
    ],
  });
  const { id } = await buildNotebook(server.db, {
    owner: tamsin,
    groupId: group.id,
    document,
    versions: ["First"],
    shares: [
      [wiremu, "co-author"],
      [pello, "reader"],
    ],
  });
  return {
    group,
    id,
    path: `/api/notebooks/${id}/versions/1/vetting`,
    tamsin: await server.as(tamsin),
    wiremu: await server.as(wiremu),
    pello: await server.as(pello),
    jorun: await server.as(group.lead),
    ishani: await server.as(ishani),
  };
}

type Agent = Awaited<ReturnType<TestServer["as"]>>;

async function request(agent: Agent, path: string, body: object = asked): Promise<string> {
  const response = await agent.post(path).send(body);
  expect(response.status, JSON.stringify(response.body)).toBe(201);
  return response.body.id;
}

const approve = (agent: Agent, id: string) => agent.post(`/api/vettings/${id}/approve`).send({ isPublic: true });

describe("every route of vetting", () => {
  const routes = [
    ["get", "/vettings", undefined],
    ["get", `/notebooks/${nobody}/vettings`, undefined],
    ["post", `/notebooks/${nobody}/versions/1/vetting`, asked],
    ["get", `/vettings/${nobody}`, undefined],
    ["put", `/vettings/${nobody}/accepted`, { accepted: [] }],
    ["post", `/vettings/${nobody}/return`, { remarks: "More" }],
    ["post", `/vettings/${nobody}/approve`, { isPublic: true }],
    ["post", `/vettings/${nobody}/take-back`, {}],
  ] as const;

  it.each(routes)("signed out: %s %s is refused", async (method, path, body) => {
    expect((await server.signedOut[method](`/api${path}`).send(body)).status).toBe(401);
  });

  it.each(routes.slice(1))("of what is not there: %s %s is not found", async (method, path, body) => {
    const someone = await server.as(await buildUser(server.db));
    expect((await someone[method](`/api${path}`).send(body)).status).toBe(404);
    const other = path.replace(nobody, "not-an-id");
    expect((await someone[method](`/api${other}`).send(body)).status).toBe(404);
  });

  it("someone without a part in the notebook or the group finds no request", async () => {
    const { tamsin, path } = await setUp();
    const id = await request(tamsin, path);
    const { jorun: otherLead } = await setUp();
    expect((await otherLead.get(`/api/vettings/${id}`)).status).toBe(404);
    expect((await approve(otherLead, id)).status).toBe(404);
    expect((await otherLead.get("/api/vettings")).body).toEqual([]);
  });
});

describe("asking for a version to be vetted", () => {
  it("needs message, summary, authors and licence", async () => {
    const { tamsin, path } = await setUp();
    const response = await tamsin.post(path).send({ ...asked, message: " ", summary: "", authors: [], licence: "" });
    expect(response.status).toBe(422);
    const paths = response.body.issues.map(({ path: where }: { path: string }) => where);
    expect(paths).toEqual(["message", "summary", "authors", "licence"]);
  });

  it("is refused to a reader, and let to a co-author", async () => {
    const { pello, wiremu, path } = await setUp();
    expect((await pello.post(path).send(asked)).status).toBe(403);
    await request(wiremu, path);
  });

  it("stands in the queue of the leads alone, who get a letter", async () => {
    const { group, tamsin, jorun, ishani, pello, path } = await setUp();
    const id = await request(tamsin, path);
    for (const lead of [jorun, ishani])
      expect(vettingListResponse.parse((await lead.get("/api/vettings")).body).map((one) => one.id)).toEqual([id]);
    expect((await pello.get("/api/vettings")).body).toEqual([]);
    const posted = await server.db.select().from(letters).where(eq(letters.toAddress, group.lead.email));
    expect(posted).toMatchObject([{ kind: "vetting_requested", toUserId: group.lead.id }]);
  });

  it("is one at a time, and can be taken back", async () => {
    const { tamsin, wiremu, jorun, path } = await setUp();
    const id = await request(tamsin, path);
    const again = await wiremu.post(path).send(asked);
    expect([again.status, again.body.code]).toEqual([409, "in_vetting"]);
    expect((await jorun.post(`/api/vettings/${id}/take-back`)).status).toBe(403);
    expect((await wiremu.post(`/api/vettings/${id}/take-back`)).status).toBe(204);
    expect((await approve(jorun, id)).body.code).toBe("vetting_over");
    await request(wiremu, path);
  });

  it("on one's own shelf says that there is no lead to ask", async () => {
    const owner = await buildUser(server.db);
    const { id } = await buildNotebook(server.db, { owner, versions: ["First"] });
    const response = await (await server.as(owner)).post(`/api/notebooks/${id}/versions/1/vetting`).send(asked);
    expect([response.status, response.body.code]).toEqual([409, "no_group"]);
  });

  it("as an edition of what the group has not published is refused", async () => {
    const { tamsin, path } = await setUp();
    const response = await tamsin.post(path).send({ ...asked, editionOf: 7 });
    expect(response.status).toBe(422);
    expect(response.body.issues).toMatchObject([{ path: "editionOf" }]);
  });
});

describe("the checks", () => {
  const verdicts = async (agent: Agent, id: string) => {
    const { checks } = vettingResponse.parse((await agent.get(`/api/vettings/${id}`)).body);
    return Object.fromEntries(checks.map(({ code, verdict }) => [code, verdict]));
  };

  it("all hold for a sound version", async () => {
    const { tamsin, jorun, path } = await setUp();
    const id = await request(tamsin, path);
    expect(await verdicts(jorun, id)).toEqual({
      same_numbers: "holds",
      no_faults: "holds",
      cautions_answered: "holds",
      sources: "holds",
      no_open_threads: "holds",
      data_present: "holds",
      not_own_alone: "holds",
    });
  });

  it("tell a fault and a value without a source, and keep the version from being published", async () => {
    const cells = [
      buildCell({ id: "warmth", text: "T_quiet = 240 K\nT_loud = 300 K # assumed\nT_none = nothing" }),
    ];
    const { tamsin, jorun, path } = await setUp({ document: buildDocument({ cells }) });
    const id = await request(tamsin, path);
    expect(await verdicts(jorun, id)).toMatchObject({ no_faults: "fails", sources: "fails" });
    const { checks } = (await jorun.get(`/api/vettings/${id}`)).body;
    expect(checks[3].reason).toMatch(/^1 of 2 do.*T_quiet in warmth\.$/);
    expect((await approve(jorun, id)).body.code).toBe("checks_open");
  });

  it("notice results that do not come out the same, to the last bit", async () => {
    const { tamsin, jorun, path, id: notebookId } = await setUp();
    // A version kept with one bit off, as if an engine had slipped.
    const { keepVersion } = await import("../../../server/commands/keepVersion");
    const { evaluateDocument } = await import("../../../server/jobs/evaluateDocument");
    const { result } = evaluateDocument(buildDocument());
    result.cells[1]!.values.T_quiet!.value = 240.00000000000003;
    const [row] = await server.db.select().from(notebooks).where(eq(notebooks.id, notebookId));
    await keepVersion(server.db, {
      notebookId,
      revision: row!.revision,
      message: "Slipped",
      result,
      actorId: row!.ownerId,
      at: new Date("2026-10-05T08:00:00Z"),
    });
    const id = await request(tamsin, path.replace("/1/", "/2/"));
    expect(await verdicts(jorun, id)).toMatchObject({ same_numbers: "fails" });
    expect((await jorun.get(`/api/vettings/${id}`)).body.checks[0].reason).toContain("warmth.T_quiet");
  });

  const moonOf = (answers?: NotebookDocument["answers"]) =>
    buildDocument({
      ...(answers ? { answers } : {}),
      cells: [
        buildCell({
          id: "moon",
          kind: "body",
          name: "nirel",
          // Over its own Hill sphere, which is a caution.
          text: "mass = 1e20 kg # assumed\nradius = 3000 km # assumed\nstar_distance = 1e9 m # assumed\nstar_mass = 1 solar_mass # assumed",
        }),
      ],
    });

  it("ask for an answer to each caution, which the lead accepts", async () => {
    const unanswered = await setUp({ document: moonOf() });
    const first = await request(unanswered.tamsin, unanswered.path);
    expect(await verdicts(unanswered.jorun, first)).toMatchObject({ cautions_answered: "fails" });

    const { cautions } = (await unanswered.jorun.get(`/api/vettings/${first}`)).body.checks[2];
    const [cell, code, entry] = cautions[0].key.split("/");
    const answer = { cell, code, entry, numbers: [], sentence: "It is meant to be torn apart." };
    const { tamsin, jorun, path } = await setUp({ document: moonOf([answer]) });
    const id = await request(tamsin, path);
    expect(await verdicts(jorun, id)).toMatchObject({ cautions_answered: "to_judge" });
    expect((await approve(jorun, id)).body.code).toBe("checks_open");
    const accepted = await jorun.put(`/api/vettings/${id}/accepted`).send({ accepted: [cautions[0].key] });
    expect(accepted.body.checks[2]).toMatchObject({ verdict: "holds", cautions: [{ sentence: answer.sentence }] });
    expect((await approve(jorun, id)).status).toBe(201);
  });
});

describe("the decision", () => {
  it("is not its author's, nor a reader's", async () => {
    const { tamsin, wiremu, pello, path } = await setUp();
    const id = await request(tamsin, path);
    for (const agent of [tamsin, wiremu, pello]) expect((await approve(agent, id)).status).toBe(403);
  });

  it("to return it needs remarks, which reach whoever asked", async () => {
    const { tamsin, jorun, path, id: notebookId } = await setUp();
    const id = await request(tamsin, path);
    expect((await jorun.post(`/api/vettings/${id}/return`).send({ remarks: "" })).status).toBe(422);
    expect((await jorun.post(`/api/vettings/${id}/return`).send({ remarks: "Say which star." })).status).toBe(204);
    const [told] = (await tamsin.get(`/api/notebooks/${notebookId}/vettings`)).body;
    expect(told).toMatchObject({ state: "returned", remarks: "Say which star.", decidedBy: { name: "Jorun" } });
  });

  it("of two leads at once is that of one; the other is told", async () => {
    const { tamsin, jorun, ishani, path, group } = await setUp();
    const id = await request(tamsin, path);
    const answers = await Promise.all([approve(jorun, id), approve(ishani, id)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
    const other = answers.find(({ status }) => status === 409)!;
    expect(other.body.detail).toMatch(/^(Jorun|Ishani) approved .*already\.$/);
    const rows = await server.db
      .select()
      .from(publishedReferences)
      .where(eq(publishedReferences.groupId, group.id));
    expect(rows).toHaveLength(1);
  });

  it("publishes the version, not what the draft has become", async () => {
    const { tamsin, jorun, path, id: notebookId, group } = await setUp();
    const id = await request(tamsin, path);
    const moved = { revision: 1, document: buildDocument({ title: "Something else" }) };
    await tamsin.put(`/api/notebooks/${notebookId}/draft`).send(moved);
    const { pin } = (await approve(jorun, id)).body;
    expect(pin).toBe(`${group.code}1.1`);
    const page = referenceResponse.parse((await server.signedOut.get(`/api/references/${pin}`)).body);
    expect(page).toMatchObject({ title: "Nirel, a first look", authors: asked.authors, vettedBy: "Jorun" });
    const [notebook] = await server.db.select().from(notebooks).where(eq(notebooks.id, notebookId));
    expect(notebook!.isReferenced).toBe(true);
  });

  it("numbers what is approved at once without gaps", async () => {
    const { group, jorun, ishani, tamsin } = await setUp();
    const [row] = await server.db.select().from(notebooks).where(eq(notebooks.groupId, group.id));
    const owner = { id: row!.ownerId, name: "Tamsin", email: "" };
    const ids = [];
    for (let index = 0; index < 4; index += 1) {
      const { id } = await buildNotebook(server.db, { owner, groupId: group.id, versions: ["First"] });
      ids.push(await request(tamsin, `/api/notebooks/${id}/versions/1/vetting`));
    }
    const answers = await Promise.all(ids.map((id, index) => approve(index % 2 ? jorun : ishani, id)));
    const pins = answers.map(({ body }) => body.pin).sort();
    expect(pins).toEqual([1, 2, 3, 4].map((number) => `${group.code}${number}.1`));
  });

  it("on a lead's own work alone is another lead's, or theirs where there is no other, and is then told", async () => {
    const lead = await buildUser(server.db, { name: "Jorun" });
    const second = await buildUser(server.db, { name: "Ishani" });
    const group = await buildGroup(server.db, { lead, members: [[second, "lead"]] });
    const { id: notebookId } = await buildNotebook(server.db, {
      owner: lead,
      groupId: group.id,
      versions: ["First"],
    });
    const agent = await server.as(lead);
    const id = await request(agent, `/api/notebooks/${notebookId}/versions/1/vetting`);
    const refused = await approve(agent, id);
    expect(refused.status).toBe(403);
    expect(refused.body.detail).toContain("your own work alone");
    await agent.patch(`/api/groups/${group.id}/members/${second.id}`).send({ role: "researcher" });
    const { pin } = (await approve(agent, id)).body;
    expect((await agent.get(`/api/references/${pin}`)).body.isVettedByOwner).toBe(true);
  });
});
