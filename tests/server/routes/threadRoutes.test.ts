import { afterAll, beforeAll, describe, expect, it } from "vitest";
import {
  readersResponse,
  thread as threadSchema,
  threadListResponse,
} from "../../../shared/schemas/comments";
import { noticesResponse } from "../../../shared/schemas/notices";
import { buildCell, buildDocument } from "../../factories/buildDocument";
import { buildGroup } from "../../factories/buildGroup";
import { buildNotebook } from "../../factories/buildNotebook";
import { buildUser } from "../../factories/buildUser";
import { lettersTo } from "../postedLetters";
import { startTestServer, type TestServer } from "../testServer";

const nobody = "00000000-0000-4000-8000-000000000000";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

/** A notebook with one thread by its owner, and who else is in it. */
async function buildThread() {
  const owner = await buildUser(server.db);
  const commenter = await buildUser(server.db);
  const coAuthor = await buildUser(server.db);
  const reader = await buildUser(server.db);
  const { id, document } = await buildNotebook(server.db, {
    owner,
    shares: [
      [commenter, "commenter"],
      [coAuthor, "co-author"],
      [reader, "reader"],
    ],
    versions: ["First"],
  });
  const at = `/api/notebooks/${id}`;
  const begun = await (
    await server.as(owner)
  )
    .post(`${at}/threads`)
    .send({ cellId: "warmth", version: null, text: "Is 240 K *measured*? <script>alert(1)</script>" });
  expect(begun.status).toBe(201);
  const thread = threadSchema.parse(begun.body);
  return {
    at,
    id,
    document,
    owner,
    commenter,
    coAuthor,
    reader,
    thread,
    threadAt: `${at}/threads/${thread.id}`,
  };
}

describe("the routes of threads", () => {
  const routes = [
    ["get", "/threads", undefined],
    ["get", "/readers", undefined],
    ["post", "/threads", { cellId: "warmth", version: null, text: "A word" }],
    ["post", "/threads/THREAD/comments", { text: "A word" }],
    ["patch", "/threads/THREAD/comments/COMMENT", { text: "A word" }],
    ["delete", "/threads/THREAD/comments/COMMENT", undefined],
    ["put", "/threads/THREAD/resolution", { isResolved: true }],
    ["put", "/threads/THREAD/seen", { commentId: nobody }],
  ] as const;

  it.each(routes)("%s %s: signed out, a stranger, a reader", async (method, path, body) => {
    const { at, thread, reader } = await buildThread();
    const comment = thread.comments[0]!;
    const address = at + path.replace("THREAD", thread.id).replace("COMMENT", comment.id);
    const sent = path.endsWith("/seen") ? { commentId: comment.id } : body;
    expect((await server.signedOut[method](address).send(sent)).status).toBe(401);
    const stranger = await server.as(await buildUser(server.db));
    expect((await stranger[method](address).send(sent)).status).toBe(404);
    const mayRead = method === "get" || path.endsWith("/seen");
    const answer = await (await server.as(reader))[method](address).send(sent);
    expect(mayRead ? answer.status < 300 : answer.status).toBe(mayRead ? true : 403);
  });

  it("refuse what is malformed: nothing said, too much said, broken characters, no yes or no", async () => {
    const { at, threadAt, owner } = await buildThread();
    const agent = await server.as(owner);
    const begin = (text: unknown) =>
      agent.post(`${at}/threads`).send({ cellId: "warmth", version: null, text });
    expect((await begin("   ")).status).toBe(422);
    expect((await begin(7)).status).toBe(422);
    expect((await begin("a null \u0000 in it")).status).toBe(422);
    const long = await begin("x".repeat(100_000));
    expect(long.status).toBe(422);
    expect(long.body.issues[0].message).toContain("at most 10000 characters");
    expect((await agent.post(`${threadAt}/comments`).send({ text: "x".repeat(10_001) })).status).toBe(422);
    expect((await agent.put(`${threadAt}/resolution`).send({ isResolved: "yes" })).status).toBe(422);
    expect((await agent.put(`${threadAt}/seen`).send({ commentId: "last" })).status).toBe(422);
    expect((await agent.get(`${at}/threads?version=first`)).status).toBe(422);
  });

  it("name what is not there: a cell, a version, a thread of another notebook, a comment of another thread", async () => {
    const one = await buildThread();
    const other = await buildThread();
    const agent = await server.as(one.owner);
    const begin = (body: object) => agent.post(`${one.at}/threads`).send({ text: "A word", ...body });
    expect((await begin({ cellId: "gone", version: null })).body.code).toBe("cell_gone");
    expect((await begin({ cellId: "warmth", version: 7 })).status).toBe(404);
    const foreign = `${one.at}/threads/${other.thread.id}`;
    expect((await agent.post(`${foreign}/comments`).send({ text: "A word" })).status).toBe(404);
    expect((await agent.put(`${foreign}/resolution`).send({ isResolved: true })).status).toBe(404);
    const foreignComment = `${one.threadAt}/comments/${other.thread.comments[0]!.id}`;
    expect((await agent.patch(foreignComment).send({ text: "Mine" })).status).toBe(404);
    expect((await agent.delete(foreignComment)).status).toBe(404);
    expect((await agent.put(`${one.threadAt}/seen`).send({ commentId: nobody })).status).toBe(404);
  });
});

