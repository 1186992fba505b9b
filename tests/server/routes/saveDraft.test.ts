import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { notebookResponse, saveDraftResponse, staleDraftProblem } from "../../../shared/schemas/notebooks";
import { documentLimits } from "../../../shared/notebook/document";
import { buildCell, buildDocument } from "../../factories/buildDocument";
import { buildNotebook } from "../../factories/buildNotebook";
import { buildUser } from "../../factories/buildUser";
import { startTestServer, type TestServer } from "../testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

/** A notebook of two who may write and one who may only read, each with their requests. */
async function setUp() {
  const [tamsin, wiremu, pello] = await Promise.all(
    ["Tamsin", "Wiremu", "Pello"].map((name) => buildUser(server.db, { name })),
  );
  const { id } = await buildNotebook(server.db, {
    owner: tamsin!,
    shares: [
      [wiremu!, "co-author"],
      [pello!, "reader"],
    ],
  });
  const path = `/api/notebooks/${id}/draft`;
  return {
    id,
    path,
    tamsin: await server.as(tamsin!),
    wiremu: await server.as(wiremu!),
    pello: await server.as(pello!),
  };
}

const titled = (title: string) => buildDocument({ title });

describe("PUT /api/notebooks/:id/draft", () => {
  it("refuses what is malformed, naming each place", async () => {
    const { tamsin, path } = await setUp();
    const cells = [buildCell({ id: "a" }), { ...buildCell({ id: "a" }), kind: "chart" }, { id: "" }];
    const response = await tamsin
      .put(path)
      .send({ revision: 0, document: { ...buildDocument(), format: 2, cells } });
    expect(response.status).toBe(422);
    const places = response.body.issues.map((issue: { path: string }) => issue.path);
    expect(places).toEqual(
      expect.arrayContaining(["revision", "document.format", "document.cells.1.kind", "document.cells.2.id"]),
    );
  });

  it("refuses a reader", async () => {
    const { pello, path } = await setUp();
    const response = await pello.put(path).send({ revision: 1, document: titled("Mine") });
    expect(response.status).toBe(403);
    expect(response.body.code).toBe("forbidden");
  });

  it("saves as the next revision, with when and by whom", async () => {
    const { id, wiremu, tamsin, path } = await setUp();
    const response = await wiremu.put(path).send({ revision: 1, document: titled("Second thoughts") });
    expect(response.status).toBe(200);
    const saved = saveDraftResponse.parse(response.body);
    expect(saved.revision).toBe(2);
    const seen = notebookResponse.parse((await tamsin.get(`/api/notebooks/${id}`)).body);
    expect(seen).toMatchObject({
      title: "Second thoughts",
      revision: 2,
      savedAt: saved.savedAt,
      savedBy: { name: "Wiremu" },
    });
  });

  it("keeps every character of the text", async () => {
    const { id, tamsin, path } = await setUp();
    const text =
      "κ = 1.5×10³ \u2009\u202eabc\u0007\r\n\t'\"\\ 😀 ${x} <script>alert(1)</script> \uFEFF $1 %s";
    const document = buildDocument({ cells: [buildCell({ id: "odd", kind: "prose", text })] });
    expect((await tamsin.put(path).send({ revision: 1, document })).status).toBe(200);
    expect((await tamsin.get(`/api/notebooks/${id}`)).body.document).toEqual(document);
  });

  it("answers a change made on an older draft with the current one, and keeps that", async () => {
    const { id, tamsin, wiremu, path } = await setUp();
    await wiremu.put(path).send({ revision: 1, document: titled("His") });
    const response = await tamsin.put(path).send({ revision: 1, document: titled("Hers") });
    expect(response.status).toBe(409);
    const { current, detail } = staleDraftProblem.parse(response.body);
    expect(current).toMatchObject({ revision: 2, document: { title: "His" }, savedBy: { name: "Wiremu" } });
    expect(detail).toMatch(/revision 2, saved by Wiremu/);
    expect((await tamsin.get(`/api/notebooks/${id}`)).body).toMatchObject({ revision: 2, title: "His" });
    expect((await tamsin.put(path).send({ revision: 3, document: titled("Hers") })).status).toBe(409);
    expect((await tamsin.put(path).send({ revision: 2, document: titled("Hers") })).body.revision).toBe(3);
  });

  it("takes again what it has saved already, so that a lost answer does no harm", async () => {
    const { tamsin, path } = await setUp();
    const change = { revision: 1, document: titled("Sent twice") };
    const first = await tamsin.put(path).send(change);
    const second = await tamsin.put(path).send(change);
    expect(second.status).toBe(200);
    expect(second.body).toEqual(first.body);
  });

  it("of two that race, saves one and gives the other the current draft", async () => {
    const { tamsin, wiremu, path } = await setUp();
    const answers = await Promise.all([
      tamsin.put(path).send({ revision: 1, document: titled("Hers") }),
      wiremu.put(path).send({ revision: 1, document: titled("His") }),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    const lost = answers.find(({ status }) => status === 409)!;
    expect(["Hers", "His"]).toContain(lost.body.current.document.title);
  });
});

describe("huge and odd documents", () => {
  it("at the limits are saved, over them refused with the reason", async () => {
    const { tamsin, path } = await setUp();
    const long = "x".repeat(documentLimits.cellLength);
    const cells = [1, 2, 3].map((id) => buildCell({ id: `long-${id}`, kind: "prose", text: long }));
    const full = buildDocument({ title: "Full", cells });
    expect((await tamsin.put(path).send({ revision: 1, document: full })).status).toBe(200);

    const more = buildDocument({
      cells: [...cells, ...cells.map((cell) => ({ ...cell, id: `${cell.id}-b` }))],
    });
    const over = await tamsin.put(path).send({ revision: 2, document: more });
    expect(over.status).toBe(422);
    expect(over.body.detail).toMatch(/at most 4000000 characters/);
    const many = buildDocument({
      cells: Array.from({ length: 501 }, (_, id) => buildCell({ id: `c${id}` })),
    });
    expect((await tamsin.put(path).send({ revision: 2, document: many })).status).toBe(422);
    const huge = await tamsin.put(path).send({ revision: 2, document: full, filler: "x".repeat(6_000_000) });
    expect(huge.status).toBe(413);
    expect(huge.body.code).toBe("too_large");
  });

  it("keys that would change every object are dropped and change none", async () => {
    const { id, tamsin, path } = await setUp();
    const body = `{"revision":1,"__proto__":{"isAdmin":true},"document":{"format":1,"title":"Odd","unitSystem":"SI",
      "headline":[],"authors":[],"constructor":{"prototype":{"isAdmin":true}},
      "cells":[{"id":"__proto__","kind":"values","name":"constructor","text":"toString = 1","__proto__":{"x":1}}]}}`;
    const response = await tamsin.put(path).set("Content-Type", "application/json").send(body);
    expect(response.status).toBe(200);
    expect(({} as { isAdmin?: boolean }).isAdmin).toBeUndefined();
    const { document } = (await tamsin.get(`/api/notebooks/${id}`)).body;
    expect(document.cells).toEqual([
      { id: "__proto__", kind: "values", name: "constructor", text: "toString = 1" },
    ]);
    expect(Object.keys(document).sort()).toEqual([
      "authors",
      "cells",
      "format",
      "headline",
      "title",
      "unitSystem",
    ]);
    await server.summaries.idle();
    expect((await tamsin.get("/api/notebooks")).body.notebooks[0].summary).not.toBeNull();
  });

  it("JSON nested a hundred thousand deep is refused and the server lives on", async () => {
    const { tamsin, path } = await setUp();
    const deep = `{"revision":1,"document":${"[".repeat(100_000)}${"]".repeat(100_000)}}`;
    const response = await tamsin.put(path).set("Content-Type", "application/json").send(deep);
    expect(response.status).toBe(422);
    expect((await server.signedOut.get("/healthz")).status).toBe(200);
  });

  it("characters that cannot be kept are refused, with their place", async () => {
    const { tamsin, path } = await setUp();
    const cells = [buildCell({ id: "a", text: "a\u0000b" }), buildCell({ id: "b", text: "\ud83d alone" })];
    const response = await tamsin.put(path).send({ revision: 1, document: buildDocument({ cells }) });
    expect(response.status).toBe(422);
    expect(response.body.issues.map((issue: { path: string }) => issue.path)).toEqual([
      "document.cells.0.text",
      "document.cells.1.text",
    ]);
  });

  it("two cells of one id are refused", async () => {
    const { tamsin, path } = await setUp();
    const cells = [buildCell({ id: "twin" }), buildCell({ id: "twin" })];
    const response = await tamsin.put(path).send({ revision: 1, document: buildDocument({ cells }) });
    expect(response.body.issues).toMatchObject([{ path: "document.cells.1.id" }]);
  });
});
