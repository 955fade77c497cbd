import { z } from "../../../shared/schemas/z";
import { invitationAccept, invitationCreate, invitationsQuery } from "../../../shared/schemas/invitation";
import type { Member, SessionAnswer } from "../../../shared/schemas/member";
import type { Deps } from "../../deps";
import { created, ok } from "../../http/answer";
import { failureLimit } from "../../http/failureLimit";
import { page } from "../../http/pages";
import { route } from "../../http/route";
import {
  acceptInvitation,
  invitationOf,
  invite,
  inviteAgain,
  listInvitations,
  offerOf,
  withdrawInvitation,
} from "./invitations";

const byId = z.object({ id: z.string().min(1) });
const byToken = z.object({ token: z.string().min(1).max(100) });

export function invitationRoutes({ db, clock, config, mailer, sessions }: Deps) {
  const limit = failureLimit(config.signInAttempts);
  const inviting = (user: Member) => ({
    authorId: user.id,
    inviterName: user.name,
    now: clock(),
    appUrl: config.appUrl,
    days: config.invitationDays,
  });
  /** Waits for the mail server, so that the answer says whether the letter went out. */
  const delivered = async (id: string, mail: { id: string } | null) => {
    if (mail) await mailer.deliver(mail.id);
    return invitationOf(db, id, clock());
  };
  return [
    route({
      method: "GET",
      path: "/api/invitations",
      roles: ["admin"],
      query: invitationsQuery,
      handle: ({ query }) => {
        const { rows, total } = listInvitations(db, query, clock());
        return ok(page(rows, total, query));
      },
    }),
    route({
      method: "POST",
      path: "/api/invitations",
      roles: ["admin"],
      body: invitationCreate,
      handle: async ({ body, user }) => {
        const { id, mail } = invite(db, body, inviting(user));
        return created(await delivered(id, mail));
      },
    }),
    route({
      method: "POST",
      path: "/api/invitations/:id/again",
      roles: ["admin"],
      params: byId,
      handle: async ({ params, user }) => {
        const { id, mail } = inviteAgain(db, params.id, inviting(user));
        return created(await delivered(id, mail));
      },
    }),
    route({
      method: "DELETE",
      path: "/api/invitations/:id",
      roles: ["admin"],
      params: byId,
      handle: ({ params }) => ok(withdrawInvitation(db, params.id, clock())),
    }),
    route({
      method: "GET",
      path: "/api/invitations/:token",
      roles: "public",
      before: [limit],
      params: byToken,
      handle: ({ params }) => ok(offerOf(db, params.token, clock()), { "Cache-Control": "no-store" }),
    }),
    route({
      method: "POST",
      path: "/api/invitations/:token/accept",
      roles: "public",
      before: [limit],
      params: byToken,
      body: invitationAccept,
      handle: async ({ params, body, req }) => {
        const user = await acceptInvitation(db, params.token, body, clock());
        await sessions.end(req.headers.cookie);
        const answer: SessionAnswer = { user, needsFirstAdmin: false };
        return created(answer, { "Set-Cookie": await sessions.start(user.id) });
      },
    }),
  ];
}
