import { eq } from "drizzle-orm";
import type { Db } from "../client";
import { users } from "../tables/users";

export type UserRow = typeof users.$inferSelect;

/** The account with this address, which comes in lower case. */
export async function findUserByEmail(db: Db, email: string): Promise<UserRow | undefined> {
  const [user] = await db.select().from(users).where(eq(users.email, email));
  return user;
}
