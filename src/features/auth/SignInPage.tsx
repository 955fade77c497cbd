import { useState } from "react";
import type { DemoAccounts } from "../../../shared/schemas/member";
import { SectionHead } from "../../components/text";
import { usePageTitle } from "../../lib/title";
import SignInForm from "./SignInForm";
import { WindowSketch } from "./WindowSketch";

const answers = [
  [
    "Where",
    "The ground in pH and potential on which the target dissolves while every other metal stays where it should.",
  ],
  ["How far", "The reaction that shuts each edge, and how many control bands a real loop has before it is reached."],
  ["By what", "The oxidants and reductants that bring a slurry there, and the caution that goes with them."],
] as const;

/** The first page of a visitor: what this answers, and the way in. */
export default function SignInPage({ demo }: { demo: DemoAccounts | null }) {
  usePageTitle("Sign in");
  const [email, setEmail] = useState("");
  return (
    <div className="flex min-h-dvh flex-col">
      <header className="flex h-11 shrink-0 items-center border-b border-ink px-5">
        <h1 className="text-lg">Gangueway</h1>
      </header>
      <main className="grid flex-1 md:grid-cols-[1fr_420px]">
        <div className="px-5 pt-[5vh] pb-10 md:pr-16">
          <p className="max-w-[24em] font-mono text-xl font-bold">
            Process windows for leach, purification and cementation circuits
          </p>
          <figure className="mt-5">
            <WindowSketch width={760} height={310} className="max-xl:hidden" />
            <WindowSketch width={400} height={330} className="xl:hidden" />
            <figcaption className="max-w-[760px] text-sm text-muted">
              Neutral leach of an invented zinc calcine. Hatched ground is shut by a metal; the square is the set point
              with what its control loop needs.
            </figcaption>
          </figure>
          <dl className="mt-5 max-w-[760px] border-t border-ink">
            {answers.map(([question, answer]) => (
              <div key={question} className="hairline grid grid-cols-[7em_1fr] gap-3 py-3">
                <dt className="font-mono font-bold">{question}</dt>
                <dd>{answer}</dd>
              </div>
            ))}
          </dl>
          <p className="mt-4 max-w-[760px] text-sm text-muted">
            Decision support. It says what can happen, not how fast, and it does not replace test work, the site’s
            procedures or licensed practice.
          </p>
        </div>
        <div className="space-y-8 border-rule px-5 pt-[5vh] pb-10 max-md:border-t md:border-l md:px-8">
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
                      className="flex w-full items-baseline justify-between gap-3 py-1 text-left hover:text-verdigris"
                      onClick={() => setEmail(account.email)}
                    >
                      <span>{account.role}</span>
                      <span className="font-mono text-sm">{account.email}</span>
                    </button>
                  </li>
                ))}
              </ul>
              <p className="pt-2 text-sm text-muted">
                Password of all four: <span className="font-mono text-ink">{demo.password}</span>. Choose a line to fill
                the form.
              </p>
            </section>
          )}
        </div>
      </main>
    </div>
  );
}
