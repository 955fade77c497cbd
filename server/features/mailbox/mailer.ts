import { eq, lte } from "drizzle-orm";
import { createTransport } from "nodemailer";
import type { Db } from "../../db/open";
import { mails } from "./schema";

export interface Letter {
  to: string;
  subject: string;
  /** `{link}` where the link stands */
  text: string;
  link: string;
  linkExpiresAt: string;
}

/** Puts a letter into the mailbox; call it in the transaction that makes its link.
 *  @returns the letter's id */
export function keepLetter(db: Db, letter: Letter, now: Date): string {
  const id = crypto.randomUUID();
  db.insert(mails)
    .values({ id, ...letter, createdAt: now.toISOString(), state: "kept" })
    .run();
  return id;
}

/** The link of a letter opens nothing any more: it need not be kept. */
export function forgetLink(db: Db, mailId: string): void {
  db.update(mails).set({ link: null }).where(eq(mails.id, mailId)).run();
}

export function forgetExpiredLinks(db: Db, now: Date): void {
  db.update(mails).set({ link: null }).where(lte(mails.linkExpiresAt, now.toISOString())).run();
}

/** Hands letters of the mailbox to a mail server, where one is set up. */
export interface Mailer {
  /** Never throws: a letter that was refused keeps its link and the server's words. */
  deliver: (mailId: string) => Promise<void>;
}

interface Settings {
  /** null: letters stay in the mailbox, and nothing goes to the network */
  smtpUrl: string | null;
  from: string;
  clock: () => Date;
}

export function createMailer(db: Db, { smtpUrl, from, clock }: Settings): Mailer {
  if (smtpUrl === null) return { deliver: () => Promise.resolve() };
  const waits = { connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 20_000 };
  const transport = createTransport({ url: smtpUrl, ...waits });
  return {
    async deliver(mailId) {
      const letter = db.select().from(mails).where(eq(mails.id, mailId)).get();
      if (!letter || letter.link === null) return;
      const { to, subject, text, link } = letter;
      try {
        await transport.sendMail({ from, to, subject, text: text.replace("{link}", () => link) });
        const sentAt = clock().toISOString();
        db.update(mails).set({ state: "sent", sentAt, error: null, link: null }).where(eq(mails.id, mailId)).run();
      } catch (error) {
        const words = error instanceof Error ? error.message : String(error);
        db.update(mails)
          .set({ state: "failed", error: words.slice(0, 500) })
          .where(eq(mails.id, mailId))
          .run();
      }
    },
  };
}
