import { GAS_CONSTANT, LN10, T_REFERENCE } from "../constants";
import type { ChemicalData, Species } from "../species/chemicalData";
import { parseFormula } from "../species/formula";
import { absoluteEntropy, type IonClass } from "./correspondence";
import { anchors } from "./equilibria";
import { heldFormation } from "./heldFormation";
import { koppHeatCapacity, type HeatCapacity } from "./heatCapacity";

interface Common {
  readonly id: string;
  readonly formula: string;
  /** J/mol at 298.15 K */
  readonly G298: number;
  /** in a few words, for the screen */
  readonly label: string;
  /** C */
  readonly trusted: readonly [number, number];
}
type Partners = readonly (readonly [id: string, n: number])[];

/** How one species goes to T; everything that does not depend on T is worked out. */
export type Model =
  | (Common & { readonly kind: "zero" })
  | (Common & { readonly kind: "heatCapacity"; readonly S: number; readonly cp: HeatCapacity })
  | (Common & { readonly kind: "correspondence"; readonly ionClass: IonClass; readonly S: number; readonly z: number })
  | (Common & { readonly kind: "anchor"; readonly partners: Partners; readonly sign: 1 | -1; readonly pK: (T: number) => number; readonly shift: number }) // prettier-ignore
  | (Common & { readonly kind: "held"; readonly partners: Partners; readonly hold: "logK" | "dG" | "none"; readonly dG298: number }); // prettier-ignore

const trustedTo = { end: 250, ion: 200, solid: 200, kopp: 150, neutral: 150, complex: 100, held: 100 };
const constant = (a: number): HeatCapacity => ({ a, b: 0, c: 0, Tmax: Infinity });
const standardG = (species: Species): number => species.row.dGf_kJ * 1000;

/** A model with a number of its own within the library, from 0 in the order first asked for. */
interface Placed {
  readonly place: number;
  readonly model: Model;
}

const cache = new WeakMap<ChemicalData, Map<string, Placed>>();

/** The temperature model of a species, worked out once for a library.
 *  @param data  the library     @param id  of a species in it     @returns  the model
 *  @throws Error where the id is unknown     @source  docs/method.md, section 1 */
export const modelOf = (data: ChemicalData, id: string): Model => modelsOf(data)(id).model;

/** `modelOf` of one library, for many species in a row.
 *  @param data  the library     @returns  id -> model with its place; throws as `modelOf`     @source  as `modelOf` */
export function modelsOf(data: ChemicalData): (id: string) => Placed {
  const models = cache.get(data) ?? new Map<string, Placed>();
  cache.set(data, models);
  return (id) => {
    const before = models.get(id);
    if (before !== undefined) return before;
    const model = build(data, id); // asks for its partners first
    const placed = { place: models.size, model };
    models.set(id, placed);
    return placed;
  };
}

function known(data: ChemicalData, id: string): Species {
  const species = data.species.get(id);
  if (species === undefined) throw new Error(`no species ${id} in the library`);
  return species;
}

/** A dissolved species of more than one part: two components beside H and O, or hydroxide on a metal. */
const isComplex = ({ composition, formula }: Species): boolean => {
  const parts = Object.keys(composition).filter((c) => c !== "H" && c !== "O").length;
  return parts > 1 || (parts === 1 && formula.includes("OH"));
};

function build(data: ChemicalData, id: string): Model {
  const species = known(data, id);
  const { row, phase, charge, formula } = species;
  const G298 = standardG(species);
  if (id === "H^+(aq)")
    return { kind: "zero", id, formula, G298: 0, label: "zero by convention at every T", trusted: [0, trustedTo.end] };
  if (anchors.has(id)) return anchored(data, species);
  if (row.S_J === null) return held(data, species);
  if (phase !== "aq") return ofHeatCapacity(species, row.S_J);
  if (charge !== 0 && row.ion_class !== null) {
    const S = absoluteEntropy(row.S_J, charge);
    const to = isComplex(species) ? trustedTo.complex : trustedTo.ion;
    const label = `entropy correspondence, ${row.ion_class.replace("_", " ")}`;
    return {
      kind: "correspondence",
      id,
      formula,
      G298,
      label,
      trusted: [0, to],
      ionClass: row.ion_class,
      S,
      z: charge,
    };
  }
  const to = isComplex(species) || row.Cp_J === null ? trustedTo.complex : trustedTo.neutral;
  const label =
    row.Cp_J === null ? "entropy held, neutral dissolved species" : "constant Cp, neutral dissolved species";
  return { kind: "heatCapacity", id, formula, G298, label, trusted: [0, to], S: row.S_J, cp: constant(row.Cp_J ?? 0) };
}

