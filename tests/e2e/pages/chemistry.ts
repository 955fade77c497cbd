import type { Locator, Page } from "playwright-core";
import { shownNumber } from "./shownNumber";

/** The chemistry library: species by element, phase and words, and one of them in full. */
export class ChemistryScreen {
  constructor(readonly page: Page) {}

  async choose(element: string, phase: "dissolved" | "solid" | "liquid" | "gas"): Promise<void> {
    await this.page.getByRole("combobox", { name: "Element or ligand group" }).click();
    await this.page.getByRole("option", { name: element }).click();
    await this.page.getByRole("radio", { name: phase, exact: true }).click();
  }

  async find(words: string): Promise<void> {
    await this.page.getByRole("searchbox", { name: "Find a species" }).fill(words);
  }

  /** What stands in a column of every row in sight. */
  column(index: number): Promise<string[]> {
    return this.page.getByRole("grid").locator(`[role=gridcell]:nth-child(${index})`).allInnerTexts();
  }

  detail(id: string): Locator {
    return this.page.getByRole("complementary", { name: `Species ${id}`, exact: true });
  }

  /** The number beside the first such label of the species in full; the edits below name their fields alike. */
  async value(id: string, label: string | RegExp): Promise<number> {
    const row = this.detail(id).getByText(label).first().locator("xpath=..");
    return shownNumber(await row.innerText());
  }
}
