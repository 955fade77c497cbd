import { asc, count, eq } from "drizzle-orm";
import type { Member, MemberRole, Preferences } from "../../../shared/schemas/member";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { hashPassword } from "../auth/passwords";
import { users } from "./schema";

const memberColumns = { id: users.id, email: users.email, name: users.name, role: users.role };

export const anyMember = (db: Db): boolean => countMembers(db) > 0;
export const countMembers = (db: Db): number => db.select({ n: count() }).from(users).get()?.n ?? 0;

export function listMembers(db: Db, { limit, offset }: { limit: number; offset: number }): Member[] {
  return db.select(memberColumns).from(users).orderBy(asc(users.email)).limit(limit).offset(offset).all();
}

export function findByEmail(db: Db, email: string): (Member & { passwordHash: string }) | undefined {
  const columns = { ...memberColumns, passwordHash: users.passwordHash };
  return db.select(columns).from(users).where(eq(users.email, email.toLowerCase())).get();
}

interface NewMember {
  email: string;
  name: string;
  role: MemberRole;
  password: string;
}

/** The administrator of an empty database.
 *  @throws Refusal CONFLICT once anybody is a member */
export async function createFirstAdmin(db: Db, now: Date, person: Omit<NewMember, "role">): Promise<Member> {
  const passwordHash = await hashPassword(person.password);
  const { email, name } = person;
  const member: Member = { id: crypto.randomUUID(), email: email.toLowerCase(), name, role: "admin" };
  return db.transaction((tx) => {
    if (anyMember(tx))
      throw new Refusal("CONFLICT", "", "There are members already: an administrator adds the others.");
    tx.insert(users)
      .values({ ...member, passwordHash, preferences: {}, createdAt: now.toISOString() })
      .run();
    return member;
  });
}

export function preferencesOf(db: Db, userId: string): Preferences {
  return db.select({ it: users.preferences }).from(users).where(eq(users.id, userId)).get()?.it ?? {};
}

export function setPreferences(db: Db, userId: string, preferences: Preferences): Preferences {
  db.update(users).set({ preferences }).where(eq(users.id, userId)).run();
  return preferences;
}
