import { createHash, randomBytes } from "node:crypto";
import { and, count, desc, eq, gt, isNotNull, isNull, lte, type SQL } from "drizzle-orm";
import type { z } from "zod";
import type {
  invitationCreate,
  InvitationOffer,
  InvitationRow,
  invitationsQuery,
  invitationStates,
} from "../../../shared/schemas/invitation";
import type { Member } from "../../../shared/schemas/member";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { hashPassword } from "../auth/passwords";
import type { Author } from "../history/service";
import { forgetLink, keepLetter } from "../mailbox/mailer";
import { mails } from "../mailbox/schema";
import { invitations, users } from "./schema";
import { findByEmail, insertMember } from "./service";

type State = (typeof invitationStates)[number];
type Stored = typeof invitations.$inferSelect;

const hashOf = (token: string) => createHash("sha256").update(token).digest("hex");

function stateOf({ acceptedAt, withdrawnAt, expiresAt }: Stored, now: Date): State {
  if (acceptedAt !== null) return "accepted";
  if (withdrawnAt !== null) return "withdrawn";
  return expiresAt <= now.toISOString() ? "expired" : "open";
}

function inState(state: State, now: Date): SQL | undefined {
  const at = now.toISOString();
  const untouched = and(isNull(invitations.acceptedAt), isNull(invitations.withdrawnAt));
  if (state === "accepted") return isNotNull(invitations.acceptedAt);
  if (state === "withdrawn") return and(isNull(invitations.acceptedAt), isNotNull(invitations.withdrawnAt));
  return and(untouched, state === "open" ? gt(invitations.expiresAt, at) : lte(invitations.expiresAt, at));
}

const selectInvitations = (db: Db) =>
  db
    .select({ invitation: invitations, invitedBy: users.name, mailState: mails.state, mailError: mails.error })
    .from(invitations)
    .innerJoin(users, eq(users.id, invitations.invitedBy))
    .innerJoin(mails, eq(mails.id, invitations.mailId));
type Selected = NonNullable<ReturnType<ReturnType<typeof selectInvitations>["get"]>>;

const asRow = ({ invitation, invitedBy, mailState, mailError }: Selected, now: Date): InvitationRow => {
  const { id, email, role, createdAt, expiresAt, mailId } = invitation;
  const mail = { id: mailId, state: mailState, error: mailError };
  return { id, email, role, invitedBy, createdAt, expiresAt, state: stateOf(invitation, now), mail };
};

/** Newest first. */
export function listInvitations(db: Db, query: z.output<typeof invitationsQuery>, now: Date) {
  const filter = query.state === "all" ? undefined : inState(query.state, now);
  const rows = selectInvitations(db)
    .where(filter)
    .orderBy(desc(invitations.createdAt), invitations.id)
    .limit(query.limit)
    .offset(query.offset)
    .all();
  const total = db.select({ n: count() }).from(invitations).where(filter).get()?.n ?? 0;
  return { rows: rows.map((row) => asRow(row, now)), total };
}

/** @throws Refusal NOT_FOUND */
export function invitationOf(db: Db, id: string, now: Date): InvitationRow {
  const found = selectInvitations(db).where(eq(invitations.id, id)).get();
  if (!found) throw new Refusal("NOT_FOUND", "id", `There is no invitation ${id}.`);
  return asRow(found, now);
}

function withdraw(db: Db, open: { id: string; mailId: string }, now: Date): void {
  db.update(invitations).set({ withdrawnAt: now.toISOString() }).where(eq(invitations.id, open.id)).run();
  forgetLink(db, open.mailId);
}

const dayOf = (iso: string) => `${iso.slice(0, 10)} ${iso.slice(11, 16)} UTC`;

const letterText = (inviter: string, role: string, message: string, expiresAt: string) =>
  [
    `${inviter} invites you to Gangueway as ${role}.`,
    ...(message === "" ? [] : [message.replaceAll("{link}", "")]),
    `Choose your name and password here; the link works once, until ${dayOf(expiresAt)}:\n{link}`,
    "If you did not expect this letter, leave it: without the link no account is made.",
  ].join("\n\n");

interface Inviting extends Author {
  inviterName: string;
  appUrl: string;
  days: number;
}

/** Makes an invitation and its letter; one that is still open for the same address is withdrawn.
 *  @throws Refusal CONFLICT when the address is a member's */
