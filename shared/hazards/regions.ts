import type { Analysis } from "../analysis";
import { clip, type Convex } from "../geometry/convex";
import { connect, type Region } from "../geometry/region";
import { saturationPressure } from "../gibbs/water";
import { fail, ok, type Outcome } from "../outcome";
import type { Outline, Point } from "../solution";
import { kelvin } from "../units";
import { outlinesOf } from "../windows/shutGround";
import { DEFERENCE, EXPOSURE_RECORDED, limitsText } from "./exposure";
import { gasPressure, hazardGases, heightOver, pressureAt, type GasPressure, type HazardGas } from "./pressures";
import { usualThreshold, type Threshold } from "./thresholds";

export { usualThreshold };

export interface HazardRegion {
  readonly gas: HazardGas;
  /** bar, equilibrium over the liquor; absolute, as every pressure here */
  readonly threshold: Threshold;
  /** where the pressure reaches the threshold: outlines with holes, in (pH, V vs SHE at T) */
  readonly region: readonly Outline[];
  /** where it equals the threshold: the border of the region without the frame's sides */
  readonly isoLines: readonly (readonly Point[])[];
  /** at the set point asked about, bar; null without one, or outside the frame */
  readonly atSetPoint: number | null;
  /** liquor's total that the pressure rests on; null for hydrogen */
  readonly of: GasPressure["of"];
  readonly caution: string;
  readonly limits: string | null;
}

export interface HazardMap {
  readonly regions: readonly HazardRegion[];
  /** gases the plan gives no pressure for, and why */
  readonly absent: readonly { readonly gas: HazardGas; readonly why: string }[];
  /** saturation pressure of water above 100 C, bar; null below: the vessel then stands open */
  readonly saturationBar: number | null;
  readonly deference: string;
  /** month the limits were recorded in */
  readonly recorded: string;
}

const ISO_TAG = 2 ** 40;

/** The part of each piece where the pressure reaches the threshold. */
function above(pressure: GasPressure, bar: number): Convex[] {
  return pressure.pieces.flatMap((part) => {
    const { piece } = part;
    const [height, x, y] = heightOver(pressure, part, bar);
    if (x === 0 && y === 0) return height >= 0 ? [piece] : []; // the same pressure all over the piece
    return clip(piece, [height, x, y], ISO_TAG) ?? [];
  });
}

/** Stretches of the borders that are the threshold itself, joined end to end. */
function isoLinesOf(pieces: readonly Convex[], regions: readonly Region[]): Point[][] {
  const lines: Point[][] = [];
  for (const loop of regions.flatMap((r) => [r.outer, ...r.holes])) {
    let open: Point[] | null = null;
    for (const { piece, edge, from, to } of loop) {
      if (pieces[piece]?.tags[edge] !== ISO_TAG) open = null;
      else if (open === null) lines.push((open = [from, to]));
      else open.push(to);
    }
  }
  return lines;
}

/** Where the equilibrium pressure of a gas reaches a threshold: exact convex pieces joined, never a grid.
 *  @param pressure  of a gas     @param bar  threshold, above zero     @returns  region, iso-pressure lines     @source  docs/method.md, section 10 */
export function regionAbove(pressure: GasPressure, bar: number): Pick<HazardRegion, "region" | "isoLines"> {
  const pieces = above(pressure, bar);
  const regions = connect(pieces);
  return { region: outlinesOf(pieces, regions), isoLines: isoLinesOf(pieces, regions) };
}

const usual: Readonly<Record<HazardGas, string>> = {
  HCN: "Never acidify a cyanide liquor or its cement; check pH before mixing streams or draining to a common sump.",
  H2S: "Hydrogen sulfide dulls the sense of smell before it kills: closed vessel, scrubber, gas alarm.",
  AsH3: "Arsine has no useful odour warning; fresh hydrogen on zinc, iron or a cathode makes it beyond what equilibrium says. Older tables put As/AsH3 0.37 V lower: the region drawn is the wider.",
  SbH3: "Stibine forms with fresh hydrogen as arsine does, beyond what equilibrium says.",
  Cl2: "Chlorine: closed vessel and scrubber; wet chlorine attacks common steels.",
  NH3: "Ammonia strips when warm and alkaline: closed vessel, scrubber, eyes first.",
  H2: "Hydrogen: vent it high, keep ignition away; overpotential delays it and does not prevent it.",
};

/** Half of a total at a pKa, to the power of the atoms that the gas takes from it; hydrogen rests on none. */
const overstated: Readonly<Record<HazardGas, string | null>> = {
  ...{ HCN: "twice", H2S: "twice", AsH3: "twice", SbH3: "twice", Cl2: "four times", NH3: "twice" },
  H2: null,
};

function caution(gas: HazardGas, { words }: Threshold, hot: boolean): string {
  const absolute = hot ? " Above 100 C the vessel is closed and gas pressures are absolute." : "";
  const over = overstated[gas];
  const share = over === null ? "" : `, and near a pKa up to ${over} the true value`;
  return `Inside, the equilibrium pressure over this liquor reaches ${words}. It is what a closed headspace tends to, not a reading of the air${share}. ${usual[gas]}${absolute}`;
}

/** Hazard regions of a plan: per gas where its equilibrium pressure over the liquor reaches a threshold, with caution, deference, exposure
 *  values and their month.
 *  @param analysis  of the plan
 *  @param options  set point to read the pressures at; thresholds in bar in place of the usual ones; gases (all unless named)
 *  @returns  regions in the order of hazardGases; OUT_OF_RANGE for a threshold that is not above zero
 *  @source  docs/method.md, section 10; thresholds of hazards/exposure.ts; saturation pressure of gibbs/water.ts */
export function hazardRegions(
  analysis: Analysis,
  options: {
    readonly setPoint?: { readonly pH: number; readonly Eh: number } | null;
    readonly thresholdBar?: Partial<Readonly<Record<HazardGas, number>>>;
    readonly gases?: readonly HazardGas[];
  } = {},
): Outcome<HazardMap> {
  const { setPoint = null, thresholdBar = {}, gases = hazardGases } = options;
  const { temperatureC } = analysis.prepared.problem;
  const regions: HazardRegion[] = [];
  const absent: HazardMap["absent"][number][] = [];
  for (const gas of hazardGases.filter((g) => gases.includes(g))) {
    const asked = thresholdBar[gas];
    if (asked !== undefined && !(asked > 0 && Number.isFinite(asked)))
      return fail("OUT_OF_RANGE", `thresholdBar.${gas}`, `a pressure must be above 0 bar; got ${asked}`);
    const threshold = asked === undefined ? usualThreshold[gas] : { bar: asked, words: `${asked} bar` };
    const pressure = gasPressure(analysis, gas);
    if ("absent" in pressure) {
      absent.push({ gas, why: pressure.absent });
      continue;
    }
    regions.push({
      gas,
      threshold,
      ...regionAbove(pressure, threshold.bar),
      atSetPoint: setPoint === null ? null : pressureAt(pressure, setPoint.pH, setPoint.Eh),
      of: pressure.of,
      caution: caution(gas, threshold, temperatureC > 100),
      limits: limitsText(gas),
    });
  }
  const saturationBar = temperatureC > 100 ? saturationPressure(kelvin(temperatureC)) / 1e5 : null;
  return ok({ regions, absent, saturationBar, deference: DEFERENCE, recorded: EXPOSURE_RECORDED });
}
