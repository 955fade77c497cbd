import { boundaryStyle, hatchesOf, hatchWeight } from "../../../shared/drawing/hatches";
import { lightPalette } from "../../../shared/drawing/palette";
import { windowName } from "../../../shared/windows/limitWords";
import { gap, heading, mutedStyle, rows, SIZES, SMALLEST, stack, textBlock, textStyle, type Block } from "./blocks";
import { drawHatch, UNIT } from "./plane";
import type { Pen } from "./pen";
import { roleColour } from "./roles";
import { metalSays } from "./says/asked";
import { setPointSays } from "./says/window";
import type { SheetWork } from "./work";

function keyRow(pen: Pen, work: SheetWork, index: number, size: number, width: number, brief: boolean): Block {
  const metal = work.revision.inputs.metals[index]!;
  const hatch = hatchesOf(work.revision.inputs.metals).get(metal.element);
  const text = textBlock(pen, metalSays(metal, work, brief), textStyle(size), width - 28);
  const colour = roleColour[metal.role];
  return {
    ...text,
    height: Math.max(text.height, size * 1.6),
    draw: (x, y) => {
      const { doc } = pen;
      const box = { x0: x, y0: y + 1, x1: x + 21, y1: y + size * 1.35 };
      doc
        .save()
        .rect(box.x0, box.y0, 21, box.y1 - box.y0)
        .clip();
      if (hatch && metal.requirement !== "free")
        drawHatch(pen, hatch, box, lightPalette[colour], hatchWeight[metal.role], UNIT * 0.8);
      doc.restore();
      const { width: weight, dash } = boundaryStyle[metal.role];
      const [on, off] = dash.split(",").map(Number.parseFloat);
      doc
        .lineWidth(weight * UNIT)
        .strokeColor(lightPalette[colour])
        .undash();
      if (on !== undefined && off !== undefined) doc.dash(on * UNIT, { space: off * UNIT });
      doc
        .rect(box.x0, box.y0, 21, box.y1 - box.y0)
        .stroke()
        .undash();
      text.draw(x + 28, y);
    },
  };
}

/** The column beside the map: where to run, and what the hatching means. */
export function besideMap(pen: Pen, work: SheetWork, width: number, height: number): Block {
  const { metals } = work.revision.inputs;
  const build = (size: number, brief: boolean): Block => {
    const { figures, notes } = setPointSays(work);
    const big = figures.map((text) => textBlock(pen, text, { size: 17, face: "monoBold", colour: "ink" }, width));
    const head = work.window
      ? [
          heading(pen, "Set point", `window ${windowName(work.chosen)}`, size, width),
          ...big,
          textBlock(pen, "vs SHE", mutedStyle(size), width),
        ]
      : [
          heading(pen, "No window is open", "", size, width),
          textBlock(
            pen,
            "All metals as required hold nowhere on this map.",
            { ...textStyle(size + 1.5), face: "bold" },
            width,
          ),
        ];
    const list = metals.map((_, i) => keyRow(pen, work, i, size, width, brief));
    return stack([
      ...head,
      ...notes.flatMap((text) => [textBlock(pen, text, textStyle(size), width), gap(size * 0.3)]),
      gap(size * 0.6),
      heading(pen, "Metals", "hatched: not as required", size, width),
      rows(pen, list, Infinity, size, width, "metals"),
    ]);
  };
  for (const brief of [false, true])
    for (const size of SIZES) {
      const block = build(size, brief);
      if (block.height <= height) return block;
    }
  return build(SMALLEST, true);
}
