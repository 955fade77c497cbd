import { insideLoop } from "../geometry/loop";
import type { Solution } from "../solution";

/** Whether a point lies in open ground: every metal there as required. Even-odd, so holes are shut. */
export const isLit = (windows: Solution["windows"], pH: number, Eh: number): boolean =>
  windows
    .flatMap(({ polygons }) => polygons.flatMap(({ outer, holes }) => [outer, ...holes]))
    .reduce((lit, ring) => lit !== insideLoop(ring, pH, Eh), false);
