import type { Express } from "express";
import request from "supertest";
import { expect, test } from "vitest";
import { routesOf } from "../../server/app";
import { ok } from "../../server/http/answer";
import { route, type Route } from "../../server/http/route";
import { memberRoles, type ApiError, type MemberRole } from "../../shared/schemas/member";
import { testServer, type TestServer } from "../support/testServer";

const nobody = "nobody";

/** Calls a route with nothing valid in it: whoever may not call it must hear so before anything else. */
async function codeFor({ app, as }: TestServer, { method, path }: Route, who: MemberRole | typeof nobody) {
  const client = who === nobody ? request(app) : await as(who);
  const verb = method.toLowerCase() as "get" | "post" | "put" | "patch" | "delete";
  const { body, status } = await client[verb](path.replaceAll(/:\w+/g, "1"));
  return { status, code: (body as Partial<ApiError>).error?.code };
}

function expected({ roles }: Route, who: MemberRole | typeof nobody) {
  if (roles === "public") return null;
  if (who === nobody) return { status: 401, code: "NOT_SIGNED_IN" };
  return roles === "signed-in" || roles.includes(who) ? null : { status: 403, code: "FORBIDDEN" };
}

test("every route refuses nobody and every role that it does not name, and lets the others through", async () => {
  const server = await testServer();
  const routes = routesOf(server.deps);
  expect(routes.length).toBeGreaterThan(15);
  let refused = 0;
  for (const declared of routes) {
    for (const who of [nobody, ...memberRoles] as const) {
      const want = expected(declared, who);
      const got = await codeFor(server, declared, who);
      const where = `${declared.method} ${declared.path} as ${who}`;
      if (want) expect(got, where).toEqual(want);
      else expect(["NOT_SIGNED_IN", "FORBIDDEN", "INTERNAL"], where).not.toContain(got.code);
      refused += want ? 1 : 0;
    }
  }
  expect(refused).toBeGreaterThan(25);
});

test.each([[undefined], [[]], ["everybody"], [["metallurgist", "owner"]]])(
  "a route whose roles are %j cannot be declared",
  (roles) => {
    const declare = () =>
      route({ method: "GET", path: "/api/new", roles: roles as unknown as "public", handle: () => ok({}) });
    expect(declare).toThrow("GET /api/new does not say which roles may call it");
  },
);

interface Layer {
  route?: { path: string; methods: Record<string, boolean> };
  handle: { stack?: Layer[] };
}

/** Every path express itself knows, with its methods, nested routers included. */
function registered(layers: Layer[]): string[] {
  return layers.flatMap(({ route: own, handle }) => {
    if (own) return Object.keys(own.methods).map((method) => `${method.toUpperCase()} ${own.path}`);
    return handle.stack ? registered(handle.stack) : [];
  });
}

test("no route stands beside the declared ones", async () => {
  const { app, deps } = await testServer();
  const declared = routesOf(deps).map(({ method, path }) => `${method} ${path}`);
  const stack = (app as Express & { router: { stack: Layer[] } }).router.stack;
  expect(registered(stack).sort()).toEqual(declared.sort());
});
