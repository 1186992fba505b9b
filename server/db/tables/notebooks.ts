import { boolean, index, integer, json, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
import type { NotebookDocument } from "../../../shared/notebook/document";
import type { NotebookSummary } from "../../../shared/notebook/summary";
import { shareRoles } from "../../../shared/schemas/roles";
import { groups } from "./groups";
import { users } from "./users";

/** A notebook with its draft. Documents are `json`, not `jsonb`: kept to the letter, in the order written. */
export const notebooks = pgTable(
  "notebooks",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    ownerId: uuid("owner_id")
      .notNull()
      .references(() => users.id),
    groupId: uuid("group_id").references(() => groups.id),
    /** Role by which everyone in the group sees it; null while it is not shared with the group. */
    groupRole: text("group_role", { enum: shareRoles }),
    /** As in the document, repeated for lists and searches. */
    title: text("title").notNull(),
    document: json("document").$type<NotebookDocument>().notNull(),
    /** Grows by one with each saved change. */
    revision: integer("revision").notNull().default(1),
    savedAt: timestamp("saved_at", { withTimezone: true }).notNull().defaultNow(),
    savedBy: uuid("saved_by")
      .notNull()
      .references(() => users.id),
    /** Number of the last kept version; 0 before the first. */
    lastVersion: integer("last_version").notNull().default(0),
    summary: json("summary").$type<NotebookSummary>(),
    /** Revision and engine that the last attempt at a summary was made for. */
    summaryRevision: integer("summary_revision").notNull().default(0),
    summaryEngine: text("summary_engine"),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
    /** Put away, to be read only, since then. */
    archivedAt: timestamp("archived_at", { withTimezone: true }),
    /** A published reference rests on it, so that it is never removed for good. */
    isReferenced: boolean("is_referenced").notNull().default(false),
    /** In the bin since then. */
    deletedAt: timestamp("deleted_at", { withTimezone: true }),
  },
  (table) => [
    index("notebooks_owner_id").on(table.ownerId),
    index("notebooks_group_id").on(table.groupId),
    index("notebooks_deleted_at").on(table.deletedAt),
  ],
);
