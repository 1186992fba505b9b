import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { setMemberRole } from "../../../server/commands/setMemberRole";
import { groupMembers } from "../../../server/db/tables/groupMembers";
import { groupListResponse, groupResponse, memberNotebooks } from "../../../shared/schemas/groups";
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

describe("every route of groups", () => {
  it.each([
    ["get", "/api/groups"],
    ["post", "/api/groups"],
    ["get", `/api/groups/${nobody}`],
    ["patch", `/api/groups/${nobody}`],
    ["post", `/api/groups/${nobody}/hand-over`],
    ["get", `/api/groups/${nobody}/members/${nobody}/notebooks`],
    ["patch", `/api/groups/${nobody}/members/${nobody}`],
    ["delete", `/api/groups/${nobody}/members/${nobody}`],
  ] as const)("signed out: %s %s is refused", async (method, path) => {
    const response = await server.signedOut[method](path).send(method === "get" ? undefined : {});
    expect(response.status).toBe(401);
    expect(response.body.code).toBe("signed_out");
  });

  it.each([
    ["get", "", undefined],
    ["patch", "", { name: "Another name" }],
    ["post", "/hand-over", { userId: nobody }],
    ["get", `/members/${nobody}/notebooks`, undefined],
    ["patch", `/members/${nobody}`, { role: "guest" }],
    ["delete", `/members/${nobody}`, undefined],
  ] as const)("outside the group: %s …%s is not found", async (method, path, body) => {
    const { id } = await buildGroup(server.db);
    const outsider = await server.as(await buildUser(server.db));
    for (const group of [id, nobody, "not-an-id"]) {
      const response = await outsider[method](`/api/groups/${group}${path}`).send(body);
      expect(response.status).toBe(404);
    }
  });
});

describe("POST /api/groups", () => {
  it("refuses a malformed one", async () => {
    const lead = await server.as(await buildUser(server.db));
    for (const code of ["C", "CARROW", "car", "C4R", "ČAR", 5, undefined]) {
      const response = await lead.post("/api/groups").send({ name: "Carrow Aeronomy", code });
      expect(response.status).toBe(422);
      expect(response.body.issues).toMatchObject([{ path: "code" }]);
    }
    expect((await lead.post("/api/groups").send({ name: "", code: "X" })).body.issues).toHaveLength(2);
  });

  it("founds a group that its founder leads; its code is taken from then on", async () => {
    const lead = await server.as(await buildUser(server.db, { name: "Jorun Aldaker" }));
    const response = await lead.post("/api/groups").send({ name: " Carrow Aeronomy ", code: "CAR" });
    expect(response.status).toBe(201);
    const group = groupResponse.parse(response.body);
    expect(group).toMatchObject({ name: "Carrow Aeronomy", code: "CAR", role: "lead", members: 1 });
    expect(group.memberList).toMatchObject([{ user: { name: "Jorun Aldaker" }, role: "lead" }]);
    expect(group.abilities).toMatchObject({ invite: true, leave: false });

    const again = await lead.post("/api/groups").send({ name: "Another", code: "CAR" });
    expect(again.status).toBe(409);
    expect(again.body).toMatchObject({ code: "code_taken", issues: [{ path: "code" }] });
  });
});

describe("GET /api/groups", () => {
  it("lists one's own groups, by name, and no other", async () => {
    const tamsin = await buildUser(server.db);
    const second = await buildGroup(server.db, { name: "Second", members: [[tamsin, "guest"]] });
    const first = await buildGroup(server.db, { name: "First", members: [[tamsin, "researcher"]] });
    await buildGroup(server.db, { name: "Not hers" });
    const response = await (await server.as(tamsin)).get("/api/groups");
    const groups = groupListResponse.parse(response.body);
    expect(groups.map(({ id, role, members }) => [id, role, members])).toEqual([
      [first.id, "researcher", 2],
      [second.id, "guest", 2],
    ]);
    expect(groups.map(({ abilities }) => abilities.createNotebook)).toEqual([true, false]);
  });
});

describe("GET /api/groups/:id", () => {
  it("shows each member the members, leads first, without addresses", async () => {
    const guest = await buildUser(server.db, { name: "Aaro Guest" });
    const researcher = await buildUser(server.db, { name: "Bela Researcher" });
    const { id, lead } = await buildGroup(server.db, {
      members: [
        [guest, "guest"],
        [researcher, "researcher"],
      ],
    });
    for (const person of [guest, researcher, lead]) {
      const response = await (await server.as(person)).get(`/api/groups/${id}`);
      const { memberList } = groupResponse.parse(response.body);
      expect(memberList.map(({ user }) => user.id)).toEqual([lead.id, researcher.id, guest.id]);
      expect(response.text).not.toContain("@");
    }
  });
});

