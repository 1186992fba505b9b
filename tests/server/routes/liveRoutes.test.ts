import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { LiveEvent } from "../../../shared/schemas/live";
import { buildGroup } from "../../factories/buildGroup";
import { buildNotebook } from "../../factories/buildNotebook";
import { buildUser } from "../../factories/buildUser";
import { listen, openStream } from "../liveStream";
import { startTestServer, type TestServer } from "../testServer";

let server: TestServer;
let origin: string;
let stop: () => Promise<void>;
beforeAll(async () => {
  server = await startTestServer();
  ({ origin, close: stop } = await listen(server));
});
afterAll(async () => {
  await stop();
  await server.close();
});

const changed =
  (part: string) =>
  (event: LiveEvent): boolean =>
    event.type === "changed" && event.part === part;
const isClosed = (event: LiveEvent): boolean => event.type === "closed";
const opened = (event: LiveEvent): boolean => event.type === "opened";
const people =
  (...names: string[]) =>
  (event: LiveEvent): boolean =>
    event.type === "presence" && event.people.map(({ person }) => person.name).join() === names.join();

async function buildPair() {
  const owner = await buildUser(server.db);
  const coAuthor = await buildUser(server.db);
  const { id, document } = await buildNotebook(server.db, { owner, shares: [[coAuthor, "co-author"]] });
  return { owner, coAuthor, id, document, at: `/api/notebooks/${id}` };
}

describe("the events of a notebook", () => {
  it("are for those who may read it: signed out, a stranger, no such notebook", async () => {
    const { id } = await buildPair();
    const stranger = await buildUser(server.db);
    expect((await openStream(server, origin, id, null)).status).toBe(401);
    expect((await openStream(server, origin, id, stranger)).status).toBe(404);
    expect((await openStream(server, origin, "not-an-id", stranger)).status).toBe(404);
  });

  it("tell of others' saves, comments and versions within two seconds", async () => {
    const { owner, coAuthor, id, document, at } = await buildPair();
    const stream = await openStream(server, origin, id, owner);
    expect(stream.type).toContain("text/event-stream");
    await stream.next(opened);

    const theirs = await server.as(coAuthor);
    await theirs.put(`${at}/draft`).send({ revision: 1, document: { ...document, title: "Warmer" } });
    expect(await stream.next(changed("draft"))).toMatchObject({
      by: { id: coAuthor.id, name: coAuthor.name },
    });
    const begun = await theirs
      .post(`${at}/threads`)
      .send({ cellId: "warmth", version: null, text: "Why?\n\nevent: closed\ndata: {}" });
    await stream.next(changed("threads"));
    await theirs.put(`${at}/threads/${begun.body.id}/resolution`).send({ isResolved: true });
    await stream.next(changed("threads"));
    await theirs.post(`${at}/versions`).send({ message: "Warm", revision: 2 });
    await stream.next(changed("notebook"));
    stream.close();
  });

  it("tell nothing of refused changes, of reading, or of other notebooks", async () => {
    const [one, other] = [await buildPair(), await buildPair()];
    const stream = await openStream(server, origin, one.id, one.owner);
    await stream.next(opened);
    const theirs = await server.as(one.coAuthor);
    expect((await theirs.put(`${one.at}/draft`).send({ revision: 1 })).status).toBe(422);
    expect((await theirs.post(`${one.at}/archive`).send({})).status).toBe(403);
    await theirs.get(`${one.at}/threads`);
    const elsewhere = await server.as(other.owner);
    await elsewhere.post(`${other.at}/threads`).send({ cellId: "warmth", version: null, text: "Why?" });
    await expect(stream.next((event) => event.type === "changed")).rejects.toThrow("No such event");
    stream.close();
  });

  it("end when access is taken away, and are not to be had again", async () => {
    const { owner, coAuthor, id, at } = await buildPair();
    const [own, theirs] = [
      await openStream(server, origin, id, owner),
      await openStream(server, origin, id, coAuthor),
    ];
    await theirs.next(opened);
    expect((await (await server.as(owner)).delete(`${at}/shares/${coAuthor.id}`)).status).toBe(204);
    await theirs.next(isClosed);
    await theirs.ended;
    expect((await openStream(server, origin, id, coAuthor)).status).toBe(404);
    await own.next(people(owner.name));
    own.close();
  });

  it("end for who is taken out of the group that it is shared with, and when it goes to the bin", async () => {
    const [lead, member] = [await buildUser(server.db), await buildUser(server.db)];
    const group = await buildGroup(server.db, { lead, members: [[member, "researcher"]] });
    const { id } = await buildNotebook(server.db, { owner: lead, groupId: group.id, groupRole: "reader" });
    const theirs = await openStream(server, origin, id, member);
    const own = await openStream(server, origin, id, lead);
    await theirs.next(opened);
    await own.next(opened);
    const agent = await server.as(lead);
    expect((await agent.delete(`/api/groups/${group.id}/members/${member.id}`)).status).toBeLessThan(300);
    await theirs.next(isClosed);
    await agent.delete(`/api/notebooks/${id}`);
    await own.next(isClosed);
  });

  it("end when the session is over, at the next sign of life", async () => {
    // Of its own, with quick signs of life: elsewhere a stream must end by the change itself.
    const quick = await startTestServer({ db: server.db, heartbeat: 200 });
    const listening = await listen(quick);
    const { owner, id } = await buildPair();
    const cookie = await quick.cookieOf(owner);
    const stream = await openStream({ ...quick, cookieOf: async () => cookie }, listening.origin, id, owner);
    await stream.next(opened);
    const session = await quick.auth.readSession(cookie);
    await quick.auth.closeSession(session!.sessionId);
    await stream.next(isClosed);
    await stream.ended;
    await listening.close();
    await quick.close();
  });
});

describe("presence", () => {
  it("tells who has the notebook open, at which cell, each person once, until they leave", async () => {
    const tamsin = await buildUser(server.db, { name: "A. Tamsin" });
    const wiremu = await buildUser(server.db, { name: "B. Wiremu" });
    const { id } = await buildNotebook(server.db, { owner: tamsin, shares: [[wiremu, "reader"]] });
    const own = await openStream(server, origin, id, tamsin);
    await own.next(people("A. Tamsin"));
    const his = await openStream(server, origin, id, wiremu);
    const { connectionId } = (await his.next(opened)) as Extract<LiveEvent, { type: "opened" }>;
    const second = await openStream(server, origin, id, wiremu);
    await own.next(people("A. Tamsin", "B. Wiremu"));

    const agent = await server.as(wiremu);
    const move = (body: object) => agent.put(`/api/notebooks/${id}/presence`).send(body);
    expect((await move({ connectionId, cellId: "warmth" })).status).toBe(204);
    const at = (cellId: string) => (event: LiveEvent) =>
      event.type === "presence" &&
      event.people.some((row) => row.person.id === wiremu.id && row.cellId === cellId);
    await own.next(at("warmth"));

    expect((await move({ connectionId: crypto.randomUUID(), cellId: null })).status).toBe(404);
    expect((await move({ connectionId: "x", cellId: null })).status).toBe(422);
    const notHis = await server.as(tamsin);
    const stolen = await notHis.put(`/api/notebooks/${id}/presence`).send({ connectionId, cellId: "intro" });
    expect(stolen.status).toBe(404);
    const strange = await server.as(await buildUser(server.db));
    expect(
      (await strange.put(`/api/notebooks/${id}/presence`).send({ connectionId, cellId: null })).status,
    ).toBe(404);

    his.close();
    second.close();
    await own.next(people("A. Tamsin"));
    own.close();
  });
});
