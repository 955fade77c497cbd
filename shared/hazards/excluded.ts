import { sideOfCorner, type Convex } from "../geometry/convex";
import type { Line } from "../geometry/line";
import type { ExcludedHazard } from "../schemas/problem";
import type { ExcludedGas } from "../solution";
import type { HazardGas } from "./gases";
import { gasPressure, heightOver, type Liquor } from "./pressures";
import { usualThreshold } from "./thresholds";

/** A convex part of a ligand cell on which a hazard's edge is one line: the hazard stands where `height` is at least zero. */
export interface HazardPart {
  /** null: the whole cell */
  readonly field: Convex | null;
  readonly height: Line;
  /** where a metal carries the gas, its ruling species there, as an index */
  readonly plane: number | null;
}

/** Ground kept out of windows for the sake of people. */
export interface HazardGround {
  readonly gas: HazardGas;
  readonly asked: ExcludedGas;
  /** component or metal the gas comes from; null for hydrogen */
  readonly carrier: string | null;
  /** per ligand cell; empty where the cell holds none of the hazard's ground */
  readonly cells: readonly (readonly HazardPart[])[];
}

/** Whether a part's own ground touches the hazard at all; a touch along an edge counts, for there it shuts what lies on the other side. */
function reaches({ height }: HazardPart, piece: Convex): boolean {
  if (height[1] === 0 && height[2] === 0) return height[0] >= 0;
  return piece.x.some((_, i) => sideOfCorner(piece, i, height) >= 0);
}

/** An exclusion as the solution repeats it: with the threshold that stood for it where none was named.
 *  @param hazard  of the problem     @returns  gas with a pressure in bar or the least pH */
export const askedOf = ({ gas, bar, pHAtLeast }: ExcludedHazard): ExcludedGas =>
  pHAtLeast === undefined ? { gas, bar: bar ?? usualThreshold[gas].bar } : { gas, pHAtLeast };

/** The ground of the hazards a problem keeps out of its windows, per ligand cell. A gas the liquor cannot give off keeps nothing out.
 *  @param liquor  of the problem     @returns  one entry a hazard with ground inside the frame, in the order of the problem
 *  @source  hazards/pressures.ts: exact lines, the same on both sides of a shared edge; a pH rule is its own line */
export function excludedGround(liquor: Liquor): HazardGround[] {
  const out: HazardGround[] = [];
  for (const hazard of liquor.prepared.problem.excludedHazards ?? []) {
    const pressure = gasPressure(liquor, hazard.gas);
    if ("absent" in pressure) continue;
    const asked = askedOf(hazard);
    const cells: HazardPart[][] = liquor.cells.map(() => []);
    for (const piece of pressure.pieces) {
      const rule = asked.bar === undefined;
      const part: HazardPart = {
        field: piece.plane === null ? null : piece.piece,
        height: rule ? [asked.pHAtLeast, -1, 0] : heightOver(pressure, piece, asked.bar),
        plane: piece.plane,
      };
      cells[piece.cell]?.push(part);
    }
    const touched = cells.map((parts, c) => {
      const cell = liquor.cells[c]?.piece;
      return cell !== undefined && parts.some((p) => reaches(p, p.field ?? cell)) ? parts : [];
    });
    if (touched.some((parts) => parts.length > 0))
      out.push({ gas: hazard.gas, asked, carrier: pressure.of?.component ?? null, cells: touched });
  }
  return out;
}
