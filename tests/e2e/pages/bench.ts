import type { Locator, Page } from "playwright-core";

/** A trial at the bench: one question at a time, in big digits. */
export class BenchScreen {
  constructor(readonly page: Page) {}

  readonly button = (name: string): Locator => this.page.getByRole("button", { name, exact: true });
  readonly field = (label: string): Locator => this.page.getByRole("textbox", { name: new RegExp(`^${label}`) });
  readonly log = (): Locator => this.page.getByRole("table", { name: "Kept so far, newest first" });

  /** From the list of what is in hand. */
  async open(code: string): Promise<void> {
    await this.page.getByRole("link", { name: new RegExp(`^${code}\\b`) }).click();
    await this.page.getByRole("heading", { name: new RegExp(`^${code}`) }).waitFor();
  }

  /** A number with the keys on the screen, as a glove does. */
  async press(label: string, digits: string): Promise<void> {
    await this.field(label).click();
    for (const key of digits) await this.button({ ".": "point", "-": "minus" }[key] ?? key).click();
  }

  async chooseElectrode(name: string): Promise<void> {
    await this.page.getByRole("button", { name: /electrode$/ }).click();
    await this.page.getByRole("dialog").getByRole("button", { name, exact: true }).click();
  }

  /** The lines kept so far, newest first: "0 min 5.10 0.707 60". */
  async lines(): Promise<string[]> {
    const texts = await this.log().locator("tbody tr").allInnerTexts();
    return texts.map((text) => text.replace(/\s+/g, " ").trim());
  }
}
