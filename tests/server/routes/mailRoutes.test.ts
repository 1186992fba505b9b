import { afterAll, beforeAll, expect, it } from "vitest";
import { keptMailResponse, mailChoicesResponse } from "../../../shared/schemas/mail";
import { buildGroup } from "../../factories/buildGroup";
import { buildUser } from "../../factories/buildUser";
import { startTestServer, type TestServer } from "../testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer({ showsMail: true });
});
afterAll(() => server.close());

it("each kind of mail is wanted until it is switched off, by each person for themselves", async () => {
  expect((await server.signedOut.get("/api/account/mail")).status).toBe(401);
  expect((await server.signedOut.patch("/api/account/mail").send({})).status).toBe(401);
  const [one, other] = [
    await server.as(await buildUser(server.db)),
    await server.as(await buildUser(server.db)),
  ];
  const before = mailChoicesResponse.parse((await one.get("/api/account/mail")).body);
  expect(new Set(Object.values(before))).toEqual(new Set([true]));

  const set = (kind: string, isWanted: unknown) => one.patch("/api/account/mail").send({ kind, isWanted });
  expect((await set("reply", false)).body).toEqual({ ...before, reply: false });
  expect((await other.get("/api/account/mail")).body).toEqual(before);
  expect((await set("reply", true)).body).toEqual(before);
});

it("the letters that keep an account safe cannot be switched off", async () => {
  const agent = await server.as(await buildUser(server.db));
  for (const kind of ["password_reset", "address_confirmation", "weather"]) {
    const answer = await agent.patch("/api/account/mail").send({ kind, isWanted: false });
    expect(answer.status).toBe(422);
    expect(answer.body.issues).toMatchObject([{ path: "kind" }]);
  }
});

it("what would have been sent is shown in development, and nowhere else", async () => {
  const { id, lead } = await buildGroup(server.db, { name: "Carrow Aeronomy" });
  const email = "l.verrano@lomme.example";
  await (await server.as(lead)).post(`/api/groups/${id}/invitations`).send({ email, role: "guest" });
  await server.post.idle();
  const shown = keptMailResponse.parse((await server.signedOut.get("/api/development/mail")).body);
  expect(shown).toMatchObject([{ to: email, subject: expect.stringContaining("Carrow Aeronomy") }]);

  const usual = await startTestServer({ db: server.db });
  expect((await usual.signedOut.get("/api/development/mail")).status).toBe(404);
  await usual.close();
});
