import { createAccount } from "../../server/commands/createAccount";
import type { Db } from "../../server/db/client";
import type { Actor } from "../../server/policies/actor";

let built = 0;

/** A person with an account; names and addresses count up, so that each is another and every run has the same. */
export async function buildUser(
  db: Db,
  parts: { name?: string; email?: string; passwordHash?: string | null } = {},
): Promise<Actor> {
  built += 1;
  const { name = `Person ${built}`, email = `person.${built}@carrow.example`, passwordHash = null } = parts;
  const { id } = await createAccount(db, { name, email, passwordHash, at: new Date("2026-10-01T08:00:00Z") });
  return { id, name, email };
}
