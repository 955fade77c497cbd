import { index, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { MailState } from "../../../shared/schemas/invitation";

/** Letters of this server, whether a mail server takes them or not. */
export const mails = sqliteTable(
  "mails",
  {
    id: text("id").primaryKey(),
    to: text("to_address").notNull(),
    subject: text("subject").notNull(),
    /** `{link}` where the link stands */
    text: text("text").notNull(),
    /** what the link opens; gone once it opens nothing or a mail server has the letter */
    link: text("link"),
    linkExpiresAt: text("link_expires_at").notNull(),
    createdAt: text("created_at").notNull(),
    state: text("state").$type<MailState>().notNull(),
    sentAt: text("sent_at"),
    error: text("error"),
  },
  (table) => [index("mails_created").on(table.createdAt)],
);
