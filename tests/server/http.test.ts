import { mkdirSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { expect, test } from "vitest";
import { tables, temporaryFolder, testServer } from "../support/testServer";

test("health says which data are served", async () => {
  const { anyone } = await testServer();
  const { body } = await anyone.get("/api/health").expect(200);
  expect(body).toEqual({ status: "ok", dataVersion: tables.version });
});

test("an unknown path below /api is a 404 in JSON", async () => {
  const { anyone } = await testServer();
  const { body } = await anyone.get("/api/nothing/here?x=1").expect(404);
  expect(body).toEqual({ error: { code: "NOT_FOUND", path: "", message: "There is no GET /api/nothing/here." } });
});

test("a body that is no JSON, or too much of it, is refused in the usual shape", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const post = () => metallurgist.post("/api/projects").set("Content-Type", "application/json");
  expect((await post().send('{"name": ').expect(400)).body).toMatchObject({ error: { code: "INVALID_JSON" } });
  const large = JSON.stringify({ name: "x".repeat(1_100_000) });
  expect((await post().send(large).expect(413)).body).toMatchObject({ error: { code: "TOO_LARGE" } });
});

test("an unexpected error is a 500 that says nothing of its inside", async () => {
  const { as, raw } = await testServer();
  const manager = await as("manager");
  raw.exec("drop table plan_revisions");
  const { body, text } = await manager.get("/api/plans").expect(500);
  expect(body).toMatchObject({ error: { code: "INTERNAL" } });
  expect(text).not.toContain("plan_revisions");
});

test("the limit and offset of a list are checked", async () => {
  const { as } = await testServer();
  const manager = await as("manager");
  const { body } = await manager.get("/api/projects?limit=5000").expect(400);
  expect(body).toMatchObject({ error: { code: "INVALID_INPUT", path: "limit" } });
});

function builtClient(): string {
  const folder = temporaryFolder();
  mkdirSync(join(folder, "assets"));
  const write = (name: string, text: string) => writeFileSync(join(folder, name), text);
  write("index.html", "<!doctype html><title>Gangueway</title>");
  write("assets/app-1a2b3c.js", "plain");
  write("assets/app-1a2b3c.js.gz", "gzipped");
  write("assets/app-1a2b3c.js.br", "brotli");
  return folder;
}

test("hashed assets are cached for good and sent compressed to those who take it", async () => {
  const { anyone } = await testServer({ clientFolder: builtClient() });
  for (const [accepts, encoding, length] of [
    ["gzip, deflate, br", "br", 6],
    ["gzip", "gzip", 7],
    ["identity", undefined, 5],
  ] as const) {
    const { headers } = await anyone.head("/assets/app-1a2b3c.js").set("Accept-Encoding", accepts).expect(200);
    expect(headers["cache-control"]).toBe("public, max-age=31536000, immutable");
    expect(headers["content-encoding"]).toBe(encoding);
    expect(Number(headers["content-length"])).toBe(length);
    expect(headers["content-type"]).toMatch(/javascript/);
    expect(headers.vary).toMatch(/Accept-Encoding/i);
  }
});

test("every page is index.html and asked for anew, a missing asset is not a page", async () => {
  const { anyone } = await testServer({ clientFolder: builtClient() });
  for (const path of ["/", "/plans/abc", "/assets/none"]) {
    const { headers, text } = await anyone.get(path).expect(200);
    expect(text).toContain("<title>Gangueway</title>");
    expect(headers["cache-control"]).toBe("no-cache");
  }
  const missing = await anyone.get("/assets/app-old.js").expect(404);
  expect(missing.text).not.toContain("<title>");
  const { headers } = await anyone.get("/");
  await anyone
    .get("/")
    .set("If-None-Match", headers.etag ?? "")
    .expect(304);
});

test("pages carry a content security policy that lets the map draw and nothing foreign in", async () => {
  const { anyone } = await testServer({ clientFolder: builtClient() });
  const policy = (await anyone.get("/")).headers["content-security-policy"] ?? "";
  expect(policy).toContain("default-src 'self'");
  expect(policy).toContain("script-src 'self';");
  expect(policy).toContain("style-src 'self' 'unsafe-inline'");
  expect(policy).toContain("frame-ancestors 'none'");
  expect(policy).not.toContain("upgrade-insecure-requests");
});
