import type { Page } from "playwright-core";
import { describe, expect, test } from "vitest";
import { graveFaults } from "../support/axe";
import { openPageAs, sharedPageAs, turnTo } from "../support/browser";
import { PlansScreen } from "./pages/plans";
import { WorkspaceScreen } from "./pages/workspace";

const path = "/plans/demo-oxide-heap";
const panel = (page: Page) => page.getByRole("region", { name: "Comments" });

test("a technician says something of a point of the map and rewords it; the manager reads, answers and cannot change it", async () => {
  const { page } = await openPageAs("technician", { path });
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  await plan.button("Comments").click();
  await panel(page).getByText("Nothing was said of this plan yet.").waitFor();

  // A draft outlives a reload, and the comments stand where they stood.
  await page.waitForURL(/comments=1/);
  await panel(page).getByLabel("New comment").fill("Foam at the weir.\n\nSee the night log.");
  await page.reload();
  await plan.drawn();
  expect(await panel(page).getByLabel("New comment").inputValue()).toBe("Foam at the weir.\n\nSee the night log.");

  await panel(page).getByRole("combobox", { name: "About" }).click();
  await page.getByRole("option", { name: /^pH .* on the map$/ }).click();
  await panel(page).getByRole("button", { name: "Send comment" }).click();
  const mine = panel(page).getByRole("article", { name: /^Comment of Technician/ });
  await mine.waitFor();
  expect(await mine.getByText("Foam at the weir.").innerText()).toBe("Foam at the weir.\n\nSee the night log.");
  await mine.getByRole("button", { name: /^pH .* vs SHE$/ }).click();
  await plan.header().getByRole("button", { name: "Comments, 1" }).waitFor();
  expect(await panel(page).getByLabel("New comment").inputValue()).toBe("");

  await mine.getByRole("button", { name: "Reword", exact: true }).click();
  await mine.getByLabel("Your words").fill("Foam at the weir, again.");
  await mine.getByRole("button", { name: "Save" }).click();
  await mine.getByText("Foam at the weir, again.").waitFor();
  await mine.getByRole("button", { name: /^reworded/ }).click();
  await page.getByRole("dialog").getByText("Foam at the weir, again.").first().waitFor();
  await page.keyboard.press("Escape");
  expect(await graveFaults(page, { within: "[aria-label=Comments]" })).toEqual([]);

  const { page: other } = await openPageAs("manager", { path });
  const theirs = new WorkspaceScreen(other);
  await theirs.drawn();
  await theirs.button("Comments, 1").click();
  const read = panel(other).getByRole("article", { name: /^Comment of Technician/ });
  await read.getByText("Foam at the weir, again.").waitFor();
  expect(await read.getByRole("button", { name: "Reword", exact: true }).count()).toBe(0);
  await panel(other).getByLabel("New comment").fill("Seen.");
  await panel(other).getByRole("combobox", { name: "About" }).click();
  await other.getByRole("option", { name: "revision 1" }).click();
  await other.keyboard.press("Tab");
  await panel(other).getByRole("button", { name: "Send comment" }).click();
  await panel(other).getByRole("link", { name: "revision 1" }).waitFor();
  const own = panel(other).getByRole("article", { name: /^Comment of Manager/ });
  await own.getByRole("button", { name: "Remove" }).click();
  await panel(other).getByRole("button", { name: "Bring it back" }).click();
  await own.getByText("Seen.").waitFor();
  await panel(other).getByRole("button", { name: "back to the answers" }).click();
  await other.getByRole("region", { name: "Set point" }).waitFor();
}, 120_000);

