import type { Problem } from "../../../../shared/schemas/problem";
import type { SetPoint } from "../../../../shared/solution";
import { fixed, withUnit } from "../../../lib/format";

/** A way along pH: "1.04 pH". */
export const pHWords = (distance: number): string => withUnit(fixed(Math.abs(distance), 2), "pH");

/** A way along Eh, as crosscuts and loops tell it whatever the scale of potentials: "155 mV". */
export const mVWords = (volts: number): string => withUnit(fixed(Math.abs(1000 * volts), 0), "mV");

/** A number of control bands in pH and mV: "1.67 pH and 333 mV". */
export const bandWords = (bands: number, band: Problem["controlBand"]): string =>
  `${pHWords(bands * band.pH)} and ${mVWords(bands * band.Eh)}`;

/** A margin in pH and mV, or in pH alone where that is what it counts. */
export const marginInUnits = (
  { margin, mixedPotential }: Pick<SetPoint, "margin" | "mixedPotential">,
  band: Problem["controlBand"],
): string => (mixedPotential ? pHWords(margin * band.pH) : bandWords(margin, band));

/** The same as a sentence tells it: a point placed by hand may stand outside, and its margin is then below zero. */
export const marginSides = (at: Pick<SetPoint, "margin" | "mixedPotential">, band: Problem["controlBand"]): string =>
  `${marginInUnits(at, band)} ${at.margin < 0 ? "outside the window" : "to either side"}`;
