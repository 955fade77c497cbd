import { Dialog, type DialogProps } from "../components/Dialog";
import SignInForm from "../features/auth/SignInForm";
import { useSession } from "../lib/session";

export default function SignInSheet(dialog: Pick<DialogProps, "open" | "onOpenChange">) {
  const { user } = useSession();
  return (
    <Dialog
      {...dialog}
      fixed
      title="Sign in again"
      description="Your session has ended. Nothing on the page is lost; what was being saved can be saved again afterwards."
      width={420}
    >
      <SignInForm email={user.email} />
    </Dialog>
  );
}
