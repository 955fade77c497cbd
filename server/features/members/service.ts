import { and, asc, count, eq, isNull, ne } from "drizzle-orm";
import type { z } from "zod";
import type { MemberRow, memberUpdate } from "../../../shared/schemas/invitation";
import type { Member, MemberRole, Preferences } from "../../../shared/schemas/member";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { hashPassword } from "../auth/passwords";
import { sessions } from "../auth/schema";
import { recordWrite, requireSeen, type Author, type Kept } from "../history/service";
import { users } from "./schema";

const memberColumns = { id: users.id, email: users.email, name: users.name, role: users.role };
const rowColumns = {
  ...memberColumns,
  version: users.version,
  createdAt: users.createdAt,
  disabledAt: users.disabledAt,
};

type Stored = Omit<MemberRow, "disabled"> & { disabledAt: string | null };
const asRow = ({ disabledAt, ...member }: Stored): MemberRow => ({ ...member, disabled: disabledAt !== null });

export const anyMember = (db: Db): boolean => countMembers(db) > 0;
export const countMembers = (db: Db): number => db.select({ n: count() }).from(users).get()?.n ?? 0;

export function listMembers(db: Db, { limit, offset }: { limit: number; offset: number }): MemberRow[] {
  return db.select(rowColumns).from(users).orderBy(asc(users.email)).limit(limit).offset(offset).all().map(asRow);
}

/** @throws Refusal NOT_FOUND */
export function memberOf(db: Db, id: string): MemberRow {
  const found = db.select(rowColumns).from(users).where(eq(users.id, id)).get();
  if (!found) throw new Refusal("NOT_FOUND", "id", `There is no member ${id}.`);
  return asRow(found);
}

export function findByEmail(db: Db, email: string) {
  const columns = { ...memberColumns, passwordHash: users.passwordHash, disabledAt: users.disabledAt };
  return db.select(columns).from(users).where(eq(users.email, email.toLowerCase())).get();
}

interface NewMember {
  email: string;
  name: string;
  role: MemberRole;
  passwordHash: string;
}

export function insertMember(db: Db, now: Date, { passwordHash, ...person }: NewMember): Member {
  const member: Member = { id: crypto.randomUUID(), ...person, email: person.email.toLowerCase() };
  db.insert(users)
    .values({ ...member, passwordHash, preferences: {}, createdAt: now.toISOString() })
    .run();
  return member;
}

/** The administrator of an empty database.
 *  @throws Refusal CONFLICT once anybody is a member */
export async function createFirstAdmin(
  db: Db,
  now: Date,
  { password, ...person }: { email: string; name: string; password: string },
): Promise<Member> {
  const passwordHash = await hashPassword(password);
  return db.transaction((tx) => {
    if (anyMember(tx))
      throw new Refusal("CONFLICT", "", "There are members already: an administrator adds the others.");
    return insertMember(tx, now, { ...person, role: "admin", passwordHash });
  });
}

export const keptMember = ({ name, role, disabled, version }: MemberRow): Kept => ({ name, role, disabled, version });

/** Somebody must be able to let others in. */
function requireAnotherAdmin(db: Db, id: string, path: string): void {
  const others = and(eq(users.role, "admin"), isNull(users.disabledAt), ne(users.id, id));
  if ((db.select({ n: count() }).from(users).where(others).get()?.n ?? 0) > 0) return;
  throw new Refusal("CONFLICT", path, "This is the last administrator: make another member one first.");
}

/** Changes name, role or access. Closing an account ends its sessions.
 *  @throws Refusal NOT_FOUND, STALE; CONFLICT for the last administrator */
export function updateMember(
  db: Db,
  id: string,
  seen: number,
  { reason, ...yours }: z.output<typeof memberUpdate>,
  author: Author,
): MemberRow {
  return db.transaction((tx) => {
    const current = memberOf(tx, id);
    const fields = keptMember(current);
    requireSeen(tx, { entity: "member", what: `The account of ${current.name}`, current, fields, seen, yours });
    const { name, role, disabled } = { ...current, ...yours };
    const isAdmin = current.role === "admin" && !current.disabled;
    if (isAdmin && role !== "admin") requireAnotherAdmin(tx, id, "role");
    if (isAdmin && disabled) requireAnotherAdmin(tx, id, "disabled");
    const version = current.version + 1;
    const disabledAt = disabled ? author.now.toISOString() : null;
    tx.update(users)
      .set({ name, role, version, ...(disabled === current.disabled ? {} : { disabledAt }) })
      .where(eq(users.id, id))
      .run();
    if (disabled) tx.delete(sessions).where(eq(sessions.userId, id)).run();
    const after: Kept = { name, role, disabled, version };
    recordWrite(tx, { entity: "member", id, action: "change", before: fields, after, reason }, author);
    return memberOf(tx, id);
  });
}

export function preferencesOf(db: Db, userId: string): Preferences {
  return db.select({ it: users.preferences }).from(users).where(eq(users.id, userId)).get()?.it ?? {};
}

export function setPreferences(db: Db, userId: string, preferences: Preferences): Preferences {
  db.update(users).set({ preferences }).where(eq(users.id, userId)).run();
  return preferences;
}
