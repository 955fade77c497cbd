/** Whether a formula's sulfur is sulfate sulfur: it holds SO4, HSO4 or S2O8.
 *  @param formula  of a species with S     @returns  true for sulfate sulfur     @source  docs/method.md, section 3 */
export const isSulfate = (formula: string): boolean => /SO4|S2O8/.test(formula);
