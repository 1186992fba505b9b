import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { notebookListResponse, notebookResponse } from "../../../shared/schemas/notebooks";
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

const titlesOf = async (agent: Awaited<ReturnType<TestServer["as"]>>, place: string) =>
  notebookListResponse
    .parse((await agent.get(`/api/notebooks?place=${place}`)).body)
    .notebooks.map(({ title }) => title);

describe("the routes of keeping house", () => {
  it.each([
    ["/move", { groupId: null }],
    ["/archive", {}],
    ["/unarchive", {}],
  ] as const)("POST …%s: signed out, a stranger, a co-author", async (path, body) => {
    const [owner, coAuthor] = [await buildUser(server.db), await buildUser(server.db)];
    const { id } = await buildNotebook(server.db, { owner, shares: [[coAuthor, "co-author"]] });
    const address = `/api/notebooks/${id}${path}`;
    expect((await server.signedOut.post(address).send(body)).status).toBe(401);
    const stranger = await server.as(await buildUser(server.db));
    expect((await stranger.post(address).send(body)).status).toBe(404);
    expect((await (await server.as(coAuthor)).post(address).send(body)).status).toBe(403);
  });
});

describe("duplicating", () => {
  it("gives a reader a copy of their own, without versions and shares", async () => {
    const [owner, reader] = [await buildUser(server.db), await buildUser(server.db)];
    const original = await buildNotebook(server.db, {
      owner,
      shares: [[reader, "reader"]],
      versions: ["First"],
    });
    const agent = await server.as(reader);
    const duplicate = (groupId: unknown) =>
      agent.post(`/api/notebooks/${original.id}/duplicate`).send({ groupId });
    expect((await duplicate("x")).status).toBe(422);
    expect((await duplicate(nobody)).status).toBe(404);
    const copy = notebookResponse.parse((await duplicate(null)).body);
    expect(copy).toMatchObject({
      title: `${original.document.title}, a copy`,
      role: "owner",
      lastVersion: null,
      sharedWith: 0,
      document: { cells: original.document.cells },
    });
    const stranger = await server.as(await buildUser(server.db));
    const unseen = await stranger.post(`/api/notebooks/${original.id}/duplicate`).send({ groupId: null });
    expect(unseen.status).toBe(404);
  });

  it("into a group asks what writing there asks", async () => {
    const owner = await buildUser(server.db);
    const { id } = await buildNotebook(server.db, { owner });
    const [asGuest, asResearcher] = [
      await buildGroup(server.db, { members: [[owner, "guest"]] }),
      await buildGroup(server.db, { members: [[owner, "researcher"]] }),
    ];
    const agent = await server.as(owner);
    const duplicate = (groupId: string) => agent.post(`/api/notebooks/${id}/duplicate`).send({ groupId });
    expect((await duplicate(asGuest.id)).status).toBe(403);
    expect((await duplicate(asResearcher.id)).body.group.id).toBe(asResearcher.id);
  });
});

describe("archiving", () => {
  it("leaves a notebook to be read only, out of the usual list, until it is taken out", async () => {
    const [owner, coAuthor] = [await buildUser(server.db), await buildUser(server.db)];
    const { id, document } = await buildNotebook(server.db, {
      owner,
      shares: [[coAuthor, "co-author"]],
      versions: ["First"],
    });
    const agent = await server.as(owner);
    const theirs = await server.as(coAuthor);
    const at = `/api/notebooks/${id}`;
    expect((await agent.post(`${at}/unarchive`)).status).toBe(403);
    const archived = notebookResponse.parse((await agent.post(`${at}/archive`)).body);
    expect(archived).toMatchObject({ isArchived: true, abilities: { edit: false, unarchive: true } });

    for (const person of [agent, theirs]) {
      expect(await titlesOf(person, "shelf")).toEqual([]);
      expect(await titlesOf(person, "archived")).toEqual([document.title]);
      expect((await person.get(at)).status).toBe(200);
      const refusals = [
        await person.put(`${at}/draft`).send({ revision: 1, document: { ...document, title: "Other" } }),
        await person.patch(at).send({ title: "Other" }),
        await person.post(`${at}/versions`).send({ message: "Second", revision: 1 }),
        await person.post(`${at}/versions/1/restore`).send({ revision: 1 }),
      ];
      for (const { status, body } of refusals) expect([status, body.code]).toEqual([409, "archived"]);
    }
    expect((await agent.post(`${at}/unarchive`)).body.isArchived).toBe(false);
    expect((await theirs.patch(at).send({ title: "Other" })).status).toBe(200);
    expect(await titlesOf(theirs, "shelf")).toEqual(["Other"]);
  });

  it("goes on through the bin", async () => {
    const owner = await buildUser(server.db);
    const { id, document } = await buildNotebook(server.db, { owner });
    const agent = await server.as(owner);
    await agent.post(`/api/notebooks/${id}/archive`);
    expect((await agent.delete(`/api/notebooks/${id}`)).status).toBe(204);
    expect(await titlesOf(agent, "archived")).toEqual([]);
    expect(await titlesOf(agent, "bin")).toEqual([document.title]);
    await agent.post(`/api/notebooks/${id}/restore-from-bin`);
    expect(await titlesOf(agent, "archived")).toEqual([document.title]);
  });
});

describe("moving", () => {
  it("takes the group's share back, keeps those in person, and needs a part in the target", async () => {
    const [owner, reader] = [await buildUser(server.db), await buildUser(server.db)];
    const [from, to, asGuest] = [
      await buildGroup(server.db, { members: [[owner, "researcher"]] }),
      await buildGroup(server.db, { members: [[owner, "researcher"]] }),
      await buildGroup(server.db, { members: [[owner, "guest"]] }),
    ];
    const { id } = await buildNotebook(server.db, {
      owner,
      groupId: from.id,
      groupRole: "co-author",
      shares: [[reader, "reader"]],
    });
    const agent = await server.as(owner);
    const move = (groupId: unknown) => agent.post(`/api/notebooks/${id}/move`).send({ groupId });
    expect((await move(undefined)).status).toBe(422);
    expect((await move(nobody)).status).toBe(404);
    expect((await move(asGuest.id)).status).toBe(403);

    const lead = await server.as(from.lead);
    expect((await lead.get(`/api/notebooks/${id}`)).status).toBe(200);
    expect((await move(to.id)).body).toMatchObject({ group: { id: to.id }, sharedWith: 1 });
    expect((await lead.get(`/api/notebooks/${id}`)).status).toBe(404);
    const newLead = await server.as(to.lead);
    expect((await newLead.get(`/api/notebooks/${id}`)).status).toBe(404);
    expect((await (await server.as(reader)).get(`/api/notebooks/${id}`)).status).toBe(200);
    expect((await move(null)).body.group).toBeNull();
  });
});
