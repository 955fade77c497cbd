import { reagentById } from "../reach/reagents";
import type { Caution, HazardContext } from "./context";
import { limitsText } from "./exposure";

/** Oxides that make chlorine from hydrochloric acid by themselves. */
const chlorineMakers = /^(MnO2|PbO2|LiCoO2)\(/;

/** (d) Chloride with Eh above 1 V in acid, or an oxide fed that makes chlorine from hydrochloric acid: Cl2. */
export function chlorine(c: HazardContext): Caution[] {
  if (!c.components.includes("Cl") || c.setPoint === null || c.setPoint.pH >= 3) return [];
  const oxides = c.feedMinerals.filter((id) => chlorineMakers.test(id)).map((id) => id.split("(")[0] ?? id);
  if (c.setPoint.Eh <= 1 && oxides.length === 0) return [];
  const cause = oxides.length > 0 ? `${oxides.join(" and ")} in the feed` : "a potential above 1 V";
  return [
    {
      code: "CHLORINE",
      agents: ["Cl2"],
      text: `Chloride below pH 3 with ${cause} makes chlorine gas: closed vessel, scrubber, gas alarm; wet chlorine attacks common steels.`,
      limits: limitsText("Cl2"),
      confirm: null,
    },
  ];
}

/** Air and ferric iron stand in every circuit with solvent extraction and are not meant. */
const mild: ReadonlySet<string> = new Set(["air", "ferric", "cupric-chloride"]);
const dosedNames: Readonly<Record<string, string>> = {
  persulfate: "S2O8^2-",
  chlorate: "NaClO3",
  peroxide: "H2O2",
  nitrate: "HNO3",
};

/** (f) An oxidant dosed where solvent extraction organic is in the circuit: fire, and a ruined organic. */
export function organicWithOxidant(c: HazardContext): Caution[] {
  if (c.circuit.sxOrganic !== true) return [];
  const chosen = (c.circuit.reagents ?? []).filter((id) => !mild.has(id) && reagentById.get(id)?.kind === "oxidant");
  const names = new Set([
    ...chosen.map((id) => reagentById.get(id)?.name ?? id),
    ...c.dosed.flatMap((d) => dosedNames[d] ?? []),
  ]);
  if (names.size === 0) return [];
  return [
    {
      code: "ORGANIC",
      agents: [...names],
      text: `Solvent extraction organic is in this circuit, and ${[...names].join(", ")} is dosed: fire and a ruined organic where they meet. Chlorate never meets organic or strong acid; peroxide with organic in a closed vessel bursts. Prove that no oxidant is left in the liquor before it goes to extraction.`,
      limits: null,
      confirm: null,
    },
  ];
}

/** Oxygen partial pressure above which the rule speaks, kPa. */
export const OXYGEN_KPA = 100;

/** (g) Oxygen partial pressure above 100 kPa: what does not burn in air burns in oxygen. */
export function oxygen(c: HazardContext): Caution[] {
  if ((c.circuit.oxygenKPa ?? 0) <= OXYGEN_KPA) return [];
  return [
    {
      code: "OXYGEN",
      agents: ["O2"],
      text: `Oxygen stands above ${OXYGEN_KPA} kPa (${c.circuit.oxygenKPa} kPa): oxygen-clean, oil-free vessel and lines, compatible alloys and seals, titanium only within its ignition limits; follow the vessel's code and the site's oxygen procedure.`,
      limits: null,
      confirm: null,
    },
  ];
}
