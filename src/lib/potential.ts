import { useMemo } from "react";
import { referencePotential } from "../../shared/electrodes/convert";
import { electrodeSeries, type ElectrodeSeries } from "../../shared/electrodes/series";
import { useChemistry } from "./chemistry";
import { celsius, fixed, signed, withUnit } from "./format";
import { useScaleChoice } from "./scaleChoice";

export type PotentialUnit = "V" | "mV";

/** How potentials are shown: the solver's volts against SHE at T, on the member's scale. */
export interface PotentialScale {
  unit: PotentialUnit;
  /** "SHE", or the electrode and its temperature: "Ag/AgCl, 3 mol/L KCl, at 25 °C" */
  electrode: string;
  /** short enough for an axis: "Ag/AgCl 3 M" */
  short: string;
  /** "V vs SHE", "mV vs Ag/AgCl 3 M": for axes and beside numbers */
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
  /** "0.58 V", "373 mV", without the electrode: that stands beside it */
  format: (voltsVsShe: number) => string;
  /** "+0.16 V": a difference with its sign */
  formatDifference: (volts: number) => string;
  /** the electrode by its id, and its temperature, C; null on SHE */
  reference: { id: string; temperatureC: number } | null;
  /** what adds to the error of the reading ("potential carried on beyond its table, ±5 mV"), or why SHE is shown instead */
  remark: string | null;
}

interface Reference {
  reference?: PotentialScale["reference"];
  electrode: string;
  short: string;
  /** potential against SHE at the electrode's own temperature, V */
  offset: number;
  remark: string | null;
}

const she: Reference = { electrode: "SHE", short: "SHE", offset: 0, remark: null };

export function potentialScale(
  unit: PotentialUnit,
  { reference = null, electrode, short, offset, remark }: Reference = she,
): PotentialScale {
  const factor = unit === "mV" ? 1000 : 1;
  const digits = unit === "mV" ? 0 : 2;
  const toShown = (E: number) => (E - offset) * factor;
  return {
    unit,
    electrode,
    short,
    reference,
    remark,
    label: `${unit} vs ${short}`,
    digits,
    toShown,
    fromShown: (shown) => shown / factor + offset,
    differenceToShown: (E) => E * factor,
    differenceFromShown: (shown) => shown / factor,
    format: (E) => withUnit(fixed(toShown(E), digits), unit),
    formatDifference: (E) => withUnit(signed(E * factor, digits), unit),
  };
}

/** "Ag/AgCl, 3 mol/L KCl" → "Ag/AgCl 3 M"; what follows a second comma is for the long name. */
export const shortElectrode = (label: string): string =>
  label
    .replace(/, ([\d.]+) mol\/L [A-Za-z]+/, " $1 M")
    .replace(/, saturated [A-Za-z0-9]+/, " sat.")
    .replace("saturated calomel sat.", "sat. calomel")
    .replace(/,.*$/, "");

const basisRemark = {
  table: null,
  borrowed: "its change with temperature is borrowed from the standard Ag/AgCl electrode",
  extrapolated: "its potential is carried on beyond its table",
} as const;

function referenceOf(series: ElectrodeSeries, tC: number): Reference {
  const found = referencePotential(series, tC);
  if (!found.ok) return { ...she, remark: `Shown against SHE: ${found.error.message}.` };
  const { E, basis, uncertainty } = found.value;
  const why = basisRemark[basis];
  return {
    reference: { id: series.id, temperatureC: tC },
    electrode: `${series.label}, at ${celsius(tC)}`,
    short: shortElectrode(series.label),
    offset: E,
    remark:
      why &&
      `${shortElectrode(series.label)} at ${celsius(tC)}: ${why}, ±${withUnit(fixed(uncertainty * 1000, 0), "mV")}.`,
  };
}

/** Electrodes are kept at room temperature unless somebody says otherwise. */
const roomC = 25;

/** The member's potential scale; a stable object while nothing changes.
 *  @param liquorC  temperature of the liquor: where the electrode stands in it ("at the liquor's temperature") */
export function usePotentialScale(liquorC: number = roomC): PotentialScale {
  const [{ potentialUnit, potentialScale: chosen, electrodeTemperatureC }] = useScaleChoice();
  const { data } = useChemistry(undefined, chosen !== "SHE");
  const tC = electrodeTemperatureC ?? liquorC;
  return useMemo(() => {
    if (chosen === "SHE" || !data) return potentialScale(potentialUnit);
    const series = electrodeSeries(data.tables).find(({ id }) => id === chosen);
    if (series) return potentialScale(potentialUnit, referenceOf(series, tC));
    return potentialScale(potentialUnit, {
      ...she,
      remark: `Shown against SHE: the library has no electrode ${chosen}.`,
    });
  }, [data, chosen, potentialUnit, tC]);
}
