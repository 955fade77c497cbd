/** The last number in a text as screens show it: true minus, thin spaces before the unit. */
export function shownNumber(text: string): number {
  const found = [...text.replaceAll("\u2212", "-").matchAll(/(?<![\w.])-?\d+(?:\.\d+)?(?![\w.])/g)].at(-1);
  if (!found) throw new Error(`No number in “${text}”.`);
  return Number(found[0]);
}
