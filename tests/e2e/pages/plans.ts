import type { Locator, Page } from "playwright-core";

/** The plans of one project, and beside them the one in hand. */
export class PlansScreen {
  constructor(private readonly page: Page) {}

  /** The row of a plan, by the whole name of it. */
  row(name: string): Locator {
    return this.page.getByRole("row").filter({ has: this.page.getByRole("link", { name, exact: true }) });
  }

  detail(name: string): Locator {
    return this.page.getByRole("complementary", { name: `Plan ${name}`, exact: true });
  }

  /** Takes a plan in hand and opens it on the table. */
  async open(name: string): Promise<void> {
    await this.row(name).click();
    await this.detail(name).getByRole("link", { name: "Open" }).click();
  }

  async duplicate(name: string, copy: string): Promise<void> {
    await this.row(name).click();
    await this.detail(name).getByRole("button", { name: "Duplicate" }).click();
    const dialog = this.page.getByRole("dialog");
    await dialog.getByLabel("Name of the copy").fill(copy);
    await dialog.getByRole("button", { name: "Duplicate" }).click();
    await this.detail(copy).waitFor();
  }

  async show(which: "Current" | "Archived"): Promise<void> {
    await this.page.getByRole("radio", { name: which }).click();
  }

  /** Words of every button that would write. */
  async writeControls(): Promise<string[]> {
    const buttons = await this.page.locator("main").getByRole("button").allInnerTexts();
    return buttons.filter((text) => /^(new|duplicate|rename|archive|take back)/i.test(text));
  }
}
