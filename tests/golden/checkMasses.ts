/** Published mass ratios as moles of one formula to moles of another, and metal deposited per charge as electrons per atom. */
export const massRatios: Readonly<Record<string, readonly [n: number, formula: string, m: number, per: string]>> = {
  "stoich-Fe-Cu": [1, "Fe", 1, "Cu"],
  "stoich-Zn-Au": [1, "Zn", 2, "Au"],
  "stoich-Zn-Ag": [1, "Zn", 2, "Ag"],
  "stoich-Zn-Cd": [1, "Zn", 1, "Cd"],
  "stoich-acid-CaCO3": [1, "H2SO4", 1, "CaCO3"],
  "stoich-acid-MgCO3": [1, "H2SO4", 1, "MgCO3"],
  "stoich-acid-ZnO": [1, "H2SO4", 1, "ZnO"],
  "stoich-CaO-acid": [1, "CaO", 1, "H2SO4"],
  "stoich-NaOH-acid": [2, "NaOH", 1, "H2SO4"],
  "stoich-gypsum-acid": [1, "CaSO4.2H2O", 1, "H2SO4"],
  "stoich-O2-CuFeS2": [1, "O2", 1, "Cu"],
  "stoich-O2-Au": [1, "O2", 4, "Au"],
  "stoich-Fe3-CuFeS2": [4, "Fe", 1, "Cu"],
  "stoich-Fe3-Cu2S": [4, "Fe", 2, "Cu"],
  "stoich-Fe3-UO2": [2, "Fe", 1, "U"],
  "stoich-Fe3-ZnS": [2, "Fe", 1, "Zn"],
  "stoich-MnO2-Fe2": [1, "MnO2", 2, "Fe"],
  "stoich-H2O2-Fe2": [1, "H2O2", 2, "Fe"],
  "stoich-NaClO3-Fe2": [1, "NaClO3", 6, "Fe"],
};

export const deposits: Readonly<Record<string, readonly [element: string, electrons: number]>> = {
  "far-Cu": ["Cu", 2],
  "far-Zn": ["Zn", 2],
  "far-Ni": ["Ni", 2],
  "far-Ag": ["Ag", 1],
  "far-Au": ["Au", 1],
  "far-Co": ["Co", 2],
};
