import { bigint, index, json, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { actNames, actSubjects, type ActDetails } from "../../../shared/schemas/audit";
import { groups } from "./groups";
import { users } from "./users";

/** The audit trail: who did what to what, written in the transaction that did it. */
export const acts = pgTable(
  "acts",
  {
    /** Counts up, so that pages of the trail hold still while it grows. */
    id: bigint("id", { mode: "number" }).primaryKey().generatedAlwaysAsIdentity(),
    at: timestamp("at", { withTimezone: true }).notNull(),
    /** Whose leads may read it; null on somebody's own shelf. */
    groupId: uuid("group_id").references(() => groups.id, { onDelete: "cascade" }),
    actorId: uuid("actor_id").references(() => users.id, { onDelete: "set null" }),
    act: text("act", { enum: actNames }).notNull(),
    subject: text("subject", { enum: actSubjects }).notNull(),
    /** Without a foreign key: the trail outlives what it speaks of. */
    subjectId: uuid("subject_id").notNull(),
    /** Its name or title at the time. */
    subjectName: text("subject_name").notNull(),
    details: json("details").$type<ActDetails>().notNull(),
  },
  (table) => [
    index("acts_group_id").on(table.groupId, table.at, table.id),
    index("acts_actor_id").on(table.actorId),
  ],
);
