import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { invitations } from "../../../server/db/tables/invitations";
import { hashOfToken } from "../../../server/mail/invitationToken";
import type { Actor } from "../../../server/policies/actor";
import { groupInvitationList, invitationResponse } from "../../../shared/schemas/invitations";
import type { GroupRole } from "../../../shared/schemas/roles";
import { buildGroup } from "../../factories/buildGroup";
import { buildNotebook } from "../../factories/buildNotebook";
import { buildUser } from "../../factories/buildUser";
import { lastTokenTo, lettersTo } from "../postedLetters";
import { startTestServer, type TestServer } from "../testServer";

const nobody = "00000000-0000-4000-8000-000000000000";
const unknownToken = "A".repeat(43);

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

let asked = 0;
const nextAddress = (): string => `asked.${(asked += 1)}@lomme.example`;

/** Invites an address to a new group and answers the token of its letter. */
async function invite(email: string, role: GroupRole = "researcher") {
  const group = await buildGroup(server.db, { name: "Carrow Aeronomy" });
  const lead = await server.as(group.lead);
  const response = await lead.post(`/api/groups/${group.id}/invitations`).send({ email, role });
  expect(response.status).toBe(201);
  const [invitation] = groupInvitationList.parse(response.body);
  return { group, lead, invitation: invitation!, token: await lastTokenTo(server, email) };
}

const accept = async (user: Actor, token: string) =>
  (await server.as(user)).post("/api/invitations/accept").send({ token });
const look = (token: unknown) => server.signedOut.post("/api/invitations/look").send({ token });

describe("the routes of a group's invitations", () => {
  const routes = [
    ["get", "", undefined],
    ["post", "", { email: "a@b.example", role: "guest" }],
    ["post", `/${nobody}/send-again`, undefined],
    ["patch", `/${nobody}`, { role: "guest" }],
    ["delete", `/${nobody}`, undefined],
  ] as const;

  it.each(routes)("%s %s: signed out, outside, not a lead", async (method, path, body) => {
    const [guest, researcher] = [await buildUser(server.db), await buildUser(server.db)];
    const { id } = await buildGroup(server.db, {
      members: [
        [guest, "guest"],
        [researcher, "researcher"],
      ],
    });
    const address = `/api/groups/${id}/invitations${path}`;
    expect((await server.signedOut[method](address).send(body)).status).toBe(401);
    const outsider = await server.as(await buildUser(server.db));
    expect((await outsider[method](address).send(body)).status).toBe(404);
    for (const member of [guest, researcher])
      expect((await (await server.as(member))[method](address).send(body)).status).toBe(403);
  });

  it("refuse a malformed one, and each other's invitations", async () => {
    const { lead, group } = await invite(nextAddress());
    const other = await invite(nextAddress());
    const bad = await lead.post(`/api/groups/${group.id}/invitations`).send({ email: "x", role: "boss" });
    expect(bad.body.issues).toHaveLength(2);
    const theirs = `/api/groups/${group.id}/invitations/${other.invitation.id}`;
    expect((await lead.patch(theirs).send({ role: "lead" })).status).toBe(404);
    expect((await lead.post(`${theirs}/send-again`)).status).toBe(404);
    expect((await lead.delete(theirs)).status).toBe(404);
    expect((await look(other.token)).status).toBe(200);
  });
});

