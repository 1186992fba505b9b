import { boolean, pgTable, primaryKey, text, uuid } from "drizzle-orm/pg-core";
import { choosableMailKinds } from "../../../shared/schemas/mail";
import { users } from "./users";

/** Which kinds of mail a person wants; a kind without a row is wanted. */
export const mailChoices = pgTable(
  "mail_choices",
  {
    userId: uuid("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    kind: text("kind", { enum: choosableMailKinds }).notNull(),
    isWanted: boolean("is_wanted").notNull(),
  },
  (table) => [primaryKey({ columns: [table.userId, table.kind] })],
);
