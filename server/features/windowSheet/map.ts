import { boundaryLines } from "../../../shared/drawing/boundaries";
import { boundaryStyle, hatchesOf, hatchWeight, type Hatch } from "../../../shared/drawing/hatches";
import { clipToBox, type Box, type Pixel } from "../../../shared/drawing/labels";
import { lightPalette } from "../../../shared/drawing/palette";
import { HCN_PH, pressureWords } from "../../../shared/hazards/words";
import type { Point } from "../../../shared/solution";
import { fixed } from "../../../shared/words/numbers";
import { drawAxes } from "./axes";
import { drawNames } from "./names";
import type { Colour, Inline, Pen, Style } from "./pen";
import { drawHatch, Plane } from "./plane";
import { roleColour, roleOrder } from "./roles";
import type { SheetWork } from "./work";
import { formula } from "./words";

const LEFT = 44;
const BELOW = 30;
const ABOVE = 4;
const PROBE = 44;

const nameStyle: Style = { size: 7.5, face: "sans", colour: "ink" };
const gasHatches = ["/", "\\", "|", "-", "x", "+", "."] as const;

/** The window map as vectors, from the solver's own polygons: hatching where a metal is not as required, windows lit, boundaries by role. */
export function drawMap(pen: Pen, work: SheetWork, outside: Box): void {
  const { doc } = pen;
  const { solution, revision, chosen, window, probe, robust } = work;
  const { inputs } = revision;
  const { frame } = solution;
  const box: Box = {
    x0: outside.x0 + LEFT,
    y0: outside.y0 + ABOVE,
    x1: outside.x1 - (probe ? PROBE : 6),
    y1: outside.y1 - BELOW,
  };
  const plane = new Plane(pen, box, frame);

  doc.save();
  doc.rect(box.x0, box.y0, box.x1 - box.x0, box.y1 - box.y0).clip();

  solution.windows.forEach((w, i) => {
    plane.outlines(w.polygons);
    doc
      .fillColor(lightPalette.tint)
      .fillOpacity(i === chosen ? 1 : 0.6)
      .fill("even-odd")
      .fillOpacity(1);
  });

  const hatches = hatchesOf(inputs.metals);
  for (const { element, role, requirement } of inputs.metals) {
    const hatch = hatches.get(element);
    if (!hatch || requirement === "free") continue;
    const shut = solution.shut?.find((s) => s.metal === element)?.polygons ?? [];
    plane.within(shut, () => drawHatch(pen, hatch, box, lightPalette[roleColour[role]], hatchWeight[role]));
  }

  const marks: Mark[] = [...drawHazards(plane, work)];

  const boundaries: Point[][] = [];
  for (const metal of [...inputs.metals].sort((a, b) => roleOrder[b.role] - roleOrder[a.role])) {
    const lines = boundaryLines(
      solution.fields.filter((f) => f.metal === metal.element),
      frame,
    );
    boundaries.push(...lines);
    const { width, dash } = boundaryStyle[metal.role];
    lines.forEach((line) => plane.trace(line));
    plane.stroke(width, roleColour[metal.role], dash);
  }

  const water = solution.waterLines.map(({ which, intercept, slope }) => ({
    which,
    line: frame.pH.map((pH): Point => [pH, intercept + slope * pH]),
  }));
  water.forEach(({ line }) => plane.trace(line));
  plane.stroke(1.3, "water", "8px,5px");

  [...solution.windows].reverse().forEach((w) => {
    plane.outlines(w.polygons);
    plane.stroke(w === window ? 2.8 : 1.5, "verdigris", w.controllable ? "solid" : "4px,3px");
  });
  if (robust && "windows" in robust) {
    plane.outlines(robust.windows);
    plane.stroke(1.6, "verdigris", "7px,3px");
  }

  const taken: Box[] = [];
  const own = window?.setPoint;
  if (own) {
    const [x, y] = [plane.px(own.pH), plane.py(own.Eh)];
    const [w, h] = [plane.px(own.pH + inputs.controlBand.pH) - x, y - plane.py(own.Eh + inputs.controlBand.Eh)];
    doc.rect(x - w, y - h, 2 * w, 2 * h);
    plane.stroke(2, "verdigris");
    doc.circle(x, y, 2.4).fill(lightPalette.verdigris);
    taken.push({ x0: x - w - 3, y0: y - h - 3, x1: x + w + 3, y1: y + h + 3 });
  }

  for (const { which, line } of water) {
    const [from, to] = line.map(plane.at) as [Pixel, Pixel];
    const [flat] = clipToBox([from, to, to], { ...box, x1: box.x1 - 8 }).sort((a, b) => b[0] - a[0]);
    if (!flat) continue;
    const text: Inline = which === "oxygen" ? [formula("O2"), ", 1 bar"] : [formula("H2"), ", 1 bar"];
    marks.push({ text, x: flat[0] - 20, y: flat[1] + (which === "oxygen" ? -4 : 12), colour: "water" });
  }
  for (const { text, x, y, colour } of marks) {
    const line = pen.line(text, { ...nameStyle, size: 7, colour });
    if (y < box.y0 + 4 || y > box.y1 - 1) continue;
    pen.write(line, x - line.width / 2, y, lightPalette.sheet);
    taken.push({ x0: x - line.width / 2 - 2, y0: y - 8, x1: x + line.width / 2 + 2, y1: y + 3 });
  }

  drawNames(plane, work, taken, boundaries);
  doc.restore();

  drawAxes(plane, solution.temperatureC, probe);
}

