import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { memberRoles, type Preferences } from "../../../shared/schemas/member";
import { mails } from "../mailbox/schema";

export const users = sqliteTable("users", {
  id: text("id").primaryKey(),
  /** lower case */
  email: text("email").notNull().unique(),
  name: text("name").notNull(),
  role: text("role", { enum: memberRoles }).notNull(),
  passwordHash: text("password_hash").notNull(),
  preferences: text("preferences", { mode: "json" }).$type<Preferences>().notNull(),
  createdAt: text("created_at").notNull(),
  /** raised when an administrator changes name, role or access */
  version: integer("version").notNull().default(1),
  /** since when this member may not sign in */
  disabledAt: text("disabled_at"),
});

export const invitations = sqliteTable(
  "invitations",
  {
    id: text("id").primaryKey(),
    /** lower case */
    email: text("email").notNull(),
    role: text("role", { enum: memberRoles }).notNull(),
    message: text("message").notNull(),
    /** SHA-256 of the link's token; the token itself is in the letter alone */
    tokenHash: text("token_hash").notNull().unique(),
    invitedBy: text("invited_by")
      .notNull()
      .references(() => users.id),
    createdAt: text("created_at").notNull(),
    expiresAt: text("expires_at").notNull(),
    withdrawnAt: text("withdrawn_at"),
    acceptedAt: text("accepted_at"),
    acceptedBy: text("accepted_by").references(() => users.id),
    mailId: text("mail_id")
      .notNull()
      .references(() => mails.id),
  },
  (table) => [index("invitations_email").on(table.email)],
);
