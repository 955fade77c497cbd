import { lazy, type ComponentType } from "react";

interface Screen {
  default: ComponentType;
}

/** A screen in a chunk of its own. */
export interface LateScreen {
  /** fetches the chunk ahead; a failure shows when the screen is due */
  ahead: () => void;
  /** to be read at each rendering: it is another one after a failure */
  readonly Part: ComponentType;
  /** after a chunk that did not come: the next visit asks again */
  forget: () => void;
}

/** @param load  an `import()` */
export function lateScreen(load: () => Promise<Screen>): LateScreen {
  let part = lazy(load);
  return {
    ahead: () => void load().catch(() => undefined),
    get Part() {
      return part;
    },
    forget: () => {
      part = lazy(load);
    },
  };
}
