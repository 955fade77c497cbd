import { readFile } from "node:fs/promises";
import { parse } from "csv-parse/sync";
import type { Locator, Page } from "playwright-core";
import { savedPath } from "../../support/download";

/** The campaigns of a project, one of them, and two side by side. */
export class CampaignsScreen {
  constructor(readonly page: Page) {}

  readonly row = (code: string): Locator =>
    this.page.getByRole("row").filter({ has: this.page.getByRole("link", { name: code, exact: true }) });
  readonly detail = (code: string): Locator =>
    this.page.getByRole("complementary", { name: `Campaign ${code}`, exact: true });

  /** Takes one in hand and puts another beside it. */
  async compare(code: string, other: string): Promise<void> {
    await this.row(code).first().click();
    await this.detail(code).getByRole("combobox", { name: "Compare with another campaign" }).click();
    await this.page.getByRole("option", { name: other }).click();
    await this.page.getByRole("heading", { name: `${code} against ${other}` }).waitFor();
  }

  /** What a press of a button hands over as a file, read as a table. */
  async file(press: () => Promise<void>): Promise<{ name: string; rows: Record<string, string>[] }> {
    const [download] = await Promise.all([this.page.waitForEvent("download"), press()]);
    const text = await readFile(await savedPath(download), "utf8");
    return { name: download.suggestedFilename(), rows: parse(text, { bom: true, columns: true }) };
  }
}
