import { expect, test } from "vitest";
import type { FeedRow } from "../../shared/schemas/feed";
import type { PlanRow } from "../../shared/schemas/plan";
import { openPage } from "../support/browser";
import { SignInScreen } from "./pages/signIn";
import { WorkspaceScreen } from "./pages/workspace";

const percent = (text: string) => ({ text, unit: "%" });
const head = (element: string, text: string) => ({
  element,
  value: percent(text),
  method: "",
  laboratory: "",
  head: true,
});

test("from sign-in to a window for a fresh feed in four presses: feeds, plan a leach of it, next, create", async () => {
  const { page } = await openPage();
  const presses: string[] = [];
  const press = async (name: string | RegExp, role: "button" | "link" = "button", within = page.locator("body")) => {
    presses.push(String(name));
    await within
      .getByRole(role, { name, exact: typeof name === "string" })
      .first()
      .click();
  };
  await new SignInScreen(page).enter("metallurgist");
  await page.getByRole("heading", { name: "Plans" }).waitFor();
  const name = `Roasted concentrate ${Date.now()}`;
  const made = await page.context().request.post("/api/feeds", {
    data: {
      projectId: "demo-calcine",
      name,
      heads: [head("Zn", "54.0"), head("Fe", "9.5"), head("Cu", "0.6"), head("Cd", "0.25"), head("SiO2", "3")],
      minerals: [{ mineral: "ZnO(s)", element: "Zn", share: percent("88") }],
    },
  });
  expect(made.status()).toBe(201);
  const feed = (await made.json()) as FeedRow;

  await press("Feeds", "link");
  await page.getByRole("row", { name: new RegExp(name) }).click();
  await press("Plan a leach of it", "link");
  const dialog = page.getByRole("dialog");
  // what follows from the assays is there, named by where it comes from
  await expect.poll(() => dialog.getByLabel("Name of the plan").inputValue()).toBe(`${name}, leach`);
  await dialog.getByRole("combobox", { name: "Metal to dissolve" }).or(dialog.getByLabel("Metal to dissolve")).first().waitFor(); // prettier-ignore
  await press("Next: its metals", "button", dialog);
  const metals = dialog.getByRole("region", { name: "Metals of the plan" });
  // 54 % at 250 g solids to a litre, 90 % of it: 121.5 g/L, three figures
  expect(Number(await metals.getByLabel("Tenor of Zn").inputValue())).toBe(122);
  expect(Number(await metals.getByLabel("Tenor of Fe").inputValue())).toBe(0.0238);
  await dialog.getByText("SiO2, not a metal of the chemistry library").waitFor();
  // every suggestion can be changed, and what follows from it follows
  await metals.getByLabel("Extraction of Zn").fill("45");
  await metals.getByLabel("Extraction of Zn").press("Tab");
  await expect.poll(async () => Number(await metals.getByLabel("Tenor of Zn").inputValue())).toBe(60.8);
  await dialog
    .getByRole("status", { name: "Window" })
    .getByText(/window/)
    .waitFor();
  await press("Create and open", "button", dialog);

  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  await page.getByTestId("set-point").waitFor();
  expect(presses).toHaveLength(4);
  const id = new URL(page.url()).pathname.split("/").at(-1)!;
  const { latest } = (await (await page.context().request.get(`/api/plans/${id}`)).json()) as PlanRow;
  expect(latest.inputs.metals.map((m) => `${m.element} ${m.role}`)).toEqual([
    "Zn target",
    "Fe gangue",
    "Cu watched",
    "Cd watched",
  ]);
  expect(latest.inputs.feedMinerals).toEqual(["ZnO(s)"]);
  await page
    .context()
    .request.delete(`/api/feeds/${feed.id}?reason=test`, { headers: { "if-match": `"${feed.version}"` } });
});

test("from a metal and a lixiviant: name, metal, create", async () => {
  const { page } = await openPage();
  await new SignInScreen(page).enter("metallurgist");
  await page.getByRole("button", { name: "New plan" }).click();
  const dialog = page.getByRole("dialog");
  await dialog.getByRole("radio", { name: "From a metal and a lixiviant" }).click();
  await dialog.getByLabel("Name").fill("Copper, first look");
  await dialog.getByRole("combobox", { name: "Metal to dissolve" }).click();
  await page.getByRole("option", { name: "Cu, copper" }).click();
  await dialog.getByRole("button", { name: "Create and open" }).click();
  await new WorkspaceScreen(page).drawn();
  await page.getByTestId("set-point").waitFor();
});
