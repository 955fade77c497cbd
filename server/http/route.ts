import { Readable } from "node:stream";
import { pipeline } from "node:stream/promises";
import { Router, type Request, type RequestHandler, type Response } from "express";
import type { z } from "zod";
import { memberRoles, type Member, type MemberRole } from "../../shared/schemas/member";
import type { Answer } from "./answer";
import { Refusal, refusalOf } from "./refusal";

/** Who may call a route. There is no default: a route that does not say is refused when the server starts. */
export type Roles = "public" | "signed-in" | readonly [MemberRole, ...MemberRole[]];
export type Method = "GET" | "POST" | "PUT" | "PATCH" | "DELETE";

interface Context<R extends Roles, P, Q, B> {
  params: P;
  query: Q;
  body: B;
  user: R extends "public" ? Member | null : Member;
  req: Request;
  res: Response;
}

interface Spec<R extends Roles, P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType> {
  method: Method;
  path: `/api/${string}`;
  roles: R;
  params?: P;
  query?: Q;
  body?: B;
  /** runs before the sign-in check: rate limits */
  before?: RequestHandler[];
  handle: (context: Context<R, z.output<P>, z.output<Q>, z.output<B>>) => Answer | Promise<Answer>;
}

/** A declared route, its types checked and then forgotten. */
export interface Route {
  method: Method;
  path: string;
  roles: Roles;
  before: RequestHandler[];
  handle: (context: Context<"public", unknown, unknown, unknown>) => Answer | Promise<Answer>;
  params?: z.ZodType;
  query?: z.ZodType;
  body?: z.ZodType;
}

function checkRoles(roles: unknown, where: string): void {
  if (roles === "public" || roles === "signed-in") return;
  const known: readonly unknown[] = memberRoles;
  if (Array.isArray(roles) && roles.length > 0 && roles.every((role) => known.includes(role))) return;
  throw new Error(`${where} does not say which roles may call it`);
}

/** Declares a route. The only way to one: who may call it stands beside what it does.
 *  @throws Error when `roles` is missing, empty or names an unknown role */
export function route<
  const R extends Roles,
  P extends z.ZodType = z.ZodUndefined,
  Q extends z.ZodType = z.ZodUndefined,
  B extends z.ZodType = z.ZodUndefined,
>(spec: Spec<R, P, Q, B>): Route {
  checkRoles(spec.roles, `${spec.method} ${spec.path}`);
  return { before: [], ...spec, handle: spec.handle as unknown as Route["handle"] };
}

/** May this member (or nobody) call the route?
 *  @throws Refusal NOT_SIGNED_IN or FORBIDDEN */
function checkAccess(roles: Roles, user: Member | null): void {
  if (roles === "public") return;
  if (!user) throw new Refusal("NOT_SIGNED_IN", "", "Sign in first.");
  if (roles === "signed-in" || roles.includes(user.role)) return;
  throw new Refusal("FORBIDDEN", "", `This needs the role ${roles.join(" or ")}; you are signed in as ${user.role}.`);
}

function parse(schema: z.ZodType | undefined, value: unknown): unknown {
  if (!schema) return undefined;
  const parsed = schema.safeParse(value, { reportInput: true });
  if (!parsed.success) throw refusalOf(parsed.error);
  return parsed.data;
}

/** Whoever asked may leave before the end. */
function unlessGone(error: NodeJS.ErrnoException): void {
  if (error.code !== "ERR_STREAM_PREMATURE_CLOSE") throw error;
}

async function send(res: Response, { status, body, json, bytes, stream, headers }: Answer): Promise<void> {
  res.status(status).set(headers);
  if (stream) await pipeline(Readable.from(stream), res).catch(unlessGone);
  else if (bytes) res.end(bytes);
  else if (json !== undefined) res.type("json").send(json);
  else if (body === undefined) res.end();
  else res.json(body);
}

/** An express router of the declared routes. `res.locals.user` was set by the session middleware. */
export function mountRoutes(routes: readonly Route[]): Router {
  const router = Router();
  for (const { method, path, roles, before, handle, ...schemas } of routes) {
    const verb = method.toLowerCase() as Lowercase<Method>;
    router[verb](path, ...before, async (req, res) => {
      const user = res.locals.user;
      checkAccess(roles, user);
      const params = parse(schemas.params, req.params);
      const query = parse(schemas.query, req.query);
      const body = parse(schemas.body, req.body ?? {});
      await send(res, await handle({ params, query, body, user, req, res }));
    });
  }
  return router;
}
