import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { notebooks } from "../../../server/db/tables/notebooks";
import type { Actor } from "../../../server/policies/actor";
import { writeNotebookFile } from "../../../shared/notebook/notebookFile";
import {
  importNotebookResponse,
  notebookListResponse,
  notebookResponse,
} from "../../../shared/schemas/notebooks";
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

/** Method, path after the notebook's id, and a body that is sound. */
const routesOfOne = [
  ["get", "", undefined],
  ["get", "/file", undefined],
  ["patch", "", { title: "Another title" }],
  ["put", "/draft", { revision: 1, document: buildDocument({ title: "Changed" }) }],
  ["delete", "", undefined],
  ["post", "/restore-from-bin", undefined],
] as const;

describe("every route of notebooks", () => {
  it.each([
    ["get", "/api/notebooks"],
    ["post", "/api/notebooks"],
    ["post", "/api/notebooks/import"],
    ...routesOfOne.map(([method, path]) => [method, `/api/notebooks/${nobody}${path}`] as const),
  ] as const)("signed out: %s %s is refused", async (method, path) => {
    const response = await server.signedOut[method](path);
    expect(response.status).toBe(401);
    expect(response.type).toBe("application/problem+json");
  });

  it.each(routesOfOne)("someone without a part: %s …%s is not found", async (method, path, body) => {
    const owner = await buildUser(server.db);
    const { id } = await buildNotebook(server.db, { owner });
    const stranger = await server.as(await buildUser(server.db));
    const answers = [];
    for (const notebook of [id, nobody, "not-an-id", "%00", "../session"]) {
      const response = await stranger[method](`/api/notebooks/${encodeURIComponent(notebook)}${path}`).send(
        body,
      );
      answers.push({ ...response.body, requestId: "" });
    }
    expect(answers.map(({ status }) => status)).toEqual([404, 404, 404, 404, 404]);
    expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
    expect((await (await server.as(owner)).get(`/api/notebooks/${id}`)).body.revision).toBe(1);
  });

  it("a private draft in a group is not there for its lead", async () => {
    const tamsin = await buildUser(server.db);
    const { id: groupId, lead } = await buildGroup(server.db, { members: [[tamsin, "researcher"]] });
    const { id } = await buildNotebook(server.db, { owner: tamsin, groupId });
    expect((await (await server.as(lead)).get(`/api/notebooks/${id}`)).status).toBe(404);
  });
});

describe("POST /api/notebooks", () => {
  it("refuses what is malformed", async () => {
    const agent = await server.as(await buildUser(server.db));
    const untitled = await agent.post("/api/notebooks").send({ title: " ", groupId: "x" });
    expect(untitled.status).toBe(422);
    expect(untitled.body.issues).toMatchObject([{ path: "title" }, { path: "groupId" }]);
    expect((await agent.post("/api/notebooks").send([])).status).toBe(422);
    expect((await agent.post("/api/notebooks")).status).toBe(422);
  });

  it("refuses a group that is not one's own, or where one only sees", async () => {
    const guest = await buildUser(server.db);
    const { id: groupId } = await buildGroup(server.db, { members: [[guest, "guest"]] });
    const { id: foreign } = await buildGroup(server.db);
    const agent = await server.as(guest);
    expect((await agent.post("/api/notebooks").send({ title: "A", groupId: foreign })).status).toBe(404);
    expect((await agent.post("/api/notebooks").send({ title: "A", groupId })).status).toBe(403);
    const text = writeNotebookFile(buildDocument());
    expect((await agent.post("/api/notebooks/import").send({ text, groupId })).status).toBe(403);
  });

  it("creates an empty notebook that is its owner's alone", async () => {
    const tamsin = await buildUser(server.db);
    const { id: groupId, code, lead } = await buildGroup(server.db, { members: [[tamsin, "researcher"]] });
    const response = await (
      await server.as(tamsin)
    )
      .post("/api/notebooks")
      .send({ title: " Nirel ", groupId });
    expect(response.status).toBe(201);
    const notebook = notebookResponse.parse(response.body);
    expect(notebook).toMatchObject({
      title: "Nirel",
      owner: { id: tamsin.id },
      group: { id: groupId, code },
      role: "owner",
      sharedWith: 0,
      revision: 1,
      lastVersion: null,
      document: { format: 1, title: "Nirel", cells: [] },
    });
    expect((await (await server.as(lead)).get(`/api/notebooks/${notebook.id}`)).status).toBe(404);
  });

  it("creates one from a document, under the title asked for", async () => {
    const agent = await server.as(await buildUser(server.db));
    const document = buildDocument();
    const response = await agent.post("/api/notebooks").send({ title: "A copy", groupId: null, document });
    expect(response.body.document).toEqual({ ...document, title: "A copy" });
  });
});

