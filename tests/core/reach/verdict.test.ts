import { describe, expect, test } from "vitest";
import { equilibriumEh } from "../../../shared/reach/reach";
import { equilibriumLine } from "../../../shared/reach/equilibrium";
import { reagentById, reagents } from "../../../shared/reach/reagents";
import { allowedAt, reachAnswers, reachOf } from "../../../shared/reach/verdict";
import type { SetPoint, Window } from "../../../shared/solution";
import { library as data } from "../../support/solver";

const box = (lo: number, hi: number, set: Partial<SetPoint> = {}): Pick<Window, "polygons" | "setPoint" | "Eh"> => ({
  polygons: [{ outer: [[0, lo], [4, lo], [4, hi], [0, hi]], holes: [] }],
  Eh: [lo, hi],
  setPoint: { pH: 2, Eh: (lo + hi) / 2, margin: 3, mixedPotential: false, cutByFrame: false, ...set },
}); // prettier-ignore
const sulfate = { preset: "sulfate", temperatureC: 25 } as const;
const answer = (id: string, window: Pick<Window, "polygons" | "setPoint" | "Eh">) =>
  reachOf(data, reagentById.get(id)!, window, sulfate);

describe("what a window allows at one pH", () => {
  test("one interval in a box, none outside", () => {
    expect(allowedAt(box(0.2, 0.9), 2)).toEqual([[0.2, 0.9]]);
    expect(allowedAt(box(0.2, 0.9), 5)).toEqual([]);
  });
  test("a hole splits it, a slanted side is cut where it stands", () => {
    const outer = [[0, 0], [4, 0], [4, 1], [0, 2]] as [number, number][]; // prettier-ignore
    const hole = [[1, 0.4], [1, 0.6], [3, 0.6], [3, 0.4]] as [number, number][]; // prettier-ignore
    expect(allowedAt({ polygons: [{ outer, holes: [hole] }] }, 2)).toEqual([[0, 0.4], [0.6, 1.5]]); // prettier-ignore
    expect(allowedAt({ polygons: [{ outer, holes: [hole] }] }, 0.5)).toEqual([[0, 1.875]]);
  });
});

describe("verdict and miss, from the practical range", () => {
  test("air, 450 to 750 mV, reaches a set point at 600 mV", () => {
    const air = answer("air", box(0.4, 0.8));
    expect(air).toMatchObject({ verdict: "reachable", shortMV: 0, side: null, practical: [0.45, 0.75], overlap: [0.45, 0.75] });
    expect(air.text).toBe("air commonly shows 450 to 750 mV: it spans the set point at pH 2.");
  }); // prettier-ignore
  test("partly: it enters the window and stays short of the set point", () => {
    const air = answer("air", box(0.7, 1.1));
    expect(air).toMatchObject({ verdict: "partly", side: "below", overlap: [0.7, 0.75] });
    expect(air.shortMV).toBeCloseTo(150, 9);
    expect(air.text).toMatch(/enters the window at pH 2 from 700 to 750 mV and stays 150 mV below the set point/);
  });
  test("not: 70 mV below the window, or above it", () => {
    const short = answer("air", box(0.82, 1.1));
    expect(short).toMatchObject({ verdict: "not reachable", side: "below", overlap: null });
    expect(short.shortMV).toBeCloseTo(70, 9);
    const beyond = answer("air", box(0.1, 0.35));
    expect(beyond).toMatchObject({ verdict: "not reachable", side: "above" });
    expect(beyond.shortMV).toBeCloseTo(100, 9);
  });
  test("an open upper end reaches as far up as is asked", () =>
    expect(answer("permanganate", box(1.2, 1.6))).toMatchObject({ verdict: "reachable", overlap: [1.2, 1.6] }));
  test("without a range on record there is an equilibrium and no verdict", () => {
    const persulfate = answer("persulfate", box(0.4, 0.8));
    expect(persulfate).toMatchObject({ verdict: "not on record", shortMV: null, practical: null });
    expect(persulfate.equilibrium!.label).toMatch(/not what a slurry shows/);
    expect(reachOf(data, reagentById.get("air")!, box(0.4, 0.8), { ...sulfate, preset: "cyanide" }).verdict).toBe("not on record");
  }); // prettier-ignore
  test("a mixed potential asks for a range: inside it is reachable, past it only partly", () => {
    const mixed = (lo: number, hi: number) => box(0.1, 1.2, { mixedPotential: true, EhRange: [lo, hi] });
    expect(answer("air", mixed(0.4, 0.8)).verdict).toBe("reachable");
    expect(answer("air", mixed(0.5, 0.7))).toMatchObject({ verdict: "partly", side: "above", shortMV: 0 });
    expect(answer("air", mixed(0.8, 1.0))).toMatchObject({ verdict: "partly", side: "below" });
  });
});