describe("a thread", () => {
  it("keeps a comment to the letter, script and all, with what its cell said", async () => {
    const { at, thread, owner } = await buildThread();
    expect(thread).toMatchObject({
      version: null,
      cell: { id: "warmth", kind: "values", name: "warmth", text: "T_quiet = 240 K # assumed" },
      resolved: null,
    });
    expect(thread.comments[0]).toMatchObject({
      author: { id: owner.id },
      text: "Is 240 K *measured*? <script>alert(1)</script>",
      isUnread: false,
    });
    const listed = await (await server.as(owner)).get(`${at}/threads`);
    expect(threadListResponse.parse(listed.body).map(({ id }) => id)).toEqual([thread.id]);
  });

  it("outlives its cell, with the text it spoke of", async () => {
    const { at, thread, owner, document } = await buildThread();
    const agent = await server.as(owner);
    const without = { ...document, cells: document.cells.filter(({ id }) => id !== "warmth") };
    expect((await agent.put(`${at}/draft`).send({ revision: 1, document: without })).status).toBe(200);
    const [left] = threadListResponse.parse((await agent.get(`${at}/threads`)).body);
    expect(left).toMatchObject({ id: thread.id, cell: { text: "T_quiet = 240 K # assumed" } });
    const reply = await agent.post(`${at}/threads/${thread.id}/comments`).send({ text: "It is gone." });
    expect(reply.status).toBe(201);
  });

  it("on a kept version stands apart from those of the draft", async () => {
    const { at, owner, thread } = await buildThread();
    const agent = await server.as(owner);
    const begun = await agent.post(`${at}/threads`).send({ cellId: "intro", version: 1, text: "As kept" });
    expect(begun.body.version).toBe(1);
    const ofVersion = threadListResponse.parse((await agent.get(`${at}/threads?version=1`)).body);
    expect(ofVersion.map(({ id }) => id)).toEqual([begun.body.id]);
    const ofDraft = threadListResponse.parse((await agent.get(`${at}/threads`)).body);
    expect(ofDraft.map(({ id }) => id)).toEqual([thread.id]);
  });

  it("quotes no more of a cell than it may keep", async () => {
    const owner = await buildUser(server.db);
    const document = buildDocument({
      cells: [buildCell({ id: "long", kind: "prose", text: "é".repeat(9_000) })],
    });
    const { id } = await buildNotebook(server.db, { owner, document });
    const begun = await (
      await server.as(owner)
    )
      .post(`/api/notebooks/${id}/threads`)
      .send({ cellId: "long", version: null, text: "Long" });
    expect(begun.body.cell.text).toBe("é".repeat(4_000));
  });

  it("is resolved and reopened by who began it and by who may edit, by nobody else", async () => {
    const { at, threadAt, owner, commenter, coAuthor } = await buildThread();
    const his = await server.as(commenter);
    const refused = await his.put(`${threadAt}/resolution`).send({ isResolved: true });
    expect(refused.status).toBe(403);
    expect(refused.body.detail).toContain("who began it");
    const own = await his.post(`${at}/threads`).send({ cellId: "intro", version: null, text: "Mine" });
    expect(own.body.abilities).toEqual({ reply: true, resolve: true });
    const ownAt = `${at}/threads/${own.body.id}/resolution`;
    expect((await his.put(ownAt).send({ isResolved: true })).body.resolved.by.id).toBe(commenter.id);
    const theirs = await (await server.as(coAuthor)).put(ownAt).send({ isResolved: false });
    expect(theirs.body.resolved).toBeNull();
    const byOwner = await (await server.as(owner)).put(ownAt).send({ isResolved: true });
    expect(byOwner.body.resolved.by.id).toBe(owner.id);
  });

  it("of an archived notebook is read and not changed", async () => {
    const { at, threadAt, owner } = await buildThread();
    const agent = await server.as(owner);
    await agent.post(`${at}/archive`).send({});
    expect((await agent.get(`${at}/threads`)).status).toBe(200);
    expect((await agent.post(`${threadAt}/comments`).send({ text: "Late" })).body.code).toBe("archived");
    expect((await agent.put(`${threadAt}/resolution`).send({ isResolved: true })).body.code).toBe("archived");
  });
});

