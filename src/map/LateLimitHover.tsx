import { lazy, Suspense, useState } from "react";
import { useCursor } from "./cursorStore";
import type { LimitHoverProps } from "./LimitHover";
import { useTold } from "./trialStore";

const LimitHover = lazy(() => import("./LimitHover"));

/** Names of limits, fetched when something on the map or in the list is first pointed at. */
export function LateLimitHover(props: LimitHoverProps) {
  const { store, cursor } = props;
  const [pointed, named, at] = [useTold(store.pointed), useTold(store.named), useCursor(cursor)];
  const [wanted, setWanted] = useState(false);
  if (!wanted && (pointed ?? named ?? at) !== null) setWanted(true);
  return wanted ? (
    <Suspense fallback={null}>
      <LimitHover {...props} />
    </Suspense>
  ) : null;
}
