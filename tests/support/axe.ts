import { AxeBuilder } from "@axe-core/playwright";
import type { Page } from "playwright-core";

interface Look {
  /** a part of the page that is all there is to use, an open dialog or menu, or all that is new; else the whole page */
  within?: string;
  /** these rules alone */
  rules?: string[];
}

interface Found {
  violations: { id: string; impact?: string | null; nodes: { html: string }[] }[];
}
interface WithAxe {
  axe?: { run: (where: unknown, options: object) => Promise<Found> };
}

/** Every fault that axe calls serious or critical, with the element; nothing on the page is left out. */
export async function graveFaults(page: Page, { within, rules }: Look = {}): Promise<string[]> {
  // The builder brings axe into the page anew each time, which takes longer than the look: it does so once.
  if (!(await page.evaluate(() => "axe" in window)))
    await new AxeBuilder({ page }).setLegacyMode().withRules("document-title").analyze();
  const { violations } = await page.evaluate(
    ([where, options]) => (window as WithAxe).axe!.run(where ?? document, options),
    [
      within ?? null,
      {
        resultTypes: ["violations"],
        preload: false, // only rules about style sheets need it, and none of those is grave
        ...(rules && { runOnly: { type: "rule", values: rules } }),
      },
    ] as const,
  );
  const grave = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
  return grave.flatMap(({ id, nodes }) => nodes.map((node) => `${id}: ${node.html}`));
}
