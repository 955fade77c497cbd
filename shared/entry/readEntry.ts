/** A typed number as the technician wrote it. The text is kept for ever; "" means not measured, never zero. */
export interface Entry {
  readonly text: string;
  readonly unit: string;
}

/** A number as it was typed, read but not changed: the text stays where it is. */
export type Reading =
  /** nothing measured: empty, or a laboratory's word for it. Never zero. */
  | { readonly kind: "blank" }
  | { readonly kind: "value"; readonly value: number }
  /** "<0.01": somewhere from zero to the limit */
  | { readonly kind: "less"; readonly limit: number }
  /** ">5": the limit or more */
  | { readonly kind: "more"; readonly limit: number }
  | { readonly kind: "bad"; readonly why: string };

/** What laboratories write where nothing was measured: not analysed, listed not received, insufficient sample. */
const NOT_MEASURED = new Set([
  "",
  "-",
  "\u2013",
  "\u2014",
  "na",
  "n.a.",
  "n.a",
  "n/a",
  "lnr",
  "is",
  "i.s.",
  "ns",
  "n.s.",
]);
const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d{1,2})?$/i;

const bad = (why: string): Reading => ({ kind: "bad", why });

/** Reads a typed number: decimal comma or point, true minus, a power of ten, "<" and ">" of a laboratory.
 *  Two such signs in one number are refused: one of them would be a thousands separator.
 *  @param text  as typed     @returns  blank, value, less, more, or why it cannot be read; unit and sign are not judged here
 *  @source  common practice, no source
 *  @example readEntry("1,52").value // => 1.52
 *  @example readEntry("<0.01").limit // => 0.01 */
export function readEntry(text: string): Reading {
  const shown = text.trim();
  if (NOT_MEASURED.has(shown.toLowerCase())) return { kind: "blank" };
  if (/^n\.?d\.?$/i.test(shown))
    return bad(
      `"${shown}" may mean not detected or not determined; write < and the detection limit, or leave it empty`,
    );
  const bare = shown.replace(/[\u2009\u202f\u00a0 ]/g, "").replace(/[\u2212\u2013]/g, "-");
  const [, sign = "", digits = ""] = /^([<>]?)(.*)$/.exec(bare) ?? [];
  if ((digits.match(/[.,]/g) ?? []).length > 1)
    return bad(`"${shown}" has more than one decimal sign; write it without thousands separators`);
  const plain = digits
    .replace(",", ".")
    .replace(/[\u00d7x*\u00b7]10\^/i, "e")
    .replace(/^10\^/, "1e");
  if (!NUMBER.test(plain)) return bad(`"${shown}" is not a number; write it like 0.05, 0,05, 5e-2 or <0.05`);
  const value = Number(plain);
  if (sign === "") return { kind: "value", value };
  if (value <= 0) return bad(`"${shown}": a limit must be above zero`);
  return sign === "<" ? { kind: "less", limit: value } : { kind: "more", limit: value };
}
