import { lowerEnvelope, type Plane } from "../../shared/geometry/envelope";
import { rectangle } from "../../shared/geometry/convex";
import { valueOf } from "../../shared/outcome";
import { solve } from "../../shared/solve";
import { chemistry } from "../support/chemistry";
import { median, seeded, table, timed } from "./rivals/measure";
import { fourInSulfate } from "./rivals/problems";

/** Planes all of which touch the envelope (tangents of a bowl, the worst case), and planes most of which do not. */
function planes(count: number, allRule: boolean): Plane[] {
  const random = seeded(7);
  return Array.from({ length: count }, () => {
    const [u, v] = [random() * 14, random() * 2 - 1];
    const lift = allRule ? 0 : random() * 4e5;
    // tangent plane of -(u^2 + 49 v^2) turned over
    return {
      k: Math.round(1024 * (100 * (u * u + 49 * v * v) + lift)),
      x: Math.round(-1024 * 200 * u),
      y: Math.round(-1024 * 9800 * v),
      atoms: 1,
    };
  });
}

const frame = rectangle([0, 14], [-1, 1], [-1, -2, -3, -4]);
const rows = [10, 20, 50, 100, 200].map((count) => {
  const cells = [String(count)];
  for (const allRule of [false, true]) {
    const set = planes(count, allRule);
    for (let i = 0; i < 20; i++) lowerEnvelope(set, frame);
    const times = Array.from({ length: 15 }, () => timed(() => lowerEnvelope(set, frame)));
    cells.push(String(lowerEnvelope(set, frame).length), (median(times) * 1000).toFixed(0));
  }
  return cells;
});
table(["species of one metal", "fields", "µs", "fields, all rule", "µs, all rule"], rows);

const library = chemistry();
const totals = [
  { component: "S", activity: 0.5 },
  { component: "Cl", activity: 0.5 },
  { component: "C", activity: 0.01 },
  { component: "NH3", activity: 0.1 },
];
table(
  ["ligands", "cells of fields", "ms a solve"],
  [0, 1, 2, 3, 4].map((n) => {
    const problem = { ...fourInSulfate, ligands: totals.slice(0, n) };
    let fields = 0;
    for (let i = 0; i < 20; i++) fields = valueOf(solve(problem, library)).fields.length;
    const times = Array.from({ length: 31 }, (_, i) =>
      timed(() => valueOf(solve({ ...problem, temperatureC: 60 + i * 1e-5 }, library))),
    );
    return [String(n), String(fields), median(times).toFixed(2)];
  }),
);