describe("POST /api/notebooks/import", () => {
  it("takes a file and gives it back to the character", async () => {
    const agent = await server.as(await buildUser(server.db));
    const text = writeNotebookFile(buildDocument());
    const imported = await agent.post("/api/notebooks/import").send({ text, groupId: null });
    expect(imported.status).toBe(201);
    expect(importNotebookResponse.parse(imported.body).title).toBe("Nirel, a first look");
    expect(imported.body.notes).toEqual([]);
    const exported = await agent.get(`/api/notebooks/${imported.body.id}/file`);
    expect(exported.text).toBe(text);
    expect(exported.headers["content-type"]).toBe("text/markdown; charset=utf-8");
    expect(exported.headers["content-disposition"]).toBe("attachment; filename=nirel-a-first-look.md");
  });

  it("names the line of a bad file and imports nothing of it", async () => {
    const agent = await server.as(await buildUser(server.db));
    const response = await agent
      .post("/api/notebooks/import")
      .send({ text: "No title\n\nhere", groupId: null });
    expect(response.status).toBe(422);
    expect(response.body.issues).toMatchObject([{ path: "line 1" }]);
    expect(response.body.detail).toMatch(/line 1/);
    expect((await agent.get("/api/notebooks")).body.notebooks).toEqual([]);
    expect((await agent.post("/api/notebooks/import").send({ text: 5, groupId: null })).status).toBe(422);
  });
});

describe("GET /api/notebooks", () => {
  it("lists what one may see, with one's role, and nothing else", async () => {
    const wiremu = await buildUser(server.db, { name: "Wiremu Castellane" });
    const tamsin = await buildUser(server.db, { name: "Tamsin Orevale" });
    const { id: groupId } = await buildGroup(server.db, {
      members: [
        [wiremu, "researcher"],
        [tamsin, "researcher"],
      ],
    });
    const titled = (title: string) => buildDocument({ title });
    await buildNotebook(server.db, { owner: wiremu, document: titled("Own") });
    await buildNotebook(server.db, {
      owner: tamsin,
      document: titled("Shared"),
      shares: [[wiremu, "co-author"]],
    });
    await buildNotebook(server.db, {
      owner: tamsin,
      document: titled("Group"),
      groupId,
      groupRole: "reader",
    });
    await buildNotebook(server.db, { owner: tamsin, document: titled("Private"), groupId });
    const agent = await server.as(wiremu);
    const list = async (query: string) => {
      const response = await agent.get(`/api/notebooks?${query}`);
      expect(response.status).toBe(200);
      return notebookListResponse.parse(response.body).notebooks;
    };

    const all = await list("order=title");
    expect(all.map(({ title, role }) => [title, role])).toEqual([
      ["Group", "reader"],
      ["Own", "owner"],
      ["Shared", "co-author"],
    ]);
    expect(all[2]!.coAuthors).toEqual([{ id: wiremu.id, name: "Wiremu Castellane" }]);
    expect((await list("q=SHAR")).map(({ title }) => title)).toEqual(["Shared"]);
    expect((await list("q=orevale&order=title")).map(({ title }) => title)).toEqual(["Group", "Shared"]);
    expect(await list(`q=${encodeURIComponent("%")}`)).toEqual([]);
    expect(await list(`q=${encodeURIComponent("' or 1=1 --")}`)).toEqual([]);
    expect((await agent.get("/api/notebooks?order=size")).status).toBe(422);
    expect((await agent.get(`/api/notebooks?q=${"x".repeat(201)}`)).status).toBe(422);
    expect((await agent.get("/api/notebooks?q=%00")).status).toBe(422);
  });

  it("puts what changed last first", async () => {
    const owner = await buildUser(server.db);
    const agent = await server.as(owner);
    for (const title of ["One", "Two", "Three"]) {
      await agent.post("/api/notebooks").send({ title, groupId: null });
      await new Promise((resolve) => setTimeout(resolve, 5));
    }
    const { notebooks: listed } = (await agent.get("/api/notebooks")).body;
    expect(listed.map(({ title }: { title: string }) => title)).toEqual(["Three", "Two", "One"]);
    const rename = await agent.patch(`/api/notebooks/${listed[2].id}`).send({ title: "First" });
    expect(rename.status).toBe(200);
    const after = (await agent.get("/api/notebooks")).body.notebooks;
    expect(after.map(({ title }: { title: string }) => title)).toEqual(["First", "Three", "Two"]);
  });
});

describe("GET /api/notebooks/:id", () => {
  it("says to whom it is shown, how far it is shared and what they may do", async () => {
    const [owner, coAuthor, reader, guest] = await Promise.all([1, 2, 3, 4].map(() => buildUser(server.db)));
    const { id: groupId, lead } = await buildGroup(server.db, {
      members: [
        [owner!, "researcher"],
        [reader!, "researcher"],
        [guest!, "guest"],
      ],
    });
    const { id } = await buildNotebook(server.db, {
      owner: owner!,
      groupId,
      groupRole: "commenter",
      shares: [
        [coAuthor!, "co-author"],
        [reader!, "reader"],
      ],
    });
    const seen = async (person: Actor) =>
      notebookResponse.parse((await (await server.as(person)).get(`/api/notebooks/${id}`)).body);
    expect(await seen(owner!)).toMatchObject({ role: "owner", sharedWith: 4, abilities: { delete: true } });
    expect(await seen(coAuthor!)).toMatchObject({
      role: "co-author",
      abilities: { edit: true, delete: false },
    });
    expect(await seen(reader!)).toMatchObject({ role: "commenter", abilities: { read: true, edit: false } });
    expect(await seen(lead)).toMatchObject({ role: "commenter" });
    expect(await seen(guest!)).toMatchObject({ role: "reader" });
  });
});

