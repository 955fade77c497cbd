import type { Analysis } from "../analysis";
import { areaOf, rectangle, type Convex } from "../geometry/convex";
import { common, meet, without } from "../geometry/overlay";
import { connect } from "../geometry/region";
import type { Frame } from "../schemas/problem";
import type { Outline } from "../solution";
import { isSliver } from "../windows/pieces";
import { outlinesOf } from "../windows/shutGround";

/** Ground of one kind: its outlines and its area, pH x V. */
export interface GroundPart {
  readonly outlines: readonly Outline[];
  readonly area: number;
}

/** What becomes of open ground from one answer to another. */
export interface GroundDifference {
  /** open after, shut before */
  readonly gained: GroundPart;
  /** open before, shut after */
  readonly lost: GroundPart;
  /** open in both */
  readonly kept: GroundPart;
  /** both are looked at here only: what the two frames have in common; null where they share nothing */
  readonly frame: Frame | null;
  /** the frames are not the same, so some ground was left out of the comparison */
  readonly framesDiffer: boolean;
}

/** What two frames have in common; null where that has no area. */
function commonFrame(a: Frame, b: Frame): Frame | null {
  const range = (p: readonly [number, number], q: readonly [number, number]): [number, number] => [
    Math.max(p[0], q[0]),
    Math.min(p[1], q[1]),
  ];
  const [pH, Eh] = [range(a.pH, b.pH), range(a.Eh, b.Eh)];
  return pH[0] < pH[1] && Eh[0] < Eh[1] ? { pH, Eh } : null;
}

function partOf(pieces: readonly Convex[]): GroundPart {
  const real = pieces.filter((p) => !isSliver(p));
  return { outlines: outlinesOf(real, connect(real)), area: real.reduce((sum, p) => sum + areaOf(p), 0) };
}

const NOTHING: GroundPart = { outlines: [], area: 0 };

/** Open ground gained, lost and kept between two answers, from the solver's own exact pieces.
 *  @param before, after  two problems worked out as far as their pieces; temperature, chemistry and frame may differ
 *  @returns  outlines (V vs SHE, each at its own temperature) and areas, pH x V; kept and lost make up what was open before,
 *            kept and gained what is open after, inside the frame the two have in common
 *  @source  exact overlay of convex pieces (geometry/overlay.ts); hairs thinner than 1e-9 pH are dropped */
export function groundDifference(before: Analysis, after: Analysis): GroundDifference {
  const [f, g] = [before.prepared.problem.frame, after.prepared.problem.frame];
  const frame = commonFrame(f, g);
  const framesDiffer = [...f.pH, ...f.Eh].join() !== [...g.pH, ...g.Eh].join();
  if (frame === null) return { gained: NOTHING, lost: NOTHING, kept: NOTHING, frame, framesDiffer };
  const sheet = rectangle(frame.pH, frame.Eh, [-1, -1, -1, -1]);
  const inside = ({ pieces }: Analysis): Convex[] => {
    const open = pieces.map(({ piece }) => piece);
    return framesDiffer ? open.flatMap((p) => meet(p, sheet) ?? []) : open;
  };
  const [a, b] = [inside(before), inside(after)];
  return {
    gained: partOf(without(b, a)),
    lost: partOf(without(a, b)),
    kept: partOf(common(a, b)),
    frame,
    framesDiffer,
  };
}
