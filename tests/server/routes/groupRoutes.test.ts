import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { groupListResponse, groupResponse } from "../../../shared/schemas/groups";
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
    ["post", `/api/groups/${nobody}/members`],
    ["patch", `/api/groups/${nobody}/members/${nobody}`],
    ["delete", `/api/groups/${nobody}/members/${nobody}`],
  ] as const)("signed out: %s %s is refused", async (method, path) => {
    const response = await server.signedOut[method](path).send(method === "get" ? undefined : {});
    expect(response.status).toBe(401);
    expect(response.body.code).toBe("signed_out");
  });

  it.each([
    ["get", "", undefined],
    ["post", "/members", { email: "person@carrow.example", role: "guest" }],
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
    expect(group.abilities).toMatchObject({ addMember: true, leave: false });

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
  it("are added by a lead, by the address of their account", async () => {
    const { id, lead } = await buildGroup(server.db);
    const ishani = await buildUser(server.db);
    const agent = await server.as(lead);
    const add = (body: object) => agent.post(`/api/groups/${id}/members`).send(body);

    expect((await add({ email: "x", role: "boss" })).body.issues).toHaveLength(2);
    const unknown = await add({ email: "nobody@carrow.example", role: "guest" });
    expect(unknown.status).toBe(422);
    expect(unknown.body).toMatchObject({ code: "no_account", issues: [{ path: "email" }] });

    const added = await add({ email: ishani.email.toUpperCase(), role: "researcher" });
    expect(added.status).toBe(201);
    expect(groupResponse.parse(added.body).memberList).toMatchObject([{}, { user: { id: ishani.id } }]);
    expect((await add({ email: ishani.email, role: "guest" })).body.code).toBe("already_member");
  });

  it("are not added, changed or removed by anyone else in the group", async () => {
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
      const added = await agent
        .post(`/api/groups/${id}/members`)
        .send({ email: "a@b.example", role: "guest" });
      expect(added.status).toBe(403);
      const changed = await agent.patch(`/api/groups/${id}/members/${person.id}`).send({ role: "lead" });
      expect(changed.status).toBe(403);
      expect((await agent.delete(`/api/groups/${id}/members/${other.id}`)).status).toBe(403);
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
      abilities: { addMember: false },
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

  it("are removed by a lead; what was theirs alone goes with them, what was shared stays", async () => {
    const tamsin = await buildUser(server.db);
    const { id, lead } = await buildGroup(server.db, { members: [[tamsin, "researcher"]] });
    const alone = await buildNotebook(server.db, { owner: tamsin, groupId: id });
    const shared = await buildNotebook(server.db, { owner: tamsin, groupId: id, groupRole: "reader" });
    const agent = await server.as(lead);
    expect((await agent.delete(`/api/groups/${id}/members/${nobody}`)).status).toBe(404);
    expect((await agent.delete(`/api/groups/${id}/members/${tamsin.id}`)).status).toBe(204);

    const hers = await server.as(tamsin);
    expect((await hers.get(`/api/notebooks/${alone.id}`)).body.group).toBeNull();
    expect((await hers.get(`/api/notebooks/${shared.id}`)).body).toMatchObject({
      group: { id },
      role: "owner",
    });
    expect((await agent.get(`/api/notebooks/${shared.id}`)).status).toBe(200);
  });
});
