import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { recordAct } from "../../../server/commands/recordAct";
import { auditResponse } from "../../../shared/schemas/audit";
import { buildGroup } from "../../factories/buildGroup";
import { buildNotebook } from "../../factories/buildNotebook";
import { buildUser } from "../../factories/buildUser";
import { startTestServer, type TestServer } from "../testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

type Agent = Awaited<ReturnType<TestServer["as"]>>;

const trailOf = async (agent: Agent, groupId: string, query = "") =>
  auditResponse.parse((await agent.get(`/api/groups/${groupId}/audit${query}`)).body);

const actsOf = async (agent: Agent, groupId: string, query = "") =>
  (await trailOf(agent, groupId, query)).lines.map(({ act }) => act);

describe("the audit trail", () => {
  it.each(["", ".csv"])("audit%s is for leads alone", async (ending) => {
    const researcher = await buildUser(server.db);
    const { id, lead } = await buildGroup(server.db, { members: [[researcher, "researcher"]] });
    const at = `/api/groups/${id}/audit${ending}`;
    expect((await server.signedOut.get(at)).status).toBe(401);
    expect((await (await server.as(await buildUser(server.db))).get(at)).status).toBe(404);
    expect((await (await server.as(researcher)).get(at)).status).toBe(403);
    const agent = await server.as(lead);
    expect((await agent.get(`${at}?kind=weather`)).status).toBe(422);
    expect((await agent.get(`${at}?from=yesterday`)).status).toBe(422);
    expect((await agent.get(at)).status).toBe(200);
  });

  it("tells who did what to what, and nothing of what was refused", async () => {
    const tamsin = await buildUser(server.db, { name: "Tamsin Orevale" });
    const { id, lead } = await buildGroup(server.db, { name: "Before", members: [[tamsin, "guest"]] });
    const agent = await server.as(lead);
    await agent.patch(`/api/groups/${id}`).send({ name: "After" });
    await agent.patch(`/api/groups/${id}/members/${tamsin.id}`).send({ role: "researcher" });
    await agent.patch(`/api/groups/${id}/members/${tamsin.id}`).send({ role: "researcher" });
    await agent.patch(`/api/groups/${id}/members/${lead.id}`).send({ role: "guest" });
    await agent.post(`/api/groups/${id}/invitations`).send({ email: "x@lomme.example", role: "guest" });
    await agent.post(`/api/groups/${id}/invitations`).send({ email: "x@lomme.example", role: "guest" });

    const { lines, total, next } = await trailOf(agent, id);
    expect(lines.map(({ act }) => act)).toEqual([
      "invitation_sent",
      "role_set",
      "group_renamed",
      "group_founded",
    ]);
    expect({ total, next }).toEqual({ total: 4, next: null });
    expect(lines[1]).toMatchObject({
      by: { id: lead.id, name: lead.name },
      subject: { kind: "person", id: tamsin.id, name: "Tamsin Orevale" },
      details: { role: "researcher", before: "guest" },
    });
    expect(lines[0]!.details).toEqual({ with: "x@lomme.example", role: "guest" });
  });

  it("names no notebook that the lead may not see", async () => {
    const tamsin = await buildUser(server.db);
    const { id, lead } = await buildGroup(server.db, { members: [[tamsin, "researcher"]] });
    const hidden = await buildNotebook(server.db, { owner: tamsin, groupId: id });
    const hers = await server.as(tamsin);
    const at = `/api/notebooks/${hidden.id}`;
    await hers.post(`${at}/shares`).send({ email: "secret@lomme.example", role: "reader" });
    const agent = await server.as(lead);
    const before = await trailOf(agent, id, "?kind=notebooks");
    expect(before.lines).toMatchObject([
      { act: "notebook_invitation_sent", subject: null, details: {}, by: { id: tamsin.id } },
    ]);
    const table = await agent.get(`/api/groups/${id}/audit.csv`);
    expect(table.text).not.toMatch(/secret|Nirel/);

    await hers.put(`${at}/group-share`).send({ role: "reader" });
    const after = await trailOf(agent, id, "?kind=notebooks");
    expect(after.lines[0]!.subject).toMatchObject({ id: hidden.id, name: hidden.document.title });
    expect(after.lines[1]!.details.with).toBe("secret@lomme.example");
  });

  it("is filtered by person, kind and time, and turned page by page without a gap", async () => {
    const tamsin = await buildUser(server.db);
    const { id, lead } = await buildGroup(server.db, { members: [[tamsin, "researcher"]] });
    for (let minute = 0; minute < 120; minute += 1) {
      await recordAct(server.db, {
        at: new Date(Date.UTC(2026, 10, 1, 0, minute)),
        groupId: id,
        actorId: minute % 3 === 0 ? tamsin.id : lead.id,
        act: minute % 2 === 0 ? "group_renamed" : "notebook_archived",
        subject: "group",
        subjectId: id,
        subjectName: `${minute}`,
      });
    }
    const agent = await server.as(lead);
    const seen: string[] = [];
    let next: number | null = null;
    do {
      const page: Awaited<ReturnType<typeof trailOf>> = await trailOf(
        agent,
        id,
        next ? `?before=${next}` : "",
      );
      expect(page.total).toBe(121);
      seen.push(...page.lines.map(({ subject }) => subject!.name));
      next = page.next;
    } while (next !== null);
    expect(seen.slice(0, 120)).toEqual(Array.from({ length: 120 }, (_, index) => `${119 - index}`));

    const query = `?person=${tamsin.id}&kind=people&from=2026-11-01T00:30:00Z&to=2026-11-01T01:00:00Z`;
    const filtered = await trailOf(agent, id, query);
    expect(filtered.lines.map(({ subject }) => subject!.name)).toEqual(["54", "48", "42", "36", "30"]);
    expect(await actsOf(agent, id, "?kind=people&to=2026-11-01T00:01:00Z")).toContain("group_renamed");
    const table = await agent.get(`/api/groups/${id}/audit.csv${query}`);
    expect(table.headers["content-disposition"]).toMatch(/audit-trail\.csv/);
    expect(table.text.trim().split("\r\n")).toHaveLength(6);
  });

  it("as a table holds no formula", async () => {
    const { id, lead } = await buildGroup(server.db, { name: '=HYPERLINK("x"),y' });
    const table = await (await server.as(lead)).get(`/api/groups/${id}/audit.csv`);
    expect(table.text).toContain(`"'=HYPERLINK(""x""),y"`);
  });

  it("is written with what it tells, or not at all", async () => {
    const [owner, heir] = [await buildUser(server.db), await buildUser(server.db)];
    const from = await buildGroup(server.db, {
      members: [
        [owner, "researcher"],
        [heir, "researcher"],
      ],
    });
    const { id } = await buildNotebook(server.db, { owner, groupId: from.id, groupRole: "reader" });
    const agent = await server.as(owner);
    const at = `/api/notebooks/${id}`;
    await agent.post(`${at}/archive`);
    await agent.post(`${at}/unarchive`);
    await agent.post(`${at}/duplicate`).send({ groupId: from.id });
    await agent.delete(at);
    await agent.post(`${at}/restore-from-bin`);
    await agent.post(`${at}/hand-over`).send({ userId: heir.id });
    await (await server.as(heir)).post(`${at}/move`).send({ groupId: null });
    expect(await actsOf(await server.as(from.lead), from.id, "?kind=notebooks")).toEqual([
      "notebook_moved_out",
      "notebook_handed_over",
      "notebook_restored",
      "notebook_deleted",
      "notebook_duplicated",
      "notebook_unarchived",
      "notebook_archived",
      "group_share_set",
    ]);
  });
});
