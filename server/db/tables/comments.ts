import { index, json, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
import type { Person } from "../../../shared/schemas/people";
import { threads } from "./threads";
import { users } from "./users";

export const comments = pgTable(
  "comments",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    threadId: uuid("thread_id")
      .notNull()
      .references(() => threads.id, { onDelete: "cascade" }),
    authorId: uuid("author_id")
      .notNull()
      .references(() => users.id),
    /** As written; emptied when it is deleted. */
    text: text("text").notNull(),
    /** Whom it speaks to, by the names that stand in it. */
    mentions: json("mentions").$type<Person[]>().notNull(),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull(),
    editedAt: timestamp("edited_at", { withTimezone: true }),
    /** Its place in the thread stays, so that answers to it still stand after something. */
    deletedAt: timestamp("deleted_at", { withTimezone: true }),
  },
  (table) => [index("comments_thread_id").on(table.threadId, table.createdAt)],
);
