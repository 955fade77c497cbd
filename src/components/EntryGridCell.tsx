import { useRef } from "react";
import { classes } from "../lib/classes";
import { getText, type GridColumn } from "./entryGridModel";
import { Select } from "./Select";

/** The list of usual words of a column, one a page. */
export const listId = (column: string) => `usual-${column}`;

interface EntryCellProps<Row> {
  column: GridColumn<Row>;
  row: Row;
  index: number;
  /** "row column", by which the keys find it */
  place: string;
  label: string;
  wrong: boolean;
  readOnly: boolean;
  onChange: (row: Row) => void;
}

/** One cell of an EntryGrid. */
export function EntryCell<Row>({ column, row, index, place, label, wrong, readOnly, onChange }: EntryCellProps<Row>) {
  const before = useRef<Row | null>(null);
  if (column.kind === "shown")
    return (
      <td className={classes("px-1 whitespace-nowrap", column.right && "text-right")}>{column.show(row, index)}</td>
    );
  if (column.kind === "check")
    return (
      <td className="px-1">
        <input
          type="checkbox"
          data-cell={place}
          aria-label={label}
          checked={column.get(row)}
          disabled={readOnly}
          onChange={(event) => onChange(column.set(row, event.target.checked))}
          className="relative top-0.5 h-3.5 w-3.5 accent-verdigris pointer-coarse:h-5 pointer-coarse:w-5"
        />
      </td>
    );
  if (column.kind === "choice") {
    const chosen = column.options.find(({ value }) => value === column.get(row));
    if (readOnly) return <td className="px-1 whitespace-nowrap">{chosen?.label ?? ""}</td>;
    return (
      <td className={classes("px-0.5", wrong && "outline-1 -outline-offset-1 outline-signal")}>
        <Select
          label={label}
          layout="bare"
          cell={place}
          value={column.get(row)}
          placeholder="choose"
          onChange={(value) => onChange(column.set(row, value))}
          options={column.options}
        />
      </td>
    );
  }
  const suffix = column.suffix?.(row);
  if (readOnly || column.closed?.(row))
    return (
      <td className={classes("px-1", !column.words && "text-right font-mono whitespace-nowrap")}>
        {column.closed?.(row) ? null : column.get(row)}
        {suffix}
      </td>
    );
  return (
    <td className="p-0">
      <input
        type="text"
        data-cell={place}
        aria-label={label}
        aria-invalid={wrong}
        autoComplete="off"
        spellCheck={false}
        list={column.usual && listId(column.id)}
        value={column.get(row)}
        onChange={(event) => onChange(column.set(row, event.target.value))}
        onFocus={(event) => {
          before.current = row;
          event.target.select();
        }}
        onKeyDown={(event) => {
          if (event.key !== "Escape" || before.current === null || getText(column, before.current) === column.get(row))
            return;
          event.stopPropagation();
          onChange(before.current);
        }}
        className={classes(
          "block h-6.5 border-0 bg-transparent px-1 focus:bg-sheet pointer-coarse:h-10",
          "w-full",
          column.words ? "text-left" : "text-right font-mono",
          wrong && "text-signal outline-1 -outline-offset-1 outline-signal",
        )}
      />
      {suffix !== undefined && <span className="-mt-1 block pr-1 pb-0.5 text-right leading-3">{suffix}</span>}
    </td>
  );
}
