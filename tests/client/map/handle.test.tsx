import { fireEvent, render, screen } from "@testing-library/react";
import { expect, test, vi } from "vitest";
import type { Point } from "../../../shared/solution";
import { sheetBoxes } from "../../../src/map/boxes";
import { SetPointHandle } from "../../../src/map/handle";

const sheet = sheetBoxes(800, 600, { metals: 2, reagents: 0, crosscuts: true, reach: false });
const visible: { pH: [number, number]; Eh: [number, number] } = { pH: [0, 10], Eh: [0, 1] };
function stage(at: Point = [5, 0.5]) {
  const onMove = vi.fn<(at: Point) => void>();
  const onSettle = vi.fn();
  render(
    <SetPointHandle sheet={sheet} visible={visible} at={at} label="Set point" onMove={onMove} onSettle={onSettle} />,
  );
  return { onMove, onSettle, handle: screen.queryByRole("button", { name: "Set point" }) };
}

test("arrow keys move the set point by a step, with Shift by five", () => {
  const { onMove, handle } = stage();
  fireEvent.keyDown(handle!, { key: "ArrowRight" });
  fireEvent.keyDown(handle!, { key: "ArrowDown", shiftKey: true });
  expect(onMove.mock.calls[0]![0][0]).toBeCloseTo(5.02, 9);
  expect(onMove.mock.calls[1]![0][1]).toBeCloseTo(0.475, 9);
});

test("a drag follows the hand from where it was taken, and ends with it", async () => {
  const { onMove, onSettle, handle } = stage();
  const perPH = (sheet.map.x1 - sheet.map.x0) / 10;
  fireEvent.pointerDown(handle!, { button: 0, clientX: 300, clientY: 200, pointerId: 1 });
  fireEvent.pointerMove(handle!, { clientX: 300 + perPH, clientY: 200, pointerId: 1 });
  await vi.waitFor(() => expect(onMove).toHaveBeenCalled());
  expect(onMove.mock.lastCall![0][0]).toBeCloseTo(6, 6);
  expect(onMove.mock.lastCall![0][1]).toBeCloseTo(0.5, 6);
  fireEvent.pointerUp(handle!, { pointerId: 1 });
  expect(onSettle).toHaveBeenCalledTimes(1);
});

test("it stays on the map, and goes when the point is out of sight", async () => {
  const { onMove, handle } = stage();
  fireEvent.pointerDown(handle!, { button: 0, clientX: 300, clientY: 200, pointerId: 1 });
  fireEvent.pointerMove(handle!, { clientX: 5000, clientY: -5000, pointerId: 1 });
  await vi.waitFor(() => expect(onMove).toHaveBeenCalled());
  expect(onMove.mock.lastCall![0][0]).toBeCloseTo(10, 9);
  expect(onMove.mock.lastCall![0][1]).toBeCloseTo(1, 9);
});

test("a point out of sight has no handle", () => expect(stage([12, 0.5]).handle).toBeNull());
