import { index, integer, pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { mailKinds } from "../../../shared/schemas/mail";
import { users } from "./users";

/**
 * A letter's way: it waits, is being sent, and then is sent or failed. It turns to `sending` before anything leaves,
 * and never back unless the mail server said that it took nothing: so no letter is sent twice.
 */
export const letterStates = ["waiting", "sending", "sent", "failed"] as const;

/** Mail to go out, written in the transaction that causes it. */
export const letters = pgTable(
  "letters",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    kind: text("kind", { enum: mailKinds }).notNull(),
    toAddress: text("to_address").notNull(),
    /** null where the address has no account. */
    toUserId: uuid("to_user_id").references(() => users.id, { onDelete: "set null" }),
    subject: text("subject").notNull(),
    /** The two bodies are emptied once it is sent: links in them open doors. */
    plain: text("plain").notNull(),
    html: text("html").notNull(),
    state: text("state", { enum: letterStates }).notNull().default("waiting"),
    /** How many times sending was begun. */
    tries: integer("tries").notNull().default(0),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull(),
    /** Not before then; while it is being sent, since then. */
    dueAt: timestamp("due_at", { withTimezone: true }).notNull(),
    sentAt: timestamp("sent_at", { withTimezone: true }),
    /** What the last try that went wrong said. */
    failure: text("failure"),
  },
  (table) => [index("letters_state_due_at").on(table.state, table.dueAt)],
);
