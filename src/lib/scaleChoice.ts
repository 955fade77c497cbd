import { useCallback, useSyncExternalStore } from "react";
import type { PotentialUnit } from "./potential";
import { usePreferences } from "./preferences";

/** Unit, electrode and its temperature; null: at the liquor's. */
export interface ScaleChoice {
  potentialUnit: PotentialUnit;
  potentialScale: string;
  electrodeTemperatureC: number | null;
}

export const usualScale: ScaleChoice = { potentialUnit: "V", potentialScale: "SHE", electrodeTemperatureC: null };

let brought: ScaleChoice | null = null;
const listeners = new Set<() => void>();

/** A scale that an address brought along stands over the member's own while that page is open; null lets it go. */
export function bringScale(choice: ScaleChoice | null): void {
  brought = choice;
  listeners.forEach((tell) => tell());
}

const subscribe = (tell: () => void) => {
  listeners.add(tell);
  return () => void listeners.delete(tell);
};

/** The scale in force and a way to change part of it, which is remembered for the member. */
export function useScaleChoice(): [ScaleChoice, (part: Partial<ScaleChoice>) => void] {
  const [own, remember] = usePreferences();
  const over = useSyncExternalStore(subscribe, () => brought);
  const { potentialUnit, potentialScale, electrodeTemperatureC } = over ?? own;
  const change = useCallback(
    (part: Partial<ScaleChoice>) => {
      if (brought) bringScale({ ...brought, ...part });
      remember(part);
    },
    [remember],
  );
  return [{ potentialUnit, potentialScale, electrodeTemperatureC }, change];
}
