import type { Entry } from "../../../shared/entry/readEntry";

/** How one technician writes numbers. */
export interface Hand {
  readonly comma: boolean;
}

const written = (text: string, { comma }: Hand): string => (comma ? text.replace(".", ",") : text);

/** A reading to so many decimals, as the instrument shows it. */
export const reading = (value: number, decimals: number, unit: string, hand: Hand): Entry => ({
  text: written(value.toFixed(decimals), hand),
  unit,
});

/** A laboratory's answer: three figures, and "<" below what the method can see. */
export function labResult(value: number, unit: string, limit: number, hand: Hand): Entry {
  if (value < limit) return { text: written(`<${limit}`, hand), unit };
  const figures = 3;
  const decimals = Math.max(0, figures - 1 - Math.floor(Math.log10(value)));
  return { text: written(value.toFixed(decimals), hand), unit };
}

/** A tenor the way a laboratory reports it: mg/L below 1 g/L. */
export const tenor = (gPerL: number, limitMgPerL: number, hand: Hand): Entry =>
  gPerL < 1 ? labResult(gPerL * 1000, "mg/L", limitMgPerL, hand) : labResult(gPerL, "g/L", 0, hand);
