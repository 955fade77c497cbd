import { expect, test } from "vitest";
import { routesOf } from "../../server/app";
import { testServer } from "../support/testServer";

/** Writes that name no version: nothing is overwritten by them, or the row is the writer's own. */
const withoutVersion = new Set([
  "DELETE /api/session",
  "DELETE /api/invitations/:id", // open or not: a second withdrawal is refused as such
  "PUT /api/me/preferences",
]);

test("every route that changes a row others may change refuses a write without If-Match, and one that is no version", async () => {
  const server = await testServer();
  const admin = await server.as("admin");
  const changing = routesOf(server.deps).filter(
    ({ method, path }) =>
      (["PUT", "PATCH", "DELETE"].includes(method) || /\/(restore|reopen)$/.test(path)) &&
      !withoutVersion.has(`${method} ${path}`),
  );
  expect(changing.length).toBeGreaterThan(11);
  for (const { method, path } of changing) {
    const verb = method.toLowerCase() as "put" | "patch" | "delete" | "post";
    const send = () => admin[verb](path.replace(":id", "1")).send({ reason: "none" });
    const where = `${method} ${path}`;
    const blind = await send();
    expect(blind.body, where).toMatchObject({ error: { code: "VERSION_REQUIRED", path: "If-Match" } });
    expect(blind.status, where).toBe(428);
    const odd = await send().set("If-Match", "*");
    expect(odd.body, where).toMatchObject({ error: { code: "INVALID_INPUT", path: "If-Match" } });
    const missing = await send().set("If-Match", '"1"');
    expect(missing.body, where).toMatchObject({ error: { code: "NOT_FOUND", path: "id" } });
  }
});

test("every recorded row can be asked what was written to it, and how it stood", async () => {
  const server = await testServer();
  const paths = routesOf(server.deps).map(({ path }) => path);
  const manager = await server.as("manager");
  for (const row of ["plans", "feeds", "campaigns", "trials"]) {
    for (const path of [`/api/${row}/:id/history`, `/api/${row}/:id/history/:version`]) {
      expect(paths).toContain(path);
      const { body } = await manager.get(path.replace(":id", "none").replace(":version", "1")).expect(404);
      expect(body).toMatchObject({ error: { code: "NOT_FOUND", path: "id" } });
    }
  }
});
