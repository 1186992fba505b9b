import { boolean, index, integer, json, pgTable, text, timestamp, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import type { NotebookDocument } from "../../../shared/notebook/document";
import type { SuppliedReference } from "../../../shared/notebook/references";
import type { Drift } from "../../../shared/schemas/references";
import type { KeptResult } from "../../../shared/schemas/results";
import type { VettingCheck } from "../../../shared/schemas/vettings";
import { groups } from "./groups";
import { notebooks } from "./notebooks";
import { users } from "./users";

/**
 * Published editions. A row carries all that was published and rests on no other; a trigger of the migrations refuses
 * to change that, and lets through who may read it, its DOI, its withdrawal and what recomputing it found.
 */
export const publishedReferences = pgTable(
  "published_references",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    groupId: uuid("group_id")
      .notNull()
      .references(() => groups.id),
    /** From 1, without gaps, in each group. */
    number: integer("number").notNull(),
    /** From 1, without gaps, in each number. */
    edition: integer("edition").notNull(),
    notebookId: uuid("notebook_id")
      .notNull()
      .references(() => notebooks.id),
    versionNumber: integer("version_number").notNull(),
    title: text("title").notNull(),
    summary: text("summary").notNull(),
    authors: json("authors").$type<string[]>().notNull(),
    licence: text("licence").notNull(),
    document: json("document").$type<NotebookDocument>().notNull(),
    result: json("result").$type<KeptResult>().notNull(),
    /** What its body cells hand on to notebooks that use it. */
    bodies: json("bodies").$type<SuppliedReference["bodies"]>().notNull(),
    /** Pins of the references that it uses: "CAR4.2". */
    restsOn: json("rests_on").$type<string[]>().notNull(),
    engine: text("engine").notNull(),
    contentHash: text("content_hash").notNull(),
    checks: json("checks").$type<VettingCheck[]>().notNull(),
    publishedAt: timestamp("published_at", { withTimezone: true }).notNull(),
    /** The lead who vetted it. */
    publishedBy: uuid("published_by")
      .notNull()
      .references(() => users.id),
    /** Vetted by its only owner, because the group had no other lead. */
    isVettedByOwner: boolean("is_vetted_by_owner").notNull(),
    isPublic: boolean("is_public").notNull(),
    doi: text("doi"),
    withdrawnAt: timestamp("withdrawn_at", { withTimezone: true }),
    withdrawnReason: text("withdrawn_reason"),
    recomputedAt: timestamp("recomputed_at", { withTimezone: true }),
    recomputedEngine: text("recomputed_engine"),
    drift: json("drift").$type<Drift>(),
  },
  (table) => [
    uniqueIndex("published_references_pin").on(table.groupId, table.number, table.edition),
    index("published_references_notebook_id").on(table.notebookId),
  ],
);
