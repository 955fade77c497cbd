import { firstAdmin, signIn, type DemoAccounts, type Member, type SessionAnswer } from "../../../shared/schemas/member";
import { demoAccounts, demoPassword } from "../../demo/accounts";
import type { Deps } from "../../deps";
import { created, noContent, ok } from "../../http/answer";
import { failureLimit } from "../../http/failureLimit";
import { Refusal } from "../../http/refusal";
import { route } from "../../http/route";
import { anyMember, createFirstAdmin, findByEmail } from "../members/service";
import { passwordMatches } from "./passwords";

export function authRoutes({ db, sessions, clock, config }: Deps) {
  const demo = (): DemoAccounts | null => {
    const accounts = demoAccounts.filter(({ email }) => findByEmail(db, email));
    return accounts.length === 0
      ? null
      : { accounts: accounts.map(({ email, role }) => ({ email, role })), password: demoPassword };
  };
  const answer = (user: Member | null): SessionAnswer => {
    const shown = user === null && demo();
    return { user, needsFirstAdmin: !anyMember(db), ...(shown && { demo: shown }) };
  };
  const limit = failureLimit(config.signInAttempts);
  return [
    route({
      method: "GET",
      path: "/api/session",
      roles: "public",
      handle: ({ user }) => ok(answer(user)),
    }),
    route({
      method: "POST",
      path: "/api/session",
      roles: "public",
      before: [limit],
      body: signIn,
      handle: async ({ body, req }) => {
        const found = findByEmail(db, body.email);
        if (!(await passwordMatches(found?.passwordHash ?? null, body.password)) || !found) {
          throw new Refusal("WRONG_CREDENTIALS", "", "No member has this e-mail address with this password.");
        }
        const { passwordHash: _, disabledAt, ...member } = found;
        if (disabledAt !== null)
          throw new Refusal("DISABLED", "", "This account is closed; an administrator can open it again.");
        await sessions.end(req.headers.cookie);
        return ok(answer(member), { "Set-Cookie": await sessions.start(member.id) });
      },
    }),
    route({
      method: "DELETE",
      path: "/api/session",
      roles: "public",
      handle: async ({ req, res }) => {
        res.set("Set-Cookie", await sessions.end(req.headers.cookie));
        return noContent();
      },
    }),
    route({
      method: "POST",
      path: "/api/first-admin",
      roles: "public",
      before: [limit],
      body: firstAdmin,
      handle: async ({ body }) => {
        const member = await createFirstAdmin(db, clock(), body);
        return created(answer(member), { "Set-Cookie": await sessions.start(member.id) });
      },
    }),
  ];
}
