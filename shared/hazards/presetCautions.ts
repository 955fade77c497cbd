import type { PresetName } from "../schemas/plan";

/** The usual caution of a liquor, whatever the set point.
 *  @source  common practice, no source; agents and their exposure values stand in rules.ts */
export const presetCaution: Readonly<Record<PresetName, string>> = {
  water:
    "Base or acid sets this pH, and metal hydroxide dust is toxic once dry: follow local codes and the site procedure.",
  sulfate:
    "Acid, oxidant and hot liquor: follow local codes and the site procedure. Add acid to water, never water to acid.",
  sulfate_sulfide:
    "Sulfide with acid gives H2S, which dulls the sense of smell before it kills. Closed vessel, scrubber, gas alarm, site procedure.",
  chloride:
    "Chloride with a strong oxidant and acid gives Cl2, and hot brine attacks common steels. Vent to a scrubber; site procedure.",
  ammonia: "Ammonia strips when warm and alkaline and burns the eyes: closed vessel, scrubber, eye wash within reach.",
  ammonia_carbonate:
    "Ammonia and CO2 strip when warm: closed vessel with relief, scrubber, eye wash within reach; site procedure.",
  cyanide:
    "Keep the liquor above pH 10.5. Never let it meet acid, in the vessel, the sump or the drain: HCN. Work only under the site's cyanide procedure.",
  carbonate: "Hot alkali burns eyes and skin, and acid frees CO2 with foam: follow the site procedure.",
  thiosulfate_ammonia:
    "Ammonia strips when warm and alkaline, and acid breaks thiosulfate to SO2 and sulfur: closed vessel, scrubber, never acidify.",
  glycine: "Alkaline liquor with oxidant: goggles and the site procedure. If cyanide is blended in, its rules hold.",
};
