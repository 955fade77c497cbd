import { useState, type ComponentType } from "react";

/** A part that stays closed until it is asked for, and whose code is fetched when a hand comes near.
 *  @param load  an `import()`, stable: defined at module level */
export function useLate<Props>(load: () => Promise<{ default: ComponentType<Props> }>) {
  const [part, setPart] = useState<ComponentType<Props> | null>(null);
  const [failed, setFailed] = useState(false);
  const fetchAhead = () => void load().catch(() => undefined);
  return {
    /** null while closed */
    Part: part,
    /** the code did not come: the server is out of reach, or has a newer version */
    failed,
    open: () =>
      void load().then(
        (loaded) => {
          setFailed(false);
          setPart(() => loaded.default);
        },
        () => setFailed(true),
      ),
    close: () => setPart(null),
    /** for the control that opens it */
    near: { onPointerEnter: fetchAhead, onFocus: fetchAhead },
  };
}

export const lateFailure = "This could not be fetched: the server does not answer. Try again.";
