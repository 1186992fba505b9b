import { eq } from "drizzle-orm";
import { afterAll, beforeAll, expect, it } from "vitest";
import { deleteNotebook } from "../../../server/commands/deleteNotebook";
import { emptyBin } from "../../../server/commands/emptyBin";
import type { Db } from "../../../server/db/client";
import { notebooks } from "../../../server/db/tables/notebooks";
import { versions } from "../../../server/db/tables/versions";
import { buildNotebook } from "../../factories/buildNotebook";
import { buildUser } from "../../factories/buildUser";
import { openTestDatabase } from "../testDatabase";

let db: Db;
let close: () => Promise<void>;
beforeAll(async () => {
  ({ db, close } = await openTestDatabase());
});
afterAll(() => close());

it("removes, with its versions, what has been in the bin for over 30 days, and nothing else", async () => {
  const owner = await buildUser(db);
  const [old, recent, kept] = [
    await buildNotebook(db, { owner, versions: ["First", "Second"] }),
    await buildNotebook(db, { owner }),
    await buildNotebook(db, { owner }),
  ];
  await deleteNotebook(db, { notebookId: old.id, actorId: owner.id, at: new Date("2026-10-31T12:00:00Z") });
  await deleteNotebook(db, {
    notebookId: recent.id,
    actorId: owner.id,
    at: new Date("2026-11-02T12:00:00Z"),
  });

  expect(await emptyBin(db, { at: new Date("2026-12-01T12:00:00Z") })).toBe(1);
  const left = await db.select({ id: notebooks.id }).from(notebooks);
  expect(left.map(({ id }) => id).sort()).toEqual([recent.id, kept.id].sort());
  expect(await db.select().from(versions).where(eq(versions.notebookId, old.id))).toEqual([]);
});

it("never removes what a reference rests on", async () => {
  const owner = await buildUser(db);
  const { id } = await buildNotebook(db, { owner, versions: ["Published"] });
  await db.update(notebooks).set({ isReferenced: true }).where(eq(notebooks.id, id));
  await deleteNotebook(db, { notebookId: id, actorId: owner.id, at: new Date("2026-01-01T12:00:00Z") });
  await emptyBin(db, { at: new Date("2026-12-01T12:00:00Z") });
  expect(await db.select().from(versions).where(eq(versions.notebookId, id))).toHaveLength(1);
});
