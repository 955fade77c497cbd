import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { davies } from "../../../shared/activity/davies";
import { acidBand, freeAcid, freeAcidCurve } from "../../../shared/activity/freeAcid";
import { valueOf } from "../../../shared/outcome";
import { runs } from "../../support/fuzz";
import { library } from "../../support/solver";

const acid = (pH: number, sulfate: number, t = 25) => valueOf(freeAcid(library, pH, sulfate, t));
const curve = (sulfate: number, t = 25) => valueOf(freeAcidCurve(library, sulfate, t));

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

  test("says when there is more acid than the sulfate could balance: a mole of H2SO4 brings its own mole of sulfate", () => {
    expect(acid(1, 0.5).withinSulfate).toBe(true);
    expect(acid(-0.3, 0.5).gPerL).toBeGreaterThan(0.5 * 98.07);
    expect(acid(-0.3, 0.5).withinSulfate).toBe(false);
  });
});

describe("pH of a free acid", () => {
  const sulfate = fc.double({ min: 0.02, max: 3, noNaN: true });
  const celsius = fc.double({ min: 0, max: 200, noNaN: true });

  test("is the way back of free acid from pH", () =>
    fc.assert(
      fc.property(sulfate, celsius, fc.double({ min: 0.02, max: 0.98, noNaN: true }), (S, t, share) => {
        const gPerL = share * S * 98.072;
        const { at, pHOf } = curve(S, t);
        expect(at(pHOf(gPerL)!).gPerL).toBeCloseTo(gPerL, 6);
      }),
      runs(60),
    ));

  test("falls as acid rises: the axis has one scale", () =>
    fc.assert(
      fc.property(sulfate, celsius, (S, t) => {
        const { pHOf } = curve(S, t);
        const all = Array.from({ length: 40 }, (_, i) => pHOf(((i + 1) / 41) * S * 98.072)!);
        for (let i = 1; i < all.length; i++) expect(all[i]).toBeLessThan(all[i - 1]!);
      }),
      runs(60),
    ));

  test("there is none for nothing, and none beyond what the sulfate balances", () => {
    const { pHOf } = curve(0.5);
    expect(pHOf(0)).toBeNull();
    expect(pHOf(49.1)).toBeNull();
    expect(pHOf(49)).not.toBeNull();
  });
});

describe("a control band in g/L", () => {
  test("is lopsided in pH, more acid the shorter way; the wider side counts", () => {
    const { low, high, counted } = valueOf(acidBand(library, 2, 0.8, 0.5, 25));
    const { at } = curve(0.5);
    const here = at(0.8).gPerL;
    expect(at(0.8 - low).gPerL).toBeCloseTo(here + 2, 6);
    expect(at(0.8 + high).gPerL).toBeCloseTo(here - 2, 6);
    expect(low).toBeLessThan(high);
    expect(counted).toBe(high);
  });

  test("a small one is the slope, on either side", () => {
    const { low, high } = valueOf(acidBand(library, 1e-4, 1, 0.5, 60));
    expect(low / high).toBeCloseTo(1, 4);
  });

  test("is refused where it takes all the acid there is, or where free acid is no measure", () => {
    expect(acidBand(library, 40, 1.4, 0.5, 25)).toMatchObject({ ok: false, error: { path: "freeAcidBand" } });
    expect(acidBand(library, 1, 1.6, 0.5, 25)).toMatchObject({ ok: false, error: { code: "OUT_OF_RANGE" } });
    expect(acidBand(library, 30, 0.4, 0.5, 25)).toMatchObject({ ok: false, error: { message: expect.stringMatching(/sulfate/) as string } });
    expect(acidBand(library, 0, 1, 0.5, 25)).toMatchObject({ ok: false });
  }); // prettier-ignore
});
