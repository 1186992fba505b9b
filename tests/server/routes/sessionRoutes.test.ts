import { eq } from "drizzle-orm";
import type { Response } from "supertest";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { demoAccounts } from "../../../server/auth/demoAccounts";
import { users } from "../../../server/db/tables/users";
import { usualTries } from "../../../server/middleware/rateLimits";
import { problem } from "../../../shared/schemas/problem";
import { sessionResponse } from "../../../shared/schemas/session";
import { buildUser } from "../../factories/buildUser";
import { startTestServer, type TestServer } from "../testServer";

const password = "copper kettle at dusk";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

const cookieIn = (response: Response) =>
  (response.headers["set-cookie"] as unknown as string[] | undefined)?.[0];

describe("POST /api/accounts", () => {
  const sam = { name: "Sefa Tuimala", email: "sefa@carrow.example", password };

  it("refuses what is malformed, naming each entry", async () => {
    const response = await server.signedOut
      .post("/api/accounts")
      .send({ name: " ", email: "sefa", password: "short" });
    expect(response.status).toBe(422);
    expect(response.type).toBe("application/problem+json");
    const { issues, requestId } = problem.parse(response.body);
    expect(issues!.map(({ path }) => path)).toEqual(["name", "email", "password"]);
    expect(response.headers["x-request-id"]).toBe(requestId);
  });

  it.each(["sefa@carrow.example", "Sefa Tuimala", "tenuity tenuity"])(
    "refuses the password %s",
    async (guess) => {
      const response = await server.signedOut.post("/api/accounts").send({ ...sam, password: guess });
      expect(response.status).toBe(422);
      expect(response.body.issues).toMatchObject([{ path: "password", code: "guessable" }]);
    },
  );

  it("refuses a password of over 200 characters", async () => {
    const response = await server.signedOut
      .post("/api/accounts")
      .send({ ...sam, password: "ab".repeat(101) });
    expect(response.status).toBe(422);
  });

  it("creates an account, its address in lower case, and signs in", async () => {
    const response = await server.signedOut
      .post("/api/accounts")
      .send({ ...sam, email: " Sefa@Carrow.example " });
    expect(response.status).toBe(201);
    expect(sessionResponse.parse(response.body)).toEqual({
      user: { id: response.body.user.id, name: "Sefa Tuimala", email: "sefa@carrow.example" },
      demo: null,
    });
    const after = await server.signedOut.get("/api/session").set("Cookie", cookieIn(response)!);
    expect(after.body.user.email).toBe("sefa@carrow.example");
    const [row] = await server.db.select().from(users).where(eq(users.email, "sefa@carrow.example"));
    expect(row!.passwordHash).toMatch(/^\$argon2id\$/);
  });

  it("refuses an address that has an account", async () => {
    const user = await buildUser(server.db);
    const response = await server.signedOut
      .post("/api/accounts")
      .send({ ...sam, email: user.email.toUpperCase() });
    expect(response.status).toBe(409);
    expect(response.body).toMatchObject({ code: "email_taken", issues: [{ path: "email" }] });
  });
});

