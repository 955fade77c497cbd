import { deepestPoint } from "../../shared/setpoint/deepestPoint";
import type { Segment } from "../../shared/setpoint/segments";
import { widestChord } from "../../shared/setpoint/widestChord";
import type { Limit, Window } from "../../shared/solution";

/** A window as the solver would print it, from its border alone: for tests of what reads windows.
 *  @param border  all loops in control bands     @param band  what one control band is, pH and V */
export function windowOf(
  border: readonly Segment[],
  band = { pH: 1, Eh: 1 },
  { mixedPotential = false, kinds = [] as readonly Limit["kind"][] } = {},
): Window {
  const deep = (mixedPotential ? widestChord(border) : deepestPoint(border))!;
  const pHs = border.map((s) => s.ax * band.pH);
  const Ehs = border.map((s) => s.ay * band.Eh);
  return {
    polygons: [],
    area: 0,
    pH: [Math.min(...pHs), Math.max(...pHs)],
    Eh: [Math.min(...Ehs), Math.max(...Ehs)],
    controllable: deep.margin >= 1,
    setPoint: {
      pH: deep.u * band.pH,
      Eh: deep.v * band.Eh,
      margin: deep.margin,
      mixedPotential,
      cutByFrame: false,
    },
    limits: border.map((s, i) => ({
      kind: kinds[i % Math.max(1, kinds.length)] ?? "metal",
      metal: `M${i}`,
      line: [0, 0, 0],
      from: [s.ax * band.pH, s.ay * band.Eh],
      to: [s.bx * band.pH, s.by * band.Eh],
      distance: 0,
      distancePH: null,
      distanceEh: null,
    })),
  };
}
