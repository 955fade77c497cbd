import { fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { describe, expect, test } from "vitest";
import { EntryGrid } from "../../src/components/EntryGrid";
import { clipboardBlock, layBlock, type GridColumn } from "../../src/components/entryGridModel";

interface Line {
  name: string;
  value: string;
  kind: string;
  on: boolean;
}
const blank = (rows: readonly Line[]): Line => ({ name: "", value: "", kind: rows.at(-1)?.kind ?? "a", on: false });
const columns: GridColumn<Line>[] = [
  { id: "name", kind: "text", header: "name", label: "name", width: "5em", words: true, get: (l) => l.name, set: (l, name) => ({ ...l, name }) },
  { id: "value", kind: "text", header: "value", label: "value", width: "5em", get: (l) => l.value, set: (l, value) => ({ ...l, value }), problem: (l) => (l.value === "x" ? "not a number" : null) },
  { id: "twice", kind: "shown", header: "twice", label: "twice", width: "5em", show: (l) => String(2 * Number(l.value)) },
  { id: "kind", kind: "choice", header: "kind", label: "kind", width: "5em", options: [{ value: "a", label: "Alpha" }, { value: "b", label: "Beta" }], get: (l) => l.kind, set: (l, kind) => ({ ...l, kind }) },
  { id: "on", kind: "check", header: "on", label: "on", width: "3em", get: (l) => l.on, set: (l, on) => ({ ...l, on }) },
]; // prettier-ignore

let latest: Line[] = [];
function Grid({ start, fixed = false }: { start: Line[]; fixed?: boolean }) {
  const [rows, setRows] = useState(start);
  return (
    <EntryGrid
      caption="Lines"
      rowName="line"
      rows={rows}
      columns={columns}
      {...(fixed ? {} : { blank })}
      onChange={(next) => {
        latest = next;
        setRows(next);
      }}
    />
  );
}
const line = (name: string, value: string): Line => ({ name, value, kind: "a", on: false });
const cell = (row: number, column: string) => screen.getByLabelText(`line ${row}, ${column}`);

describe("a block from a spreadsheet", () => {
  test("cells by tab, rows by line; a last line break is none", () =>
    expect(clipboardBlock('a\t"1,5"\r\nb\t2\r\n')).toEqual([
      ["a", "1,5"],
      ["b", "2"],
    ]));
  test("is laid over what is typed, computed columns passed over, rows added", () => {
    const laid = layBlock([line("a", "1")], columns, { row: 0, column: 1 }, [["7", "beta", "yes"], ["8", "nonsense", ""]], blank); // prettier-ignore
    expect(laid.lost).toBe(0);
    expect(laid.rows).toEqual([
      { name: "a", value: "7", kind: "b", on: true },
      { name: "", value: "8", kind: "b", on: false },
    ]);
  });
  test("what finds no place is counted, never silently lost", () => {
    const laid = layBlock([line("a", "1")], columns, { row: 0, column: 4 }, [["yes", "more"], ["no", "x"]], null); // prettier-ignore
    expect(laid.lost).toBe(3);
  });
});

describe("entry as in a ledger", () => {
  test("typing into the free row adds it", () => {
    render(<Grid start={[line("a", "1")]} />);
    fireEvent.change(cell(2, "name"), { target: { value: "b" } });
    expect(latest.map((l) => l.name)).toEqual(["a", "b"]);
    expect(cell(3, "name")).toBeTruthy();
  });
  test("Enter goes down, arrows pass over computed cells", () => {
    render(<Grid start={[line("a", "1"), line("b", "2")]} />);
    cell(1, "value").focus();
    fireEvent.keyDown(cell(1, "value"), { key: "Enter" });
    expect(document.activeElement).toBe(cell(2, "value"));
    fireEvent.keyDown(cell(2, "value"), { key: "ArrowRight" });
    expect(document.activeElement).toBe(cell(2, "kind"));
  });
  test("Ctrl+D repeats the cell above, text as it stands", () => {
    render(<Grid start={[line("a", "<0,05"), line("b", "")]} />);
    cell(2, "value").focus();
    fireEvent.keyDown(cell(2, "value"), { key: "d", ctrlKey: true });
    expect(latest[1]?.value).toBe("<0,05");
  });
  test("Escape takes back what was typed into the cell", () => {
    render(<Grid start={[line("a", "1")]} />);
    fireEvent.focus(cell(1, "value"));
    fireEvent.change(cell(1, "value"), { target: { value: "12" } });
    fireEvent.keyDown(cell(1, "value"), { key: "Escape" });
    expect((cell(1, "value") as HTMLInputElement).value).toBe("1");
  });
  test("a pasted block says how much it was, and what found no place", () => {
    render(<Grid start={[line("a", "1")]} fixed />);
    fireEvent.paste(cell(1, "value"), { clipboardData: { getData: () => "5\n6" } });
    expect(latest[0]?.value).toBe("5");
    expect(screen.getByText("2 × 1 pasted; 1 cell found no place and were left out")).toBeTruthy();
  });
  test("one pasted word is left to the field", () => {
    render(<Grid start={[line("a", "1")]} />);
    expect(fireEvent.paste(cell(1, "value"), { clipboardData: { getData: () => "5" } })).toBe(true);
  });
  test("what is wrong is said with its row, and stays as typed", () => {
    render(<Grid start={[line("a", "x")]} />);
    expect(screen.getByRole("alert").textContent).toBe("line 1: not a number");
    expect(cell(1, "value").getAttribute("aria-invalid")).toBe("true");
    expect((cell(1, "value") as HTMLInputElement).value).toBe("x");
  });
  test("a row can be taken out; rows that are fixed cannot", () => {
    render(<Grid start={[line("a", "1"), line("b", "2")]} />);
    fireEvent.click(screen.getByRole("button", { name: "remove line 1" }));
    expect(latest.map((l) => l.name)).toEqual(["b"]);
  });
});