/** A word on the map, its middle at a point of the base line. */
interface Mark {
  text: Inline;
  x: number;
  y: number;
  colour: Colour;
}

/** Where gas leaves the liquor, in the signal colour and nothing else: sparse hatching, an edge, and its name. */
function drawHazards(plane: Plane, { revision, solution, drawnGases }: SheetWork): Mark[] {
  const { pen, box, frame } = plane;
  const marks: Mark[] = [];
  const { kept = [] } = solution;
  const sparse: Hatch = { shape: "|", size: 16, solidity: 0.07 };
  kept.forEach((k, i) => {
    plane.within(k.polygons, () => drawHatch(pen, sparse, box, lightPalette.signal, 0.55));
    plane.outlines(k.polygons);
    plane.stroke(1.6, "signal");
    const rule = k.bar === undefined ? `pH ${k.pHAtLeast}` : pressureWords(k.bar);
    const right = Math.max(...k.polygons.flatMap(({ outer }) => outer.map(([pH]) => plane.px(pH))));
    const x = Math.min(box.x1 - 60, Math.max(box.x0 + 60, right - 60));
    marks.push({ text: [formula(k.gas), ` kept out, ${rule}`], x, y: box.y0 + 9 + 11 * i, colour: "signal" });
  });
  const keepsHCN = kept.some((k) => k.gas === "HCN");
  if (!keepsHCN && revision.inputs.ligands.some((l) => l.component === "CN") && frame.pH[0] < HCN_PH) {
    const edge = Math.min(HCN_PH, frame.pH[1]);
    const [lo, hi] = frame.Eh;
    const region: Point[] = [
      [frame.pH[0], lo],
      [edge, lo],
      [edge, hi],
      [frame.pH[0], hi],
    ];
    plane.within([{ outer: region, holes: [] }], () => drawHatch(pen, sparse, box, lightPalette.signal, 0.55));
    plane.trace(region.slice(1, 3));
    plane.stroke(1.6, "signal");
    const x = Math.max(box.x0 + 34, plane.px(edge) - 36);
    marks.push({ text: ["HCN below pH ", fixed(HCN_PH, 1)], x, y: box.y0 + 9, colour: "signal" });
  }
  drawnGases.forEach((region, i) => {
    const hatch: Hatch = { shape: gasHatches[i % gasHatches.length] ?? "/", size: 18, solidity: 0.06 };
    plane.within(region.region, () => drawHatch(pen, hatch, box, lightPalette.signal, 0.5));
    region.isoLines.forEach((line) => plane.trace(line));
    plane.stroke(1.4, "signal");
    const spot = longestStretch(
      region.isoLines.map((line) => line.map(plane.at)),
      box,
    );
    const [threshold = ""] = region.threshold.words.split(",");
    if (spot)
      marks.push({
        text: [formula(region.gas), `, ${threshold.replace(" by volume", "")}`],
        x: spot[0],
        y: spot[1] - 3,
        colour: "signal",
      });
  });
  return marks;
}

/** The middle of the longest straight stretch of some lines in sight, away from the sides. */
function longestStretch(lines: readonly (readonly Pixel[])[], box: Box): Pixel | null {
  const inner = { x0: box.x0 + 30, y0: box.y0 + 24, x1: box.x1 - 30, y1: box.y1 - 8 };
  let best: { middle: Pixel; length: number } | null = null;
  for (const line of lines)
    for (const [i, b] of line.entries()) {
      const a = line[i - 1];
      if (!a) continue;
      const part = clipToBox([a, b, b], inner);
      const [first, last] = [part[0], part.findLast(([x, y]) => x !== part[0]?.[0] || y !== part[0]?.[1])];
      if (!first || !last) continue;
      const length = Math.hypot(last[0] - first[0], last[1] - first[1]);
      if (best === null || length > best.length)
        best = { middle: [(first[0] + last[0]) / 2, (first[1] + last[1]) / 2], length };
    }
  return best?.middle ?? null;
}
