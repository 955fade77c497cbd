import type { ElectrodeSeries } from "../../../../shared/electrodes/series";
import { numberIn } from "../../../../shared/entry/measure";
import type { Planned } from "../../../../shared/schemas/trialRecord";
import { deviation, type PlannedPoint } from "../../../../shared/trials/deviation";
import { judge } from "../../../../shared/trials/judge";
import { fixed, withUnit } from "../../../lib/format";
import type { SolvedRevision } from "../../../lib/solvedRevision";
import { orpOf } from "./orp";
import type { PlaceSentence } from "./placeWords";

interface Point {
  readonly pH: number;
  readonly Eh: number;
  readonly EhUncertainty: number;
}

/** The set point a trial was laid out for, its potential on the SHE scale. */
export function plannedPoint(planned: Planned, electrodes: readonly ElectrodeSeries[]): PlannedPoint {
  const orp = orpOf(
    {
      at: { text: "", unit: "h" },
      temperature: planned.temperature,
      pH: { value: { text: "", unit: "pH" }, temperature: { text: "", unit: "C" }, cooledSample: false },
      orp: planned.orp,
      note: "",
    },
    electrodes,
  );
  return { pH: numberIn(planned.pH, "pH"), Eh: orp.kind === "read" ? orp.point.Eh : null };
}

/** Whether the trial was laid out outside every window on purpose; where no potential was planned, at the measured one. */
export function plannedOutside(planned: PlannedPoint, measured: Point, solved: SolvedRevision): boolean {
  if (planned.pH === null || !solved.solution) return false;
  const point = { pH: planned.pH, Eh: planned.Eh ?? measured.Eh };
  return judge(point, solved.solution, solved.inputs.controlBand).verdict === "outside";
}

/** How far a reading is from its own set point, whatever the window says: "pH 0.21 below its planned 2.20". */
export function deviationWords(
  point: Point,
  planned: PlannedPoint,
  band: { pH: number; Eh: number },
): PlaceSentence | null {
  const found = deviation(point, planned, band);
  if (found.bands === null) return null;
  if (!found.off) return { text: "Held at its planned set point.", tone: "good" };
  const side = (difference: number) => (difference < 0 ? "below" : "above");
  const off = [
    found.pH !== null &&
      planned.pH !== null &&
      Math.abs(found.pH) > band.pH &&
      `pH ${fixed(Math.abs(found.pH), 2)} ${side(found.pH)} its planned ${fixed(planned.pH, 2)}`,
    found.Eh !== null &&
      planned.Eh !== null &&
      Math.abs(found.Eh) - point.EhUncertainty > band.Eh &&
      `${withUnit(fixed(Math.abs(found.Eh) * 1000, 0), "mV")} ${side(found.Eh)} its planned ${withUnit(fixed(planned.Eh * 1000, 0), "mV")} vs SHE`,
  ].filter((part) => part !== false);
  return { text: `Off its planned set point: ${off.join(", ")}.`, tone: "bad" };
}
