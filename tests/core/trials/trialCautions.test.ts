import { expect, test } from "vitest";
import { electrodeSeries } from "../../../shared/electrodes/series";
import type { Feed } from "../../../shared/schemas/feed";
import type { TrialInput } from "../../../shared/schemas/trial";
import { trialCautions } from "../../../shared/trials/trialCautions";
import { chemistry } from "../../support/chemistry";
import { assays, feedOf, trialOf, typed } from "../../support/trials";

const electrodes = electrodeSeries(chemistry().tables);
const ore = feedOf({ Cu: "1 %" });
const codes = (record: Partial<TrialInput>, feed: Feed = ore) =>
  trialCautions(trialOf(record), feed, electrodes).map((c) => c.code);
const at = (pH: string, mV?: string): Partial<TrialInput>["measured"] => ({
  readings: [
    {
      temperature: typed("25 C"),
      pH: { value: typed(`${pH} pH`) },
      ...(mV === undefined ? {} : { orp: { value: typed(`${mV} mV`), electrode: "AGCL-3M" } }),
    },
  ],
});

test("cyanide under pH 10.5, by the lowest pH met; nothing above it", () => {
  const charge = { liquorAssays: assays({ NaCN: "0.5 g/L" }) };
  expect(codes({ charge, measured: at("10.2") })).toEqual(["HCN"]);
  expect(codes({ charge, measured: at("10.8") })).toEqual([]);
  expect(codes({ charge, planned: { pH: typed("9.5 pH") } })).toEqual(["HCN"]);
});
test("zinc dust in acid: hydrogen always, arsine where arsenic was assayed", () => {
  const zinc = { cementingMetal: { metal: "Zn", dosed: typed("2 g") } };
  const arsenic = trialCautions(
    trialOf({
      kind: "cementation",
      measured: { ...at("4.5"), ...zinc },
      charge: { liquorAssays: assays({ As: "<0.5 mg/L" }) },
    }),
    ore,
    electrodes,
  );
  expect(codes({ kind: "cementation", measured: { ...at("4.5"), ...zinc } })).toEqual(["ARSINE", "HYDROGEN"]);
  expect(arsenic[0]?.agents).toEqual(["AsH3"]);
});
test("a sulfide mineral in acid without an oxidant, and not with one", () => {
  const feed = feedOf(
    { Zn: "50 %" },
    { minerals: [{ mineral: "ZnS(s,sphalerite)", element: "Zn", share: typed("90 %") }] },
  );
  expect(codes({ measured: at("1.5") }, feed)).toEqual(["H2S"]);
  const doses = [{ role: "oxidant" as const, reagent: "H2O2", amount: typed("5 g") }];
  expect(codes({ measured: { ...at("1.5"), doses } }, feed)).toEqual([]);
});
test("chloride in acid above 1 V on the SHE scale, as 850 mV on Ag/AgCl is", () => {
  const charge = { liquorAssays: assays({ HCl: "36 g/L" }) };
  expect(codes({ charge, measured: at("1", "850") })).toEqual(["CHLORINE"]);
  expect(codes({ charge, measured: at("1", "700") })).toEqual([]);
});
test("an empty record is quiet", () => expect(codes({})).toEqual([]));
