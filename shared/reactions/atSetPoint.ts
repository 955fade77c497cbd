import { ok, type Outcome } from "../outcome";
import type { Problem } from "../schemas/problem";
import { SULFIDE_SULFUR } from "../selection/components";
import type { ChemicalData } from "../species/chemicalData";
import { unknownSpecies } from "./names";
import { overallOf, type OverallQuestion, type OverallReaction } from "./overall";
import { isLigand, namedProducts, partsOf } from "./products";
import { redoxReagentById } from "./redoxReagents";
import { standingAt, type Standing } from "./standing";

export interface SetPointQuestion extends Partial<Pick<OverallQuestion, "redox" | "acid" | "base" | "metal">> {
  /** species id: feed mineral, metal, or ion of the liquor */
  readonly from: string;
  readonly at: { readonly pH: number; readonly Eh: number };
  /** products chosen by hand, component -> id, in place of what rules at the set point: `{ "S(sulfide)": "SO4^2-(aq)" }`; the cementing
   *  metal's element among them */
  readonly products?: Readonly<Record<string, string>>;
}

export interface OverallAtSetPoint extends OverallReaction {
  /** what each part of the start becomes, and a cementing metal's element, by component */
  readonly products: ReadonlyMap<string, string>;
  readonly assumed: Standing["assumed"];
}

/** A product chosen by hand may take sulfide sulfur to sulfate where the plan would not. */
const takesSulfideUp = (data: ChemicalData, products: ReadonlyMap<string, string>): boolean =>
  partsOf(data.species.get(products.get(SULFIDE_SULFUR) ?? ""), false).includes("S");

/** The overall reaction of a feed mineral, metal or ion of the liquor at a set point: every part becomes the species that rules there, with
 *  the liquor's own ligands; a cementing metal becomes what its element is there.
 *  @param problem  a plan's question     @param data  the library
 *  @param asked  start and set point, and what the user chooses: redox reagent, acid (by the lixiviant unless named), base, metal, products
 *  @returns  as `overallOf`, with the products found and the activities assumed for what the plan does not name; INVALID_INPUT for a
 *    product that cannot be one (`products.ts`)
 *  @source  docs/method.md, section 8. While sulfate is not reduced a sulfide's sulfur stops at sulfur or H2S, above 150 C at sulfate */
export function overallReaction(
  problem: Problem,
  data: ChemicalData,
  asked: SetPointQuestion,
): Outcome<OverallAtSetPoint> {
  const from = data.species.get(asked.from);
  if (from === undefined) return unknownSpecies(data, asked.from, "from");
  const redox = asked.redox === undefined ? undefined : redoxReagentById.get(asked.redox);
  const cementing = redox?.role === "cementing metal" ? redox.sold?.formula : undefined;
  // Which sulfur a mineral holds depends on whether the two mix, which the first look at the point decides.
  const bare = standingAt(problem, data, asked.at);
  if (!bare.ok) return bare;
  const { sulfateReduction } = bare.value;
  const parts = partsOf(from, sulfateReduction);
  const chosen = namedProducts(data, from, asked.products ?? {}, { parts, cementing, sulfateReduction });
  if (!chosen.ok) return chosen;
  const { named, brings } = chosen.value;
  const wanted = [...parts, ...(cementing === undefined ? [] : [cementing])].filter((c) => !named.has(c));
  const standing = standingAt(problem, data, asked.at, [...wanted, ...brings]);
  if (!standing.ok) return standing;
  const { species, assumed } = standing.value;
  const products = new Map<string, string>();
  for (const component of parts) {
    const id = named.get(component) ?? species.get(component);
    if (id !== undefined) products.set(component, id);
  }
  const redoxMade = cementing === undefined ? undefined : (named.get(cementing) ?? species.get(cementing));
  const oneSulfur = sulfateReduction || takesSulfideUp(data, products);
  // Ligands that the products (or the cementing metal's) take up come as the liquor holds them.
  const made = [...products.values(), ...(redoxMade === undefined ? [] : [redoxMade])];
  const taken = new Set(made.flatMap((id) => partsOf(data.species.get(id), sulfateReduction)));
  const ligands = new Map(
    [...species].filter(
      ([c]) => taken.has(c) && !products.has(c) && isLigand(data, c) && !(c === "S" && oneSulfur && products.has(SULFIDE_SULFUR)),
    ),
  ); // prettier-ignore
  const { redox: redoxId, metal, base, acid = species.has("S") || !species.has("Cl") ? "H2SO4" : "HCl" } = asked;
  const overall = overallOf(data, {
    ...{ from: from.id, products: [...products.values()], ligands, acid, sulfateReduction: oneSulfur },
    ...(redoxId === undefined ? {} : { redox: redoxId }),
    ...(redoxMade === undefined ? {} : { redoxMade }),
    ...(base === undefined ? {} : { base }),
    ...(metal === undefined ? {} : { metal }),
    temperatureC: problem.temperatureC,
    pH: asked.at.pH,
  });
  if (!overall.ok) return overall;
  if (cementing !== undefined && redoxMade !== undefined) products.set(cementing, redoxMade);
  return ok({ ...overall.value, products, assumed });
}
