import { expect, test } from "vitest";
import { potentialScale, shortElectrode } from "../../src/lib/potential";

const probe = { electrode: "Ag/AgCl, 3 mol/L KCl, at 25 °C", short: "Ag/AgCl 3 M", offset: 0.207, remark: null };

test("volts against SHE stand as the solver gives them", () => {
  const scale = potentialScale("V");
  expect(scale.label).toBe("V vs SHE");
  expect(scale.format(0.5812)).toBe("0.58\u2009V");
  expect(scale.format(-0.2)).toBe("\u22120.20\u2009V");
});

// practice brief: Eh = reading + E_ref; one liquor at 624 mV SHE reads 417 on Ag/AgCl 3 M (207 mV at 25 C)
test("a probe's reading is the potential less that of its electrode, and back", () => {
  const scale = potentialScale("mV", probe);
  expect(scale.toShown(0.624)).toBeCloseTo(417, 9);
  expect(scale.fromShown(417)).toBeCloseTo(0.624, 12);
  expect(scale.format(0.624)).toBe("417\u2009mV");
  expect(scale.label).toBe("mV vs Ag/AgCl 3 M");
});

test("a difference has the unit but no electrode", () => {
  const scale = potentialScale("mV", probe);
  expect(scale.differenceToShown(0.03)).toBeCloseTo(30, 9);
  expect(scale.differenceFromShown(30)).toBeCloseTo(0.03, 12);
  expect(scale.formatDifference(0.16)).toBe("+160\u2009mV");
});

test.each([
  ["Ag/AgCl, 3 mol/L KCl", "Ag/AgCl 3 M"],
  ["Ag/AgCl, 3.5 mol/L KCl, junction included", "Ag/AgCl 3.5 M"],
  ["Ag/AgCl, saturated KCl, without junction", "Ag/AgCl sat."],
  ["saturated calomel, saturated KCl", "sat. calomel"],
  ["mercury/mercurous sulfate, saturated K2SO4", "mercury/mercurous sulfate sat."],
])("%s is short for an axis", (label, short) => {
  expect(shortElectrode(label)).toBe(short);
});
