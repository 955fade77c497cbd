import { fail, ok, type Outcome } from "../outcome";
import { sulfurComponent } from "../selection/components";
import type { ChemicalData, Species } from "../species/chemicalData";
import { unknownSpecies } from "./names";
import { nullSpace, wholeRatio } from "./nullSpace";

/** Coefficients by species id, products positive, smallest whole numbers; `e^-` among them. */
export type Coefficients = ReadonlyMap<string, number>;

type Column = readonly [what: string, n: number][];

/** What one species holds. While sulfate is not reduced, sulfate sulfur and other sulfur are two components. */
function columnOf(species: Species, oneSulfur: boolean): Column {
  const held = Object.entries(species.composition).map(([component, n]): [string, number] => [
    component === "S" ? sulfurComponent(species, oneSulfur) : component,
    n,
  ]);
  return [...held, ["charge", species.charge]];
}

/** What a component stands in, apart from H and O, where it must stand in two to be carried over. */
function lonely(columns: readonly Column[]): string[] {
  const times = new Map<string, number>();
  for (const column of columns) for (const [what] of column) times.set(what, (times.get(what) ?? 0) + 1);
  return [...times].filter(([what, n]) => n === 1 && what !== "charge").map(([what]) => what);
}

/** One species turned into others with H2O, H^+ and e^-, balanced by the null space of the composition matrix.
 *  @param data  the library     @param from  species id, used up
 *  @param partners  ids that may hold its components: products, and what the ligands of the products come from; one a component
 *  @param oneSulfur  true where sulfate and sulfide sulfur turn into each other
 *  @returns  smallest whole coefficients, `from` negative, zeros left out. UNKNOWN_SPECIES; LIGAND_MISSING naming the component that no
 *    partner carries; INVALID_INPUT where the partners leave more than one way
 *  @source  null space of components and charge over species (Smith and Missen, Chemical Reaction Equilibrium Analysis, 1982)
 *  @example valueOf(halfReaction(chemistry(), "CuFeS2(s)", ["Cu^2+(aq)", "Fe^2+(aq)", "S(s,rhombic)"], false)).get("e^-") // => 4 */
export function halfReaction(
  data: ChemicalData,
  from: string,
  partners: readonly string[],
  oneSulfur: boolean,
): Outcome<Coefficients> {
  const ids = [...new Set([from, ...partners, "H2O(l)", "H^+(aq)"])];
  const columns: Column[] = [];
  for (const id of ids) {
    const species = data.species.get(id);
    if (species === undefined) return unknownSpecies(data, id, "reaction");
    columns.push(columnOf(species, oneSulfur));
  }
  ids.push("e^-");
  columns.push([["charge", -1]]);
  const names = [...new Set(columns.flatMap((c) => c.map(([what]) => what)))];
  const rows = names.map((name) => columns.map((c) => c.find(([what]) => what === name)?.[1] ?? 0));
  const { dimension, vector } = nullSpace(rows);
  const uncarried = lonely(columns).join(", ");
  if (dimension > 1)
    return fail("INVALID_INPUT", "products", `${from}: more than one way to write it with ${partners.join(", ")}`);
  if (vector === null || Math.abs(vector[0] ?? 0) < 1e-9)
    return fail("LIGAND_MISSING", "products", `${from}: nothing carries ${uncarried || "its parts"} over`);
  const whole = wholeRatio(vector);
  const sign = (whole[0] ?? 0) > 0 ? -1 : 1;
  // The decomposition works in rounded numbers; the whole ones must close exactly.
  for (const row of rows)
    if (Math.abs(row.reduce((sum, n, i) => sum + n * (whole[i] ?? 0), 0)) > 1e-9)
      return fail("BAD_DATA", "reaction", `${from} with ${partners.join(", ")} does not close in whole numbers`);
  return ok(new Map(ids.flatMap((id, i) => (whole[i] === 0 ? [] : [[id, sign * (whole[i] ?? 0)] as const]))));
}

const gcd = (a: number, b: number): number => (b === 0 ? Math.abs(a) : gcd(b, a % b));

/** Two half-reactions added so that their electrons cancel.
 *  @param one, other  one gives electrons up, the other takes them     @returns  smallest whole coefficients without `e^-`
 *  @throws RangeError where both give, or both take     @source  electron balance */
export function joined(one: Coefficients, other: Coefficients): Coefficients {
  const [a, b] = [one.get("e^-") ?? 0, other.get("e^-") ?? 0];
  if (a * b >= 0) throw new RangeError("two half-reactions join where one gives electrons and the other takes them");
  const sum = new Map<string, number>();
  for (const [half, factor] of [
    [one, Math.abs(b)],
    [other, Math.abs(a)],
  ] as const)
    for (const [id, n] of half) sum.set(id, (sum.get(id) ?? 0) + n * factor);
  const kept = [...sum].filter(([, n]) => n !== 0);
  const divisor = kept.reduce((d, [, n]) => gcd(d, n), 0);
  return new Map(kept.map(([id, n]) => [id, n / divisor]));
}

/** The same reaction written for a basic liquor: each H^+ is H2O less OH^-.
 *  @param reaction  with H^+     @returns  with OH^-     @source  H2O = H^+ + OH^- */
export function withHydroxide(reaction: Coefficients): Coefficients {
  const protons = reaction.get("H^+(aq)") ?? 0;
  const water = (reaction.get("H2O(l)") ?? 0) + protons;
  const others = [...reaction].filter(([id]) => id !== "H^+(aq)" && id !== "H2O(l)");
  const hydroxide = (reaction.get("OH^-(aq)") ?? 0) - protons;
  const added = [["H2O(l)", water], ["OH^-(aq)", hydroxide]] as const; // prettier-ignore
  return new Map([...others.filter(([id]) => id !== "OH^-(aq)"), ...added.filter(([, n]) => n !== 0)]);
}
