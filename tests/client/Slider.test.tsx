import { fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { expect, test, vi } from "vitest";
import { LogSlider, Slider } from "../../src/components/Slider";

function Activity({ start, seen, done }: { start: number; seen: (x: number) => void; done: (x: number) => void }) {
  const [value, setValue] = useState(start);
  return (
    <LogSlider
      label="Zinc"
      value={value}
      min={1e-8}
      max={10}
      onChange={(x) => {
        seen(x);
        setValue(x);
      }}
      onCommit={done}
    />
  );
}
const thumb = () => screen.getByRole("slider", { name: "Zinc, slider" });

test("stands at the logarithm of its value and says the value itself", () => {
  render(<Activity start={0.01} seen={() => undefined} done={() => undefined} />);
  expect(Number(thumb().getAttribute("aria-valuenow"))).toBeCloseTo(-2, 9);
  expect(thumb().getAttribute("aria-valuemin")).toBe("-8");
  expect(thumb().getAttribute("aria-valuemax")).toBe("1");
  expect(thumb().getAttribute("aria-valuetext")).toBe("1.0e-2");
});

test("a key moves a twentieth of a decade, in two figures, and Page ten times that", () => {
  const seen = vi.fn();
  const done = vi.fn();
  render(<Activity start={0.01} seen={seen} done={done} />);
  fireEvent.keyDown(thumb(), { key: "ArrowRight" });
  expect(seen).toHaveBeenLastCalledWith(0.011);
  expect(done).toHaveBeenLastCalledWith(0.011);
  fireEvent.keyDown(thumb(), { key: "PageUp" });
  expect(seen).toHaveBeenLastCalledWith(0.035);
  fireEvent.keyDown(thumb(), { key: "Home" });
  expect(seen).toHaveBeenLastCalledWith(1e-8);
});

test("keys walk the whole scale without sticking where two figures round", () => {
  const seen = vi.fn();
  render(<Activity start={0.01} seen={seen} done={() => undefined} />);
  for (let i = 0; i < 40; i++) fireEvent.keyDown(thumb(), { key: "ArrowRight" });
  expect(seen).toHaveBeenCalledTimes(40);
  expect(seen).toHaveBeenLastCalledWith(1);
  const values = seen.mock.calls.map(([x]) => x as number);
  expect([...values].sort((a, b) => a - b)).toEqual(values);
  expect(new Set(values).size).toBe(40);
});

test("a typed number need not lie on the track", () => {
  const done = vi.fn();
  render(<Activity start={0.01} seen={() => undefined} done={done} />);
  const field = screen.getByRole("spinbutton", { name: "Zinc" });
  fireEvent.change(field, { target: { value: "3,3e-11" } });
  fireEvent.keyDown(field, { key: "Enter" });
  expect(done).toHaveBeenLastCalledWith(3.3e-11);
  expect(thumb().getAttribute("aria-valuenow")).toBe("-8");
  fireEvent.change(field, { target: { value: "-1" } });
  fireEvent.keyDown(field, { key: "Enter" });
  expect(screen.getByRole("alert").textContent).toContain("must be above 0");
  expect(done).toHaveBeenCalledTimes(1);
});

test("an even slider moves by its step", () => {
  const seen = vi.fn();
  render(<Slider label="Liquor" value={60} min={0} max={150} step={5} unit="°C" onChange={seen} />);
  const liquor = screen.getByRole("slider", { name: "Liquor, slider" });
  expect(liquor.getAttribute("aria-valuetext")).toBe("60\u2009°C");
  fireEvent.keyDown(liquor, { key: "ArrowLeft" });
  expect(seen).toHaveBeenLastCalledWith(55);
});
