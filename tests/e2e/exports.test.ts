import { execFileSync } from "node:child_process";
import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { projectRoot } from "../../server/root";
import type { Solution } from "../../shared/solution";
import { openPageAs, sharedPageAs } from "../support/browser";
import { savedPath } from "../support/download";
import { readPdf } from "../support/pdf";
import { WorkspaceScreen } from "./pages/workspace";

const path = "/plans/demo-neutral-leach";

/** A command behind the word More that ends in a file. */
async function fileOf(plan: WorkspaceScreen, command: string): Promise<{ name: string; path: string; bytes: Buffer }> {
  const coming = plan.page.waitForEvent("download");
  await plan.command(command);
  const download = await coming;
  const path = await savedPath(download);
  return { name: download.suggestedFilename(), path, bytes: readFileSync(path) };
}

describe("a technician takes away", () => {
  const shared = sharedPageAs("technician", { path });

  test("the problem is a file that the command line solves as it is; windows, limits and polygons come as tables with units", async () => {
    const { page } = shared();
    const plan = new WorkspaceScreen(page);
    await plan.drawn();
    const problem = await fileOf(plan, "Problem, for the solver");
    const solution = JSON.parse((await fileOf(plan, "Solution")).bytes.toString()) as Solution;
    const answer = execFileSync(process.execPath, ["--import", "tsx", "server/tools/solve.ts", problem.path], {
      cwd: projectRoot,
      encoding: "utf8",
    });
    const solved = JSON.parse(answer) as Solution;
    expect(solved.windows).toEqual(solution.windows);
    expect(solved.fields).toEqual(solution.fields);

    const lines = async (command: string) =>
      (await fileOf(plan, command)).bytes.toString("utf8").replace("\ufeff", "").trim().split("\r\n");
    const limits = await lines("Limits of the windows");
    expect(limits[0]).toContain("from_Eh_V_SHE");
    expect(limits).toHaveLength(1 + solution.windows.flatMap((w) => w.limits).length);
    const windows = await lines("Windows and their set points");
    expect(windows[0]).toContain("set_point_Eh_V_SHE");
    expect(windows).toHaveLength(1 + solution.windows.length);
    const polygons = await lines("Polygons of the map");
    expect(polygons[0]).toBe("what,metal,of,polygon,ring,corner,pH,Eh_V_SHE,plan,state,temperature_C,chemistry_data");
    expect(polygons[1]).toContain('"Neutral leach, second tank","revision 3, invented data",60,');
    expect(polygons.filter((l) => l.startsWith("window,")).length).toBe(solution.windows[0]?.polygons[0]?.outer.length);
  });

  test("the window sheet of the saved revision; an electrode of the member stands on it too", async () => {
    const { page } = shared();
    const plan = new WorkspaceScreen(page);
    await plan.drawn();
    const { pH, EhText } = await plan.answers();
    const sheet = await fileOf(plan, "Window sheet, revision 3");
    expect(sheet.name).toBe("neutral-leach-second-tank-window-sheet-revision-3.pdf");
    const { words, pages } = readPdf(sheet.bytes);
    expect(pages).toBe(1);
    expect(words).toContain(`pH ${pH.toFixed(2)} ${EhText.replace("\u2009", " ")} vs SHE`);
    expect(words).toContain("INVENTED DEMO DATA");

    await page.request.put("/api/me/preferences", { data: { potentialScale: "AGCL-3M", electrodeTemperatureC: 25 } });
    // The bare address states no scale: the member's own stands.
    await page.goto(path);
    await plan.drawn();
    await page.getByText("Ag/AgCl, 3 mol/L KCl, at 25").first().waitFor();
    const second = readPdf((await fileOf(plan, "Window sheet, revision 3")).bytes);
    expect(second.words).toContain("E / mV vs Ag/AgCl, 3 mol/L KCl");
  });
});

test("with unsaved changes the sheet is that of the saved revision, and says so", async () => {
  const { page } = await openPageAs("metallurgist", { path });
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  const saved = await plan.answers();
  await plan.type("Temperature of the liquor", "88");
  await plan.header().getByText("Unsaved changes").waitFor();
  await plan.button("More commands").click();
  await page.getByRole("menuitem", { name: "Window sheet, revision 3 PDF, as saved" }).waitFor();
  await page.keyboard.press("Escape");
  const { words } = readPdf((await fileOf(plan, "Window sheet, revision 3")).bytes);
  await plan.header().getByText("The sheet is that of revision 3, without the unsaved changes.").waitFor();
  expect(words).toContain("60.0 °C, sulfate");
  expect(words).toContain(`pH ${saved.pH.toFixed(2)} `);
  await plan.button("Undo").click();
});
