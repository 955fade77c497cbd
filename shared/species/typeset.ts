/** A piece of a formula as it is set: on the line, below or above it. */
export interface FormulaPart {
  readonly text: string;
  readonly kind: "plain" | "sub" | "sup";
}

const minus = "\u2212";
/** Letters and brackets; a hydrate point with its coefficient; a subscript, which ends before a hydrate point. */
const hydrate = "[.·](?:\\d+(?:\\.\\d+)?)?(?=H2O(?:$|[.·]))";
const piece = new RegExp(`(${hydrate})|(\\d+(?!${hydrate})\\.\\d+|\\d+)|([^\\d.·]+|[.·])`, "g");

/** How a formula is set: subscripts, the charge above with a true minus sign, hydrate water full size behind a middle dot.
 *  Any text is accepted, so that a field can be set while it is typed.
 *  @param formula  as typed, `Cu(NH3)4^2+`     @returns  the parts in order; joined they read the formula
 *  @source  IUPAC Red Book 2005, IR-4.2 to IR-4.4
 *  @example typeset("SO4^2-").length // => 3
 *  @example typeset("CuSO4.5H2O").filter((p) => p.kind === "sub").length // => 2 */
export function typeset(formula: string): FormulaPart[] {
  const parts: FormulaPart[] = [];
  const caret = formula.indexOf("^");
  const neutral = caret < 0 ? formula : formula.slice(0, caret);
  for (const [, water, subscript, other] of neutral.matchAll(piece)) {
    if (water !== undefined) parts.push({ text: `·${water.slice(1)}`, kind: "plain" });
    else if (subscript !== undefined) parts.push({ text: subscript, kind: "sub" });
    else if (other !== undefined) parts.push({ text: other, kind: "plain" });
  }
  if (caret >= 0) parts.push({ text: formula.slice(caret + 1).replace("-", minus), kind: "sup" });
  return parts;
}

/** A formula read aloud or put in a title: charge behind a space, true minus, middle dot, no markup.
 *  @param formula  as typed     @returns  `Cu(NH3)4 2+`
 *  @source  as `typeset`
 *  @example formulaPlain("Fe^3+").length // => 5 */
export function formulaPlain(formula: string): string {
  return typeset(formula)
    .map(({ text, kind }) => (kind === "sup" ? ` ${text}` : text))
    .join("");
}