export function invite(
  db: Db,
  { email: typed, role, message }: z.output<typeof invitationCreate>,
  { authorId, inviterName, now, appUrl, days }: Inviting,
): InvitationRow {
  const email = typed.toLowerCase();
  const token = randomBytes(32).toString("base64url");
  const expiresAt = new Date(now.getTime() + days * 86_400_000).toISOString();
  return db.transaction((tx) => {
    if (findByEmail(tx, email)) throw new Refusal("CONFLICT", "email", `${email} is a member already.`);
    const stillOpen = and(eq(invitations.email, email), inState("open", now));
    for (const older of tx.select().from(invitations).where(stillOpen).all()) withdraw(tx, older, now);
    const text = letterText(inviterName, role, message, expiresAt);
    const link = `${appUrl}/invitation/${token}`;
    const letter = { to: email, subject: "Invitation to Gangueway", text, link, linkExpiresAt: expiresAt };
    const mailId = keepLetter(tx, letter, now);
    const id = crypto.randomUUID();
    const row = { id, email, role, message, tokenHash: hashOf(token), invitedBy: authorId, mailId };
    tx.insert(invitations)
      .values({ ...row, createdAt: now.toISOString(), expiresAt })
      .run();
    return invitationOf(tx, id, now);
  });
}

/** The same invitation anew, with a new link and a new term; the old link opens nothing any more.
 *  @throws Refusal NOT_FOUND; CONFLICT when it was accepted */
export function inviteAgain(db: Db, id: string, inviting: Inviting): InvitationRow {
  const found = db.select().from(invitations).where(eq(invitations.id, id)).get();
  if (!found) throw new Refusal("NOT_FOUND", "id", `There is no invitation ${id}.`);
  if (found.acceptedAt !== null) throw new Refusal("CONFLICT", "id", `${found.email} has accepted already.`);
  return invite(db, found, inviting);
}

/** @throws Refusal NOT_FOUND; CONFLICT when it is not open */
export function withdrawInvitation(db: Db, id: string, now: Date): InvitationRow {
  return db.transaction((tx) => {
    const row = invitationOf(tx, id, now);
    if (row.state !== "open" || !row.mail)
      throw new Refusal("CONFLICT", "id", `The invitation is ${row.state} already.`);
    withdraw(tx, { id, mailId: row.mail.id }, now);
    return invitationOf(tx, id, now);
  });
}

/** The open invitation behind a link.
 *  @throws Refusal NOT_FOUND for a link that never was; EXPIRED for one used, withdrawn or too old */
function behind(db: Db, token: string, now: Date): Selected {
  const found = selectInvitations(db)
    .where(eq(invitations.tokenHash, hashOf(token)))
    .get();
  if (!found)
    throw new Refusal("NOT_FOUND", "token", "This link is not one of ours; copy the whole of it from the letter.");
  const state = stateOf(found.invitation, now);
  const why = { accepted: "was used already", withdrawn: "was withdrawn", expired: "has expired", open: null }[state];
  if (why === null) return found;
  throw new Refusal("EXPIRED", "token", `This invitation ${why}; ask an administrator for a new one.`);
}

export function offerOf(db: Db, token: string, now: Date): InvitationOffer {
  const { invitation, invitedBy } = behind(db, token, now);
  const { email, role, expiresAt } = invitation;
  return { email, role, expiresAt, invitedBy };
}

/** Makes the invited member; the link opens nothing from then on.
 *  @throws Refusal NOT_FOUND, EXPIRED; CONFLICT when the address became a member's meanwhile */
export async function acceptInvitation(
  db: Db,
  token: string,
  { name, password }: { name: string; password: string },
  now: Date,
): Promise<Member> {
  behind(db, token, now);
  const passwordHash = await hashPassword(password);
  return db.transaction((tx) => {
    // Asked again: somebody may have been faster while the password was hashed.
    const { invitation } = behind(tx, token, now);
    const { id, email, role, mailId } = invitation;
    if (findByEmail(tx, email)) throw new Refusal("CONFLICT", "email", `${email} is a member already; sign in.`);
    const member = insertMember(tx, now, { email, role, name, passwordHash });
    tx.update(invitations)
      .set({ acceptedAt: now.toISOString(), acceptedBy: member.id })
      .where(eq(invitations.id, id))
      .run();
    forgetLink(tx, mailId);
    return member;
  });
}
