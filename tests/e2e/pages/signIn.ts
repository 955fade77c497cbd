import type { Page } from "playwright-core";
import { demoAccounts, demoPassword } from "../../../server/demo/accounts";
import type { MemberRole } from "../../../shared/schemas/member";

/** The page before everything: address and password, and the demo's accounts. */
export class SignInScreen {
  constructor(private readonly page: Page) {}

  /** Types the demo account of a role, as one would by hand. */
  async enter(role: MemberRole): Promise<void> {
    await this.page.goto("/");
    await this.page.getByLabel("E-mail").fill(demoAccounts.find((a) => a.role === role)?.email ?? "");
    await this.page.getByLabel("Password").fill(demoPassword);
    await this.page.getByRole("button", { name: "Sign in" }).click();
    await this.page.getByRole("heading", { name: "Plans" }).waitFor();
  }
}
