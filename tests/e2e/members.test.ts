import { expect, test } from "vitest";
import { openPage, openPageAs } from "../support/browser";
import { MembersScreen } from "./pages/members";

const email = "new.hand@tarnhollow.example";
const name = "New hand (invented)";
const password = "three quiet copper kettles";

test("an administrator invites, the link of the letter opens one account once, the role is changed and the account closed", async () => {
  const { page } = await openPageAs("admin", { path: "/members" });
  const members = new MembersScreen(page);
  await members.invite(email, "technician");
  await page.getByRole("dialog").getByRole("link", { name: "mailbox" }).click();
  const path = await members.linkInLetter(email);

  const { page: theirs } = await openPage({ expected: [403, 404, 409, 410] });
  await theirs.goto(path);
  await theirs.getByText(email).first().waitFor();
  await theirs.getByLabel("Name").fill(name);
  await theirs.getByLabel("Password").fill("short");
  await theirs.getByRole("button", { name: "Accept and sign in" }).click();
  await theirs.getByText(/^Too short/).waitFor();
  expect(await theirs.getByLabel("Name").inputValue()).toBe(name);
  await theirs.getByLabel("Password").fill(password);
  await theirs.getByRole("button", { name: "Accept and sign in" }).click();
  await theirs.getByRole("button", { name: "technician", exact: true }).waitFor();
  await theirs.goto(path);
  await theirs.getByText(/This link opens nothing/).waitFor();

  await page.getByRole("link", { name: "Members", exact: true }).first().click();
  await members.row(name).click();
  await members.detail(name).getByRole("combobox", { name: "Role" }).click();
  await page.getByRole("option", { name: "manager" }).click();
  await members.detail(name).getByLabel("Why, for the record").fill("Runs the plant from November");
  await members.detail(name).getByRole("button", { name: "Save" }).click();
  await members.row(name).getByRole("gridcell", { name: "manager" }).waitFor();
  await theirs.goto("/plans");
  await theirs.getByRole("button", { name: "manager", exact: true }).waitFor();
  // what is still asked for after the account is closed would be refused
  await theirs.getByRole("link", { name: "Neutral leach, second tank" }).waitFor();

  await members.detail(name).getByRole("button", { name: "Close the account" }).click();
  await page.getByRole("dialog").getByRole("button", { name: "Close the account" }).click();
  await members.row(name).getByRole("gridcell", { name: "closed" }).waitFor();
  await theirs.goto("/plans");
  await theirs.getByRole("button", { name: "Sign in" }).waitFor();
  await members.detail(name).getByRole("button", { name: "History" }).click();
  await page.getByRole("dialog").getByText("Runs the plant from November").waitFor();
});

test("who is no administrator sees neither members nor letters", async () => {
  const { page } = await openPageAs("metallurgist", { path: "/mailbox" });
  await page.getByText("For administrators").waitFor();
  expect(await page.getByRole("link", { name: "Members" }).count()).toBe(0);
});
