import { createHash } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { versions } from "../../../server/db/tables/versions";
import { contentText } from "../../../shared/notebook/contentText";
import { engineVersion } from "../../../shared/notebook/engine";
import { notebookResponse, staleDraftProblem } from "../../../shared/schemas/notebooks";
import { versionListResponse, versionResponse, versionSummary } from "../../../shared/schemas/versions";
import { buildDocument } from "../../factories/buildDocument";
import { buildNotebook } from "../../factories/buildNotebook";
import { buildUser } from "../../factories/buildUser";
import { startTestServer, type TestServer } from "../testServer";

const nobody = "00000000-0000-4000-8000-000000000000";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

async function setUp(messages: string[] = []) {
  const [tamsin, wiremu, pello] = await Promise.all(
    ["Tamsin", "Wiremu", "Pello"].map((name) => buildUser(server.db, { name })),
  );
  const { id, document } = await buildNotebook(server.db, {
    owner: tamsin!,
    versions: messages,
    shares: [
      [wiremu!, "co-author"],
      [pello!, "reader"],
    ],
  });
  return {
    id,
    document,
    path: `/api/notebooks/${id}/versions`,
    tamsin: await server.as(tamsin!),
    wiremu: await server.as(wiremu!),
    pello: await server.as(pello!),
  };
}

const routes = [
  ["get", "", undefined],
  ["post", "", { message: "A message", revision: 1 }],
  ["get", "/1", undefined],
  ["post", "/1/restore", { revision: 1 }],
] as const;

describe("every route of versions", () => {
  it.each(routes)("signed out: %s …%s is refused", async (method, path) => {
    expect((await server.signedOut[method](`/api/notebooks/${nobody}/versions${path}`)).status).toBe(401);
  });

  it.each(routes)("someone without a part: %s …%s is not found", async (method, path, body) => {
    const { id } = await setUp(["First"]);
    const stranger = await server.as(await buildUser(server.db));
    for (const notebook of [id, nobody, "not-an-id"]) {
      const response = await stranger[method](`/api/notebooks/${notebook}/versions${path}`).send(body);
      expect(response.status).toBe(404);
    }
  });

  it("a version that is not there is not found", async () => {
    const { tamsin, path } = await setUp(["First"]);
    for (const number of ["2", "0", "-1", "1.5", "99999999999", "one"]) {
      expect((await tamsin.get(`${path}/${number}`)).status).toBe(404);
      expect((await tamsin.post(`${path}/${number}/restore`).send({ revision: 1 })).status).toBe(404);
    }
  });
});

