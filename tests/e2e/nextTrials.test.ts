import { expect, test } from "vitest";
import type { Page as Listing } from "../../shared/schemas/api";
import type { CampaignRow } from "../../shared/schemas/campaign";
import type { TrialRow } from "../../shared/schemas/trial";
import type { TrialListRow } from "../../shared/schemas/trialRows";
import { openPageAs } from "../support/browser";
import { WorkspaceScreen } from "./pages/workspace";

const path = "/plans/demo-oxide-heap";

test("a metallurgist asks for next trials, drops one, moves one by keys, plans them in one action and takes them back", async () => {
  const { page } = await openPageAs("metallurgist", { path });
  await new WorkspaceScreen(page).drawn();
  const block = page.getByRole("region", { name: "Next trials" });
  const items = block.getByRole("list", { name: "Proposed conditions" }).getByRole("listitem");
  await block.getByRole("button", { name: "Propose" }).click();
  await expect.poll(() => items.count()).toBe(4);
  const places = async () => (await items.allInnerTexts()).map((text) => /pH [\d.]+, \S+/.exec(text)?.[0]);
  const all = await places();
  expect(new Set(all).size).toBe(4);
  expect(await items.first().innerText()).toMatch(
    /Largest gap: [\d.]+ control bands from the nearest trial, OX-1-\d+; [\d.]+ inside/,
  );
  // the same numbers stand on the map
  for (const n of [1, 2, 3, 4]) await page.getByTestId(`proposed-${n}`).waitFor();

  await block.getByRole("button", { name: "Drop proposal 2" }).click();
  await expect.poll(places).toEqual([all[0], all[2], all[3]]);
  await page.getByTestId("proposed-1").focus();
  await page.keyboard.press("Shift+ArrowLeft");
  await expect.poll(async () => (await places())[0]).not.toBe(all[0]);
  expect((await places()).slice(1)).toEqual([all[2], all[3]]);
  await block.getByText("Moved by hand", { exact: false }).waitFor();

  const { request } = page.context();
  const listed = async <T>(url: string) => ((await (await request.get(url)).json()) as Listing<T>).rows;
  const [campaign] = await listed<CampaignRow>("/api/campaigns?planId=demo-oxide-heap");
  const planned = () => listed<TrialListRow>(`/api/trials?campaignId=${campaign!.id}&status=planned&limit=100`);
  const before = await planned();
  await block.getByRole("button", { name: "Plan these 3 trials" }).click();
  const dialog = page.getByRole("dialog");
  await dialog.getByText("from the plan").first().waitFor();
  await dialog.getByRole("button", { name: "Plan them" }).click();
  await block.getByText(/3 trials planned in/).waitFor();
  const made = (await planned()).filter(({ id }) => !before.some((b) => b.id === id));
  expect(made).toHaveLength(3);
  const records = await Promise.all(
    made.map(async ({ id }) => (await (await request.get(`/api/trials/${id}`)).json()) as TrialRow),
  );
  const stayed = records.filter((t) => !t.notes.includes("Moved by hand"));
  expect(stayed.map((t) => `pH ${t.planned.pH.text}`).sort()).toEqual(
    all
      .slice(2)
      .map((p) => p?.split(",")[0])
      .sort(),
  );
  for (const t of records) {
    expect(t.planned.temperature.text).toBe("25");
    expect(t.planned.orp.electrode).not.toBeNull();
    expect(t.notes).toMatch(/^Proposed\. /);
  }
  await block.getByRole("button", { name: "Undo" }).click();
  await expect.poll(async () => (await planned()).length, { timeout: 15_000 }).toBe(before.length);
});

test("a technician plans them into a campaign that stands, and lays out no new one", async () => {
  const { page } = await openPageAs("technician", { path });
  await new WorkspaceScreen(page).drawn();
  const block = page.getByRole("region", { name: "Next trials" });
  await block.getByRole("button", { name: "Propose" }).click();
  await block.getByRole("button", { name: /^Plan these/ }).click();
  const dialog = page.getByRole("dialog");
  await dialog.getByRole("combobox", { name: "Campaign" }).click();
  await page.getByRole("option").first().waitFor();
  expect((await page.getByRole("option").allInnerTexts()).join()).not.toContain("a new campaign");
  await page.keyboard.press("Escape");
  await dialog.getByRole("button", { name: "Plan them" }).click();
  await block.getByText(/trials planned in/).waitFor();
  await block.getByRole("button", { name: "Undo" }).click();
  await block.getByRole("button", { name: /^Plan these/ }).waitFor();
});

test("whoever may not plan sees the proposals and no button", async () => {
  const { page } = await openPageAs("manager", { path });
  await new WorkspaceScreen(page).drawn();
  const block = page.getByRole("region", { name: "Next trials" });
  await block.getByRole("button", { name: "Propose" }).click();
  await block.getByText("Technicians and metallurgists turn them into planned trials.").waitFor();
  expect(await block.getByRole("button", { name: /^Plan/ }).count()).toBe(0);
});
