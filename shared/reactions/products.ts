import { fail, ok, type Outcome } from "../outcome";
import { componentKind, SULFIDE_SULFUR, sulfurComponent } from "../selection/components";
import type { ChemicalData, Species } from "../species/chemicalData";
import { unknownSpecies } from "./names";

/** Components of a species apart from H and O, sulfur by the pool it belongs to.
 *  @param species  any; undefined has none     @param sulfateReduction  the two sulfurs are one
 *  @returns  components in the order of the formula */
export const partsOf = (species: Species | undefined, sulfateReduction: boolean): string[] =>
  Object.keys(species?.composition ?? {})
    .filter((c) => c !== "H" && c !== "O")
    .map((c) => (c === "S" && species ? sulfurComponent(species, sulfateReduction) : c));

/** Whether the liquor brings a component along: a ligand or a partner such as K, no metal.
 *  @param data  the library     @param component  as in components.csv */
export const isLigand = (data: ChemicalData, component: string): boolean => {
  const kind = componentKind(data, component);
  return kind === "ligand" || kind === "partner";
};

/** Element or group behind a component: sulfide sulfur is sulfur. */
const elementOf = (component: string): string => (component === SULFIDE_SULFUR ? "S" : component);

interface Start {
  readonly parts: readonly string[];
  /** element of the cementing metal, where one closes the electrons */
  readonly cementing: string | undefined;
  readonly sulfateReduction: boolean;
}

/** Why a species cannot be what a component of the start becomes; null where it can. */
function refused(data: ChemicalData, from: Species, component: string, product: Species, start: Start): string | null {
  if (product.id === from.id) return `${from.id} cannot be made of itself`;
  if (!(elementOf(component) in product.composition)) {
    return `${product.id} holds no ${elementOf(component)}, so the ${elementOf(component)} of ${from.id} cannot become it`;
  }
  const own = new Set([...start.parts.map(elementOf), elementOf(component)]);
  const alien = partsOf(product, true).find((c) => !own.has(c) && !isLigand(data, c));
  return alien === undefined ? null : `${product.id} holds ${alien}, which neither ${from.id} nor the liquor brings`;
}

/** Products chosen by hand, held against what they are to be made of.
 *  @param data  the library     @param from  start     @param products  component -> species id     @param start  its parts
 *  @returns  the choices and the ligands they bring along. INVALID_INPUT where the start has no such part, the species does not hold it,
 *    is the start itself, or holds a metal that nothing brings; UNKNOWN_SPECIES
 *  @source  conservation of the elements */
export function namedProducts(
  data: ChemicalData,
  from: Species,
  products: Readonly<Record<string, string>>,
  start: Start,
): Outcome<{ named: ReadonlyMap<string, string>; brings: readonly string[] }> {
  const named = new Map<string, string>();
  const brings = new Set<string>();
  for (const [component, id] of Object.entries(products)) {
    const path = `products.${component}`;
    // A choice for a cementing metal waits until that metal is chosen; any other part must be there.
    if (!start.parts.includes(component) && component !== start.cementing) {
      if (componentKind(data, component) === "metal") continue;
      return fail("INVALID_INPUT", path, `${from.id} holds no ${component} that could become ${id}`);
    }
    const product = data.species.get(id);
    if (product === undefined) return unknownSpecies(data, id, path);
    const why = refused(data, from, component, product, start);
    if (why !== null) return fail("INVALID_INPUT", path, why);
    named.set(component, id);
    for (const c of partsOf(product, start.sulfateReduction))
      if (isLigand(data, c) && !start.parts.includes(c)) brings.add(c);
  }
  return ok({ named, brings: [...brings] });
}

/** Species that a component of a start may be let become: all that hold it and no metal from elsewhere, solids first, then what is
 *  dissolved, then gases.
 *  @param data  the library     @param from  species id of the start     @param component  one of its parts, or a cementing metal
 *  @param sulfateReduction  the two sulfurs are one
 *  @returns  ids; none for an unknown start     @source  species tables
 *  @example productsFor(chemistry(), "CuFeS2(s)", "S(sulfide)", false).indexOf("S(s,rhombic)") // => 0 */
export function productsFor(data: ChemicalData, from: string, component: string, sulfateReduction: boolean): string[] {
  const species = data.species.get(from);
  if (species === undefined) return [];
  const start: Start = { parts: partsOf(species, sulfateReduction), cementing: component, sulfateReduction };
  // Sulfur that leaves a mineral leaves it alone: a sulfide of the same metals is another mineral, not a product of leaching.
  const alone = elementOf(component) === "S" || isLigand(data, component);
  const rank = { s: 0, l: 1, aq: 1, g: 2 };
  return [...data.species.values()]
    .filter(
      (s) =>
        refused(data, species, component, s, start) === null &&
        (!alone || partsOf(s, true).length === 1) &&
        !partsOf(s, true).some((c) => c !== elementOf(component) && start.parts.includes(c) && !isLigand(data, c)),
    )
    .sort((a, b) => rank[a.phase] - rank[b.phase])
    .map((s) => s.id);
}
