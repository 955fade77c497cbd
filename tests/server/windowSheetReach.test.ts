import { expect, test } from "vitest";
import { windowSheet } from "../../server/features/windowSheet/page";
import { reachSays } from "../../server/features/windowSheet/says/reach";
import { workOf } from "../../server/features/windowSheet/work";
import { valueOf } from "../../shared/outcome";
import { readPdf } from "../support/pdf";
import { sheetPlan, sheetRevision } from "../support/sheetFixture";
import { bytesOf, collisions, planOf } from "../support/sheets";
import { library, tables, testServer } from "../support/testServer";

const workWith = (reach?: string[]) => valueOf(workOf(sheetPlan, sheetRevision(tables.version), library, { reach }));

test("the reach of the reagents asked for is told with its verdict and hazard, and the page stays one", async () => {
  const work = workWith(["permanganate", "ferric"]);
  expect(work.reach.map((r) => r.reagent.id)).toEqual(["ferric", "permanganate"]);
  const sheet = readPdf(await windowSheet(work));
  expect([sheet.pages, collisions(sheet)]).toEqual([1, []]);
  expect(sheet.words).toContain("Reach what platinum commonly reads, vs SHE; no equilibrium");
  expect(sheet.words).toMatch(/ferric 550 to 800 mV: [^.]+; hydrolysis and jarosite coatings above pH 2\./);
  expect(sheet.words).toMatch(/KMnO4 1000 mV and more: \d+ mV above the window; strong oxidiser/);
});

test("the usual reagents of the liquor speak where none is named, none where none is wanted, and an unknown one is refused", async () => {
  expect(workWith().reach.map((r) => r.reagent.id)).toEqual(["air", "peroxide", "manganese-dioxide"]);
  expect(reachSays(workWith([]))).toEqual([]);
  const { as } = await testServer();
  const made = await planOf(await as("metallurgist"));
  const client = await as("manager");
  const path = `/api/plans/${made.id}/revisions/1/window-sheet.pdf`;
  expect(readPdf(await bytesOf(client, `${path}?reach=ferric`)).words).toContain("550 to 800");
  const refused = await client.get(`${path}?reach=ferric,magic`).expect(400);
  expect(refused.body).toMatchObject({ error: { code: "INVALID_INPUT", path: "reach" } });
});
