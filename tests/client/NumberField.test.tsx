import { fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { expect, test, vi } from "vitest";
import { NumberField, type NumberFieldProps } from "../../src/components/NumberField";

function Held({ start, seen, ...rest }: { start: number; seen: (x: number) => void } & Partial<NumberFieldProps>) {
  const [value, setValue] = useState(start);
  return (
    <NumberField
      label="Temperature"
      value={value}
      onCommit={(x) => {
        seen(x);
        setValue(x);
      }}
      {...rest}
    />
  );
}
const field = () => screen.getByRole<HTMLInputElement>("spinbutton", { name: "Temperature" });
const type = (text: string) => fireEvent.change(field(), { target: { value: text } });

test("commits on Enter and on leaving, not while typing", () => {
  const seen = vi.fn();
  render(<Held start={60} seen={seen} unit="°C" />);
  type("75");
  expect(seen).not.toHaveBeenCalled();
  fireEvent.keyDown(field(), { key: "Enter" });
  expect(seen).toHaveBeenLastCalledWith(75);
  type("80,5");
  fireEvent.blur(field());
  expect(seen).toHaveBeenLastCalledWith(80.5);
  expect(field().value).toBe("80.5");
});

test("keeps what was typed when it is wrong, and says what is wrong", () => {
  const seen = vi.fn();
  render(<Held start={60} seen={seen} unit="°C" min={0} max={150} />);
  type("180");
  fireEvent.blur(field());
  expect(seen).not.toHaveBeenCalled();
  expect(field().value).toBe("180");
  expect(field().getAttribute("aria-invalid")).toBe("true");
  expect(screen.getByRole("alert").textContent).toContain("the most is 150");
  type("sixty");
  fireEvent.blur(field());
  expect(screen.getByRole("alert").textContent).toContain("“sixty” is not a number");
  fireEvent.keyDown(field(), { key: "Escape" });
  expect(field().value).toBe("60");
  expect(screen.queryByRole("alert")).toBeNull();
});

test("arrow keys step, Shift ten times as far, and stop at the bounds", () => {
  const seen = vi.fn();
  render(<Held start={60} seen={seen} step={1} max={150} />);
  fireEvent.keyDown(field(), { key: "ArrowUp" });
  expect(seen).toHaveBeenLastCalledWith(61);
  fireEvent.keyDown(field(), { key: "ArrowDown", shiftKey: true });
  expect(seen).toHaveBeenLastCalledWith(51);
  for (let i = 0; i < 12; i++) fireEvent.keyDown(field(), { key: "ArrowUp", shiftKey: true });
  expect(seen).toHaveBeenLastCalledWith(150);
  expect(seen).toHaveBeenCalledTimes(12);
});

test("a factor steps on a log scale and never reaches the excluded bound", () => {
  const seen = vi.fn();
  render(<Held start={0.01} seen={seen} factor={10} above={0} />);
  fireEvent.keyDown(field(), { key: "ArrowDown" });
  expect(seen).toHaveBeenLastCalledWith(0.001);
  type("0");
  fireEvent.blur(field());
  expect(screen.getByRole("alert").textContent).toContain("must be above 0");
});

test("an unchanged field does not commit, even where it shows fewer figures than it holds", () => {
  const seen = vi.fn();
  render(<Held start={1 / 3} seen={seen} />);
  fireEvent.focus(field());
  fireEvent.blur(field());
  expect(seen).not.toHaveBeenCalled();
});

test("an optional field may be emptied", () => {
  const cleared = vi.fn();
  const committed = vi.fn();
  render(<NumberField label="Temperature" value={3} onCommit={committed} onClear={cleared} />);
  type(" ");
  fireEvent.blur(field());
  expect(cleared).toHaveBeenCalledOnce();
  expect(committed).not.toHaveBeenCalled();
});

test("for those who may only look it is text", () => {
  const { container } = render(
    <NumberField label="Temperature" value={60} unit="°C" onCommit={() => undefined} readOnly />,
  );
  expect(screen.queryByRole("spinbutton")).toBeNull();
  expect(container.textContent).toBe("Temperature60\u2009°C");
});
