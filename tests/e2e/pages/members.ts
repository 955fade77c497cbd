import type { Locator, Page } from "playwright-core";
import type { MemberRole } from "../../../shared/schemas/member";

/** Members and invitations, and the letters that carry links. */
export class MembersScreen {
  constructor(readonly page: Page) {}

  readonly button = (name: string): Locator => this.page.getByRole("button", { name, exact: true });
  readonly row = (text: string): Locator => this.page.getByRole("row").filter({ hasText: text });
  readonly detail = (name: string): Locator =>
    this.page.getByRole("complementary", { name: `Member ${name}`, exact: true });

  async invite(email: string, role: MemberRole): Promise<void> {
    await this.button("Invite a member").click();
    const dialog = this.page.getByRole("dialog");
    await dialog.getByLabel("E-mail").fill(email);
    await dialog.getByRole("combobox", { name: "Role" }).click();
    await this.page.getByRole("option", { name: role }).click();
    await dialog.getByRole("button", { name: "Send the letter" }).click();
    await this.page.getByRole("dialog", { name: "Invited" }).waitFor();
  }

  /** The path that the letter's link opens. */
  async linkInLetter(to: string): Promise<string> {
    await this.page.getByRole("button", { name: new RegExp(`^${to}`) }).click();
    const href = await this.page
      .getByRole("article", { name: "Letter" })
      .getByRole("link", { name: /invitation/ })
      .getAttribute("href");
    return new URL(href ?? "").pathname;
  }
}
