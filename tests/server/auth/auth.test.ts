import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { createAuth, type Auth } from "../../../server/auth/auth";
import type { Db } from "../../../server/db/client";
import { sessions } from "../../../server/db/tables/sessions";
import { buildUser } from "../../factories/buildUser";
import { openTestDatabase } from "../testDatabase";

const day = 86_400_000;

let db: Db;
let auth: Auth;
let close: () => Promise<void>;
beforeAll(async () => {
  ({ db, close } = await openTestDatabase());
  auth = await createAuth(db, { hasSecureCookies: true });
});
afterAll(() => close());

const idIn = (cookie: string) => /tenuity_session=([^;]*)/.exec(cookie)![1]!;

describe("sessions", () => {
  it("come in a cookie that scripts and other sites do not see", async () => {
    const { id } = await buildUser(db);
    const cookie = await auth.openSession(id);
    expect(cookie).toMatch(/HttpOnly/i);
    expect(cookie).toMatch(/SameSite=Lax/i);
    expect(cookie).toMatch(/Secure/i);
    const plain = await createAuth(db, { hasSecureCookies: false });
    expect(await plain.openSession(id)).not.toMatch(/Secure/i);
  });

  it("leave no id in the database, only its hash", async () => {
    const { id } = await buildUser(db);
    const sessionId = idIn(await auth.openSession(id));
    const rows = await db.select().from(sessions).where(eq(sessions.userId, id));
    expect(rows).toHaveLength(1);
    expect(rows[0]!.id).toMatch(/^[0-9a-f]{64}$/);
    expect(JSON.stringify(rows)).not.toContain(sessionId);
  });

  it("open for their id and for no other, nor for the hash that the database has", async () => {
    const user = await buildUser(db);
    const sessionId = idIn(await auth.openSession(user.id));
    const [row] = await db.select().from(sessions).where(eq(sessions.userId, user.id));
    expect((await auth.readSession(`tenuity_session=${sessionId}`))?.actor).toEqual(user);
    const another = `${sessionId.slice(0, -1)}${sessionId.endsWith("x") ? "y" : "x"}`;
    expect(await auth.readSession(`tenuity_session=${another}`)).toBeNull();
    expect(await auth.readSession(`tenuity_session=${row!.id}`)).toBeNull();
    expect(await auth.readSession("another=cookie")).toBeNull();
  });

  it("are renewed in the second half of their 30 days", async () => {
    const { id } = await buildUser(db);
    const header = `tenuity_session=${idIn(await auth.openSession(id))}`;
    expect((await auth.readSession(header))?.cookie).toBeNull();
    await db
      .update(sessions)
      .set({ expiresAt: new Date(Date.now() + 14 * day) })
      .where(eq(sessions.userId, id));
    expect((await auth.readSession(header))?.cookie).toMatch(/tenuity_session=/);
    const [row] = await db.select().from(sessions).where(eq(sessions.userId, id));
    expect(row!.expiresAt.getTime()).toBeGreaterThan(Date.now() + 29 * day);
  });

  it("lapse, and are swept away", async () => {
    const { id } = await buildUser(db);
    const lapsed = { expiresAt: new Date(Date.now() - 1000) };
    const header = `tenuity_session=${idIn(await auth.openSession(id))}`;
    await db.update(sessions).set(lapsed).where(eq(sessions.userId, id));
    expect(await auth.readSession(header)).toBeNull();
    await auth.openSession(id);
    await db.update(sessions).set(lapsed).where(eq(sessions.userId, id));
    await auth.sweepExpired();
    expect(await db.select().from(sessions).where(eq(sessions.userId, id))).toEqual([]);
  });

  it("end when they are closed", async () => {
    const { id } = await buildUser(db);
    const header = `tenuity_session=${idIn(await auth.openSession(id))}`;
    const { sessionId } = (await auth.readSession(header))!;
    expect(await auth.closeSession(sessionId)).toMatch(/Max-Age=0/);
    expect(await auth.readSession(header)).toBeNull();
  });
});

describe("passwords", () => {
  it("are checked against their Argon2id hash", async () => {
    const passwordHash = await auth.hashPassword("copper kettle at dusk");
    expect(passwordHash).toMatch(/^\$argon2id\$/);
    const user = await buildUser(db, { passwordHash });
    expect(await auth.checkPassword(user.email, "copper kettle at dusk")).toEqual(user);
    expect(await auth.checkPassword(` ${user.email.toUpperCase()} `, "copper kettle at dusk")).toEqual(user);
    expect(await auth.checkPassword(user.email, "copper kettle at dawn")).toBeNull();
  });

  it("open no account that has none, or that does not exist", async () => {
    const user = await buildUser(db, { passwordHash: null });
    expect(await auth.checkPassword(user.email, "")).toBeNull();
    expect(await auth.checkPassword("nobody@carrow.example", "copper kettle at dusk")).toBeNull();
    expect(await auth.checkPassword("no address", "copper kettle at dusk")).toBeNull();
  });

  it("take as long to refuse for an unknown address as for a known one", async () => {
    const user = await buildUser(db, { passwordHash: await auth.hashPassword("copper kettle at dusk") });
    const time = async (email: string) => {
      const begin = performance.now();
      for (let count = 0; count < 5; count += 1) await auth.checkPassword(email, "a wrong password");
      return performance.now() - begin;
    };
    await time(user.email);
    const [known, unknown] = [await time(user.email), await time("nobody@carrow.example")];
    // Without the decoy an unknown address is over twenty times faster; noise on a busy machine stays within four.
    expect(unknown).toBeGreaterThan(known / 4);
  });
});
