import { pgTable, primaryKey, timestamp, uuid } from "drizzle-orm/pg-core";
import { threads } from "./threads";
import { users } from "./users";

/** How far each person has read a thread; without a row, not at all. */
export const threadReads = pgTable(
  "thread_reads",
  {
    threadId: uuid("thread_id")
      .notNull()
      .references(() => threads.id, { onDelete: "cascade" }),
    userId: uuid("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    /** When the last comment seen was written. */
    seenUntil: timestamp("seen_until", { withTimezone: true }).notNull(),
  },
  (table) => [primaryKey({ columns: [table.threadId, table.userId] })],
);
