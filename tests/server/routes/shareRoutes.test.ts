import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { sharesResponse } from "../../../shared/schemas/shares";
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

const routes = [
  ["post", "/shares", { email: "a@b.example", role: "reader" }],
  ["patch", `/shares/${nobody}`, { role: "reader" }],
  ["delete", `/shares/${nobody}`, undefined],
  ["put", "/group-share", { role: null }],
  ["patch", `/invitations/${nobody}`, { role: "reader" }],
  ["delete", `/invitations/${nobody}`, undefined],
  ["post", `/invitations/${nobody}/send-again`, undefined],
  ["post", "/hand-over", { userId: nobody }],
] as const;

describe("the routes of shares", () => {
  it.each(routes)("%s %s: signed out, a stranger, a co-author", async (method, path, body) => {
    const [owner, coAuthor] = [await buildUser(server.db), await buildUser(server.db)];
    const { id } = await buildNotebook(server.db, { owner, shares: [[coAuthor, "co-author"]] });
    const address = `/api/notebooks/${id}${path}`;
    expect((await server.signedOut[method](address).send(body)).status).toBe(401);
    const stranger = await server.as(await buildUser(server.db));
    expect((await stranger[method](address).send(body)).status).toBe(404);
    expect((await (await server.as(coAuthor))[method](address).send(body)).status).toBe(403);
  });

  it("refuse what is malformed, and name what is not there", async () => {
    const owner = await buildUser(server.db);
    const { id } = await buildNotebook(server.db, { owner });
    const agent = await server.as(owner);
    const at = `/api/notebooks/${id}`;
    expect((await agent.post(`${at}/shares`).send({ email: "x", role: "owner" })).body.issues).toHaveLength(
      2,
    );
    expect((await agent.patch(`${at}/shares/${nobody}`).send({ role: "owner" })).status).toBe(422);
    expect((await agent.put(`${at}/group-share`).send({ role: "owner" })).status).toBe(422);
    expect((await agent.patch(`${at}/shares/${nobody}`).send({ role: "reader" })).status).toBe(404);
    expect((await agent.delete(`${at}/shares/${nobody}`)).status).toBe(404);
    expect((await agent.delete(`${at}/shares/not-an-id`)).status).toBe(404);
    expect((await agent.post(`${at}/hand-over`).send({ userId: nobody })).status).toBe(404);
    expect((await agent.put(`${at}/group-share`).send({ role: "reader" })).body.code).toBe("no_group");
  });
});

describe("sharing with a person", () => {
  it("lets them in by role, tells them by a letter, and can be changed and taken back", async () => {
    const [owner, wiremu] = [await buildUser(server.db), await buildUser(server.db)];
    const { id, document } = await buildNotebook(server.db, { owner });
    const agent = await server.as(owner);
    const his = await server.as(wiremu);
    const at = `/api/notebooks/${id}`;
    const share = { email: wiremu.email.toUpperCase(), role: "commenter" };
    const shared = await agent.post(`${at}/shares`).send(share);
    expect(shared.status).toBe(201);
    expect(sharesResponse.parse(shared.body)).toMatchObject({
      owner: { id: owner.id },
      people: [{ user: { id: wiremu.id }, role: "commenter", groupRole: null }],
      invitations: [],
      group: null,
    });
    expect((await agent.post(`${at}/shares`).send(share)).body.code).toBe("already_shared");
    expect((await his.get(at)).body.role).toBe("commenter");
    const [letter] = await lettersTo(server, wiremu.email);
    expect(letter!.plain).toContain(`https://tenuity.example/notebooks/${id}`);

    const save = { revision: 1, document };
    expect((await his.put(`${at}/draft`).send(save)).status).toBe(403);
    const changed = await agent.patch(`${at}/shares/${wiremu.id}`).send({ role: "co-author" });
    expect(sharesResponse.parse(changed.body).people).toMatchObject([{ role: "co-author" }]);
    expect((await his.put(`${at}/draft`).send(save)).status).toBe(200);

    expect((await agent.delete(`${at}/shares/${wiremu.id}`)).status).toBe(204);
    expect((await his.get(at)).status).toBe(404);
  });

  it("sends no letter that they have switched off, and shares all the same", async () => {
    const [owner, reader] = [await buildUser(server.db), await buildUser(server.db)];
    const { id } = await buildNotebook(server.db, { owner });
    const theirs = await server.as(reader);
    await theirs.patch("/api/account/mail").send({ kind: "notebook_invitation", isWanted: false });
    const agent = await server.as(owner);
    await agent.post(`/api/notebooks/${id}/shares`).send({ email: reader.email, role: "reader" });
    expect(await lettersTo(server, reader.email)).toEqual([]);
    expect((await theirs.get(`/api/notebooks/${id}`)).status).toBe(200);
  });

  it("is given up by them, and by nobody who has it through a group alone", async () => {
    const [owner, reader, member] = [
      await buildUser(server.db),
      await buildUser(server.db),
      await buildUser(server.db),
    ];
    const group = await buildGroup(server.db, {
      members: [
        [owner, "researcher"],
        [member, "guest"],
      ],
    });
    const { id } = await buildNotebook(server.db, {
      owner,
      groupId: group.id,
      groupRole: "reader",
      shares: [[reader, "reader"]],
    });
    const giveUp = async (person: typeof owner) =>
      (await server.as(person)).delete(`/api/notebooks/${id}/shares/${person.id}`);
    expect((await giveUp(member)).status).toBe(403);
    expect((await giveUp(owner)).status).toBe(403);
    expect((await giveUp(reader)).status).toBe(204);
    expect((await (await server.as(reader)).get(`/api/notebooks/${id}`)).status).toBe(404);
  });

  it("who has no account yet is invited; addresses are for the owner's eyes", async () => {
    const [owner, reader] = [await buildUser(server.db), await buildUser(server.db)];
    const { id } = await buildNotebook(server.db, { owner, shares: [[reader, "reader"]] });
    const other = await buildNotebook(server.db, { owner });
    const agent = await server.as(owner);
    const at = `/api/notebooks/${id}`;
    const email = "n.harcourt@vell.example";
    const shared = await agent.post(`${at}/shares`).send({ email, role: "commenter" });
    const [invitation] = sharesResponse.parse(shared.body).invitations;
    expect(invitation).toMatchObject({ email, role: "commenter", hasLapsed: false });
    expect((await agent.post(`${at}/shares`).send({ email, role: "reader" })).body.code).toBe(
      "already_invited",
    );
    const seen = await (await server.as(reader)).get(`${at}/shares`);
    expect(sharesResponse.parse(seen.body)).toMatchObject({ invitations: [], people: [{ role: "reader" }] });
    expect(seen.text).not.toContain("@");

    const theirs = `/api/notebooks/${other.id}/invitations/${invitation!.id}`;
    expect((await agent.patch(theirs).send({ role: "reader" })).status).toBe(404);
    const mine = `${at}/invitations/${invitation!.id}`;
    expect((await agent.patch(mine).send({ role: "lead" })).status).toBe(422);
    expect((await agent.patch(mine).send({ role: "reader" })).body.invitations[0].role).toBe("reader");
    expect((await agent.post(`${mine}/send-again`)).status).toBe(200);
    expect(await lettersTo(server, email)).toHaveLength(2);
    expect((await agent.delete(mine)).status).toBe(204);
    expect((await agent.get(`${at}/shares`)).body.invitations).toEqual([]);
  });

  it("not with oneself", async () => {
    const owner = await buildUser(server.db);
    const { id } = await buildNotebook(server.db, { owner });
    const answer = await (
      await server.as(owner)
    )
      .post(`/api/notebooks/${id}/shares`)
      .send({ email: owner.email, role: "reader" });
    expect(answer.body).toMatchObject({ code: "own_notebook", issues: [{ path: "email" }] });
  });
});

