import { fail, ok, type Outcome } from "../outcome";
import type { ChemicalData } from "../species/chemicalData";
import { asTyped, findSpecies } from "./names";

/** Equals sign or any of the usual arrows. */
const arrow = /\s*(?:=|⇌|→|⟶|<?-{1,2}>|<?=>)\s*/;
/** A plus joins terms unless it is a charge: right behind a caret and its number. */
const joint = /(?<!\^\d*)\+/;
const coefficient = /^(\d+(?:\.\d+)?(?:\/\d+)?|\.\d+)\s*/;

export interface ReadReaction {
  /** species id -> coefficient, products positive; the shape `reactionAtT` takes */
  readonly species: Record<string, number>;
  /** formulas whose phase was chosen: "O2 read as O2(g)" */
  readonly assumed: readonly string[];
}

function number(text: string): number {
  const [top, bottom] = text.split("/");
  return Number(top) / Number(bottom ?? 1);
}

/** Reads a typed reaction: `Cu^2+ + 2 e^- = Cu`, `CuO(s)+2H^+=Cu^2++H2O`, `4 Au + 8 CN^- + O2 + 2 H2O → 4 Au(CN)2^- + 4 OH^-`. Terms are ids,
 *  formulas or mineral names, with whole, decimal or broken coefficients. A species on both sides is netted. Balance is not looked at.
 *  @param data  the library     @param text  the reaction     @param path  where it stands, for the failure
 *  @returns  coefficients by id; INVALID_INPUT for what cannot be read, else as `findSpecies`
 *  @source  IUPAC Green Book 2007, 2.10.1 (equations)
 *  @example valueOf(readReaction(chemistry(), "Cu^2++2e^-=Cu")).species["e^-"] // => -2 */
export function readReaction(data: ChemicalData, text: string, path = "reaction"): Outcome<ReadReaction> {
  const sides = text.split(arrow);
  if (sides.length !== 2)
    return fail("INVALID_INPUT", path, `"${text}": a reaction has two sides joined by one "=" or arrow`);
  const terms = new Map<string, number>();
  const assumed = new Set<string>();
  for (const [side, sign] of [
    [sides[0] ?? "", -1],
    [sides[1] ?? "", 1],
  ] as const) {
    const pieces = asTyped(side)
      .split(joint)
      .map((piece) => piece.trim());
    if (pieces.includes(""))
      return fail("INVALID_INPUT", path, `"${text}": a term is missing beside a "+"; a charge is written Cu^2+`);
    for (const term of pieces) {
      const size = coefficient.exec(term);
      const name = size === null ? term : term.slice(size[0].length);
      const found = findSpecies(data, name, path);
      if (!found.ok) return found;
      const { id, chosen } = found.value;
      if (chosen) assumed.add(`${name} read as ${id}`);
      terms.set(id, (terms.get(id) ?? 0) + sign * number(size?.[1] ?? "1"));
    }
  }
  const left = [...terms].filter(([, n]) => n !== 0);
  if (left.length === 0) return fail("INVALID_INPUT", path, `"${text}": both sides are the same`);
  return ok({ species: Object.fromEntries(left), assumed: [...assumed] });
}
