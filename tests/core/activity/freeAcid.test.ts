import { describe, expect, test } from "vitest";
import { davies } from "../../../shared/activity/davies";
import { freeAcid } from "../../../shared/activity/freeAcid";
import { valueOf } from "../../../shared/outcome";
import { library } from "../../support/solver";

const acid = (pH: number, sulfate: number, t = 25) => valueOf(freeAcid(library, pH, sulfate, t));

describe("free acid from pH", () => {
  test("satisfies mass action with pK2 = 1.99 at 25 C (CRC) and gives back the pH", () => {
    const { hydrogen, bisulfate, ionicStrength } = acid(1.8, 0.05);
    const [g1, g2] = [davies(1, ionicStrength), davies(2, ionicStrength)];
    expect(-Math.log10(hydrogen * g1)).toBeCloseTo(1.8, 6);
    const K2 = (hydrogen * g1 * (0.05 - bisulfate) * g2) / (bisulfate * g1);
    expect(-Math.log10(K2)).toBeCloseTo(1.99, 1);
  });

  test("is all hydrogen ion where there is next to no sulfate: 0.01 mol/L is 0.49 g/L", () => {
    const { gPerL, bisulfate } = acid(2, 1e-6);
    expect(bisulfate).toBeLessThan(1e-6);
    expect(gPerL).toBeCloseTo((0.01 / davies(1, 0.01 / 2)) * 49.035, 1);
  });

  test("rises as pH falls, as sulfate rises, and as bisulfate holds on when hot", () => {
    expect(acid(1, 0.5).gPerL).toBeGreaterThan(acid(1.4, 0.5).gPerL);
    expect(acid(1.2, 1).gPerL).toBeGreaterThan(acid(1.2, 0.5).gPerL);
    expect(acid(1.2, 0.5, 90).gPerL).toBeGreaterThan(acid(1.2, 0.5, 25).gPerL);
  });

  test("says when it is beyond Davies, and refuses a liquor without sulfate", () => {
    expect(acid(1.2, 0.02).withinDavies).toBe(true);
    expect(acid(1.2, 1).withinDavies).toBe(false);
    expect(freeAcid(library, 1, 0, 25)).toMatchObject({ ok: false, error: { code: "OUT_OF_RANGE", path: "sulfate" } });
  });
});
