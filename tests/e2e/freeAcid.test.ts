import { describe, expect, test } from "vitest";
import { acidBand, freeAcid, freeAcidCurve } from "../../shared/activity/freeAcid";
import { valueOf } from "../../shared/outcome";
import { chemistry } from "../support/chemistry";
import { openPageAs, sharedPageAs, turnTo } from "../support/browser";
import { shownNumber } from "./pages/shownNumber";
import { WorkspaceScreen } from "./pages/workspace";

const data = chemistry();
const heap = "/plans/demo-oxide-heap";

describe("on the plan screen of a heap,", () => {
  const shared = sharedPageAs("metallurgist", { path: heap });

  test("free acid stands under the pH axis, under the cursor, at the set point and in the ledger, as the core reckons it; a band in g/L strays with the set point", async () => {
    const { page } = shared();
    const sheet = new WorkspaceScreen(page);
    await sheet.drawn();
    // More sulfate, and the set point held well below pH 1.5.
    await sheet.type("Total of S", "1");
    await page.locator("[data-handle]").first().focus();
    for (let i = 0; i < 8; i++) await page.keyboard.press("Shift+ArrowLeft");
    await page.getByTestId("held").waitFor();
    const { pH } = await sheet.answers();
    expect(pH).toBeLessThan(1.3);
    const here = valueOf(freeAcid(data, pH, 1, 25)).gPerL;
    const shown = await page.getByText(/^about \d+/).first().innerText(); // prettier-ignore
    expect(Math.abs(shownNumber(shown.replace("about", "")) - here)).toBeLessThan(1.2);
    await page.getByText(/free acid, by the same reckoning/).first().waitFor(); // prettier-ignore

    await expect.poll(() => sheet.axisWords()).toContain("free acid, g/L H2SO4");
    const { pHOf } = valueOf(freeAcidCurve(data, 1, 25));
    const ticks = await sheet.acidTicks();
    expect(ticks.length).toBeGreaterThan(2);
    // As near as a screen centres a number: a pixel is about 0.015 of pH.
    for (const [gPerL, at] of ticks) expect(Math.abs(at - pHOf(gPerL)!)).toBeLessThan(0.02);

    await sheet.pointAt(0.9, 0.5);
    await expect.poll(() => sheet.readOut().innerText()).toMatch(/pH 0\.9\d?\s*about \d+\sg\/L/);
    await sheet.pointAt(3, 0.5);
    await expect.poll(() => sheet.readOut().innerText()).not.toMatch(/g\/L/);

    // A band given in g/L is shown on both sides in pH, the wider counts; it strays with the set point and is undone.
    const bands = sheet.asks("Control bands");
    await bands.getByRole("radio", { name: "free acid, g/L" }).click();
    await sheet.type("Control band of free acid", "5");
    const { counted } = valueOf(acidBand(data, 5, (await sheet.answers()).pH, 1, 25));
    await expect.poll(() => bands.innerText()).toContain(`the wider side counts, pH ±${counted.toFixed(2)}`);

    await sheet.type("Control band of free acid", "400");
    await bands.getByRole("alert").getByText(/leaves no acid/).waitFor(); // prettier-ignore
    expect(await bands.innerText()).toContain(`pH ±${counted.toFixed(2)}`);

    await sheet.type("Temperature of the liquor", "90");
    await bands.getByRole("button", { name: "convert there" }).click();
    await bands.getByRole("button", { name: "convert there" }).waitFor({ state: "detached" });
    await sheet.button("Undo").click();
    await bands.getByRole("button", { name: "convert there" }).waitFor();
    await bands.getByRole("radio", { name: "pH", exact: true }).click();
    expect(Number(await sheet.number("Control band of pH").inputValue())).toBeCloseTo(counted, 1);
  });

  test("what an overall reaction makes is chosen, re-balanced, refused where it cannot be, and kept with the plan", async () => {
    const { page } = shared();
    await turnTo(page, heap);
    const sheet = new WorkspaceScreen(page);
    await sheet.drawn();
    const overall = page.getByRole("region", { name: "Overall reactions" });
    await overall.getByText(/^From the feed mineral/).click();
    const iron = overall.getByRole("listitem").filter({ hasText: "Fe becomes" });
    await iron.getByRole("combobox", { name: "What Fe of Fe(s) becomes" }).click();
    await page.getByRole("option", { name: /KFe3/ }).click();
    await iron.getByText("chosen").waitFor();
    await iron.getByLabel("K2SO4", { exact: true }).first().waitFor();
    await page.reload();
    await sheet.drawn();
    await overall.getByText(/^From the feed mineral/).click();
    await iron.getByText("chosen").waitFor();
    await sheet.button("Save revision").click();
    await page.getByRole("dialog").getByText(/Overall reaction of Fe/).waitFor(); // prettier-ignore
    await page.keyboard.press("Escape");
  });

  test("a total is given in g/L and comes back in mol/L; revisions say which was typed; there is no free acid without sulfate", async () => {
    const { page } = shared();
    const sheet = new WorkspaceScreen(page);
    await turnTo(page, "/plans/demo-cyanide-leach");
    await sheet.drawn();
    expect(await sheet.axisWords()).not.toContain("free acid, g/L H2SO4");

    await turnTo(page, "/plans/demo-neutral-leach");
    await sheet.drawn();
    await sheet.button("Give S in g/L").click();
    expect(Number(await sheet.number("Total of S").inputValue())).toBeCloseTo(0.5 * 96.056, 2);
    await sheet.type("Total of S", "96.056");
    await page.reload();
    await sheet.drawn();
    expect(await sheet.number("Total of S").inputValue()).toBe("96.056");
    await sheet.button("Give S in mol/L").click();
    expect(Number(await sheet.number("Total of S").inputValue())).toBeCloseTo(1, 4);
    await sheet.button("Undo").click();
    await sheet.button("Give S in mol/L").waitFor();
    await sheet.button("Save revision").click();
    await page.getByRole("dialog").getByText(/mol\/L, typed in g\/L/).waitFor(); // prettier-ignore
  });
});

describe("from a line of the plan to what it rests on", () => {
  test("the limits lead to the method, a species to its row; the document has contents, and its links stay inside", async () => {
    const { page } = await openPageAs("manager", { path: "/plans/demo-neutral-leach" });
    const sheet = new WorkspaceScreen(page);
    await sheet.drawn();
    await page.getByRole("region", { name: "Set point" }).getByRole("link", { name: "The method: set point" }).click();
    const heading = page.getByRole("heading", { name: "6. Set point" });
    await heading.waitFor();
    await expect.poll(async () => (await heading.boundingBox())?.y ?? 9999).toBeLessThan(300);
    await page.getByRole("link", { name: "0008" }).click();
    await page.getByRole("heading", { level: 1, name: /^0008/ }).waitFor();
    await page.getByRole("link", { name: "Back to the method" }).click();
    await page.getByRole("navigation", { name: "Contents" }).getByRole("link", { name: "Free acid" }).click();
    await expect.poll(() => page.url()).toMatch(/\/method#11-free-acid$/);
    await turnTo(page, "/method/no-such-thing");
    await page.getByText("There is no such document").waitFor();

    await turnTo(page, "/plans/demo-neutral-leach");
    await sheet.drawn();
    await page.getByText(/^\d+ species, /).click();
    await page.getByRole("region", { name: "Fields drawn" }).getByRole("link", { name: /ferrihydrite/ }).click(); // prettier-ignore
    await expect.poll(() => decodeURIComponent(page.url())).toContain("/chemistry/Fe(OH)3(s,ferrihydrite)");
  });
});
