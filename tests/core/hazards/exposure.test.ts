import { describe, expect, test } from "vitest";
import { DEFERENCE, exposureLimits, exposureOf, limitsText } from "../../../shared/hazards/exposure";
import { practiceCheck } from "../../support/practice";

type Authority = "NIOSH" | "OSHA" | "IDLH";
const value = (agent: string, authority: Authority, kind: string) =>
  exposureOf.get(agent)!.limits.find((l) => l.authority === authority && l.kind === kind);

describe("exposure values of the practice brief, as displayed", () => {
  test.each<[string, string, string, Authority, string]>([
    ["S01", "NIOSH_REL_ST", "HCN", "NIOSH", "short-term"],
    ["S01", "OSHA_PEL_TWA_skin", "HCN", "OSHA", "average"],
    ["S02", "NIOSH_REL_ceiling_10min", "H2S", "NIOSH", "ceiling"],
    ["S02", "OSHA_ceiling", "H2S", "OSHA", "ceiling"],
    ["S02", "OSHA_peak_10min", "H2S", "OSHA", "peak"],
    ["S02", "IDLH", "H2S", "IDLH", ""],
    ["S03", "NIOSH_REL_ceiling_15min", "AsH3", "NIOSH", "ceiling"],
    ["S03", "OSHA_PEL_TWA", "AsH3", "OSHA", "average"],
    ["S04", "NIOSH_REL_TWA", "SbH3", "NIOSH", "average"],
    ["S04", "OSHA_PEL_TWA", "SbH3", "OSHA", "average"],
    ["S04", "IDLH", "SbH3", "IDLH", ""],
    ["S05", "NIOSH_REL_ceiling_15min", "Cl2", "NIOSH", "ceiling"],
    ["S05", "OSHA_ceiling", "Cl2", "OSHA", "ceiling"],
    ["S05", "IDLH", "Cl2", "IDLH", ""],
    ["S06", "NIOSH_REL_TWA", "NH3", "NIOSH", "average"],
    ["S06", "NIOSH_ST", "NH3", "NIOSH", "short-term"],
    ["S06", "OSHA_PEL_TWA", "NH3", "OSHA", "average"],
    ["S06", "IDLH", "NH3", "IDLH", ""],
    ["S07", "OSHA_PEL_TWA", "Cr(VI)", "OSHA", "average"],
    ["S07", "NIOSH_REL_TWA", "Cr(VI)", "NIOSH", "average"],
  ])("%s %s", (id, key, agent, authority, kind) => {
    const shown = value(agent, authority, kind)!;
    const micrograms = id === "S07" ? 1000 : 1; // the check is in ug/m3, the table in mg/m3
    expect(shown.value * micrograms).toBeCloseTo(practiceCheck(id).expected(key), 12);
    expect(limitsText(agent)).toContain(`${shown.value} ${shown.unit}`);
  });
  test("what was not re-read says so", () => {
    expect(limitsText("HCN")).toBe(
      "HCN: NIOSH 4.7 ppm short-term (skin), OSHA 10 ppm (skin), IDLH 50 ppm (from memory). US values, recorded December 2026.",
    );
    expect(limitsText("H2S")).toBe(
      "H2S: NIOSH 10 ppm ceiling (10 min), OSHA 20 ppm ceiling, 50 ppm peak (10 min), IDLH 100 ppm. US values, recorded December 2026.",
    );
    expect(limitsText("H2")).toMatch(/4 to 75 %/);
    expect(limitsText("N2")).toBeNull();
  });
});

test("every agent has a place, a source and a sentence; the deference wording names what it does not replace", () => {
  expect(new Set(exposureLimits.map((e) => e.agent)).size).toBe(exposureLimits.length);
  for (const row of exposureLimits) {
    expect(row.source + row.where, row.agent).not.toBe("");
    expect(limitsText(row.agent), row.agent).toMatch(/recorded December 2026/);
  }
  expect(DEFERENCE).toMatch(
    /hazard study.*safety data sheets.*local law.*licensed engineer.*industrial hygienist.*stated date/,
  );
});