describe("a comment", () => {
  it("is edited and deleted by its author alone", async () => {
    const { threadAt, owner, coAuthor, thread } = await buildThread();
    const [agent, theirs] = [await server.as(owner), await server.as(coAuthor)];
    const commentAt = `${threadAt}/comments/${thread.comments[0]!.id}`;
    expect((await theirs.patch(commentAt).send({ text: "Yours" })).status).toBe(403);
    expect((await theirs.delete(commentAt)).status).toBe(403);
    const edited = threadSchema.parse((await agent.patch(commentAt).send({ text: "Assumed?" })).body);
    expect(edited.comments[0]).toMatchObject({ text: "Assumed?", isDeleted: false });
    expect(edited.comments[0]!.editedAt).not.toBeNull();
  });

  it("leaves its place when it is deleted, and takes the thread along when nothing else is left", async () => {
    const { at, threadAt, owner, coAuthor, thread } = await buildThread();
    const [agent, theirs] = [await server.as(owner), await server.as(coAuthor)];
    const reply = threadSchema.parse(
      (await theirs.post(`${threadAt}/comments`).send({ text: "Assumed." })).body,
    );
    const first = `${threadAt}/comments/${thread.comments[0]!.id}`;
    expect((await agent.delete(first)).status).toBe(204);
    expect((await agent.delete(first)).status).toBe(404);
    expect((await agent.patch(first).send({ text: "Back" })).status).toBe(404);
    const [left] = threadListResponse.parse((await agent.get(`${at}/threads`)).body);
    expect(left!.comments.map(({ text, isDeleted }) => [text, isDeleted])).toEqual([
      ["", true],
      ["Assumed.", false],
    ]);
    expect((await theirs.delete(`${threadAt}/comments/${reply.comments[1]!.id}`)).status).toBe(204);
    expect((await agent.get(`${at}/threads`)).body).toEqual([]);
  });

  it("is unread by each other person until they have seen it, and what comes later is unread again", async () => {
    const { at, threadAt, owner, coAuthor, thread } = await buildThread();
    const [agent, theirs] = [await server.as(owner), await server.as(coAuthor)];
    const unread = async (who: typeof agent) =>
      threadListResponse.parse((await who.get(`${at}/threads`)).body)[0]!.comments.map((row) => row.isUnread);
    expect(await unread(agent)).toEqual([false]);
    expect(await unread(theirs)).toEqual([true]);
    await theirs.put(`${threadAt}/seen`).send({ commentId: thread.comments[0]!.id });
    expect(await unread(theirs)).toEqual([false]);
    await agent.post(`${threadAt}/comments`).send({ text: "And the pressure?" });
    expect(await unread(theirs)).toEqual([false, true]);
    expect(await unread(agent)).toEqual([false, false]);
  });
});

describe("a mention", () => {
  it("tells the person in the page and by letter, once, and not the writer", async () => {
    const { at, threadAt, owner, reader } = await buildThread();
    const agent = await server.as(owner);
    const text = `What do you say, @${reader.name}? And I, @${owner.name}.`;
    const replied = threadSchema.parse((await agent.post(`${threadAt}/comments`).send({ text })).body);
    const comment = replied.comments[1]!;
    expect(comment.mentions.map(({ id }) => id).sort()).toEqual([owner.id, reader.id].sort());
    const theirs = await server.as(reader);
    const told = noticesResponse.parse((await theirs.get("/api/notices")).body);
    expect(told).toMatchObject({
      unread: 1,
      notices: [{ kind: "mention", by: { id: owner.id }, isRead: false }],
    });
    expect(noticesResponse.parse((await agent.get("/api/notices")).body).notices).toEqual([]);
    const [letter] = await lettersTo(server, reader.email);
    expect(letter!.subject).toBe(`${owner.name} mentions you in “Nirel, a first look”`);
    expect(letter!.plain).toContain(`https://tenuity.example${at.replace("/api", "")}#thread-${replied.id}`);

    const again = await agent.patch(`${threadAt}/comments/${comment.id}`).send({ text: `${text} Please.` });
    expect(again.status).toBe(200);
    expect(await lettersTo(server, reader.email)).toHaveLength(1);
  });

  it("of someone known who may not see the notebook is refused with the reason, and nothing is written", async () => {
    const outsider = await buildUser(server.db, { name: "Jorun Outsider" });
    const owner = await buildUser(server.db);
    const group = await buildGroup(server.db, { lead: owner, members: [[outsider, "researcher"]] });
    const { id } = await buildNotebook(server.db, { owner, groupId: group.id });
    const agent = await server.as(owner);
    const body = { cellId: "warmth", version: null, text: "Ask @Jorun Outsider" };
    const refused = await agent.post(`/api/notebooks/${id}/threads`).send(body);
    expect(refused.status).toBe(422);
    expect(refused.body).toMatchObject({ code: "mention_unseen", issues: [{ path: "text" }] });
    expect(refused.body.detail).toContain("Jorun Outsider may not see this notebook");
    expect((await agent.get(`/api/notebooks/${id}/threads`)).body).toEqual([]);
    const people = readersResponse.parse((await agent.get(`/api/notebooks/${id}/readers`)).body);
    expect(people.map((person) => person.id)).toEqual([owner.id]);

    await agent.put(`/api/notebooks/${id}/group-share`).send({ role: "reader" });
    expect((await agent.post(`/api/notebooks/${id}/threads`).send(body)).status).toBe(201);
  });

  it("says nothing of strangers: a name nobody here knows is plain text", async () => {
    await buildUser(server.db, { name: "Hidden Stranger" });
    const { threadAt, owner } = await buildThread();
    const answer = await (
      await server.as(owner)
    )
      .post(`${threadAt}/comments`)
      .send({ text: "Ask @Hidden Stranger or t@carrow.example" });
    expect(answer.status).toBe(201);
    expect(threadSchema.parse(answer.body).comments[1]!.mentions).toEqual([]);
  });
});

