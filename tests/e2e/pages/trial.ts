import type { Locator, Page } from "playwright-core";
import type { TrialRow } from "../../../shared/schemas/trial";
import { shownNumber } from "./shownNumber";

/** The sheet a trial is laid out on, its record, and its accounts. */
export class TrialScreen {
  constructor(readonly page: Page) {}

  readonly button = (name: string): Locator => this.page.getByRole("button", { name, exact: true });
  readonly tab = (name: "Record" | "Accounts"): Locator => this.page.getByRole("tab", { name });

  /** A field of one part of the record: "charge", "Dry mass". */
  readonly field = (part: string, label: string): Locator =>
    this.page.locator(`#${part}`).getByRole("textbox", { name: label, exact: true });
  /** A cell of a ledger: "Final liquor, Zn". */
  readonly cell = (name: string): Locator => this.page.getByRole("textbox", { name, exact: true });

  async chooseUnit(label: string, unit: string): Promise<void> {
    await this.page
      .getByRole("combobox", { name: `Unit of ${label}`, exact: true })
      .first()
      .click();
    await this.page.getByRole("option", { name: unit, exact: true }).click();
  }

  async save(): Promise<void> {
    await this.page.keyboard.press("Control+s");
    await this.page.getByText(/^saved /).waitFor();
  }

  /** The record as the server has it. */
  async stored(): Promise<TrialRow> {
    const id = /trials\/([^?#]+)/.exec(this.page.url())?.[1] ?? "";
    return this.page.evaluate(async (id) => (await (await fetch(`/api/trials/${id}`)).json()) as TrialRow, id);
  }

  /** Every basis with its figure, in the order shown. */
  async bases(word: "extraction" | "recovery"): Promise<{ name: string; value: number; working: string }[]> {
    const rows = this.page.getByRole("table", { name: `${word} on every basis` }).locator("tbody tr");
    const cells = await rows.evaluateAll((all) => all.map((tr) => [...tr.children].map((td) => td.textContent ?? "")));
    return cells
      .filter(([, value]) => value !== "open")
      .map(([name = "", value = "", , working = ""]) => ({ name, value: shownNumber(value), working }));
  }
}