function ofHeatCapacity(species: Species, S: number): Model {
  const { row, id, formula, phase } = species;
  const common = { kind: "heatCapacity", id, formula, G298: standardG(species), S } as const;
  if (row.Cp_a !== null) {
    const Tmax = row.Cp_Tmax_K ?? Infinity;
    const to = Math.min(trustedTo.end, Tmax === Infinity ? trustedTo.solid : Math.round(Tmax - 273.15));
    return {
      ...common,
      label: "Cp polynomial",
      trusted: [0, to],
      cp: { a: row.Cp_a, b: row.Cp_b ?? 0, c: row.Cp_c ?? 0, Tmax },
    };
  }
  if (row.Cp_J !== null)
    return { ...common, label: "constant Cp", trusted: [0, trustedTo.solid], cp: constant(row.Cp_J) };
  if (phase === "g") return { ...common, label: "entropy held, gas", trusted: [0, trustedTo.held], cp: constant(0) };
  const atoms = parseFormula(formula);
  const cp = constant(atoms.ok ? koppHeatCapacity(atoms.value.atoms) : 0);
  return { ...common, label: "Cp estimated by Kopp's rule", trusted: [0, trustedTo.kopp], cp };
}

function within(data: ChemicalData, partners: Partners, lo: number, hi: number): readonly [number, number] {
  for (const [id] of partners) {
    const { trusted } = modelOf(data, id);
    lo = Math.max(lo, trusted[0]);
    hi = Math.min(hi, trusted[1]);
  }
  return [lo, hi];
}

const sumAt298 = (data: ChemicalData, partners: Partners): number =>
  partners.reduce((sum, [id, n]) => sum + n * standardG(known(data, id)), 0);

function anchored(data: ChemicalData, species: Species): Model {
  const anchor = anchors.get(species.id);
  if (anchor === undefined) throw new Error(`no anchor for ${species.id}`);
  const { partners, sign, pK, model: label } = anchor;
  const G298 = standardG(species);
  const ownPK = (sign * (G298 - sumAt298(data, partners))) / (LN10 * GAS_CONSTANT * T_REFERENCE);
  const trusted = within(data, partners, ...anchor.trusted);
  return {
    kind: "anchor",
    id: species.id,
    formula: species.formula,
    G298,
    label,
    trusted,
    partners,
    sign,
    pK,
    shift: ownPK - pK(T_REFERENCE),
  };
}

function held(data: ChemicalData, species: Species): Model {
  const { id, formula } = species;
  const G298 = standardG(species);
  const rule = data.extrapolation.get(id);
  if (rule === undefined || rule.reaction === null) {
    const partners = heldFormation(data, species);
    const label = "no temperature data: dG of formation held";
    return {
      kind: "held",
      id,
      formula,
      G298,
      label,
      trusted: [20, 30],
      partners,
      hold: "none",
      dG298: G298 - sumAt298(data, partners),
    };
  }
  const partners = [...rule.reaction.terms]
    .filter(([p]) => p !== id && p !== "H^+(aq)")
    .map(([p, n]) => [p, -n] as const);
  const label = rule.hold === "logK" ? "log K of its reaction held" : "dG of its reaction held";
  const trusted = within(data, partners, 0, trustedTo.held);
  return {
    kind: "held",
    id,
    formula,
    G298,
    label,
    trusted,
    partners,
    hold: rule.hold,
    dG298: G298 - sumAt298(data, partners),
  };
}
