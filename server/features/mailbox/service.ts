import { count, desc } from "drizzle-orm";
import type { MailRow } from "../../../shared/schemas/invitation";
import type { Db } from "../../db/open";
import { forgetExpiredLinks } from "./mailer";
import { mails } from "./schema";

/** What stands where a link was. */
const blotted = "(the link was sent, used, withdrawn or has expired)";

/** Newest letter first. */
export function listMails(
  db: Db,
  now: Date,
  { limit, offset }: { limit: number; offset: number },
): { rows: MailRow[]; total: number } {
  forgetExpiredLinks(db, now);
  const rows = db.select().from(mails).orderBy(desc(mails.createdAt), mails.id).limit(limit).offset(offset).all();
  const total = db.select({ n: count() }).from(mails).get()?.n ?? 0;
  const shown = rows.map(({ link, linkExpiresAt: _, text, ...mail }): MailRow => {
    return { ...mail, text: text.replace("{link}", () => link ?? blotted) };
  });
  return { rows: shown, total };
}
