import { lightPalette } from "../../../shared/drawing/palette";
import { fixed } from "../../../shared/words/numbers";
import type { Pen, Style } from "./pen";
import type { Plane } from "./plane";
import type { SheetWork } from "./work";

const axisStyle: Style = { size: 7.5, face: "mono", colour: "ink" };

/** Round steps that give some `wanted` ticks. */
export function ticksOf(lo: number, hi: number, wanted: number): { at: number[]; digits: number } {
  const raw = (hi - lo) / wanted;
  const power = 10 ** Math.floor(Math.log10(raw));
  const step = ([1, 2, 5, 10].find((s) => s * power >= raw * 0.999) ?? 10) * power;
  const first = Math.ceil(lo / step - 1e-9);
  const at: number[] = [];
  for (let k = first; k * step <= hi + 1e-9 * step; k++) at.push(k * step);
  return { at, digits: Math.max(0, -Math.floor(Math.log10(step) + 1e-9)) };
}

/** The frame of the map with its scales: pH below, Eh vs SHE at the left, the probe's millivolts at the right. */
export function drawAxes(plane: Plane, temperatureC: number, probe: SheetWork["probe"]): void {
  const { pen, box, frame } = plane;
  const { doc } = pen;
  const ink = lightPalette.ink;
  doc.lineWidth(0.9).strokeColor(ink).undash();
  doc.rect(box.x0, box.y0, box.x1 - box.x0, box.y1 - box.y0).stroke();
  const pH = ticksOf(frame.pH[0], frame.pH[1], 8);
  for (const v of pH.at) {
    doc
      .moveTo(plane.px(v), box.y1)
      .lineTo(plane.px(v), box.y1 + 3.5)
      .stroke();
    const line = pen.line(fixed(v, pH.digits), axisStyle);
    pen.write(line, plane.px(v) - line.width / 2, box.y1 + 11.5);
    doc.lineWidth(0.9).strokeColor(ink);
  }
  const Eh = ticksOf(frame.Eh[0], frame.Eh[1], 8);
  for (const v of Eh.at) {
    doc
      .moveTo(box.x0, plane.py(v))
      .lineTo(box.x0 - 3.5, plane.py(v))
      .stroke();
    const line = pen.line(fixed(v, Math.max(1, Eh.digits)), axisStyle);
    pen.write(line, box.x0 - 6 - line.width, plane.py(v) + 2.6);
    doc.lineWidth(0.9).strokeColor(ink);
  }
  const under = pen.line(`pH at ${fixed(temperatureC, 1)}\u2009°C`, { ...axisStyle, face: "monoBold" });
  pen.write(under, box.x1 - under.width, box.y1 + 22);
  upright(pen, "Eh / V vs SHE", box.x0 - 34, (box.y0 + box.y1) / 2);
  if (!probe) return;
  const mV = (E: number) => (E - probe.offset) * 1000;
  const ticks = ticksOf(mV(frame.Eh[0]), mV(frame.Eh[1]), 8);
  for (const v of ticks.at) {
    const y = plane.py(v / 1000 + probe.offset);
    doc
      .lineWidth(0.9)
      .strokeColor(ink)
      .moveTo(box.x1, y)
      .lineTo(box.x1 + 3.5, y)
      .stroke();
    pen.write(pen.line(fixed(v, 0), axisStyle), box.x1 + 6, y + 2.6);
  }
  upright(pen, `E / mV vs ${probe.label}`, box.x1 + 38, (box.y0 + box.y1) / 2);
}

/** Words that run up the page, their middle at a point. */
function upright(pen: Pen, text: string, x: number, y: number): void {
  const line = pen.line(text, { ...axisStyle, face: "monoBold" });
  pen.doc.save().rotate(-90, { origin: [x, y] });
  pen.write(line, x - line.width / 2, y);
  pen.doc.restore();
}
