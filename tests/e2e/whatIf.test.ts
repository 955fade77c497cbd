import { expect, test } from "vitest";
import { openPageAs } from "../support/browser";
import { WorkspaceScreen } from "./pages/workspace";

test("a link's settings are a proposal until they are kept, and its view is what is seen; what cannot be read is named", async () => {
  const query = "settings=3~temperatureC:85&focus=Zn&pH=2..7&Eh=0..1&hide=Xx";
  const { page } = await openPageAs("metallurgist", { path: `/plans/demo-neutral-leach?${query}` });
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  await page.getByText("hide=Xx (the plan has no Xx)").waitFor();
  const proposal = page.getByRole("region", { name: "Settings from a link" });
  await proposal.getByText("1 difference from revision 3").waitFor();
  expect(await plan.axisWords()).toContain("pH at 85 °C");
  await proposal.getByRole("button", { name: "Keep as my draft" }).click();
  await plan.header().getByText("Unsaved changes").waitFor();
  await plan.button("Undo").click();
  await expect.poll(() => plan.number("Temperature of the liquor").inputValue()).toBe("60");
  await expect.poll(() => new URL(page.url()).search).toBe("?view=1&pH=2..7&Eh=0..1&focus=Zn");
});

test("two revisions stand side by side with what was lost; a setting varied shows where a window opens, and a small map sets the plan", async () => {
  const { page } = await openPageAs("metallurgist", { path: "/plans/demo-neutral-leach/compare?a=1&b=2" });
  await expect
    .poll(() => page.getByTestId("verdict").innerText())
    .toMatch(/less open ground than A: ground is only lost/);
  await page.goto("/plans/demo-neutral-leach?view=1&vary=amount-Fe&over=1e-9..0.1");
  const plan = new WorkspaceScreen(page);
  const film = page.getByTestId("film");
  await film.getByText("a window opens").waitFor();
  await film.getByRole("button", { name: /^4\.64e−3: margin/ }).click();
  await plan.header().getByText("Unsaved changes").waitFor();
  await plan.button("Undo").click();
  await film.getByRole("button", { name: "back to the map" }).click();
  await plan.drawn();
  await page.goBack();
  await film.waitFor();
});
