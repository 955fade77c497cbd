import { fail, ok, type Outcome } from "../outcome";
import { symbols } from "./symbols";

/** A formula taken apart: atoms by element symbol, charge in units of e. Brackets are multiplied out, hydrate water counted in. */
export interface ParsedFormula {
  readonly atoms: Readonly<Record<string, number>>;
  readonly charge: number;
}

/** What remains of a formula from a hydrate point on: `.5H2O`, `.0.5H2O`, a middle dot instead of the point. */
const hydrateTail = /^[.·](\d+(?:\.\d+)?)?(?=H2O(?:$|\^|[.·]))/;
const chargeTail = /^\^(\d*)([+-])$/;
const plainNumber = /^\d+/;
const decimalNumber = /^\d+\.\d+/;

class Mistake extends Error {
  constructor(
    readonly at: number,
    what: string,
  ) {
    super(what);
  }
}

class Reader {
  position = 0;
  readonly text: string;
  constructor(text: string) {
    this.text = text;
  }
  get rest(): string {
    return this.text.slice(this.position);
  }
  get character(): string {
    return this.text.charAt(this.position);
  }
  take(pattern: RegExp): string | undefined {
    const found = pattern.exec(this.rest)?.[0];
    if (found !== undefined) this.position += found.length;
    return found;
  }
}

/** A subscript. `4.5` is a fraction (Fe4.5Ni4.5S8) unless a hydrate starts at the point (CuSO4.5H2O). */
function subscript(reader: Reader): number {
  const whole = plainNumber.exec(reader.rest)?.[0];
  if (whole === undefined) return 1;
  const hydrateFollows = hydrateTail.test(reader.rest.slice(whole.length));
  const start = reader.position;
  const digits = (hydrateFollows ? undefined : reader.take(decimalNumber)) ?? reader.take(plainNumber);
  const value = Number(digits);
  if (value === 0) throw new Mistake(start, "a subscript of zero");
  return value;
}

function add(into: Map<string, number>, from: ReadonlyMap<string, number>, times: number): void {
  for (const [symbol, n] of from) into.set(symbol, (into.get(symbol) ?? 0) + n * times);
}

/** A run of elements and bracketed groups, up to a closing bracket, a hydrate point, a charge or the end. */
function run(reader: Reader, opened: number | null): Map<string, number> {
  const atoms = new Map<string, number>();
  const start = reader.position;
  for (;;) {
    if (reader.character === "(") {
      const at = reader.position;
      reader.position += 1;
      const inner = run(reader, at);
      add(atoms, inner, subscript(reader));
      continue;
    }
    if (reader.character === ")") {
      if (opened === null) throw new Mistake(reader.position, 'a ")" that closes nothing');
      if (atoms.size === 0) throw new Mistake(opened, "an empty bracket");
      reader.position += 1;
      return atoms;
    }
    const at = reader.position;
    const symbol = reader.take(/^[A-Z][a-z]?/);
    if (symbol === undefined) break;
    if (!symbols.has(symbol)) throw new Mistake(at, `"${symbol}" is no element`);
    add(atoms, new Map([[symbol, 1]]), subscript(reader));
  }
  if (opened !== null) throw new Mistake(opened, 'a "(" that is never closed');
  if (reader.position === start) {
    const found = reader.character;
    throw new Mistake(start, found === "" ? "an element is missing here" : `"${found}" where an element should stand`);
  }
  return atoms;
}

function parse(text: string): ParsedFormula {
  if (text === "e^-") return { atoms: {}, charge: -1 };
  const reader = new Reader(text);
  const atoms = run(reader, null);
  while (reader.character === "." || reader.character === "·") {
    const at = reader.position;
    const head = reader.take(hydrateTail);
    if (head === undefined) throw new Mistake(at, "a point that starts no hydrate: write .nH2O");
    const times = head.slice(1) === "" ? 1 : Number(head.slice(1));
    if (times === 0) throw new Mistake(at, "a hydrate of zero water");
    add(atoms, new Map([["H", 2], ["O", 1]]), times); // prettier-ignore
    reader.take(/^H2O/);
  }
  let charge = 0;
  if (reader.character === "^") {
    const at = reader.position;
    const [, digits, sign] = chargeTail.exec(reader.rest) ?? [];
    if (digits === undefined || sign === undefined)
      throw new Mistake(at, "a charge is written number before sign, as in ^2+ or ^-");
    if (digits === "0" || digits === "1")
      throw new Mistake(at + 1, `a charge of "${digits}${sign}": write ^${sign} or none`);
    charge = (digits === "" ? 1 : Number(digits)) * (sign === "+" ? 1 : -1);
    reader.position = text.length;
  }
  if (reader.position < text.length)
    throw new Mistake(reader.position, `"${reader.character}" where the formula should end or an element follow`);
  return { atoms: Object.fromEntries(atoms), charge };
}

/** Reads a formula as IUPAC prints it, typed with a caret: `Cu(NH3)4^2+`, `KFe3(SO4)2(OH)6`, `CuSO4.5H2O`, `Fe4.5Ni4.5S8`, `e^-`.
 *  A point is a hydrate point where only `nH2O` follows it, a decimal point anywhere else.
 *  @param text  the formula     @param path  where it stands, for the failure
 *  @returns  atoms per formula unit and the charge; BAD_FORMULA names the character (counted from 1) and what is wrong there
 *  @source  IUPAC Red Book 2005, IR-4.2 to IR-4.4 (formulas, charge number before sign, addition compounds)
 *  @example valueOf(parseFormula("Cu(NH3)4^2+")).atoms.H // => 12
 *  @example valueOf(parseFormula("CuSO4.5H2O")).atoms.O // => 9
 *  @example valueOf(parseFormula("Fe4.5Ni4.5S8")).atoms.Ni // => 4.5
 *  @example valueOf(parseFormula("Fe(CN)6^4-")).charge // => -4 */
export function parseFormula(text: string, path = "formula"): Outcome<ParsedFormula> {
  try {
    return ok(parse(text));
  } catch (error) {
    if (!(error instanceof Mistake)) throw error;
    return fail("BAD_FORMULA", path, `"${text}", character ${error.at + 1}: ${error.message}`);
  }
}