describe("notices", () => {
  it("tell those who wrote in a thread of replies, unless they may not see the notebook any longer", async () => {
    const { at, threadAt, owner, commenter, coAuthor } = await buildThread();
    const [agent, his, theirs] = [
      await server.as(owner),
      await server.as(commenter),
      await server.as(coAuthor),
    ];
    await his.post(`${threadAt}/comments`).send({ text: "From a lamp." });
    const ofOwner = noticesResponse.parse((await agent.get("/api/notices")).body);
    expect(ofOwner.notices.map(({ kind, excerpt }) => [kind, excerpt])).toEqual([["reply", "From a lamp."]]);
    expect(ofOwner.notices[0]!.notebook.title).toBe("Nirel, a first look");

    await agent.delete(`${at}/shares/${commenter.id}`);
    await theirs.post(`${threadAt}/comments`).send({ text: "From the sun." });
    expect(noticesResponse.parse((await his.get("/api/notices")).body)).toEqual({ notices: [], unread: 0 });
    expect(await lettersTo(server, commenter.email)).toEqual([]);
  });

  it("of a notebook taken away are not shown any longer", async () => {
    const { at, threadAt, owner, commenter } = await buildThread();
    const agent = await server.as(owner);
    await agent.post(`${threadAt}/comments`).send({ text: `See @${commenter.name}` });
    const his = await server.as(commenter);
    expect((await his.get("/api/notices")).body.unread).toBe(1);
    await agent.delete(`${at}/shares/${commenter.id}`);
    expect((await his.get("/api/notices")).body).toEqual({ notices: [], unread: 0 });
  });

  it("are read one by one, all together, or with their thread; those of others stay", async () => {
    const { threadAt, owner, coAuthor, commenter } = await buildThread();
    const [agent, theirs, his] = [
      await server.as(owner),
      await server.as(coAuthor),
      await server.as(commenter),
    ];
    const say = async (text: string) =>
      threadSchema.parse((await theirs.post(`${threadAt}/comments`).send({ text })).body).comments.at(-1)!;
    await say("One");
    await say("Two");
    const both = noticesResponse.parse((await agent.get("/api/notices")).body);
    expect(both.unread).toBe(2);
    const ids = [both.notices[0]!.id];
    expect((await his.post("/api/notices/read").send({ ids })).status).toBe(200);
    expect((await agent.get("/api/notices")).body.unread).toBe(2);
    expect((await agent.post("/api/notices/read").send({ ids })).body.unread).toBe(1);
    expect((await agent.post("/api/notices/read").send({ ids: null })).body.unread).toBe(0);
    const three = await say("Three");
    await agent.put(`${threadAt}/seen`).send({ commentId: three.id });
    expect((await agent.get("/api/notices")).body.unread).toBe(0);
    expect((await server.signedOut.get("/api/notices")).status).toBe(401);
    expect((await server.signedOut.post("/api/notices/read").send({ ids: null })).status).toBe(401);
    expect((await agent.post("/api/notices/read").send({ ids: "all" })).status).toBe(422);
  });
});