describe("keeping a version", () => {
  it("needs a message and a revision", async () => {
    const { tamsin, path } = await setUp();
    const response = await tamsin.post(path).send({ message: " ", revision: "1" });
    expect(response.status).toBe(422);
    expect(response.body.issues).toMatchObject([{ path: "message" }, { path: "revision" }]);
  });

  it("is refused to a reader", async () => {
    const { pello, path } = await setUp();
    expect((await pello.post(path).send({ message: "Mine", revision: 1 })).status).toBe(403);
  });

  it("numbers it, and keeps document, results, engine and content hash", async () => {
    const { id, tamsin, pello, path, document } = await setUp();
    const response = await tamsin.post(path).send({ message: "First look", revision: 1 });
    expect(response.status).toBe(201);
    const kept = versionSummary.parse(response.body);
    const contentHash = createHash("sha256").update(contentText(document, engineVersion)).digest("hex");
    expect(kept).toMatchObject({ number: 1, message: "First look", keptBy: { name: "Tamsin" }, contentHash });

    const read = versionResponse.parse((await pello.get(`${path}/1`)).body);
    expect(read).toMatchObject({ ...kept, document });
    expect(read.result.engine).toBe(engineVersion);
    expect(read.result.cells[1]).toMatchObject({
      name: "warmth",
      values: { T_quiet: { value: 240, unit: "K" } },
    });
    expect((await pello.get(`/api/notebooks/${id}`)).body.lastVersion).toBe(1);
    expect((await pello.get("/api/notebooks")).body.notebooks[0].lastVersion).toBe(1);
  });

  it("on an older draft answers with the current one", async () => {
    const { id, tamsin, wiremu, path } = await setUp();
    await wiremu
      .put(`/api/notebooks/${id}/draft`)
      .send({ revision: 1, document: buildDocument({ title: "His" }) });
    const response = await tamsin.post(path).send({ message: "Mine", revision: 1 });
    expect(response.status).toBe(409);
    expect(staleDraftProblem.parse(response.body).current).toMatchObject({
      revision: 2,
      document: { title: "His" },
    });
    expect((await tamsin.get(path)).body).toEqual([]);
  });

  it("by several at once gives each its own number", async () => {
    const { tamsin, wiremu, path } = await setUp();
    const keep = (agent: typeof tamsin, message: string) => agent.post(path).send({ message, revision: 1 });
    const answers = await Promise.all([
      keep(tamsin, "a"),
      keep(wiremu, "b"),
      keep(tamsin, "c"),
      keep(wiremu, "d"),
    ]);
    expect(answers.map(({ status }) => status)).toEqual([201, 201, 201, 201]);
    expect(answers.map(({ body }) => body.number).sort()).toEqual([1, 2, 3, 4]);
    const list = versionListResponse.parse((await tamsin.get(path)).body);
    expect(list.map(({ number }) => number)).toEqual([4, 3, 2, 1]);
  });

  it("is refused, with the reason, where the results take too long", async () => {
    const slow = await startTestServer({
      db: server.db,
      evaluator: {
        evaluate: async () => ({ ok: false, reason: "It takes over 10 s. Make its cells smaller." }),
        close: async () => undefined,
      },
    });
    const owner = await buildUser(slow.db);
    const { id } = await buildNotebook(slow.db, { owner });
    const agent = await slow.as(owner);
    const response = await agent
      .post(`/api/notebooks/${id}/versions`)
      .send({ message: "Heavy", revision: 1 });
    expect(response.status).toBe(422);
    expect(response.body).toMatchObject({
      code: "evaluation_failed",
      detail: expect.stringContaining("over 10 s"),
    });
    await slow.close();
  });
});

describe("a kept version", () => {
  it("stays as it is whatever the draft becomes, even for one who writes to the database", async () => {
    const { id, tamsin, path, document } = await setUp(["First"]);
    await tamsin
      .put(`/api/notebooks/${id}/draft`)
      .send({ revision: 1, document: buildDocument({ title: "New" }) });
    expect((await tamsin.get(`${path}/1`)).body.document).toEqual(document);
    const tamper = server.db
      .update(versions)
      .set({ message: "Tampered" })
      .where(and(eq(versions.notebookId, id), eq(versions.number, 1)));
    await expect(tamper).rejects.toMatchObject({ cause: { message: "a kept version never changes" } });
  });

  it("is restored to the draft as a new revision", async () => {
    const { id, tamsin, pello, path, document } = await setUp(["First"]);
    const changed = { revision: 1, document: buildDocument({ title: "New" }) };
    await tamsin.put(`/api/notebooks/${id}/draft`).send(changed);
    expect((await tamsin.post(`${path}/1/restore`).send({})).status).toBe(422);
    expect((await pello.post(`${path}/1/restore`).send({ revision: 2 })).status).toBe(403);
    expect((await tamsin.post(`${path}/1/restore`).send({ revision: 1 })).body.code).toBe("stale_revision");
    const restored = await tamsin.post(`${path}/1/restore`).send({ revision: 2 });
    expect(restored.status).toBe(200);
    expect(notebookResponse.parse(restored.body)).toMatchObject({ revision: 3, document, lastVersion: 1 });
  });
});
