import { sql } from "drizzle-orm";
import { check, index, pgTable, text, timestamp, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import { groupRoles, shareRoles } from "../../../shared/schemas/roles";
import { groups } from "./groups";
import { notebooks } from "./notebooks";
import { users } from "./users";

/** Invitations to a group or to a notebook, each for one address and good once. */
export const invitations = pgTable(
  "invitations",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    groupId: uuid("group_id").references(() => groups.id, { onDelete: "cascade" }),
    notebookId: uuid("notebook_id").references(() => notebooks.id, { onDelete: "cascade" }),
    /** In lower case, like an account's. */
    email: text("email").notNull(),
    /** In the group or the notebook, whichever it is to. */
    role: text("role", { enum: [...groupRoles, ...shareRoles] }).notNull(),
    /** SHA-256 of the token in the letter; the token itself stands in the letter alone. */
    tokenHash: text("token_hash").notNull().unique(),
    invitedBy: uuid("invited_by")
      .notNull()
      .references(() => users.id),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull(),
    expiresAt: timestamp("expires_at", { withTimezone: true }).notNull(),
    acceptedAt: timestamp("accepted_at", { withTimezone: true }),
    revokedAt: timestamp("revoked_at", { withTimezone: true }),
  },
  (table) => [
    check("invitations_to_one", sql`num_nonnulls(${table.groupId}, ${table.notebookId}) = 1`),
    uniqueIndex("invitations_open_to_group")
      .on(table.groupId, table.email)
      .where(sql`accepted_at is null and revoked_at is null`),
    uniqueIndex("invitations_open_to_notebook")
      .on(table.notebookId, table.email)
      .where(sql`accepted_at is null and revoked_at is null`),
    index("invitations_group_id").on(table.groupId),
    index("invitations_notebook_id").on(table.notebookId),
  ],
);