describe("for a metallurgist", () => {
  const shared = sharedPageAs("metallurgist", { path: "/plans/demo-ammonia-leach", expected: [409, 412, 500] });

  test("words that were changed elsewhere meanwhile are shown before they are overwritten, and a server that is away loses nothing", async () => {
    const { page } = shared();
    const plan = new WorkspaceScreen(page);
    await plan.drawn();
    await page.keyboard.press("c");
    const text = panel(page).getByLabel("New comment");
    await text.fill("Nickel plates on the probe.");
    await page.route("**/api/plans/*/comments", (route) =>
      route.request().method() === "POST" ? route.fulfill({ status: 500, json: {} }) : route.continue(),
    );
    await panel(page).getByRole("button", { name: "Send comment" }).click();
    await panel(page).getByText("Not sent; your words are still here").waitFor();
    expect(await text.inputValue()).toBe("Nickel plates on the probe.");
    await page.unroute("**/api/plans/*/comments");
    await text.press("Control+Enter");
    const mine = panel(page).getByRole("article", { name: /^Comment of Metallurgist/ });
    await mine.getByText("Nickel plates on the probe.").waitFor();

    await mine.getByRole("button", { name: "Reword", exact: true }).click();
    await mine.getByLabel("Your words").fill("Nickel plates on both probes.");
    const list = (await (await page.request.get("/api/plans/demo-ammonia-leach/comments")).json()) as {
      rows: { id: string }[];
    };
    const elsewhere = await page.request.patch(`/api/comments/${list.rows[0]?.id}`, {
      headers: { "If-Match": '"1"' },
      data: { text: "Nickel plates on the second probe." },
    });
    expect(elsewhere.status()).toBe(200);
    await mine.getByRole("button", { name: "Save" }).click();
    await mine.getByText("Reworded meanwhile, elsewhere.").waitFor();
    await mine.getByText("Nickel plates on the second probe.").waitFor();
    expect(await mine.getByLabel("Your words").inputValue()).toBe("Nickel plates on both probes.");
    await mine.getByRole("button", { name: "Save" }).click();
    await mine.getByText("Nickel plates on both probes.").waitFor();
    await mine.getByRole("button", { name: "Reword", exact: true }).waitFor();
  }, 120_000);

  test("a plan goes to another project with all its revisions; a name that is taken there is told at the name", async () => {
    const { page } = shared();
    await turnTo(page, "/plans/demo-neutral-leach");
    const plan = new WorkspaceScreen(page);
    await plan.drawn();
    const first = await plan.answers();
    await plan.command("Duplicate");
    const dialog = page.getByRole("dialog");
    await dialog.getByRole("combobox", { name: "Project" }).click();
    const project = await page.getByRole("option").nth(1).innerText();
    await page.getByRole("option").nth(1).click();
    await dialog.getByRole("combobox", { name: "Takes along" }).click();
    await page.getByRole("option", { name: /^all 3 revisions/ }).click();
    const { rows } = (await (await page.request.get("/api/plans?archived=all&limit=200")).json()) as {
      rows: { name: string; siteName: string; projectName: string }[];
    };
    const taken = rows.find((r) => `${r.siteName} / ${r.projectName}` === project)?.name ?? "";
    expect(taken).not.toBe("");
    await dialog.getByLabel("Name of the copy").fill(taken);
    await dialog.getByRole("button", { name: "Duplicate" }).click();
    await dialog.getByRole("alert").getByText(`a plan “${taken}” already`).waitFor();
    await dialog.getByLabel("Name of the copy").fill("Neutral leach, as the zinc works run it");
    await dialog.getByRole("button", { name: "Duplicate" }).click();
    await page.getByRole("heading", { name: "Neutral leach, as the zinc works run it" }).waitFor();
    await plan.drawn();
    expect(await plan.answers()).toEqual(first);
    await plan
      .header()
      .getByText(/^revision 3, saved/)
      .waitFor();
    await page.getByRole("link", { name: "Plans" }).click();
    const plans = new PlansScreen(page);
    await plans.row("Neutral leach, as the zinc works run it").click();
    await plans
      .detail("Neutral leach, as the zinc works run it")
      .getByText(/Copied from “Neutral leach, second tank”, revision 3, of /)
      .waitFor();
  }, 120_000);
});
