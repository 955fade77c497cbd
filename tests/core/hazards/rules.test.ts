import { describe, expect, test } from "vitest";
import { presetCaution } from "../../../shared/hazards/presetCautions";
import { cautionsFor, type HazardContext, hazardContext, isSulfideMineral } from "../../../shared/hazards/rules";
import { presetNames } from "../../../shared/schemas/plan";

const quiet: HazardContext = {
  temperatureC: 25,
  components: ["S"],
  metals: [{ element: "Cu", requirement: "dissolved" }],
  feedMinerals: [],
  dosed: [],
  sulfideSulfur: false,
  circuit: {},
  setPoint: { pH: 2, Eh: 0.6 },
};
const codes = (change: Partial<HazardContext>) => cautionsFor({ ...quiet, ...change }).map((c) => c.code);
const at = (pH: number) => ({ setPoint: { pH, Eh: 0.2 } });

test("a plain copper leach triggers none of the rules", () => expect(codes({})).toEqual([]));

describe("(a) cyanide", () => {
  const cyanide = { components: ["CN"] };
  test("at pH 10.5 and above nothing is said", () => expect(codes({ ...cyanide, ...at(10.5) })).toEqual([]));
  test("just below pH 10.5 it warns", () => expect(codes({ ...cyanide, ...at(10.49) })).toEqual(["HCN"]));
  test("a named procedure is asked for below pH 10.0 only", () => {
    const [warn] = cautionsFor({ ...quiet, ...cyanide, ...at(10.0) });
    const [ask] = cautionsFor({ ...quiet, ...cyanide, ...at(9.99) });
    expect(warn!.confirm).toBeNull();
    expect(ask!.confirm).toMatch(/named procedure/);
  });
  test("without cyanide the same pH is silent", () => expect(codes(at(8))).toEqual([]));
  test("the limits name agency and value", () =>
    expect(cautionsFor({ ...quiet, ...cyanide, ...at(9) })[0]!.limits).toMatch(/NIOSH 4\.7 ppm/));
});

describe("(b) zinc, iron or aluminium as cementing metal", () => {
  const purification = {
    metals: [
      { element: "Zn", requirement: "dissolved" },
      { element: "Cd", requirement: "metal" },
    ],
    ...at(4.5),
  };
  test("arsine is named where arsenic is in the plan as a metal or as a component", () => {
    const asMetal = cautionsFor({
      ...quiet,
      ...purification,
      metals: [...purification.metals, { element: "As", requirement: "free" }],
    });
    const asOther = cautionsFor({ ...quiet, ...purification, components: ["S", "As"] });
    for (const cautions of [asMetal, asOther]) {
      expect(cautions.map((c) => c.code)).toEqual(["ARSINE", "HYDROGEN"]);
      expect(cautions[0]!.agents).toEqual(["AsH3"]);
      expect(cautions[0]!.text).toMatch(/arsine/);
    }
  });
  test("antimony gives stibine", () =>
    expect(cautionsFor({ ...quiet, ...purification, components: ["Sb"] })[0]!.agents).toEqual(["SbH3"]));
  test("with neither in the plan the assay is asked for, and hydrogen is named anyway", () => {
    const cautions = cautionsFor({ ...quiet, ...purification });
    expect(cautions[0]!.text).toMatch(/names neither/);
    expect(cautions[1]!.code).toBe("HYDROGEN");
    expect(cautions[1]!.text).toMatch(/zinc/i);
  });
  test("it waits for no window: acid is assumed until a set point says otherwise", () => {
    expect(codes({ ...purification, setPoint: null })).toEqual(["ARSINE", "HYDROGEN"]);
    expect(codes({ ...purification, ...at(11) })).toEqual([]);
  });
  test("arsenic or antimony of a feed mineral counts", () => {
    const feed = (id: string) => cautionsFor({ ...quiet, ...purification, feedMinerals: [id] })[0]!.agents;
    expect(feed("FeAsS(s,arsenopyrite)")).toEqual(["AsH3"]);
    expect(feed("Sb2S3(s,stibnite)")).toEqual(["SbH3"]);
    expect(feed("Ag2S(s,acanthite)")).toEqual(["AsH3", "SbH3"]); // neither: the assay is asked for
  });
  test("a cementing metal in use counts though the plan does not name it", () => {
    const copper = { metals: [{ element: "Cu", requirement: "metal" }], ...at(2) };
    expect(codes(copper)).toEqual([]);
    expect(codes({ ...copper, circuit: { reagents: ["iron-scrap"] } })).toEqual(["ARSINE", "HYDROGEN"]);
    expect(codes({ ...copper, circuit: { reagents: ["ferric", "air"] } })).toEqual([]);
  });
  test("a dissolved metal that cements nothing is silent", () => {
    expect(
      codes({
        ...purification,
        metals: [
          { element: "Ni", requirement: "dissolved" },
          { element: "Cu", requirement: "metal" },
        ],
      }),
    ).toEqual([]);
    expect(codes({ ...purification, metals: [{ element: "Zn", requirement: "dissolved" }] })).toEqual([]);
  });
});

