import type { PresetName } from "../schemas/plan";

/** Liquors that most practical ranges were read in. */
export const acidLiquors: readonly PresetName[] = ["sulfate", "sulfate_sulfide", "chloride", "water"];
export const allLiquors: readonly PresetName[] = [
  ...acidLiquors,
  "ammonia",
  "ammonia_carbonate",
  "cyanide",
  "carbonate",
  "thiosulfate_ammonia",
  "glycine",
];
/** Sources of the rows of the table. */
export const HANDBOOK = "E0: handbook value, from memory. Range: common practice, no source.";
export const METAL =
  "E0: handbook value, from memory. What a slurry with the metal in it shows depends on the dissolved metal: no range given.";
