import { DrizzleSQLiteAdapter } from "@lucia-auth/adapter-drizzle";
import type { RequestHandler } from "express";
import { Lucia, TimeSpan } from "lucia";
import type { Member } from "../../../shared/schemas/member";
import type { Db } from "../../db/open";
import { users } from "../members/schema";
import { sessions } from "./schema";

interface UserAttributes {
  email: string;
  name: string;
  role: Member["role"];
  disabledAt: string | null;
}
type SessionLucia = Lucia<Record<never, never>, UserAttributes>;

declare module "lucia" {
  interface Register {
    Lucia: SessionLucia;
    DatabaseUserAttributes: UserAttributes;
  }
}

declare global {
  // eslint-disable-next-line @typescript-eslint/no-namespace -- the way express's types are extended
  namespace Express {
    interface Locals {
      /** who is signed in, set by the session middleware */
      user: Member | null;
    }
  }
}

/** All the server knows of sessions; the library behind it is named in this file alone. */
export interface Sessions {
  /** @returns the Set-Cookie header that signs the member in */
  start(userId: string): Promise<string>;
  /** @returns the Set-Cookie header that signs out; the session in the given Cookie header is gone */
  end(cookieHeader: string | undefined): Promise<string>;
  /** puts `res.locals.user` on every request and renews or clears the cookie */
  middleware: RequestHandler;
}

export function createSessions(db: Db, { https, days }: { https: boolean; days: number }): Sessions {
  const lucia: SessionLucia = new Lucia(new DrizzleSQLiteAdapter(db, sessions, users), {
    sessionExpiresIn: new TimeSpan(days, "d"),
    sessionCookie: {
      name: "gangueway_session",
      expires: true,
      attributes: { secure: https, sameSite: "lax" },
    },
    // The adapter reads the whole row; only these leave it.
    getUserAttributes: ({ email, name, role, disabledAt }) => ({ email, name, role, disabledAt }),
  });
  const idIn = (cookieHeader: string | undefined) => lucia.readSessionCookie(cookieHeader ?? "");
  return {
    async start(userId) {
      const session = await lucia.createSession(userId, {});
      return lucia.createSessionCookie(session.id).serialize();
    },
    async end(cookieHeader) {
      const id = idIn(cookieHeader);
      if (id) await lucia.invalidateSession(id);
      return lucia.createBlankSessionCookie().serialize();
    },
    middleware: async (req, res, next) => {
      res.locals.user = null;
      const sessionId = idIn(req.headers.cookie);
      if (sessionId) {
        const { session, user } = await lucia.validateSession(sessionId);
        // Closing an account ends its sessions; a sign-in that was under way meanwhile opens nothing either.
        if (user && user.disabledAt === null) {
          const { id, email, name, role } = user;
          res.locals.user = { id, email, name, role };
        }
        if (session?.fresh) res.appendHeader("Set-Cookie", lucia.createSessionCookie(session.id).serialize());
        if (!session) res.appendHeader("Set-Cookie", lucia.createBlankSessionCookie().serialize());
      }
      next();
    },
  };
}
