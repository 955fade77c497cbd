import { fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { expect, test, vi } from "vitest";
import { DataTable } from "../../src/components/DataTable";
import { tableCsv, type Column } from "../../src/components/tableModel";

interface Metal {
  symbol: string;
  name: string;
  mass: number | null;
}
const metals: Metal[] = [
  { symbol: "Zn", name: "zinc", mass: 65.38 },
  { symbol: "Fe", name: "iron", mass: 55.845 },
  { symbol: "Cu", name: "copper", mass: 63.546 },
  { symbol: "X", name: 'unknown, "so far"', mass: null },
];
const columns: Column<Metal>[] = [
  { id: "symbol", header: "symbol", value: (m) => m.symbol },
  { id: "name", header: "name", value: (m) => m.name },
  { id: "mass", header: "M", unit: "g/mol", digits: 2, asGiven: true, value: (m) => m.mass },
];

function Table({ filter = "", onSelect = () => undefined, onOpen = () => undefined }: Partial<Handlers>) {
  const [selected, setSelected] = useState<string>();
  return (
    <DataTable
      caption="Metals"
      rows={metals}
      columns={columns}
      rowKey={(m) => m.symbol}
      filter={filter}
      selectedKey={selected}
      onSelect={(m) => {
        setSelected(m.symbol);
        onSelect(m);
      }}
      onOpen={onOpen}
    />
  );
}
interface Handlers {
  filter: string;
  onSelect: (m: Metal) => void;
  onOpen: (m: Metal) => void;
}

const bodyRows = () => [...document.querySelectorAll<HTMLTableRowElement>("tbody tr")];
const column = (at: number) => bodyRows().map((row) => row.cells[at]?.textContent);
const symbols = () => column(0);

test("sorts by a heading, unknown values last both ways", () => {
  render(<Table />);
  expect(symbols()).toEqual(["Zn", "Fe", "Cu", "X"]);
  fireEvent.click(screen.getByRole("button", { name: "M" }));
  expect(symbols()).toEqual(["Fe", "Cu", "Zn", "X"]);
  expect(screen.getByRole("columnheader", { name: /^M/ }).getAttribute("aria-sort")).toBe("ascending");
  fireEvent.click(screen.getByRole("button", { name: "M" }));
  expect(symbols()).toEqual(["Zn", "Cu", "Fe", "X"]);
});

test("every word of the filter must stand in the row", () => {
  const { rerender } = render(<Table filter="co" />);
  expect(symbols()).toEqual(["Cu"]);
  rerender(<Table filter="cu iron" />);
  expect(screen.getByText(/^Nothing matches\./)).toBeTruthy();
});

test("numbers align on the point and show no more figures than they have", () => {
  render(<Table />);
  expect(column(2)).toEqual(["65.38", "55.84", "63.55", ""]);
});

test("arrow keys walk the rows and select as they go, Enter opens", async () => {
  const onSelect = vi.fn();
  const onOpen = vi.fn();
  render(<Table onSelect={onSelect} onOpen={onOpen} />);
  const focused = () => (document.activeElement as HTMLElement).dataset.key;
  const first = bodyRows()[0]!;
  expect(first.tabIndex).toBe(0);
  first.focus();
  fireEvent.click(first);
  fireEvent.keyDown(first, { key: "ArrowDown" });
  await vi.waitFor(() => expect(focused()).toBe("Fe"));
  expect(onSelect).toHaveBeenLastCalledWith(metals[1]);
  fireEvent.keyDown(document.activeElement!, { key: "End" });
  await vi.waitFor(() => expect(focused()).toBe("X"));
  fireEvent.keyDown(document.activeElement!, { key: "ArrowDown" });
  await vi.waitFor(() => expect(focused()).toBe("X"));
  fireEvent.keyDown(document.activeElement!, { key: "Enter" });
  expect(onOpen).toHaveBeenLastCalledWith(metals[3]);
  expect(bodyRows()[3]?.getAttribute("aria-selected")).toBe("true");
});

test("the exported file carries units, quotes and empty cells for what is unknown", () => {
  expect(tableCsv(metals, columns)).toBe(
    'symbol,name,M (g/mol)\r\nZn,zinc,65.38\r\nFe,iron,55.845\r\nCu,copper,63.546\r\nX,"unknown, ""so far""",\r\n',
  );
  const formula = [{ symbol: "=1+1", name: "-2", mass: -3 }];
  expect(tableCsv(formula, columns)).toBe("symbol,name,M (g/mol)\r\n'=1+1,-2,-3\r\n");
});
