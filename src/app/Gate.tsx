import { lazy, Suspense } from "react";
import { ErrorNote } from "../components/status";
import { useSessionQuery } from "../lib/session";
import { AppShell, Waiting } from "./AppShell";

const SignInPage = lazy(() => import("../features/auth/SignInPage"));
const FirstAdminPage = lazy(() => import("../features/firstAdmin/FirstAdminPage"));

/** What stands at any address: the first-admin page, the sign-in, or the screen itself. The address is kept, so that one
 *  arrives where one was going. */
export function Gate() {
  const { data, error, refetch, isPending } = useSessionQuery();
  if (isPending) return <Waiting />;
  if (!data) {
    return (
      <div className="measure p-5">
        <ErrorNote doing="Gangueway could not be opened" error={error} retry={() => void refetch()} />
      </div>
    );
  }
  if (data.user) return <AppShell />;
  return (
    <Suspense fallback={<Waiting />}>
      {data.needsFirstAdmin ? <FirstAdminPage /> : <SignInPage demo={data.demo ?? null} />}
    </Suspense>
  );
}
