import { integer, json, pgTable, primaryKey, text, timestamp, uuid } from "drizzle-orm/pg-core";
import type { NotebookDocument } from "../../../shared/notebook/document";
import type { KeptResult } from "../../../shared/schemas/results";
import { notebooks } from "./notebooks";
import { users } from "./users";

/** Kept states of notebooks. A row is written once: a trigger of the migrations refuses any update. */
export const versions = pgTable(
  "versions",
  {
    notebookId: uuid("notebook_id")
      .notNull()
      .references(() => notebooks.id, { onDelete: "cascade" }),
    /** From 1, without gaps, in each notebook. */
    number: integer("number").notNull(),
    message: text("message").notNull(),
    document: json("document").$type<NotebookDocument>().notNull(),
    result: json("result").$type<KeptResult>().notNull(),
    engine: text("engine").notNull(),
    contentHash: text("content_hash").notNull(),
    keptAt: timestamp("kept_at", { withTimezone: true }).notNull().defaultNow(),
    keptBy: uuid("kept_by")
      .notNull()
      .references(() => users.id),
  },
  (table) => [primaryKey({ columns: [table.notebookId, table.number] })],
);