describe("members", () => {
  it("are not changed, removed or made lead by anyone but a lead", async () => {
    const researcher = await buildUser(server.db);
    const guest = await buildUser(server.db);
    const { id } = await buildGroup(server.db, {
      members: [
        [researcher, "researcher"],
        [guest, "guest"],
      ],
    });
    for (const [person, other] of [
      [researcher, guest],
      [guest, researcher],
    ] as const) {
      const agent = await server.as(person);
      const changed = await agent.patch(`/api/groups/${id}/members/${person.id}`).send({ role: "lead" });
      expect(changed.status).toBe(403);
      expect((await agent.delete(`/api/groups/${id}/members/${other.id}`)).status).toBe(403);
      expect((await agent.get(`/api/groups/${id}/members/${other.id}/notebooks`)).status).toBe(403);
      expect((await agent.post(`/api/groups/${id}/hand-over`).send({ userId: other.id })).status).toBe(403);
      expect((await agent.patch(`/api/groups/${id}`).send({ name: "Mine" })).status).toBe(403);
    }
  });

  it("change role by a lead's word; the last lead stays one", async () => {
    const wiremu = await buildUser(server.db);
    const { id, lead } = await buildGroup(server.db, { members: [[wiremu, "researcher"]] });
    const agent = await server.as(lead);
    const set = (userId: string, role: unknown) =>
      agent.patch(`/api/groups/${id}/members/${userId}`).send({ role });

    expect((await set(wiremu.id, "king")).status).toBe(422);
    expect((await set(nobody, "guest")).status).toBe(404);
    expect((await set("not-an-id", "guest")).status).toBe(404);
    const last = await set(lead.id, "researcher");
    expect(last.status).toBe(409);
    expect(last.body.code).toBe("last_lead");

    const promoted = await set(wiremu.id, "lead");
    expect(promoted.status).toBe(200);
    expect(groupResponse.parse(promoted.body).memberList.map(({ role }) => role)).toEqual(["lead", "lead"]);
    const stepped = await set(lead.id, "guest");
    expect(groupResponse.parse(stepped.body)).toMatchObject({
      role: "guest",
      abilities: { invite: false },
    });
  });

  it("leave by themselves; the last lead cannot", async () => {
    const guest = await buildUser(server.db);
    const { id, lead } = await buildGroup(server.db, { members: [[guest, "guest"]] });
    const refused = await (await server.as(lead)).delete(`/api/groups/${id}/members/${lead.id}`);
    expect(refused.status).toBe(409);
    expect(refused.body.code).toBe("last_lead");
    const agent = await server.as(guest);
    expect((await agent.delete(`/api/groups/${id}/members/${guest.id}`)).status).toBe(204);
    expect((await agent.get(`/api/groups/${id}`)).status).toBe(404);
  });

  it("two leads who leave at once do not both get away", async () => {
    const second = await buildUser(server.db);
    const { id, lead } = await buildGroup(server.db, { members: [[second, "lead"]] });
    const answers = await Promise.all(
      [lead, second].map(async (person) =>
        (await server.as(person)).delete(`/api/groups/${id}/members/${person.id}`),
      ),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([204, 409]);
  });

  it("two leads who remove each other at once do not both succeed, though a third is there", async () => {
    const [second, third] = [await buildUser(server.db), await buildUser(server.db)];
    const { id, lead } = await buildGroup(server.db, {
      members: [
        [second, "lead"],
        [third, "lead"],
      ],
    });
    const answers = await Promise.all(
      [
        [lead, second],
        [second, lead],
      ].map(async ([by, whom]) => (await server.as(by!)).delete(`/api/groups/${id}/members/${whom!.id}`)),
    );
    const [done, refused] = answers.map(({ status }) => status).sort();
    expect(done).toBe(204);
    expect([404, 409]).toContain(refused);
    const group = groupResponse.parse((await (await server.as(third)).get(`/api/groups/${id}`)).body);
    expect(group.members).toBe(2);
  });

  it("are not changed by a lead who has ceased to be one in the meantime", async () => {
    const [second, guest] = [await buildUser(server.db), await buildUser(server.db)];
    const { id, lead } = await buildGroup(server.db, {
      members: [
        [second, "lead"],
        [guest, "guest"],
      ],
    });
    const at = new Date();
    const change = { groupId: id, actorId: second.id, at };
    await setMemberRole(server.db, { ...change, userId: second.id, role: "researcher" });
    const late = setMemberRole(server.db, { ...change, userId: guest.id, role: "lead" });
    await expect(late).rejects.toMatchObject({ code: "not_lead_any_more" });
    const group = groupResponse.parse((await (await server.as(lead)).get(`/api/groups/${id}`)).body);
    expect(group.memberList.map(({ role }) => role)).toEqual(["lead", "researcher", "guest"]);
  });

  it("leave their notebooks in the group to the lead who removes them, who is told how many before", async () => {
    const tamsin = await buildUser(server.db);
    const { id, lead } = await buildGroup(server.db, { members: [[tamsin, "researcher"]] });
    const alone = await buildNotebook(server.db, { owner: tamsin, groupId: id });
    const shared = await buildNotebook(server.db, {
      owner: tamsin,
      groupId: id,
      groupRole: "reader",
      shares: [[lead, "commenter"]],
    });
    const elsewhere = await buildNotebook(server.db, { owner: tamsin });
    const agent = await server.as(lead);
    const told = await agent.get(`/api/groups/${id}/members/${tamsin.id}/notebooks`);
    expect(memberNotebooks.parse(told.body)).toEqual({
      notebooks: 2,
      goTo: { id: lead.id, name: lead.name },
    });
    expect((await agent.delete(`/api/groups/${id}/members/${nobody}`)).status).toBe(404);
    expect((await agent.delete(`/api/groups/${id}/members/${tamsin.id}`)).status).toBe(204);

    for (const { id: notebookId } of [alone, shared]) {
      const notebook = (await agent.get(`/api/notebooks/${notebookId}`)).body;
      expect(notebook).toMatchObject({ role: "owner", group: { id } });
      expect((await agent.get(`/api/notebooks/${notebookId}/shares`)).body.people).toEqual([]);
    }
    const hers = await server.as(tamsin);
    expect((await hers.get(`/api/notebooks/${alone.id}`)).status).toBe(404);
    expect((await hers.get(`/api/notebooks/${elsewhere.id}`)).body.role).toBe("owner");
  });

  it("who leave leave them to the lead who has been there longest", async () => {
    const [tamsin, newer] = [await buildUser(server.db), await buildUser(server.db)];
    const { id, lead } = await buildGroup(server.db, {
      members: [
        [tamsin, "lead"],
        [newer, "lead"],
      ],
    });
    const later = new Date("2026-11-01T00:00:00Z");
    await server.db.update(groupMembers).set({ joinedAt: later }).where(eq(groupMembers.userId, newer.id));
    const { id: notebookId } = await buildNotebook(server.db, { owner: tamsin, groupId: id });
    const hers = await server.as(tamsin);
    const told = await hers.get(`/api/groups/${id}/members/${tamsin.id}/notebooks`);
    expect(told.body).toMatchObject({ notebooks: 1, goTo: { id: lead.id } });
    expect((await hers.delete(`/api/groups/${id}/members/${tamsin.id}`)).status).toBe(204);
    const theirs = await (await server.as(lead)).get(`/api/notebooks/${notebookId}`);
    expect(theirs.body.role).toBe("owner");
  });
});

describe("PATCH /api/groups/:id", () => {
  it("renames the group for its leads; the code stays", async () => {
    const { id, lead, code } = await buildGroup(server.db, { name: "Before" });
    const agent = await server.as(lead);
    expect((await agent.patch(`/api/groups/${id}`).send({ name: " " })).status).toBe(422);
    const renamed = await agent.patch(`/api/groups/${id}`).send({ name: "After", code: "XXXXX" });
    expect(groupResponse.parse(renamed.body)).toMatchObject({ name: "After", code });
  });
});

describe("POST /api/groups/:id/hand-over", () => {
  it("makes a member lead in one's place", async () => {
    const tamsin = await buildUser(server.db);
    const { id, lead } = await buildGroup(server.db, { members: [[tamsin, "guest"]] });
    const agent = await server.as(lead);
    const handOver = (userId: unknown) => agent.post(`/api/groups/${id}/hand-over`).send({ userId });
    expect((await handOver("x")).status).toBe(422);
    expect((await handOver(nobody)).status).toBe(404);
    expect((await handOver(lead.id)).body.code).toBe("already_lead");

    const answer = groupResponse.parse((await handOver(tamsin.id)).body);
    expect(answer.memberList.map(({ user, role }) => [user.id, role])).toEqual([
      [tamsin.id, "lead"],
      [lead.id, "researcher"],
    ]);
    expect((await handOver(tamsin.id)).status).toBe(403);
  });
});