describe("PATCH /api/notebooks/:id", () => {
  it("refuses a malformed title, and a reader", async () => {
    const [owner, reader] = await Promise.all([buildUser(server.db), buildUser(server.db)]);
    const { id } = await buildNotebook(server.db, { owner: owner!, shares: [[reader!, "reader"]] });
    const agent = await server.as(owner!);
    expect((await agent.patch(`/api/notebooks/${id}`).send({ title: "" })).status).toBe(422);
    expect((await agent.patch(`/api/notebooks/${id}`).send({ title: "x".repeat(301) })).status).toBe(422);
    expect((await (await server.as(reader!)).patch(`/api/notebooks/${id}`).send({ title: "B" })).status).toBe(
      403,
    );
  });

  it("renames as the next revision; the same title changes nothing", async () => {
    const owner = await buildUser(server.db);
    const { id } = await buildNotebook(server.db, { owner });
    const agent = await server.as(owner);
    const renamed = await agent.patch(`/api/notebooks/${id}`).send({ title: "Nirel, again" });
    expect(renamed.body).toMatchObject({
      title: "Nirel, again",
      revision: 2,
      document: { title: "Nirel, again" },
    });
    const again = await agent.patch(`/api/notebooks/${id}`).send({ title: "Nirel, again" });
    expect(again.body.revision).toBe(2);
  });
});

describe("the bin", () => {
  it("takes the owner's notebook, hides it from all, and gives it back to the owner", async () => {
    const [owner, coAuthor] = await Promise.all([buildUser(server.db), buildUser(server.db)]);
    const { id } = await buildNotebook(server.db, { owner: owner!, shares: [[coAuthor!, "co-author"]] });
    const [mine, theirs] = [await server.as(owner!), await server.as(coAuthor!)];

    expect((await theirs.delete(`/api/notebooks/${id}`)).status).toBe(403);
    expect((await mine.delete(`/api/notebooks/${id}`)).status).toBe(204);
    expect((await mine.delete(`/api/notebooks/${id}`)).status).toBe(404);
    expect((await mine.get(`/api/notebooks/${id}`)).status).toBe(404);
    expect((await theirs.get(`/api/notebooks/${id}`)).status).toBe(404);
    const save = { revision: 1, document: buildDocument({ title: "Changed" }) };
    expect((await theirs.put(`/api/notebooks/${id}/draft`).send(save)).status).toBe(404);
    expect((await mine.get("/api/notebooks")).body.notebooks).toEqual([]);
    const bin = notebookListResponse.parse((await mine.get("/api/notebooks?place=bin")).body).notebooks;
    expect(bin).toMatchObject([{ id, abilities: { restoreFromBin: true, read: false } }]);
    expect(bin[0]!.deletedAt).not.toBeNull();
    expect((await theirs.get("/api/notebooks?place=bin")).body.notebooks).toEqual([]);

    expect((await theirs.post(`/api/notebooks/${id}/restore-from-bin`)).status).toBe(404);
    const restored = await mine.post(`/api/notebooks/${id}/restore-from-bin`);
    expect(restored.status).toBe(200);
    expect(notebookResponse.parse(restored.body).revision).toBe(1);
    expect((await mine.post(`/api/notebooks/${id}/restore-from-bin`)).status).toBe(403);
    expect((await theirs.get(`/api/notebooks/${id}`)).status).toBe(200);
  });
});

describe("summaries", () => {
  it("follow a save, also for those who only look at the list", async () => {
    const owner = await buildUser(server.db);
    const { id } = await buildNotebook(server.db, { owner });
    const agent = await server.as(owner);
    expect((await agent.get("/api/notebooks")).body.notebooks[0].summary).toBeNull();
    const cells = [buildCell({ id: "wrong", text: "T_quiet = 240 K + 3 km" })];
    await agent.put(`/api/notebooks/${id}/draft`).send({ revision: 1, document: buildDocument({ cells }) });
    await server.summaries.idle();
    const [item] = notebookListResponse.parse((await agent.get("/api/notebooks")).body).notebooks;
    expect(item!.summary).toMatchObject({ faults: 1, strip: null });
    const [row] = await server.db.select().from(notebooks).where(eq(notebooks.id, id));
    expect(row).toMatchObject({ revision: 2, summaryRevision: 2 });
  });
});