describe("(c) sulfide in acid", () => {
  test("a sulfide mineral below pH 4 warns, at pH 4 it does not", () => {
    const feed = { feedMinerals: ["ZnS(s,sphalerite)"] };
    expect(codes({ ...feed, ...at(3.9) })).toEqual(["H2S"]);
    expect(codes({ ...feed, ...at(4) })).toEqual([]);
  });
  test("sulfide sulfur in the liquor counts as well", () => expect(codes({ sulfideSulfur: true })).toEqual(["H2S"]));
  test("an oxidant dosed silences it, a reductant dosed does not", () => {
    expect(codes({ sulfideSulfur: true, dosed: ["peroxide"] })).toEqual([]);
    expect(codes({ sulfideSulfur: true, dosed: ["sulfite"] })).toEqual(["H2S"]);
  });
  test("an oxidant in use silences it, air alone does not", () => {
    expect(codes({ sulfideSulfur: true, circuit: { reagents: ["ferric"] } })).toEqual([]);
    expect(codes({ sulfideSulfur: true, circuit: { reagents: ["air", "zinc-dust"] } })).toContain("H2S");
  });
  test.each([
    ["CuFeS2(s)", true],
    ["FeAsS(s,arsenopyrite)", true],
    ["CoS(s)", true],
    ["SnS(s)", true],
    ["S(s,rhombic)", false],
    ["SnO2(s,cassiterite)", false],
    ["PbSO4(s,anglesite)", false],
    ["KFe3(SO4)2(OH)6(s,jarosite)", false],
    ["CaSiO3(s,wollastonite)", false],
  ])("%s is a sulfide: %s", (id, answer) => expect(isSulfideMineral(id)).toBe(answer));
});

describe("(d) chlorine", () => {
  const brine = { components: ["Cl"] };
  const spot = (pH: number, Eh: number) => ({ setPoint: { pH, Eh } });
  test("chloride, above 1 V, below pH 3: all three are needed", () => {
    expect(codes({ ...brine, ...spot(2.9, 1.01) })).toEqual(["CHLORINE"]);
    expect(codes({ ...brine, ...spot(3, 1.2) })).toEqual([]);
    expect(codes({ ...brine, ...spot(1, 1) })).toEqual([]);
    expect(codes({ ...spot(1, 1.2) })).toEqual([]);
  });
  test("cathode powder in hydrochloric acid makes chlorine at any potential", () => {
    const [caution] = cautionsFor({ ...quiet, ...brine, ...spot(0.5, 0.6), feedMinerals: ["LiCoO2(s)"] });
    expect(caution!.text).toMatch(/LiCoO2 in the feed/);
    expect(caution!.limits).toMatch(/NIOSH 0\.5 ppm ceiling \(15 min\)/);
  });
});

describe("(f) oxidant where extraction organic is in the circuit", () => {
  test("a dosed oxidant or one in use, with organic only", () => {
    const circuit = { sxOrganic: true };
    expect(codes({ dosed: ["chlorate"], circuit })).toEqual(["ORGANIC"]);
    expect(codes({ circuit: { ...circuit, reagents: ["permanganate"] } })).toEqual(["ORGANIC"]);
    expect(codes({ dosed: ["chlorate"] })).toEqual([]);
    expect(codes({ circuit })).toEqual([]);
  });
  test("air and ferric iron are in every such circuit, a reductant oxidises nothing", () =>
    expect(codes({ circuit: { sxOrganic: true, reagents: ["air", "ferric", "sulfite"] }, dosed: ["sulfite"] })).toEqual(
      [],
    ));
  test("the oxidants are named once each", () =>
    expect(
      cautionsFor({ ...quiet, dosed: ["peroxide"], circuit: { sxOrganic: true, reagents: ["peroxide"] } })[0]!.agents,
    ).toEqual(["H2O2"]));
});

describe("(g) oxygen", () => {
  test("above 100 kPa it warns, at 100 kPa it does not", () => {
    expect(codes({ circuit: { oxygenKPa: 100 } })).toEqual([]);
    expect(codes({ circuit: { oxygenKPa: 101 } })).toEqual(["OXYGEN"]);
    expect(cautionsFor({ ...quiet, circuit: { oxygenKPa: 650 } })[0]!.text).toMatch(/650 kPa.*titanium/);
  });
});

describe("(e) ammonia", () => {
  const ammonia = { components: ["NH3"], temperatureC: 45 };
  test("above pH 9.5 and above 40 C it warns", () => expect(codes({ ...ammonia, ...at(9.6) })).toEqual(["NH3"]));
  test("either alone is silent", () => {
    expect(codes({ ...ammonia, ...at(9.5) })).toEqual([]);
    expect(codes({ ...ammonia, temperatureC: 40, ...at(10) })).toEqual([]);
  });
});

test("every lixiviant has its usual caution", () => {
  for (const preset of presetNames) expect(presetCaution[preset].length, preset).toBeGreaterThan(40);
});

test("the context is read from a plan: totals of ligands and others, sulfide where its couple is on", () => {
  const plan = {
    temperatureC: 55,
    preset: "sulfate",
    ligands: [{ component: "S", activity: 0.5 }],
    others: [{ component: "As", activity: 1e-4 }],
    metals: [
      {
        element: "Zn",
        role: "target",
        requirement: "dissolved",
        entry: "activity",
        value: 1,
        gammaFrom: "one",
        gamma: null,
      },
    ],
    feedMinerals: ["ZnO(s)"],
    dosed: ["peroxide"],
    sulfateReduction: true,
  } as const;
  const context = hazardContext(
    {
      ...plan,
      ligands: [...plan.ligands],
      others: [...plan.others],
      metals: [...plan.metals],
      feedMinerals: [...plan.feedMinerals],
      dosed: [...plan.dosed],
    },
    { pH: 4.5, Eh: 0 },
  );
  expect(context).toEqual({
    temperatureC: 55,
    components: ["S", "As"],
    metals: [{ element: "Zn", requirement: "dissolved" }],
    feedMinerals: ["ZnO(s)"],
    dosed: ["peroxide"],
    sulfideSulfur: true,
    circuit: {},
    setPoint: { pH: 4.5, Eh: 0 },
  });
});