describe("/api/session", () => {
  it("says that nobody is signed in", async () => {
    const response = await server.signedOut.get("/api/session");
    expect(response.status).toBe(200);
    expect(response.body).toEqual({ user: null, demo: null });
    expect(response.headers["cache-control"]).toBe("no-store");
  });

  it("refuses a malformed sign-in", async () => {
    expect((await server.signedOut.post("/api/session").send({ email: 3 })).status).toBe(422);
  });

  it("answers a wrong password and an unknown address alike", async () => {
    const user = await buildUser(server.db, { passwordHash: await server.auth.hashPassword(password) });
    const wrong = await server.signedOut
      .post("/api/session")
      .send({ email: user.email, password: "something else" });
    const unknown = await server.signedOut
      .post("/api/session")
      .send({ email: "nobody@carrow.example", password });
    expect(wrong.status).toBe(401);
    expect({ ...wrong.body, requestId: "" }).toEqual({ ...unknown.body, requestId: "" });
  });

  it("signs in, under a new session each time, and out", async () => {
    const user = await buildUser(server.db, { passwordHash: await server.auth.hashPassword(password) });
    const first = await server.signedOut.post("/api/session").send({ email: user.email, password });
    expect(first.status).toBe(201);
    expect(sessionResponse.parse(first.body).user).toEqual(user);
    const second = await server.signedOut
      .post("/api/session")
      .set("Cookie", cookieIn(first)!)
      .send({ email: user.email, password });
    expect(cookieIn(second)).not.toBe(cookieIn(first));
    const stale = await server.signedOut.get("/api/session").set("Cookie", cookieIn(first)!);
    expect(stale.body.user).toBeNull();

    const out = await server.signedOut.delete("/api/session").set("Cookie", cookieIn(second)!);
    expect(out.status).toBe(204);
    const after = await server.signedOut.get("/api/session").set("Cookie", cookieIn(second)!);
    expect(after.body.user).toBeNull();
  });

  it("signs out who is signed out already", async () => {
    expect((await server.signedOut.delete("/api/session")).status).toBe(204);
  });
});

describe("looking round as a demonstration account", () => {
  it("is not found where the demonstration is off", async () => {
    const { email } = demoAccounts[0]!;
    await buildUser(server.db, { email });
    const response = await server.signedOut.post("/api/session/demo").send({ email });
    expect(response.status).toBe(404);
  });

  it("opens the accounts of the demonstration and no other", async () => {
    const demo = await startTestServer({ db: server.db, demo: true });
    const [, jorun, tamsin] = demoAccounts;
    await buildUser(demo.db, { ...jorun });
    const passwordHash = await demo.auth.hashPassword(password);
    await buildUser(demo.db, { ...tamsin, passwordHash });
    const stranger = await buildUser(demo.db);

    expect((await demo.signedOut.get("/api/session")).body.demo).toEqual(demoAccounts);
    const opened = await demo.signedOut.post("/api/session/demo").send({ email: jorun!.email });
    expect(opened.status).toBe(201);
    expect(opened.body.user.name).toBe(jorun!.name);
    expect((await demo.signedOut.post("/api/session/demo").send({ email: stranger.email })).status).toBe(404);
    // Someone real who had the address first keeps their password.
    expect((await demo.signedOut.post("/api/session/demo").send({ email: tamsin!.email })).status).toBe(404);
    expect((await demo.signedOut.post("/api/session/demo").send({})).status).toBe(422);
    // A demonstration account has no password to sign in with.
    const guessed = await demo.signedOut.post("/api/session").send({ email: jorun!.email, password: "" });
    expect(guessed.status).toBe(401);
    await demo.close();
  });
});

describe("too many tries", () => {
  it("close sign-in to one account and sign-up, and say how long to wait", async () => {
    const strict = await startTestServer({
      db: server.db,
      tries: { ...usualTries, signInPerAccount: 2, signUp: 1 },
    });
    const user = await buildUser(strict.db, { passwordHash: await strict.auth.hashPassword(password) });
    const signIn = (secret: string, email = user.email) =>
      strict.signedOut.post("/api/session").send({ email, password: secret });

    expect((await signIn("wrong")).status).toBe(401);
    expect((await signIn(password)).status).toBe(201);
    expect((await signIn("wrong")).status).toBe(401);
    const refused = await signIn(password, user.email.toUpperCase());
    expect(refused.status).toBe(429);
    expect(refused.body.code).toBe("too_many_tries");
    expect(refused.body.detail).toMatch(/Wait 1[45] minutes/);
    expect((await signIn("wrong", "nobody@carrow.example")).status).toBe(401);

    const signUp = (email: string) =>
      strict.signedOut.post("/api/accounts").send({ name: "New", email, password });
    expect((await signUp("one@carrow.example")).status).toBe(201);
    expect((await signUp("two@carrow.example")).status).toBe(429);
    await strict.close();
  });
});
