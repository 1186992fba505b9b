import { pgTable, text, timestamp, uuid } from "drizzle-orm/pg-core";

/** What would have been sent, where there is no mail server: kept to be looked at in development. */
export const keptMail = pgTable("kept_mail", {
  id: uuid("id").primaryKey(),
  toAddress: text("to_address").notNull(),
  subject: text("subject").notNull(),
  plain: text("plain").notNull(),
  html: text("html").notNull(),
  takenAt: timestamp("taken_at", { withTimezone: true }).notNull(),
});
