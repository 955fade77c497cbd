import type { Plane } from "../../../shared/geometry/envelope";
import type { MetalFields } from "../../../shared/fields/fields";

/** The honest rival: which species of each metal is stable at every point of a grid, and nothing else. Typed arrays, planes
 *  hoisted to one line of the grid, no allocation while it runs. Ligands: their holders are found per point first. */
export interface Grid {
  /** runs the grid; returns a checksum so that no work can be skipped */
  run(): number;
  /** plane evaluations of the last run */
  evaluations(): number;
}

export interface GridInput {
  /** per ligand: planes of its species */
  ligands: readonly (readonly Plane[])[];
  /** per combination of holders (mixed radix over the ligands), per metal: planes */
  combinations: readonly (readonly (readonly Plane[])[])[];
  frame: { pH: [number, number]; Eh: [number, number] };
  size: number;
}

/** Flattens the planes and closes over the buffers. */
export function makeGrid({ ligands, combinations, frame, size }: GridInput): Grid {
  const ligandStart = new Int32Array(ligands.length + 1);
  ligands.forEach((l, i) => (ligandStart[i + 1] = ligandStart[i]! + l.length));
  const lk = Float64Array.from(ligands.flat(), (p) => p.k / p.atoms);
  const lx = Float64Array.from(ligands.flat(), (p) => p.x / p.atoms);
  const ly = Float64Array.from(ligands.flat(), (p) => p.y / p.atoms);
  const lRow = new Float64Array(lk.length);
  const metals = combinations[0]!.length;
  const flat = combinations.flatMap((c) => c.flat());
  const start = new Int32Array(combinations.length * metals + 1);
  combinations.flat().forEach((planes, i) => (start[i + 1] = start[i]! + planes.length));
  const k = Float64Array.from(flat, (p) => p.k / p.atoms);
  const x = Float64Array.from(flat, (p) => p.x / p.atoms);
  const y = Float64Array.from(flat, (p) => p.y / p.atoms);
  const row = new Float64Array(k.length);
  const owner = new Uint8Array(size * size * metals);
  const dpH = (frame.pH[1] - frame.pH[0]) / (size - 1);
  const dE = (frame.Eh[1] - frame.Eh[0]) / (size - 1);
  const nl = ligands.length;
  let count = 0;

  function run(): number {
    count = 0;
    let sum = 0;
    for (let j = 0; j < size; j++) {
      const E = frame.Eh[0] + j * dE;
      for (let i = 0; i < lRow.length; i++) lRow[i] = lk[i]! + ly[i]! * E;
      for (let i = 0; i < row.length; i++) row[i] = k[i]! + y[i]! * E;
      for (let i = 0; i < size; i++) {
        const pH = frame.pH[0] + i * dpH;
        let combination = 0;
        for (let l = 0; l < nl; l++) {
          const from = ligandStart[l]!;
          const to = ligandStart[l + 1]!;
          let best = from;
          let low = lRow[from]! + lx[from]! * pH;
          for (let s = from + 1; s < to; s++) {
            const h = lRow[s]! + lx[s]! * pH;
            if (h < low) {
              low = h;
              best = s;
            }
          }
          combination = combination * (to - from) + best - from;
        }
        count += lRow.length;
        const base = combination * metals;
        const at = (j * size + i) * metals;
        for (let m = 0; m < metals; m++) {
          const from = start[base + m]!;
          const to = start[base + m + 1]!;
          let best = from;
          let low = row[from]! + x[from]! * pH;
          for (let s = from + 1; s < to; s++) {
            const h = row[s]! + x[s]! * pH;
            if (h < low) {
              low = h;
              best = s;
            }
          }
          owner[at + m] = best - from;
          sum += best - from;
          count += to - from;
        }
      }
    }
    return sum;
  }
  return { run, evaluations: () => count };
}

/** Planes of every combination of ligand holders, from the solver's own formation step (set-up, not timed). */
export function combinationsOf(
  ligandPlanes: readonly { component: string; planes: readonly Plane[] }[],
  metals: readonly MetalFields[],
): Plane[][][] {
  let combos = [new Map<string, Plane>()];
  for (const { component, planes } of ligandPlanes)
    combos = combos.flatMap((c) => planes.map((p) => new Map(c).set(component, p)));
  return combos.map((holders) =>
    metals.map((m) =>
      m.formations.map(({ plane, ligands }) => {
        let { k, x, y } = plane;
        for (const [component, n] of ligands) {
          const p = holders.get(component)!;
          k -= n * p.k;
          x -= n * p.x;
          y -= n * p.y;
        }
        return { k, x, y, atoms: plane.atoms };
      }),
    ),
  );
}