describe("the table", () => {
  test("every reagent answers with a sentence and says what it can do to people or plant", () => {
    const all = reachAnswers(data, box(0.3, 0.9), sulfate, reagents.map((r) => r.id)); // prettier-ignore
    expect(all.map((a) => a.reagent.id)).toEqual(reagents.map((r) => r.id));
    for (const a of all) {
      expect(a.text + a.sideHazard, a.reagent.id).not.toBe("");
      expect(a.sideHazard.length, a.reagent.id).toBeGreaterThan(5);
    }
  });
  test("unless named, those considered in the liquor", () => {
    const ids = reachAnswers(data, box(0.3, 0.9), { preset: "cyanide", temperatureC: 25 }).map((a) => a.reagent.id);
    expect(ids).toContain("air");
    expect(ids).toContain("zinc-dust");
    expect(ids).not.toContain("chlorate");
  });
  // Practice brief, section 6: what a stirred vessel commonly shows, mV SHE.
  test.each<[string, number, number | null]>([
    ["air", 450, 750], ["ferric", 550, 800], ["peroxide", 600, 900], ["manganese-dioxide", 600, 750], ["chlorate", 600, 900],
    ["chlorine", 900, 1200], ["hypochlorite", 600, 800], ["permanganate", 1000, null], ["ozone", 1000, 1300],
    ["peroxomonosulfuric", 700, 1000], ["so2-oxygen", 500, 900], ["nitrate", 700, 950], ["cupric-chloride", 450, 700],
    ["sulfite", 250, 450], ["ferrous", 300, 600], ["sulfide", -100, 250], ["organic", 200, 500],
  ])("%s: %d to %s mV", (id, lo, hi) => {
    expect(reagentById.get(id)!.reached!.map((v) => v && Math.round(1000 * v))).toEqual([lo, hi]);
  }); // prettier-ignore
  test.each([
    ["air", 1.229], ["ferric", 0.771], ["peroxide", 1.776], ["manganese-dioxide", 1.224], ["chlorate", 1.451], ["chlorine", 1.358],
    ["permanganate", 1.507], ["ozone", 2.076], ["peroxomonosulfuric", 1.8], ["nitrate", 0.957], ["cupric-chloride", 0.153],
    ["persulfate", 2.0], ["dichromate", 1.36], ["sulfite", 0.16], ["sulfide", 0.142], ["peroxide-reductant", 0.695],
    ["zinc-dust", -0.762], ["iron-scrap", -0.447], ["aluminium", -1.662], ["magnesium", -2.372], ["cadmium", -0.403],
    ["nickel", -0.257], ["copper", 0.342],
  ])("E0 of %s is %d V", (id, E0) => expect(reagentById.get(id)!.couple!.E0).toBe(E0)); // prettier-ignore
});

describe("equilibrium lines", () => {
  test("at 25 C the library's line lies on the handbook's, within what the tables differ by", () => {
    for (const reagent of reagents) {
      if (reagent.couple === undefined || reagent.id === "cupric-chloride") continue; // drawn as CuCl2^-, not as the bare ion
      const line = equilibriumLine(data, reagent, 25)!;
      for (const pH of [0, 1]) {
        if (reagent.id === "sulfide" || reagent.id === "hypochlorite") continue; // written from HS^- and ClO^-, not from H2S
        expect(Math.abs(line.intercept + line.slope * pH - equilibriumEh(reagent.couple, pH, 25)), reagent.id).toBeLessThan(0.07);
      }
    }
  }); // prettier-ignore
  test("hypochlorite gives its handbook potential in base, 0.84 V at pH 14", () => {
    const { intercept, slope } = equilibriumLine(data, reagentById.get("hypochlorite")!, 25)!;
    expect(intercept + 14 * slope).toBeCloseTo(0.84, 1);
  });
  test("E0 follows T where the library has the half-reaction: oxygen falls by 0.846 mV/K (Bratsch 1989)", () => {
    const at = (T: number) => equilibriumLine(data, reagentById.get("air")!, T)!.intercept;
    expect((at(30) - at(20)) / 10).toBeCloseTo(-0.000846, 5);
  });
  test("without a half-reaction the handbook's E0 stands, and says so; without a couple there is no line", () => {
    expect(equilibriumLine(data, reagentById.get("peroxomonosulfuric")!, 60)).toMatchObject({ intercept: 1.8, from: "handbook" });
    expect(equilibriumLine(data, reagentById.get("so2-oxygen")!, 60)).toBeNull();
  }); // prettier-ignore
});
