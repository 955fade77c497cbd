/** The window of the demo's neutral leach as the solver answers it, for the first page: it is shown before anybody is signed in, so
 *  before chemistry and solver are there. Points are pH and V vs SHE, rounded to 0.01 and 0.001; a test solves it again. */
export const windowFigure = {
  planName: "Neutral leach, second tank",
  frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
  window: [
    [6.14, 0.209],
    [6.14, 0.793],
    [4.06, 0.931],
    [4.06, 0.622],
  ],
  /** ground where a metal is not as required */
  shut: {
    Zn: [
      [8, -0.2],
      [8, 1.2],
      [6.14, 1.2],
      [6.14, -0.2],
    ],
    Fe: [
      [8, -0.2],
      [8, -0.159],
      [4.06, 0.622],
      [4.06, 1.2],
      [1, 1.2],
      [1, -0.2],
    ],
  },
  setPoint: [5.1, 0.708],
  controlBand: [0.15, 0.03],
} as const;
