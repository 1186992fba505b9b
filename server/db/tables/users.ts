import { pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";

export const users = pgTable("users", {
  id: uuid("id").primaryKey().defaultRandom(),
  name: text("name").notNull(),
  /** In lower case, trimmed: the one form by which it is looked up. */
  email: text("email").notNull().unique(),
  /** Argon2id; null for a demonstration account, which has no password to guess. */
  passwordHash: text("password_hash"),
  createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
});
