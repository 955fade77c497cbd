import { DEFERENCE } from "../../../shared/hazards/exposure";
import { lightPalette } from "../../../shared/drawing/palette";
import { windowName } from "../../../shared/windows/limitWords";
import { cells, gap, heading, mutedStyle, rows, stack, textBlock, textStyle, type Block, type Column } from "./blocks";
import type { Pen } from "./pen";
import { inputsSay } from "./says/asked";
import { cautionsSay } from "./says/cautions";
import { reactionsSay } from "./says/reactions";
import { reachSays } from "./says/reach";
import { robustSays } from "./says/robust";
import { gradesSay, warningsSay } from "./says/trust";
import { conflictSays, limitSays } from "./says/window";
import type { SheetWork } from "./work";

const GUTTER = 16;

/** How many rows of each part are shown; what does not fit is counted on the page. */
export interface Caps {
  limits: number;
  inputs: number;
  warnings: number;
  reactions: number;
  reach: number;
  exposure: boolean;
  /** every species is named with its grade, not only those on a limit */
  grades: boolean;
}
export const ALL: Caps = {
  limits: Infinity,
  inputs: Infinity,
  warnings: Infinity,
  reactions: Infinity,
  reach: Infinity,
  exposure: true,
  grades: true,
};

const ledger: readonly Column[] = [
  { share: 0.085 },
  { share: 0.265 },
  { share: 0.415 },
  { share: 0.14, align: "right" },
  { share: 0.095, align: "right" },
];

function limitsBlock(pen: Pen, work: SheetWork, size: number, width: number, caps: Caps): Block {
  if (!work.window) {
    const said = conflictSays(work).map((text) => textBlock(pen, text, textStyle(size + 0.6), width));
    return stack([
      heading(pen, "What cannot hold together", "", size, width),
      rows(pen, said, caps.limits, size, width, "sets"),
    ]);
  }
  const style = textStyle(size);
  const list = work.sentences.map((s) => cells(pen, ledger, limitSays(s), style, width));
  const head = cells(
    pen,
    ledger,
    ["side", "what happens there", "by which reaction", "distance", "control bands"],
    mutedStyle(size - 0.7),
    width,
  );
  return stack([
    heading(
      pen,
      `What shuts window ${windowName(work.chosen)}`,
      "distances from the set point, nearest first",
      size,
      width,
    ),
    head,
    gap(size * 0.35),
    rows(pen, list, caps.limits, size, width, "limits"),
  ]);
}

function leftColumn(pen: Pen, work: SheetWork, size: number, width: number, caps: Caps): Block {
  const style = textStyle(size);
  const pair: readonly Column[] = [{ share: 0.27 }, { share: 0.73 }];
  const asked = inputsSay(work).map(([label, value]) => cells(pen, pair, [label, value], style, width));
  const over = robustSays(work)?.map((text) => textBlock(pen, text, style, width));
  const reached = reachSays(work).map((text) => textBlock(pen, text, style, width));
  const balanced = reactionsSay(work).map(({ reaction, demand }) =>
    stack([textBlock(pen, reaction, style, width), textBlock(pen, demand, mutedStyle(size - 0.5), width)]),
  );
  return stack([
    heading(pen, "What was asked", "", size, width),
    rows(pen, asked, caps.inputs, size, width, "inputs"),
    ...(over
      ? [
          gap(size * 0.8),
          heading(pen, "Over the ranges", "dashed inner outline", size, width),
          rows(pen, over, Infinity, size, width, "lines"),
        ]
      : []),
    ...(reached.length > 0
      ? [
          gap(size * 0.8),
          heading(pen, "Reach", "what platinum commonly reads, vs SHE; no equilibrium", size, width),
          rows(pen, reached, caps.reach, size, width, "reagents"),
        ]
      : []),
    ...(balanced.length > 0
      ? [
          gap(size * 0.8),
          heading(pen, "Overall reactions", "at the set point; mol/mol, kg/t of the start", size, width),
          rows(pen, balanced, caps.reactions, size, width, "reactions"),
        ]
      : []),
  ]);
}

function gradesBlock(pen: Pen, work: SheetWork, size: number, width: number, caps: Caps): Block {
  const grades = gradesSay(work, !caps.grades).map((text) => textBlock(pen, text, textStyle(size), width));
  return stack([
    gap(size * 0.8),
    heading(pen, "Data grades", "bold: on a limit of the window", size, width),
    rows(pen, grades, Infinity, size, width, "grades"),
  ]);
}

function rightColumn(pen: Pen, work: SheetWork, size: number, width: number, caps: Caps): Block {
  const inner = width - 8;
  const cautions = cautionsSay(work).map(({ text, limits }): Block => {
    const body = stack([
      textBlock(pen, text, textStyle(size), inner),
      ...(limits && caps.exposure ? [textBlock(pen, limits, mutedStyle(size - 0.9), inner)] : []),
    ]);
    return {
      height: body.height + size * 0.55,
      dropped: limits && !caps.exposure ? 1 : 0,
      draw: (x, y) => {
        pen.doc.rect(x, y + 1, 2.4, body.height).fill(lightPalette.signal);
        body.draw(x + 8, y);
      },
    };
  });
  const without = cautions.some((c) => c.dropped > 0);
  const warnings = warningsSay(work).map((text) => textBlock(pen, text, textStyle(size), width));
  return stack([
    heading(pen, "Cautions", "", size, width),
    gap(size * 0.2),
    ...cautions,
    ...(without
      ? [textBlock(pen, "Exposure values stand in the plan.", { ...textStyle(size), face: "bold" }, width)]
      : []),
    textBlock(pen, DEFERENCE, mutedStyle(size - 0.9), width),
    ...(warnings.length > 0
      ? [
          gap(size * 0.6),
          heading(pen, "Before you trust this", "", size, width),
          rows(pen, warnings, caps.warnings, size, width, "warnings"),
        ]
      : []),
  ]);
}

/** Under the map: what shuts the window, then what was asked and how good the data are beside cautions and warnings. */
export function belowMap(pen: Pen, work: SheetWork, size: number, width: number, caps: Caps): Block {
  const half = (width - GUTTER) / 2;
  const limits = limitsBlock(pen, work, size, width, caps);
  const asked = leftColumn(pen, work, size, half, caps);
  const cautions = rightColumn(pen, work, size, half, caps);
  const grades = gradesBlock(pen, work, size, half, caps);
  // where there is more room
  const onTheLeft = asked.height <= cautions.height;
  const left = onTheLeft ? stack([asked, grades]) : asked;
  const right = onTheLeft ? cautions : stack([cautions, grades]);
  const top = limits.height + size;
  return {
    height: top + Math.max(left.height, right.height),
    dropped: limits.dropped + left.dropped + right.dropped,
    draw: (x, y) => {
      limits.draw(x, y);
      left.draw(x, y + top);
      right.draw(x + half + GUTTER, y + top);
    },
  };
}
