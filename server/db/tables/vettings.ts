import { sql } from "drizzle-orm";
import { foreignKey, index, integer, json, pgTable, text, timestamp, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import { vettingStates, type Recomputation, type VettingCheck } from "../../../shared/schemas/vettings";
import { groups } from "./groups";
import { notebooks } from "./notebooks";
import { users } from "./users";
import { versions } from "./versions";

/** Requests that the lead examine a version, and what became of each. */
export const vettings = pgTable(
  "vettings",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    groupId: uuid("group_id")
      .notNull()
      .references(() => groups.id),
    notebookId: uuid("notebook_id")
      .notNull()
      .references(() => notebooks.id, { onDelete: "cascade" }),
    versionNumber: integer("version_number").notNull(),
    message: text("message").notNull(),
    requestedBy: uuid("requested_by")
      .notNull()
      .references(() => users.id),
    requestedAt: timestamp("requested_at", { withTimezone: true }).notNull(),
    /** What would be published with it. */
    summary: text("summary").notNull(),
    /** In order. */
    authors: json("authors").$type<string[]>().notNull(),
    licence: text("licence").notNull(),
    /** Number of the reference that it would be a new edition of; null for a new reference. */
    editionOf: integer("edition_of"),
    /** As found when it was asked for. */
    recomputed: json("recomputed").$type<Recomputation>().notNull(),
    /** Cautions whose answers a lead has accepted, by cell, code and entry. */
    accepted: json("accepted").$type<string[]>().notNull(),
    state: text("state", { enum: vettingStates }).notNull().default("requested"),
    remarks: text("remarks"),
    decidedBy: uuid("decided_by").references(() => users.id),
    decidedAt: timestamp("decided_at", { withTimezone: true }),
    /** As they stood at the decision. */
    checks: json("checks").$type<VettingCheck[]>(),
  },
  (table) => [
    foreignKey({
      columns: [table.notebookId, table.versionNumber],
      foreignColumns: [versions.notebookId, versions.number],
    }).onDelete("cascade"),
    uniqueIndex("vettings_open").on(table.notebookId).where(sql`state = 'requested'`),
    index("vettings_group_id").on(table.groupId, table.state),
    index("vettings_notebook_id").on(table.notebookId),
  ],
);
