import { expect, test } from "vitest";
import { fromSHE, toSHE } from "../../shared/electrodes/convert";
import { electrodeSeries } from "../../shared/electrodes/series";
import { metalAccount } from "../../shared/metallurgy/account/metalAccount";
import { valueOf } from "../../shared/outcome";
import type { FeedRow } from "../../shared/schemas/feed";
import type { MapTrials } from "../../shared/schemas/trialRows";
import { judge } from "../../shared/trials/judge";
import { chemistry } from "../support/chemistry";
import { openPageAs } from "../support/browser";
import { BenchScreen } from "./pages/bench";
import { CampaignsScreen } from "./pages/campaigns";
import { demoInputs, solved } from "./pages/core";
import { TrialScreen } from "./pages/trial";
import { WorkspaceScreen } from "./pages/workspace";

const tablet = { width: 834, height: 1112 };
const planId = "demo-neutral-leach";
const probe = electrodeSeries(chemistry().tables).find(({ id }) => id === "AGCL-3M")!;

/** The trial of this story: laid out in the first test, recorded in the second, read in those after. */
const story = { id: "", code: "" };

test("a metallurgist lays a trial out on the set point of the campaign's plan", async () => {
  const { page } = await openPageAs("metallurgist", { path: "/campaigns" });
  const campaigns = new CampaignsScreen(page);
  await campaigns.row("NL-1").first().click();
  await campaigns.detail("NL-1").getByRole("link", { name: "Open" }).click();
  await page.getByRole("link", { name: "Plan a trial" }).click();

  const sheet = new TrialScreen(page);
  story.code = await sheet.field("trial", "Code").inputValue();
  expect(story.code).toBe("NL-1-23");
  await sheet.button("Take the set point of Neutral leach, second tank").click();
  const setPoint = solved(demoInputs(planId)).windows[0]!.setPoint;
  await expect.poll(() => sheet.field("planned", "pH").inputValue()).toBe(setPoint.pH.toFixed(2));
  expect(Number(await sheet.field("planned", "ORP").inputValue())).toBe(Math.round(setPoint.Eh * 1000));
  await sheet.field("planned", "Tenor of Zn, final liquor").fill("84");
  await sheet.field("planned", "Duration").fill("two hours");
  await sheet.button("Plan it").click();
  await page.getByText(/Not planned yet/).waitFor();
  await sheet.field("planned", "Duration").fill("2,0");
  await sheet.button("Plan it").click();
  await page.waitForURL(/\/trials\/(?!plan)/);
  story.id = /trials\/([^?#]+)/.exec(page.url())![1]!;
  const stored = await sheet.stored();
  expect(stored).toMatchObject({ code: "NL-1-23", status: "planned", version: 1, kind: "leach", stage: "NL" });
  expect(stored.planned.duration).toEqual({ text: "2,0", unit: "h" });
});

test("a technician records it at the bench: an ORP without its electrode is refused, and a reload loses nothing", async () => {
  const { page } = await openPageAs("technician", { path: "/bench", viewport: tablet });
  const bench = new BenchScreen(page);
  await bench.open(story.code);
  await bench.button("Start the trial").click();
  await bench.press("pH", "5.05");
  await bench.press("ORP as read", "480");
  await bench.button("Keep reading").click();
  await page.getByText("Name the electrode: an ORP without it says nothing").waitFor();
  expect(await page.getByText("Nothing kept yet.").count()).toBe(1);

  await page.reload();
  await bench.field("ORP as read").waitFor();
  expect(await bench.field("pH").inputValue()).toBe("5.05");
  expect(await bench.field("ORP as read").inputValue()).toBe("480");
  await bench.chooseElectrode("Ag/AgCl 3 M");
  await bench.press("Electrode at", "25");
  await bench.press("Pulp temperature", "61");
  const Eh = valueOf(toSHE(0.48, probe, 25));
  await page.getByText(`= ${Eh.toFixed(3)}`).waitFor();
  await bench.button("Keep reading").click();
  await expect.poll(() => bench.lines()).toEqual([expect.stringContaining(`5.05 ${Eh.toFixed(3)} 61`)]);
  expect(await bench.field("pH").inputValue()).toBe("");
  // A reading far from what was planned is said in its own words, beside where it stands on the map.
  await bench.press("pH", "3.00");
  const reads = Math.round(valueOf(fromSHE(0.7, probe, 25)) * 1000);
  await bench.press("ORP as read", String(reads));
  await page.getByText(/^Off its planned set point: pH 2\.\d+ below its planned/).waitFor();
  await page.getByText(/^Outside, /).waitFor();
  await bench.field("pH").fill("5.10");
  await page.getByText(/^Inside window A/).waitFor();
  await bench.press("Pulp temperature", "60.5");
  await bench.button("Keep reading").click();
  await expect.poll(() => bench.lines()).toHaveLength(2);

  await bench.button("End the trial").click();
  await page.getByRole("dialog").getByRole("button", { name: "End the trial" }).click();
  await page.getByRole("link", { name: "Whole record" }).click();
  const record = new TrialScreen(page);
  await record.field("charge", "Dry mass").fill("170,0");
  await record.field("charge", "Wet mass").fill("170.0");
  await record.field("charge", "Liquor at the start").fill("2000");
  await record.page.locator("#charge").getByRole("combobox", { name: "Unit of Liquor at the start" }).click();
  await page.getByRole("option", { name: "mL", exact: true }).click();
  await record.field("products", "Liquor in the vessel at the end").fill("1.96");
  await record.field("products", "Dry residue").fill("64.8");
  await record.cell("Lixiviant, Zn").fill("40");
  await record.cell("Final liquor, Zn").fill("83,1");
  await record.cell("Final liquor, Fe").fill("<0.001");
  await record.cell("Residue, Zn").fill("18.9");
  await record.cell("Residue, Fe").fill("23.0");
  // What was typed is in this browser before the server has it.
  await page.getByText(/not saved yet/).waitFor();
  await page.reload();
  await page.getByText(/not saved yet/).waitFor();
  expect(await record.cell("Final liquor, Fe").inputValue()).toBe("<0.001");
  expect((await record.stored()).products.finalAssays).toEqual([]);
  await record.save();
  const stored = await record.stored();
  expect(stored.status).toBe("awaiting assay");
  expect(stored.charge).toMatchObject({
    dryMass: { text: "170,0", unit: "g" },
    liquorVolume: { text: "2000", unit: "mL" },
  });
  expect(stored.products.finalAssays.map(({ analyte, value }) => [analyte, value.text, value.unit])).toEqual([
    ["Zn", "83,1", "g/L"],
    ["Fe", "<0.001", "g/L"],
  ]);
  expect(stored.measured.readings[0]?.orp).toEqual({
    value: { text: "480", unit: "mV" },
    electrode: "AGCL-3M",
    electrodeTemperature: { text: "25", unit: "C" },
  });
});

test("a metallurgist sees it on the map, judged, linked with its row both ways, opens it with a click, and reads its account on every basis", async () => {
  const { page } = await openPageAs("metallurgist", { path: `/plans/${planId}` });
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  await page.getByRole("tab", { name: /^Trials/ }).click();
  const { rows } = await page.evaluate(
    async (id) => (await (await fetch(`/api/plans/${id}/trials`)).json()) as MapTrials,
    planId,
  );
  const own = rows.find(({ id }) => id === story.id)!;
  const { pH, Eh } = own.figures as { pH: number; Eh: number };
  expect([pH, Number(Eh.toFixed(3))]).toEqual([5.1, 0.7]);
  const inputs = demoInputs(planId);
  expect(judge({ pH, Eh }, solved(inputs), inputs.controlBand).verdict).toBe("inside");

  const table = page.getByRole("grid", { name: "Trials on the map" });
  const row = table.getByRole("row").filter({ has: page.getByText(story.code, { exact: true }) });
  await row.scrollIntoViewIfNeeded();
  expect((await row.getByRole("gridcell").allInnerTexts()).at(-1)).toBe("in");
  const ring = page.getByTestId("trial-ring");
  await row.hover();
  await expect.poll(() => ring.isVisible()).toBe(true);
  const at = await plan.pixelOf(pH, Eh);
  const box = (await ring.boundingBox())!;
  expect(Math.hypot(box.x + box.width / 2 - at[0], box.y + box.height / 2 - at[1])).toBeLessThan(2);
  await page.mouse.move(3, 3);
  await expect.poll(() => ring.isVisible()).toBe(false);
  await plan.pointAt(pH, Eh);
  await expect.poll(() => table.locator("tr[data-hovered]").count()).toBe(1);
  await page.mouse.click(...at);
  await page.waitForURL(new RegExp(`/trials/${story.id}$`));

  // Every basis stands there side by side with the numbers in it, as the core works them out.
  const trial = new TrialScreen(page);
  await trial.tab("Accounts").click();
  await page.getByText(/of the Zn dissolved, by calculated head/).waitFor();
  const stored = await trial.stored();
  const feed = await page.evaluate(
    async (id) => (await (await fetch(`/api/feeds/${id}`)).json()) as FeedRow,
    stored.feedId,
  );
  const account = metalAccount(stored, feed, "Zn", chemistry().molarMass);
  const shown = await trial.bases("extraction");
  const known = account.bases.filter(({ value }) => value !== null);
  expect(known.length).toBeGreaterThanOrEqual(3);
  expect(shown[0]?.name).toBe("calculated head");
  for (const { name, value } of known) {
    const line = shown.find((row) => row.name === name);
    expect(line?.value, name).toBeCloseTo((value!.lo + value!.hi) / 2, 1);
    expect(line?.working).toMatch(/= [\d.]+\s*%/);
  }
  // A "<" is an interval, and the account of the gangue says so.
  await page.getByRole("radio", { name: "Fe", exact: true }).click();
  await page.getByText(/of the Fe dissolved/).waitFor();
  await page
    .getByText(/0(\.\d+)? to 0\.\d+/)
    .first()
    .waitFor();
});

test("two who edit the same field are shown the difference, and neither loses what was typed", async () => {
  const first = new TrialScreen(
    (await openPageAs("technician", { path: `/trials/${story.id}`, expected: [412] })).page,
  );
  const second = new TrialScreen((await openPageAs("metallurgist", { path: `/trials/${story.id}` })).page);
  const zinc = "Final liquor, Zn";
  await second.cell(zinc).fill("82.0");
  await second.field("products", "Filtrate").fill("1.90");
  await first.cell(zinc).fill("84.5");
  await first.field("products", "Wash").fill("0.6");
  await second.save();
  await first.page.keyboard.press("Control+s");
  const dialog = first.page.getByRole("dialog", { name: `Two versions of trial ${story.code}` });
  await dialog.waitFor();
  const cells = await dialog.locator("tbody tr").first().locator("td").allInnerTexts();
  expect(cells.slice(1, 4).map((text) => /[\d.,]+/.exec(text)?.[0])).toEqual(["83,1", "84.5", "82.0"]);
  expect(await dialog.locator("tbody tr").count()).toBe(1);
  await dialog.getByRole("radio", { name: "mine" }).click();
  await dialog.getByRole("button", { name: "Save with these" }).click();
  await first.page.getByText(/^saved /).waitFor();
  const { products } = await first.stored();
  expect(products.finalAssays[0]?.value.text).toBe("84.5");
  expect([products.filtrateVolume.text, products.washVolume.text]).toEqual(["1.90", "0.6"]);
});

test("a manager puts two campaigns side by side and takes the figures and the trials away as files", async () => {
  const { page } = await openPageAs("manager", { path: "/campaigns" });
  const campaigns = new CampaignsScreen(page);
  await campaigns.compare("NL-1", "NL-2");
  await page.getByText(/no feed was run in both, so the difference may be the ore/).waitFor();
  await page.getByText("Stage WA stands in one campaign only.").waitFor();
  await page.getByText(/Read against different electrodes \(NL-1: .*Ag\/AgCl 3 mol\/L KCl/).waitFor();
  const pair = await campaigns.file(() => page.getByRole("button", { name: "Export CSV" }).click());
  expect(pair.name).toBe("gangueway-NL-1-NL-2.csv");
  expect(pair.rows.map(({ campaign, stage }) => `${campaign} ${stage}`)).toEqual(["NL-1 NL", "NL-2 NL", "NL-2 WA"]);

  await page.getByRole("link", { name: "Campaigns", exact: true }).first().click();
  await campaigns.row("NL-1").first().click();
  await campaigns.detail("NL-1").getByRole("link", { name: "Open" }).click();
  expect(await page.getByRole("link", { name: "Plan a trial" }).count()).toBe(0);
  await page.getByRole("button", { name: "Export" }).click();
  const trials = await campaigns.file(() => page.getByRole("menuitem").first().click());
  const own = trials.rows.find(({ trial }) => trial === story.code)!;
  expect(own).toMatchObject({
    "reference electrode": "AGCL-3M",
    "final liquor, Fe, as typed": "<0.001",
    "final liquor, Fe, unit": "g/L",
  });
  expect(Number(own["Eh / V vs SHE"])).toBeCloseTo(0.7, 2);
});
