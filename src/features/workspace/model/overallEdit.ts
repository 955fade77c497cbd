import type { OverallChoice, PlanInputs } from "../../../../shared/schemas/plan";
import type { Edit } from "./edit";

/** The plan with one start's choices in place; what chooses nothing is not kept. */
function withChoice(p: PlanInputs, from: string, { products, redox }: OverallChoice): PlanInputs {
  const { [from]: _old, ...others } = p.overall ?? {};
  const kept: OverallChoice = {
    ...(products && Object.keys(products).length > 0 ? { products } : {}),
    ...(redox === undefined ? {} : { redox }),
  };
  const overall = Object.keys(kept).length > 0 ? { ...others, [from]: kept } : others;
  const { overall: _all, ...rest } = p;
  return Object.keys(overall).length > 0 ? { ...rest, overall } : rest;
}

/** What one part of a mineral, metal or ion becomes; null: what rules at the set point. */
export const chooseProduct =
  (from: string, component: string, product: string | null): Edit =>
  (p) => {
    const old = p.overall?.[from] ?? {};
    const { [component]: _old, ...others } = old.products ?? {};
    return withChoice(p, from, { ...old, products: product === null ? others : { ...others, [component]: product } });
  };

/** What closes the electrons of one overall reaction. */
export const chooseRedox =
  (from: string, redox: string): Edit =>
  (p) =>
    withChoice(p, from, { ...p.overall?.[from], redox });
