import { expect, test } from "vitest";
import type { PlanRow } from "../../shared/schemas/plan";
import { speciesText, textWidth } from "../../src/map/speciesText";
import { openPageAs, turnTo } from "../support/browser";
import { tenMetals } from "../support/tenMetals";
import { demoInputs, solved } from "./pages/core";
import { WorkspaceScreen } from "./pages/workspace";

/** px a letter of a field's name is high */
const LETTERS = 11;

type Point = readonly [x: number, y: number];

const area = (ring: readonly Point[]): number =>
  Math.abs(ring.reduce((sum, [x, y], i) => {
    const [nx, ny] = ring[(i + 1) % ring.length] as Point;
    return sum + x * ny - nx * y;
  }, 0)) / 2; // prettier-ignore

interface Box {
  left: number;
  top: number;
  right: number;
  bottom: number;
}
const overlap = (a: Box, b: Box, slack: number): boolean =>
  a.left < b.right - slack && b.left < a.right - slack && a.top < b.bottom - slack && b.top < a.bottom - slack;

test("names on the map never lie over each other, stand in their own field, and a field too small for its name has none", async () => {
  const { page } = await openPageAs("metallurgist", { path: "/plans/demo-neutral-leach" });
  const plan = new WorkspaceScreen(page);
  const { projectId } = (await (await page.request.get("/api/plans/demo-neutral-leach")).json()) as PlanRow;
  const made = await page.request.post("/api/plans", {
    data: { projectId, name: `Ten metals ${Date.now()}`, inputs: tenMetals() },
  });
  expect(made.status()).toBe(201);
  const { id } = (await made.json()) as PlanRow;
  const counted: number[] = [];
  let tooSmall = 0;
  for (const [path, asked] of [
    ["/plans/demo-neutral-leach", demoInputs("demo-neutral-leach")],
    [`/plans/${id}`, tenMetals()],
  ] as const) {
    if (counted.length > 0) await turnTo(page, path);
    await plan.drawn();
    for (const temperatureC of [25, 60, 95]) {
      await plan.type("Temperature of the liquor", String(temperatureC));
      const { fields } = solved({ ...asked, temperatureC });
      for (const size of [
        { width: 1280, height: 800 },
        { width: 834, height: 1112 },
      ]) {
        await page.setViewportSize(size);
        await expect.poll(() => plan.axisWords()).toContain(`pH at ${temperatureC} °C`);
        const where = `${asked.metals.length} metals, ${temperatureC} °C, ${size.width} px`;
        const names = await plan.names();
        expect(names.length, where).toBeGreaterThan(5);
        counted.push(names.length);
        const ground = await plan.mapBox();
        names.forEach(({ id: one, box: a }, i) => {
          expect(overlap(a, ground, 0) && a.left >= ground.left && a.right <= ground.right, `${where}: ${one} in the map`).toBe(true); // prettier-ignore
          for (const { id: other, box: b } of names.slice(i + 1))
            expect(overlap(a, b, 0.5), `${where}: ${one} over ${other}`).toBe(false);
        });
        // Every field in pixels: whose name is shown has room for it, and the name's middle is there.
        const scale = await plan.pixelsPer();
        for (const key of new Set(fields.map((f) => `${f.metal} ${f.species}`))) {
          const pieces = fields.filter((f) => `${f.metal} ${f.species}` === key);
          const px = pieces.reduce((sum, f) => sum + area(f.polygon.map(([pH, Eh]) => [pH * scale.pH, Eh * scale.Eh])), 0); // prettier-ignore
          const room = LETTERS * textWidth(speciesText(pieces[0]!.species), LETTERS);
          const name = names.find((n) => n.id === key);
          if (px < room) {
            tooSmall += 1;
            expect(name, `${where}: ${key} in ${px.toFixed(0)} px² of the ${room.toFixed(0)} it needs`).toBeUndefined();
          }
          if (name)
            expect(
              pieces.some((f) => contains(f.polygon, name.pH, name.Eh)),
              `${where}: ${key} in its field`,
            ).toBe(true);
        }
      }
    }
  }
  expect(counted).toHaveLength(12);
  expect(tooSmall, "fields too small for a name").toBeGreaterThan(0);
});

/** Even-odd. */
function contains(ring: readonly Point[], x: number, y: number): boolean {
  let odd = false;
  ring.forEach(([ax, ay], i) => {
    const [bx, by] = ring[(i + ring.length - 1) % ring.length] as Point;
    if (ay > y !== by > y && x < ax + ((y - ay) / (by - ay)) * (bx - ax)) odd = !odd;
  });
  return odd;
}
