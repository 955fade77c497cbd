import { fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { expect, test, vi } from "vitest";
import { NumberField } from "../../../src/components/NumberField";
import { useKeys } from "../../../src/features/workspace/model/useKeys";

function Screen({ undo, save, letter }: { undo: () => void; save: (value: number) => void; letter: () => void }) {
  const [value, setValue] = useState(60);
  useKeys([
    { key: "z", ctrl: true, run: undo },
    { key: "s", ctrl: true, run: () => save(value) },
    { key: "f", run: letter },
  ]);
  return <NumberField label="Temperature" value={value} onCommit={setValue} />;
}

test("in a field a letter is a letter, undo is the field's while something typed waits, and saving takes what was typed first", async () => {
  const [undo, save, letter] = [vi.fn(), vi.fn(), vi.fn()];
  render(<Screen {...{ undo, save, letter }} />);
  const field = screen.getByRole<HTMLInputElement>("spinbutton", { name: "Temperature" });
  field.focus();
  fireEvent.keyDown(field, { key: "f" });
  expect(letter).not.toHaveBeenCalled();

  fireEvent.change(field, { target: { value: "85" } });
  expect(fireEvent.keyDown(field, { key: "z", ctrlKey: true })).toBe(true);
  expect(undo).not.toHaveBeenCalled();
  fireEvent.keyDown(field, { key: "Enter" });
  expect(fireEvent.keyDown(field, { key: "z", ctrlKey: true })).toBe(false);
  expect(undo).toHaveBeenCalledOnce();

  fireEvent.change(field, { target: { value: "90" } });
  expect(fireEvent.keyDown(field, { key: "s", ctrlKey: true })).toBe(false);
  await vi.waitFor(() => expect(save).toHaveBeenCalledExactlyOnceWith(90));
});
