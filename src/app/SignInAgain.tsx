import { whenOpened } from "../components/whenOpened";
import { useSessionEnded } from "../lib/session";

interface Sheet {
  open: boolean;
  onOpenChange: (open: boolean) => void;
}
const SignInSheet = whenOpened<Sheet>(() => import("./SignInSheet"));
const stays = () => undefined;

/** The session ended while the page was open: the page stays as it is, with everything typed, until one signs in again. */
export const SignInAgain = () => <SignInSheet open={useSessionEnded()} onOpenChange={stays} />;
