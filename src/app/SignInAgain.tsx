import { lazy, Suspense } from "react";
import { Dialog } from "../components/Dialog";
import { Loading } from "../components/status";
import { useSession, useSessionEnded } from "../lib/session";

const SignInForm = lazy(() => import("../features/auth/SignInForm"));

/** The session ended while the page was open: the page stays as it is, with everything typed, until one signs in again. */
export function SignInAgain() {
  const ended = useSessionEnded();
  const { user } = useSession();
  return (
    <Dialog
      open={ended}
      onOpenChange={() => undefined}
      fixed
      title="Sign in again"
      description="Your session has ended. Nothing on the page is lost; what was being saved can be saved again afterwards."
      width={420}
    >
      <Suspense fallback={<Loading label="Opening" />}>
        <SignInForm email={user.email} />
      </Suspense>
    </Dialog>
  );
}
