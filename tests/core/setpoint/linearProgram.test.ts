import { describe, expect, test } from "vitest";
import { largest, type Constraint } from "../../../shared/setpoint/linearProgram";
import { seeded, type Random } from "../../support/random";

const BOX = 50;
const walls: Constraint[] = [[1, 0, 0, BOX], [-1, 0, 0, BOX], [0, 1, 0, BOX], [0, -1, 0, BOX], [0, 0, 1, BOX], [0, 0, -1, BOX]]; // prettier-ignore

/** The best of all crossings of three planes that every row allows. */
function slowly(rows: readonly Constraint[]): number | null {
  const all = [...rows, ...walls];
  let best: number | null = null;
  for (let i = 0; i < all.length; i++)
    for (let j = 0; j < i; j++)
      for (let k = 0; k < j; k++) {
        const at = crossing(all[i]!, all[j]!, all[k]!);
        if (at && all.every((r) => excess(r, at) < 1e-9) && (best === null || at[2] > best)) best = at[2];
      }
  return best;
}

const excess = ([a, b, c, d]: Constraint, [u, v, m]: readonly [number, number, number]): number =>
  a * u + b * v + c * m - d;

function crossing(p: Constraint, q: Constraint, r: Constraint): [number, number, number] | null {
  const det = (i: number, j: number, k: number): number =>
    p[i]! * (q[j]! * r[k]! - q[k]! * r[j]!) -
    p[j]! * (q[i]! * r[k]! - q[k]! * r[i]!) +
    p[k]! * (q[i]! * r[j]! - q[j]! * r[i]!);
  const all = det(0, 1, 2);
  return Math.abs(all) < 1e-12 ? null : [det(3, 1, 2) / all, det(0, 3, 2) / all, det(0, 1, 3) / all];
}

const whole = (r: Random): Constraint => [r.whole(-2, 2), r.whole(-2, 2), r.whole(-1, 2), r.whole(-6, 10)];
const anyNumber = (r: Random): Constraint => [
  r.between(-1, 1),
  r.between(-1, 1),
  r.between(-0.2, 1),
  r.between(-6, 10),
];

describe("the linear program", () => {
  test.each([
    ["whole numbers, many rows alike", whole],
    ["any numbers", anyNumber],
  ] as const)("equals brute force: %s", (_, row) => {
    const random = seeded(20261201);
    const complaints: string[] = [];
    let empty = 0;
    for (let n = 0; n < 700; n++) {
      const rows = Array.from({ length: random.whole(1, 8) }, () => row(random));
      const [found, best] = [largest(rows, BOX), slowly(rows)];
      if (best === null) empty++;
      if ((found === null) !== (best === null) || (found && Math.abs(found[2] - best!) > 1e-7))
        complaints.push(`${JSON.stringify(rows)}: ${found?.[2]}, by hand ${best}`);
      if (found && [...rows, ...walls].some((r) => excess(r, found) > 1e-7))
        complaints.push(`${JSON.stringify(rows)}: outside`);
    }
    expect(complaints).toEqual([]);
    expect(empty).toBeGreaterThan(20);
  });

  test("nothing asked: the corner of the box", () => expect(largest([], 7)).toEqual([7, 7, 7]));
  test("a contradiction", () => expect(largest([[1, 0, 0, -1], [-1, 0, 0, -1]], 7)).toBeNull()); // prettier-ignore
  test("a row of zeros that cannot hold", () => expect(largest([[0, 0, 0, -1]], 7)).toBeNull());
});
