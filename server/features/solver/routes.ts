import { z } from "../../../shared/schemas/z";
import { reactionDesk } from "../../../shared/reactions/desk";
import type { Deps } from "../../deps";
import { ok } from "../../http/answer";
import { Refusal } from "../../http/refusal";
import { route } from "../../http/route";

export const solverRoutes = ({ chemistry, solve }: Deps) => [
  route({
    method: "POST",
    path: "/api/solve",
    roles: "signed-in",
    // The solver checks the problem itself, so that this route and the command line refuse in the same words.
    body: z.unknown(),
    handle: ({ body }) => {
      const solution = solve(body, chemistry.data);
      if (!solution.ok) throw Refusal.from(solution.error);
      return ok(solution.value);
    },
  }),
  route({
    method: "POST",
    path: "/api/reaction",
    roles: "signed-in",
    body: z.unknown(), // checked by the desk, for the same reason
    handle: ({ body }) => {
      const answer = reactionDesk(chemistry.data, body);
      if (!answer.ok) throw Refusal.from(answer.error);
      return ok(answer.value);
    },
  }),
];