describe("an invitation to a group", () => {
  it("keeps no token but its hash, and the letter's bodies go when it is sent", async () => {
    const email = nextAddress();
    const { token } = await invite(email);
    const rows = await server.db.select().from(invitations).where(eq(invitations.email, email));
    expect(JSON.stringify(rows)).not.toContain(token);
    expect(rows[0]!.tokenHash).toBe(hashOfToken(token));
    const [letter] = await lettersTo(server, email);
    expect(letter!.subject).toMatch(/invites you to Carrow Aeronomy/);
  });

  it("is seen by whoever holds the link, accepted once, and found used after that", async () => {
    const email = nextAddress();
    const { token, group } = await invite(email, "researcher");
    expect(invitationResponse.parse((await look(token)).body)).toMatchObject({
      to: "group",
      name: "Carrow Aeronomy",
      role: "researcher",
      email,
      invitedBy: group.lead.name,
    });
    const user = await buildUser(server.db, { email });
    expect((await server.signedOut.post("/api/invitations/accept").send({ token })).status).toBe(401);
    expect((await accept(user, token)).body).toEqual({ to: "group", id: group.id });
    expect((await (await server.as(user)).get(`/api/groups/${group.id}`)).body.role).toBe("researcher");

    for (const answer of [await accept(user, token), await look(token)])
      expect(answer).toMatchObject({ status: 409, body: { code: "invitation_used" } });
  });

  it("used twice at once counts once", async () => {
    const email = nextAddress();
    const { token } = await invite(email);
    const user = await buildUser(server.db, { email });
    const answers = await Promise.all([accept(user, token), accept(user, token)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it("is for its address alone, and says so", async () => {
    const email = nextAddress();
    const { token, group } = await invite(email);
    const other = await buildUser(server.db);
    const answer = await accept(other, token);
    expect(answer).toMatchObject({ status: 403, body: { code: "invitation_for_another" } });
    expect(answer.body.detail).toContain(email);
    expect((await (await server.as(other)).get(`/api/groups/${group.id}`)).status).toBe(404);
  });

  it("is over after 14 days, and can be sent again by a new link alone", async () => {
    const email = nextAddress();
    const { token, lead, group, invitation } = await invite(email);
    const days = (Date.parse(invitation.expiresAt) - Date.parse(invitation.invitedAt)) / 86_400_000;
    expect(days).toBe(14);
    await server.db
      .update(invitations)
      .set({ expiresAt: new Date() })
      .where(eq(invitations.id, invitation.id));
    const user = await buildUser(server.db, { email });
    for (const answer of [await accept(user, token), await look(token)])
      expect(answer).toMatchObject({ status: 409, body: { code: "invitation_lapsed" } });
    const listed = await lead.get(`/api/groups/${group.id}/invitations`);
    expect(listed.body).toMatchObject([{ email, hasLapsed: true }]);

    const again = await lead.post(`/api/groups/${group.id}/invitations/${invitation.id}/send-again`);
    expect(groupInvitationList.parse(again.body)).toMatchObject([{ hasLapsed: false }]);
    const newToken = await lastTokenTo(server, email);
    expect((await accept(user, token)).status).toBe(404);
    expect((await accept(user, newToken)).status).toBe(200);
  });

  it("changes its role, and is taken back", async () => {
    const email = nextAddress();
    const { token, lead, group, invitation } = await invite(email, "guest");
    const address = `/api/groups/${group.id}/invitations/${invitation.id}`;
    expect((await lead.patch(address).send({ role: "lead" })).body).toMatchObject([{ role: "lead" }]);
    expect((await look(token)).body.role).toBe("lead");
    expect((await lead.delete(address)).status).toBe(204);
    const user = await buildUser(server.db, { email });
    for (const answer of [await accept(user, token), await look(token)])
      expect(answer).toMatchObject({ status: 409, body: { code: "invitation_revoked" } });
    expect((await lead.delete(address)).status).toBe(404);
    expect((await lead.get(`/api/groups/${group.id}/invitations`)).body).toEqual([]);
  });

  it("is one at a time for an address, and none for a member", async () => {
    const email = nextAddress();
    const { lead, group, token } = await invite(email);
    const ask = () => lead.post(`/api/groups/${group.id}/invitations`).send({ email, role: "guest" });
    expect((await ask()).body).toMatchObject({ code: "already_invited", issues: [{ path: "email" }] });
    await accept(await buildUser(server.db, { email }), token);
    expect((await ask()).body).toMatchObject({ code: "already_member", issues: [{ path: "email" }] });
  });

  it("is refused where the person has switched such letters off", async () => {
    const group = await buildGroup(server.db);
    const user = await buildUser(server.db);
    await (
      await server.as(user)
    )
      .patch("/api/account/mail")
      .send({ kind: "group_invitation", isWanted: false });
    const lead = await server.as(group.lead);
    const body = { email: user.email, role: "guest" };
    const answer = await lead.post(`/api/groups/${group.id}/invitations`).send(body);
    expect(answer).toMatchObject({ status: 409, body: { code: "mail_switched_off" } });
    expect((await lead.get(`/api/groups/${group.id}/invitations`)).body).toEqual([]);
  });

  it("of nobody is not found, and half a link is refused", async () => {
    expect((await look(unknownToken)).status).toBe(404);
    for (const token of ["", "short", 5, undefined]) expect((await look(token)).status).toBe(422);
  });
});

describe("creating an account by an invitation", () => {
  const account = { name: "Lio Verrano", password: "three small warm moons" };

  it("puts one in the group in the same act", async () => {
    const email = nextAddress();
    const { token, group } = await invite(email, "guest");
    const response = await server.signedOut
      .post("/api/accounts")
      .send({ ...account, email: email.toUpperCase(), invitation: token });
    expect(response.status).toBe(201);
    const agent = await server.as(response.body.user);
    expect((await agent.get(`/api/groups/${group.id}`)).body.role).toBe("guest");
  });

  it("with another address creates nothing", async () => {
    const { token } = await invite(nextAddress());
    const email = nextAddress();
    const body = { ...account, email, invitation: token };
    const response = await server.signedOut.post("/api/accounts").send(body);
    expect(response.body.code).toBe("invitation_for_another");
    expect((await server.signedOut.post("/api/accounts").send({ ...account, email })).status).toBe(201);
  });

  it("opens a notebook that was shared with the address", async () => {
    const email = nextAddress();
    const owner = await buildUser(server.db);
    const { id } = await buildNotebook(server.db, { owner });
    const agent = await server.as(owner);
    await agent.post(`/api/notebooks/${id}/shares`).send({ email, role: "commenter" });
    const token = await lastTokenTo(server, email);
    const response = await server.signedOut
      .post("/api/accounts")
      .send({ ...account, email, invitation: token });
    const invited = await server.as(response.body.user);
    expect((await invited.get(`/api/notebooks/${id}`)).body.role).toBe("commenter");
  });

  it("opens no notebook that has gone to the bin", async () => {
    const email = nextAddress();
    const owner = await buildUser(server.db);
    const { id } = await buildNotebook(server.db, { owner });
    const agent = await server.as(owner);
    await agent.post(`/api/notebooks/${id}/shares`).send({ email, role: "reader" });
    const token = await lastTokenTo(server, email);
    await agent.delete(`/api/notebooks/${id}`);
    const answer = await accept(await buildUser(server.db, { email }), token);
    expect(answer.body.code).toBe("invitation_revoked");
  });
});
