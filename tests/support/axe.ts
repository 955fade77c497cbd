import { AxeBuilder } from "@axe-core/playwright";
import type { Page } from "playwright-core";

interface Look {
  /** a part of the page that is all there is to use: an open dialog or menu; else the whole page */
  within?: string;
  /** these rules alone */
  rules?: string[];
}

/** Every fault that axe calls serious or critical, with the element; nothing on the page is left out. */
export async function graveFaults(page: Page, { within, rules }: Look = {}): Promise<string[]> {
  // A page without frames needs no second page to put results together.
  const axe = new AxeBuilder({ page }).setLegacyMode();
  if (within !== undefined) axe.include(within);
  // Only faults are described in full.
  axe.options({
    resultTypes: ["violations"],
    ...(rules && { runOnly: { type: "rule" as const, values: rules } }),
  });
  const { violations } = await axe.analyze();
  const grave = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
  return grave.flatMap(({ id, nodes }) => nodes.map((node) => `${id}: ${node.html}`));
}
