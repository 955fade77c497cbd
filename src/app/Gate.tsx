import { lazy, Suspense } from "react";
import { ErrorNote } from "../components/status";
import { useSessionQuery } from "../lib/session";
import { AppShell, Waiting } from "./AppShell";

const SignInPage = lazy(() => import("../features/auth/SignInPage"));
const FirstAdminPage = lazy(() => import("../features/firstAdmin/FirstAdminPage"));

/** Before anything is known of who is there: the line at the top stands already, where it will stay. */
const Cold = () => (
  <>
    <header className="flex h-11 items-center border-b border-ink px-5 font-mono text-lg font-bold">Gangueway</header>
    <Waiting />
  </>
);

/** What stands at any address: the first-admin page, the sign-in, or the screen itself. The address is kept, so that one
 *  arrives where one was going. */
export function Gate() {
  const { data, error, refetch, isPending } = useSessionQuery();
  if (isPending) return <Cold />;
  if (!data) {
    return (
      <div className="measure p-5">
        <ErrorNote doing="Gangueway could not be opened" error={error} retry={() => void refetch()} />
      </div>
    );
  }
  if (data.user) return <AppShell />;
  return (
    <Suspense fallback={<Cold />}>
      {data.needsFirstAdmin ? <FirstAdminPage /> : <SignInPage demo={data.demo ?? null} />}
    </Suspense>
  );
}
