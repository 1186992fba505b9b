import { index, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { noticeKinds } from "../../../shared/schemas/notices";
import { comments } from "./comments";
import { users } from "./users";

/** What a person is told of in the page. */
export const notices = pgTable(
  "notices",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    userId: uuid("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    kind: text("kind", { enum: noticeKinds }).notNull(),
    /** Goes with what it tells of. */
    commentId: uuid("comment_id")
      .notNull()
      .references(() => comments.id, { onDelete: "cascade" }),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull(),
    readAt: timestamp("read_at", { withTimezone: true }),
  },
  (table) => [
    index("notices_user_id").on(table.userId, table.createdAt),
    index("notices_comment_id").on(table.commentId),
  ],
);
