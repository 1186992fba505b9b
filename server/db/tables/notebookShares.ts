import { index, pgTable, primaryKey, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { shareRoles } from "../../../shared/schemas/roles";
import { notebooks } from "./notebooks";
import { users } from "./users";

/** A notebook shared with one person. */
export const notebookShares = pgTable(
  "notebook_shares",
  {
    notebookId: uuid("notebook_id")
      .notNull()
      .references(() => notebooks.id, { onDelete: "cascade" }),
    userId: uuid("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    role: text("role", { enum: shareRoles }).notNull(),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
  },
  (table) => [
    primaryKey({ columns: [table.notebookId, table.userId] }),
    index("notebook_shares_user_id").on(table.userId),
  ],
);