describe("sharing with the group", () => {
  it("lets everyone in it in, a guest to read alone, and is taken back", async () => {
    const [owner, guest] = [await buildUser(server.db), await buildUser(server.db)];
    const group = await buildGroup(server.db, {
      members: [
        [owner, "researcher"],
        [guest, "guest"],
      ],
    });
    const { id } = await buildNotebook(server.db, { owner, groupId: group.id });
    const agent = await server.as(owner);
    const shared = await agent.put(`/api/notebooks/${id}/group-share`).send({ role: "co-author" });
    expect(sharesResponse.parse(shared.body).group).toMatchObject({
      role: "co-author",
      people: 3,
      guests: 1,
    });
    const roleOf = async (person: typeof owner) =>
      (await (await server.as(person)).get(`/api/notebooks/${id}`)).body.role;
    expect(await roleOf(group.lead)).toBe("co-author");
    expect(await roleOf(guest)).toBe("reader");
    await agent.put(`/api/notebooks/${id}/group-share`).send({ role: null });
    expect(await roleOf(group.lead)).toBeUndefined();
  });
});

describe("handing a notebook over", () => {
  it("makes another the owner and leaves the one before as a co-author", async () => {
    const [owner, wiremu] = [await buildUser(server.db), await buildUser(server.db)];
    const { id } = await buildNotebook(server.db, { owner, shares: [[wiremu, "reader"]] });
    const agent = await server.as(owner);
    const handOver = (userId: string) => agent.post(`/api/notebooks/${id}/hand-over`).send({ userId });
    expect((await handOver(owner.id)).status).toBe(404);
    expect((await handOver((await buildUser(server.db)).id)).status).toBe(404);
    expect((await handOver(wiremu.id)).body).toMatchObject({ role: "co-author", owner: { id: wiremu.id } });
    expect((await handOver(wiremu.id)).status).toBe(403);
    const his = await (await server.as(wiremu)).get(`/api/notebooks/${id}/shares`);
    expect(sharesResponse.parse(his.body).people).toMatchObject([{ user: { id: owner.id } }]);
  });

  it("within a group goes only to those who may write there", async () => {
    const [owner, guest, outsider] = [
      await buildUser(server.db),
      await buildUser(server.db),
      await buildUser(server.db),
    ];
    const group = await buildGroup(server.db, {
      members: [
        [owner, "researcher"],
        [guest, "guest"],
      ],
    });
    const { id } = await buildNotebook(server.db, {
      owner,
      groupId: group.id,
      shares: [[outsider, "co-author"]],
    });
    const agent = await server.as(owner);
    const handOver = (userId: string) => agent.post(`/api/notebooks/${id}/hand-over`).send({ userId });
    expect((await handOver(guest.id)).body.code).toBe("not_in_group");
    expect((await handOver(outsider.id)).body.code).toBe("not_in_group");
    expect((await handOver(group.lead.id)).status).toBe(200);
  });

  it("twice at once has one new owner", async () => {
    const [owner, one, two] = [
      await buildUser(server.db),
      await buildUser(server.db),
      await buildUser(server.db),
    ];
    const { id } = await buildNotebook(server.db, {
      owner,
      shares: [
        [one, "reader"],
        [two, "reader"],
      ],
    });
    const agent = await server.as(owner);
    const answers = await Promise.all(
      [one, two].map(({ id: userId }) => agent.post(`/api/notebooks/${id}/hand-over`).send({ userId })),
    );
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
  });
});
