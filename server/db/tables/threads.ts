import { index, integer, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { notebooks } from "./notebooks";
import { users } from "./users";

/** A thread of comments on one cell, of the draft or of a kept version. */
export const threads = pgTable(
  "threads",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    notebookId: uuid("notebook_id")
      .notNull()
      .references(() => notebooks.id, { onDelete: "cascade" }),
    /** Of a kept version; null: on the draft. Versions go only with their notebook. */
    version: integer("version"),
    /** Without a foreign key: cells live in documents, and the thread outlives its cell. */
    cellId: text("cell_id").notNull(),
    /** The cell as it was when the thread began, for when it is gone. */
    cellKind: text("cell_kind").notNull(),
    cellName: text("cell_name").notNull(),
    cellText: text("cell_text").notNull(),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull(),
    createdBy: uuid("created_by")
      .notNull()
      .references(() => users.id),
    resolvedAt: timestamp("resolved_at", { withTimezone: true }),
    resolvedBy: uuid("resolved_by").references(() => users.id),
  },
  (table) => [index("threads_notebook_id").on(table.notebookId, table.version)],
);
