import type { Db } from "../db/client";
import type { UserRow } from "../db/reads/findUser";
import { users } from "../db/tables/users";
import { conflict } from "../errors";

/** A new account. `passwordHash` is null for a demonstration account. The address comes in lower case. */
export async function createAccount(
  db: Db,
  { name, email, passwordHash, at }: { name: string; email: string; passwordHash: string | null; at: Date },
): Promise<UserRow> {
  const [user] = await db
    .insert(users)
    .values({ name, email, passwordHash, createdAt: at })
    .onConflictDoNothing({ target: users.email })
    .returning();
  if (user) return user;
  const message = "There is an account with this address already. Sign in with it, or use another address.";
  throw conflict("email_taken", message, [{ path: "email", message, code: "email_taken" }]);
}
