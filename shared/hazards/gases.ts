/** Gases whose pressure over the liquor follows from its metals and ligands. */
export const hazardGases = ["HCN", "H2S", "AsH3", "SbH3", "Cl2", "NH3", "H2"] as const;
export type HazardGas = (typeof hazardGases)[number];
