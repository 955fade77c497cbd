import { Suspense } from "react";
import { NavLink, Outlet } from "react-router-dom";
import { Loading } from "../components/status";
import { classes } from "../lib/classes";
import { mayDo, useSession, type Permission } from "../lib/session";
import { MemberMenu } from "./MemberMenu";
import { Place } from "./Place";
import { SignInAgain } from "./SignInAgain";

const places: readonly { to: string; name: string; needs?: Permission }[] = [
  { to: "/plans", name: "Plans" },
  { to: "/bench", name: "Bench" },
  { to: "/campaigns", name: "Campaigns" },
  { to: "/feeds", name: "Feeds" },
  { to: "/chemistry", name: "Chemistry" },
  { to: "/reactions", name: "Reactions" },
  { to: "/members", name: "Members", needs: "manageMembers" },
];

/** The line at the top of every screen: where one is, where one can go, who one is. The screen below fills the rest. */
export function AppShell() {
  const { user } = useSession();
  const open = places.filter(({ needs }) => needs === undefined || mayDo(user.role, needs));
  return (
    <div className="flex h-dvh flex-col print:h-auto">
      <a
        href="#screen"
        className="no-print absolute -top-20 left-2 z-50 border border-ink bg-paper px-3 py-1 focus:top-1"
      >
        Skip to the screen
      </a>
      <header className="no-print flex h-11 shrink-0 items-stretch gap-6 border-b border-ink px-5">
        <NavLink to="/plans" className="flex items-center font-mono text-lg font-bold no-underline">
          Gangueway
        </NavLink>
        <Place />
        <nav aria-label="Places" className="flex gap-5">
          {open.map(({ to, name }) => (
            <NavLink
              key={to}
              to={to}
              className={({ isActive }) =>
                classes(
                  "-mb-px flex items-center border-y-[3px] border-transparent no-underline hover:border-b-rule",
                  isActive && "border-b-verdigris! font-bold",
                )
              }
            >
              {name}
            </NavLink>
          ))}
        </nav>
        <span className="flex-1" />
        <MemberMenu />
      </header>
      <main
        id="screen"
        tabIndex={-1}
        className="flex min-h-0 flex-1 flex-col overflow-y-auto outline-none print:overflow-visible"
      >
        <Suspense fallback={<Waiting />}>
          <Outlet />
        </Suspense>
      </main>
      <SignInAgain />
    </div>
  );
}

export const Waiting = () => (
  <div className="px-5">
    <Loading label="Opening" />
  </div>
);
