// @vitest-environment jsdom
import { render } from "@testing-library/react";
import { expect, test } from "vitest";
import { sheetBoxes } from "../../../src/map/boxes";
import { trace } from "../../../src/map/plotTypes";
import { Shapes } from "../../../src/map/svg/Shapes";
import { themeColours } from "../../../src/lib/theme";
import { millivolts } from "./fixture";

const sheet = sheetBoxes(400, 300, { metals: 0, reagents: 0, crosscuts: false, reach: false });
const { x0, x1, y0, y1 } = sheet.map;
const visible = { pH: [0, 10] as [number, number], Eh: [-0.2, 0.8] as [number, number] };
const view = { scale: millivolts, colours: themeColours.light };

const drawn = (...traces: ReturnType<typeof trace>[]) =>
  render(<Shapes traces={traces} sheet={sheet} visible={visible} view={view} />).container;

test("corners stand where the axes have them, on the shown scale", () => {
  const [left, right] = [millivolts.toShown(-0.2), millivolts.toShown(0.8)];
  const area = trace({
    uid: "a",
    name: "A",
    mode: "lines",
    fill: "toself",
    fillcolor: "red",
    x: [0, 10, 10, null, 5, 5],
    y: [left, left, right, null, left, right],
  });
  const path = drawn(area).querySelector("[data-trace=a] path");
  const foot = sheet.height - y0;
  const head = sheet.height - y1;
  expect(path?.getAttribute("d")).toBe(
    `M${x0} ${foot}L${x1} ${foot}L${x1} ${head}M${(x0 + x1) / 2} ${foot}L${(x0 + x1) / 2} ${head}`,
  );
  expect(path?.getAttribute("fill")).toBe("red");
  expect(path?.hasAttribute("stroke")).toBe(false);
});

test("a hatched area takes its own pattern; a dashed line its dashes; a gap in the sizes leaves a mark out", () => {
  const hatched = trace({
    uid: "h",
    name: "H",
    mode: "lines",
    line: { color: "rgba(0,0,0,0)", width: 0 },
    fill: "toself",
    fillpattern: { shape: "/", size: 9, solidity: 0.12, fgcolor: "black", fgopacity: 0.5, bgcolor: "rgba(0,0,0,0)" },
    x: [0, 1, 1],
    y: [0, 0, 1],
  });
  const line = trace({
    uid: "l",
    name: "L",
    mode: "lines",
    line: { color: "blue", width: 1.5, dash: "8px,5px" },
    x: [0, 1],
    y: [0, 1],
  });
  const marks = trace({
    uid: "m",
    name: "M",
    mode: "lines+markers",
    line: { color: "green", width: 1 },
    marker: { color: "green", size: [0, 8], symbol: "circle", opacity: 1, line: { width: 0 } },
    x: [0, 5],
    y: [0, 300],
  });
  const container = drawn(hatched, line, marks);
  const fill = container.querySelector("[data-trace=h] path")?.getAttribute("fill") ?? "";
  const pattern = /^url\(#(.+)\)$/.exec(fill)?.[1];
  expect(container.querySelector(`pattern[id="${pattern}"]`)).not.toBeNull();
  const stroked = container.querySelector("[data-trace=l] path");
  expect([stroked?.getAttribute("stroke-dasharray"), stroked?.getAttribute("stroke-width")]).toEqual(["8,5", "1.5"]);
  expect(container.querySelectorAll("[data-trace=m] circle")).toHaveLength(1);
  expect(container.querySelector("[data-trace=m] circle")?.getAttribute("r")).toBe("4");
});
