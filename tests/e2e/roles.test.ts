import { describe, expect, test } from "vitest";
import { sharedPageAs, turnTo } from "../support/browser";
import { PlansScreen } from "./pages/plans";
import { WorkspaceScreen } from "./pages/workspace";

describe.each(["technician", "manager"] as const)("a %s", (role) => {
  const shared = sharedPageAs(role, { path: "/plans", expected: [403] });

  test("opens a plan and tries what they like, is told that it cannot be saved, and is refused by the server", async () => {
    const { page } = shared();
    const plans = new PlansScreen(page);
    await plans.row("Neutral leach, second tank").waitFor();
    expect(await plans.writeControls()).toEqual([]);
    await plans.open("Neutral leach, second tank");
    const plan = new WorkspaceScreen(page);
    await plan.drawn();

    const before = await plan.answers();
    await plan.drag("Temperature of the liquor", 50, () => expect.poll(() => plan.answers()).not.toEqual(before));
    await plan
      .header()
      .getByText(/^Tried here only · go back to revision \d+; your role looks and tries, a metallurgist saves/)
      .waitFor();
    expect(await plan.button("Save revision").count()).toBe(0);
    await page.keyboard.press("Control+s");
    expect(await page.getByRole("dialog").count()).toBe(0);
    await plan.button("More commands").click();
    await page.getByRole("menuitem", { name: "Print" }).waitFor();
    const commands = await page.getByRole("menuitem").allInnerTexts();
    expect(commands.length).toBeGreaterThan(3);
    expect(commands.filter((c) => /name|duplicate|archive/i.test(c))).toEqual([]);
    await page.keyboard.press("Escape");

    const answers = await page.evaluate(async () => {
      const at = "/api/plans/demo-neutral-leach";
      const plan = (await (await fetch(at)).json()) as { version: number; latest: { inputs: object } };
      const send = async (method: string, path: string, body: object) => {
        const headers = { "content-type": "application/json", "if-match": `"${plan.version}"` };
        return (await fetch(path, { method, headers, body: JSON.stringify(body) })).status;
      };
      return [
        await send("POST", `${at}/revisions`, { note: "", inputs: plan.latest.inputs }),
        await send("PATCH", at, { name: "Renamed" }),
        await send("POST", `${at}/duplicate`, { name: "Copy", projectId: "demo-calcine" }),
      ];
    });
    expect(answers).toEqual([403, 403, 403]);
  });

  test("has the reaction desk, which works out what is typed and says what is wrong with what does not balance", async () => {
    const { page } = shared();
    await turnTo(page, "/reactions");
    const field = page.getByRole("textbox", { name: "Reaction" });
    await field.fill("Cu^2+ + Zn = Cu + Zn^2+");
    await page.getByRole("button", { name: "Work it out" }).click();
    await page
      .getByText(/37\.\d/)
      .first()
      .waitFor(); // log K of 2 (0.337 + 0.763) / 0.05916
    await field.fill("Cu^2+ + Zn = Cu");
    await page.getByRole("button", { name: "Work it out" }).click();
    await page.getByRole("alert").first().waitFor();
    expect(await field.inputValue()).toBe("Cu^2+ + Zn = Cu");
  });
});
