import { useState } from "react";
import { SectionHead } from "../../components/text";
import type { DemoAccounts } from "../../lib/session";
import { usePageTitle } from "../../lib/title";
import { SignInForm } from "./SignInForm";

/** The first page of a visitor: what this is, and the way in. */
export function SignInPage({ demo }: { demo: DemoAccounts | null }) {
  usePageTitle("Sign in");
  const [email, setEmail] = useState("");
  return (
    <main className="mx-auto grid max-w-[880px] gap-x-16 gap-y-10 px-6 py-[10vh] md:grid-cols-2">
      <div>
        <h1 className="font-mono text-xl">Gangueway</h1>
        <p className="mt-3 text-lg">
          Where in potential and pH the target metal dissolves while the gangue stays solid, and how far a real loop may
          drift before it does not.
        </p>
        <p className="mt-3 text-muted">
          Plans, windows and set points for leach, purification and cementation circuits. Decision support: it does not
          replace test work, site procedures or licensed practice.
        </p>
      </div>
      <div className="space-y-8">
        <section>
          <SectionHead>Sign in</SectionHead>
          <div className="pt-4">
            <SignInForm email={email} password={email && demo ? demo.password : ""} />
          </div>
        </section>
        {demo && (
          <section>
            <SectionHead aside="invented data">Demo accounts</SectionHead>
            <ul>
              {demo.accounts.map((account) => (
                <li key={account.email} className="hairline">
                  <button
                    type="button"
                    className="flex w-full justify-between gap-3 py-1 text-left hover:text-verdigris"
                    onClick={() => setEmail(account.email)}
                  >
                    <span>{account.role}</span>
                    <span className="font-mono text-sm">{account.email}</span>
                  </button>
                </li>
              ))}
            </ul>
            <p className="pt-2 text-sm text-muted">
              Password for all of them: <span className="font-mono text-ink">{demo.password}</span>. Choose a line to
              fill the form.
            </p>
          </section>
        )}
      </div>
    </main>
  );
}
