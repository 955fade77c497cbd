import { AxeBuilder } from "@axe-core/playwright";
import { expect, test } from "vitest";
import { demoAccounts } from "../../server/demo/accounts";
import { openPage } from "../support/browser";

test("the sign-in page names the demo's accounts and is free of accessibility faults", async () => {
  const { page } = await openPage();
  await page.goto("/");
  for (const { email } of demoAccounts) await page.getByText(email).waitFor();
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
});

test("every demo account signs in by a choice from the list, sees that the data are invented, and signs out", async () => {
  const { page } = await openPage();
  await page.goto("/");
  // One after the other in the same browser, as at a shared bench.
  for (const { email, role, name } of demoAccounts) {
    await page.getByText(email).click();
    await page.getByRole("button", { name: "Sign in" }).click();
    await page.getByRole("heading", { name: "Plans" }).waitFor();
    await page.getByText("invented").first().waitFor();
    await page.getByRole("button", { name: role, exact: true }).click();
    await page.getByRole("menu").getByText(name).waitFor();
    await page.getByRole("menuitem", { name: "Sign out" }).click();
    await page.getByRole("button", { name: "Sign in" }).waitFor();
  }
});

test("a wrong password is told in words and keeps what was typed", async () => {
  const { page } = await openPage({ expected: [401] });
  await page.goto("/");
  await page.getByLabel("E-mail").fill("metallurgist@tarnhollow.example");
  await page.getByLabel("Password").fill("a guess");
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.getByText("No member has this e-mail address with this password.").waitFor();
  expect(await page.getByLabel("E-mail").inputValue()).toBe("metallurgist@tarnhollow.example");
});
