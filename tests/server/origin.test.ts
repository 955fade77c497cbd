import { expect, test } from "vitest";
import { emailOf, password, testServer } from "../support/testServer";

const body = { email: emailOf("manager"), password };

test.each(["http://evil.example", "null", "http://127.0.0.1:9", "https://leach.example.evil.example"])(
  "a write from a page of %s is refused",
  async (origin) => {
    const { anyone } = await testServer({ env: { APP_URL: "https://leach.example" } });
    const refused = await anyone.post("/api/session").set("Origin", origin).send(body).expect(403);
    expect(refused.body).toMatchObject({ error: { code: "WRONG_ORIGIN" } });
    expect(refused.text).toContain(origin);
    expect(refused.headers["set-cookie"]).toBeUndefined();
  },
);

test("a write from the page it was served with, or from APP_URL behind a proxy, is taken", async () => {
  const { anyone } = await testServer({ env: { APP_URL: "https://leach.example" } });
  const host = "127.0.0.1:4321";
  await anyone.post("/api/session").set("Host", host).set("Origin", `http://${host}`).send(body).expect(200);
  await anyone.post("/api/session").set("Origin", "https://leach.example").send(body).expect(200);
  await anyone.post("/api/session").send(body).expect(200);
});

test("reading is not a matter of origin", async () => {
  const { anyone } = await testServer();
  await anyone.get("/api/health").set("Origin", "http://evil.example").expect(200);
});
