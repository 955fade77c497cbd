import { useMemo } from "react";
import { fixed, signed, withUnit } from "./format";
import { usePreferences } from "./preferences";

export type PotentialUnit = "V" | "mV";

/** How potentials are shown: the solver's volts against SHE at T, on the member's scale. */
export interface PotentialScale {
  unit: PotentialUnit;
  /** the electrode named beside every number: "SHE", "Ag/AgCl 3 M at 25 °C" */
  electrode: string;
  /** "V vs SHE": for axes and headings */
  label: string;
  /** decimals that fit the unit */
  digits: number;
  /** volts vs SHE to the number shown */
  toShown: (voltsVsShe: number) => number;
  /** the number shown to volts vs SHE */
  fromShown: (shown: number) => number;
  /** a difference, such as a control band or a distance: unit only, no electrode */
  differenceToShown: (volts: number) => number;
  differenceFromShown: (shown: number) => number;
  /** "0.58 V", "373 mV" */
  format: (voltsVsShe: number) => string;
  /** "+0.16 V": a difference with its sign */
  formatDifference: (volts: number) => string;
}

/** @param offset  potential of the electrode against SHE at its own temperature, V */
export function potentialScale(unit: PotentialUnit, electrode: string, offset: number): PotentialScale {
  const factor = unit === "mV" ? 1000 : 1;
  const digits = unit === "mV" ? 0 : 2;
  const toShown = (E: number) => (E - offset) * factor;
  return {
    unit,
    electrode,
    label: `${unit} vs ${electrode}`,
    digits,
    toShown,
    fromShown: (shown) => shown / factor + offset,
    differenceToShown: (E) => E * factor,
    differenceFromShown: (shown) => shown / factor,
    format: (E) => withUnit(fixed(toShown(E), digits), unit),
    formatDifference: (E) => withUnit(signed(E * factor, digits), unit),
  };
}

/** The member's potential scale; a stable object while the preference stands. */
export function usePotentialScale(): PotentialScale {
  const [{ potentialUnit }] = usePreferences();
  return useMemo(() => potentialScale(potentialUnit, "SHE", 0), [potentialUnit]);
}
