import { valueOf } from "../outcome";
import { parseReaction } from "../species/reaction";
import type { Coefficients } from "./halfReaction";

/** What takes the electrons of a dissolving mineral, or gives them. The ids are those of reach/reagents.ts where it speaks of the same. */
export interface RedoxReagent {
  readonly id: string;
  readonly role: "oxidant" | "reductant" | "cementing metal";
  /** species id used up */
  readonly used: string;
  /** in acid */
  readonly half: Coefficients;
  /** above pH 4, where it differs */
  readonly halfInBase?: Coefficients;
  /** what is bought and weighed, and how many units of `used` one of it holds; null where it is the liquor's own acid */
  readonly sold: { readonly formula: string; readonly holds: number } | null;
}

const read = (half: string): Coefficients => valueOf(parseReaction(half)).terms;

/** A half-reaction whose first term is what is used up. */
function reagent(role: RedoxReagent["role"], id: string, half: string, sold: string | null, halfInBase?: string): RedoxReagent {
  const coefficients = read(half);
  const [used = ""] = coefficients.keys();
  return {
    id,
    role,
    used,
    half: coefficients,
    ...(halfInBase === undefined ? {} : { halfInBase: read(halfInBase) }),
    sold: sold === null ? null : { formula: sold, holds: 1 },
  };
} // prettier-ignore

const metal = (id: string, element: string, charge: number): RedoxReagent =>
  reagent("cementing metal", id, `${element}(s) = ${element}^${charge}+(aq) + ${charge} e^-`, element);

const MANGANESE_IN_BASE = "MnO4^-(aq) + 4 H^+(aq) + 3 e^- = MnO2(s,birnessite) + 2 H2O(l)";

/** Oxidants, reductants and cementing metals as half-reactions over the library. Cementing metals stand with their simple ion; at a set
 *  point the species that rules there takes its place.
 *  @source  half-reactions of the handbooks (CRC). Peroxomonosulfuric acid, sulfur dioxide with oxygen, and organics have none here: by test */
export const redoxReagents: readonly RedoxReagent[] = [
  reagent("oxidant", "air", "O2(g) + 4 H^+(aq) + 4 e^- = 2 H2O(l)", "O2"),
  reagent("oxidant", "ferric", "Fe^3+(aq) + e^- = Fe^2+(aq)", "Fe^3+"),
  reagent("oxidant", "peroxide", "H2O2(aq) + 2 H^+(aq) + 2 e^- = 2 H2O(l)", "H2O2"),
  reagent("oxidant", "manganese-dioxide", "MnO2(s,pyrolusite) + 4 H^+(aq) + 2 e^- = Mn^2+(aq) + 2 H2O(l)", "MnO2"),
  reagent("oxidant", "chlorate", "ClO3^-(aq) + 6 H^+(aq) + 6 e^- = Cl^-(aq) + 3 H2O(l)", "NaClO3"),
  reagent("oxidant", "chlorine", "Cl2(g) + 2 e^- = 2 Cl^-(aq)", "Cl2"),
  reagent("oxidant", "hypochlorite", "ClO^-(aq) + 2 H^+(aq) + 2 e^- = Cl^-(aq) + H2O(l)", "NaClO"),
  reagent("oxidant", "permanganate", "MnO4^-(aq) + 8 H^+(aq) + 5 e^- = Mn^2+(aq) + 4 H2O(l)", "KMnO4", MANGANESE_IN_BASE),
  reagent("oxidant", "ozone", "O3(g) + 2 H^+(aq) + 2 e^- = O2(g) + H2O(l)", "O3"),
  reagent("oxidant", "persulfate", "S2O8^2-(aq) + 2 e^- = 2 SO4^2-(aq)", "Na2S2O8"),
  reagent("oxidant", "dichromate", "Cr2O7^2-(aq) + 14 H^+(aq) + 6 e^- = 2 Cr^3+(aq) + 7 H2O(l)", "Na2Cr2O7"),
  reagent("oxidant", "nitrate", "NO3^-(aq) + 4 H^+(aq) + 3 e^- = NO(g) + 2 H2O(l)", "HNO3"),
  reagent("oxidant", "cupric-chloride", "Cu^2+(aq) + 2 Cl^-(aq) + e^- = CuCl2^-(aq)", "Cu^2+"),
  reagent("oxidant", "acid", "H^+(aq) + e^- = 0.5 H2(g)", null),
  reagent("reductant", "sulfite", "H2SO3(aq) + H2O(l) = SO4^2-(aq) + 4 H^+(aq) + 2 e^-", "SO2"),
  reagent("reductant", "ferrous", "Fe^2+(aq) = Fe^3+(aq) + e^-", "Fe^2+"),
  reagent("reductant", "sulfide", "HS^-(aq) = S(s,rhombic) + H^+(aq) + 2 e^-", "NaHS"),
  reagent("reductant", "peroxide-reductant", "H2O2(aq) = O2(g) + 2 H^+(aq) + 2 e^-", "H2O2"),
  metal("zinc-dust", "Zn", 2),
  metal("iron-scrap", "Fe", 2),
  metal("aluminium", "Al", 3),
  metal("magnesium", "Mg", 2),
  metal("cadmium", "Cd", 2),
  metal("nickel", "Ni", 2),
  metal("copper", "Cu", 2),
]; // prettier-ignore

export const redoxReagentById: ReadonlyMap<string, RedoxReagent> = new Map(redoxReagents.map((r) => [r.id, r]));
