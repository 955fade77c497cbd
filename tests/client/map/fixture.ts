import type { Field, Limit, Point, Solution, Window } from "../../../shared/solution";
import { themeColours } from "../../../src/lib/theme";
import { defaultLayers, type MapView } from "../../../src/map/view";

/** A sheet made by hand: pH 0 to 10, Eh 0 to 1 V. Zinc dissolves left of pH 6; iron is dissolved inside a box around (3, 0.5) and
 *  solid elsewhere, so that iron's shut ground is a block and the window has a hole. */
const box = (x0: number, x1: number, y0: number, y1: number): Point[] => [
  [x0, y0],
  [x1, y0],
  [x1, y1],
  [x0, y1],
];

export const fields: Field[] = [
  { metal: "Zn", species: "Zn^2+(aq)", state: "dissolved", polygon: box(0, 4, 0, 1) },
  // the same species in a second ligand cell: a seam at pH 4 that must not be drawn
  { metal: "Zn", species: "Zn^2+(aq)", state: "dissolved", polygon: box(4, 6, 0, 1) },
  { metal: "Zn", species: "ZnO(s)", state: "compound", polygon: box(6, 10, 0, 1) },
  { metal: "Fe", species: "Fe^2+(aq)", state: "dissolved", polygon: box(2, 4, 0.4, 0.6) },
  { metal: "Fe", species: "FeOOH(s,goethite)", state: "compound", polygon: box(0, 10, 0, 0.4) },
  { metal: "Fe", species: "FeOOH(s,goethite)", state: "compound", polygon: box(0, 2, 0.4, 0.6) },
  { metal: "Fe", species: "FeOOH(s,goethite)", state: "compound", polygon: box(4, 10, 0.4, 0.6) },
  { metal: "Fe", species: "FeOOH(s,goethite)", state: "compound", polygon: box(0, 10, 0.6, 1) },
];

const limit = (parts: Partial<Limit> & Pick<Limit, "kind" | "line" | "from" | "to">): Limit => ({
  distance: 2,
  distancePH: null,
  distanceEh: null,
  ...parts,
});

export const window: Window = {
  polygons: [{ outer: box(0, 6, 0, 1), holes: [[...box(2, 4, 0.4, 0.6)].reverse()] }],
  area: 5.6,
  pH: [0, 6],
  Eh: [0, 1],
  controllable: true,
  setPoint: { pH: 1, Eh: 0.5, margin: 3, mixedPotential: false, couple: ["Fe^2+(aq)", "Fe^3+(aq)"], cutByFrame: true },
  limits: [
    limit({
      kind: "metal",
      metal: "Zn",
      inside: "Zn^2+(aq)",
      outside: "ZnO(s)",
      line: [6, -1, 0],
      from: [6, 0],
      to: [6, 1],
      distance: 33.3,
      distancePH: 5,
    }),
    limit({
      kind: "metal",
      metal: "Fe",
      inside: "FeOOH(s,goethite)",
      outside: "Fe^2+(aq)",
      line: [2, -1, 0],
      from: [2, 0.4],
      to: [2, 0.6],
      distance: 6.7,
      distancePH: 1,
    }),
    limit({ kind: "frame", side: "low pH", line: [0, 1, 0], from: [0, 0], to: [0, 1], distance: 6.7, distancePH: -1 }),
  ],
};

export const solution: Solution = {
  temperatureC: 60,
  fields,
  windows: [window],
  setPoint: window.setPoint,
  conflicts: [],
  leftOut: [],
  warnings: [],
  waterLines: [
    { which: "oxygen", intercept: 1.2, slope: -0.066 },
    { which: "hydrogen", intercept: 0, slope: -0.066 },
  ],
  metals: [
    { metal: "Zn", requirement: "dissolved", activity: 0.08 },
    { metal: "Fe", requirement: "solid", activity: 1e-5 },
  ],
  shut: [
    { metal: "Zn", polygons: [{ outer: box(6, 10, 0, 1), holes: [] }] },
    { metal: "Fe", polygons: [{ outer: box(2, 4, 0.4, 0.6), holes: [] }] },
  ],
  frame: { pH: [0, 10], Eh: [0, 1] },
};

/** millivolts against an electrode at +0.2 V: every drawn potential must have gone through the scale */
export const millivolts: MapView["scale"] = {
  unit: "mV",
  short: "Ag/AgCl",
  toShown: (E) => (E - 0.2) * 1000,
  fromShown: (shown) => shown / 1000 + 0.2,
};

export const view: MapView = {
  metals: [
    { element: "Zn", role: "target", requirement: "dissolved" },
    { element: "Fe", role: "gangue", requirement: "solid" },
  ],
  frame: solution.frame,
  controlBand: { pH: 0.15, Eh: 0.03 },
  visible: solution.frame,
  scale: millivolts,
  colours: themeColours.light,
  plain: false,
  focus: null,
  hidden: new Set(),
  pair: null,
  layers: defaultLayers,
  window: 0,
};
