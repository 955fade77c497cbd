import { useEffect, useRef, useState, type ComponentType, type KeyboardEvent, type ReactNode } from "react";
import { classes } from "../lib/classes";
import { fixed } from "../lib/format";
import { PlainBody, type TableBodyProps } from "./tableBody";
import { useTableModel, type Column, type Sort } from "./tableModel";

export interface DataTableProps<Row extends object> {
  /** what the table holds, for those who hear it */
  caption: string;
  rows: readonly Row[];
  /** stable: defined at module level or memoised */
  columns: readonly Column<Row>[];
  rowKey: (row: Row) => string;
  /** words that must all stand in a row; typed beside the table's other filters */
  filter?: string;
  initialSort?: Sort;
  /** sorting done elsewhere, as by the server: the rows come in this order, and a heading asks for another */
  sorted?: { by: Sort; onSort: (sort: Sort) => void };
  selectedKey?: string | undefined;
  /** follows the arrow keys and clicks */
  onSelect?: (row: Row) => void;
  /** Enter or double click; a single click where there is no `onSelect` */
  onOpen?: (row: Row) => void;
  /** the row under the pointer, null when it leaves */
  onHover?: (row: Row | null) => void;
  /** a row pointed at elsewhere, as on a map */
  hoveredKey?: string | null;
  /** stands in place of the rows when the filter leaves none */
  empty?: ReactNode;
  /** height of a row in px; rows never wrap */
  rowHeight?: number;
  muted?: (row: Row) => boolean;
  /** the scrolling box: give it a height */
  className?: string;
  /** told the rows as filtered and sorted, for a count or an export */
  onShown?: (rows: readonly Row[]) => void;
  /** `VirtualBody` where there are hundreds of rows */
  Body?: ComponentType<TableBodyProps>;
}

const none = () => undefined;

/** A table that sorts by its headings and is walked with the arrow keys; the row in focus is the row selected. */
export function DataTable<Row extends object>(props: DataTableProps<Row>) {
  const { caption, rows, columns, rowKey, filter = "", initialSort, selectedKey } = props;
  const { onSelect, onOpen, empty, rowHeight = 28, muted, className, onShown = none, Body = PlainBody } = props;
  const model = useTableModel(rows, columns, rowKey, filter, initialSort);
  const { onHover, hoveredKey, sorted: given } = props;
  const shown = given ? rows : model.shown;
  const sort = given ? given.by : model.sorting[0];
  const setSort = given ? given.onSort : (next: Sort) => model.setSorting([{ ...next, desc: next.desc ?? false }]);
  const headHeight = columns.some((column) => column.unit) ? 40 : 26;
  const box = useRef<HTMLDivElement>(null);
  const [reached, setReached] = useState<string | null>(null);
  const current = selectedKey ?? reached;
  const at = shown.findIndex((row) => rowKey(row) === current);
  const interactive = Boolean(onSelect ?? onOpen);

  const reveal = useRef<(index: number) => void>(none);

  useEffect(() => onShown(shown), [shown, onShown]);

  function reach(index: number) {
    const row = shown[Math.max(0, Math.min(shown.length - 1, index))];
    if (!row) return;
    const key = rowKey(row);
    setReached(key);
    onSelect?.(row);
    reveal.current(shown.indexOf(row));
    // the row may only come into the page with the scroll
    requestAnimationFrame(() => box.current?.querySelector<HTMLElement>(`[data-key="${CSS.escape(key)}"]`)?.focus());
  }

  function onKeyDown(event: KeyboardEvent) {
    const page = Math.max(1, Math.floor((box.current?.clientHeight ?? 0) / rowHeight) - 2);
    const to: Record<string, number> = {
      ArrowDown: at + 1,
      ArrowUp: at - 1,
      PageDown: at + page,
      PageUp: at - page,
      Home: 0,
      End: shown.length - 1,
    };
    const next = to[event.key];
    if (next !== undefined) {
      event.preventDefault();
      reach(next);
    } else if (event.key === "Enter" && shown[at] && event.target instanceof HTMLTableRowElement) {
      event.preventDefault();
      (onOpen ?? onSelect)?.(shown[at]);
    }
  }

  function drawRow(row: Row, index: number) {
    const key = rowKey(row);
    const selected = key === selectedKey;
    const tabStop = at < 0 ? index === 0 : key === current;
    return (
      <tr
        key={key}
        data-key={key}
        aria-rowindex={index + 2}
        aria-selected={onSelect ? selected : undefined}
        data-hovered={key === hoveredKey ? "" : undefined}
        tabIndex={interactive ? (tabStop ? 0 : -1) : undefined}
        style={{ height: rowHeight }}
        onClick={() => {
          setReached(key);
          (onSelect ?? onOpen)?.(row);
        }}
        onDoubleClick={() => onOpen?.(row)}
        onPointerEnter={onHover && (() => onHover(row))}
        className={classes(
          "border-b border-rule -outline-offset-2!",
          interactive && "cursor-pointer hover:bg-tint/30",
          key === hoveredKey && "bg-tint/50",
          // thinned, so that copper keeps its contrast on it
          selected && "bg-tint/60!",
          muted?.(row) && "text-muted",
        )}
      >
        {columns.map((column) => (
          <Cell key={column.id} column={column} row={row} />
        ))}
      </tr>
    );
  }

  return (
    <div ref={box} className={classes("overflow-auto", className)}>
      <table role="grid" aria-rowcount={shown.length + 1} className="w-full table-fixed border-collapse text-sm">
        <caption className="sr-only">{caption}</caption>
        <colgroup>
          {columns.map((column) => (
            <col key={column.id} className={hidden(column)} style={{ width: column.width }} />
          ))}
        </colgroup>
        <thead className="sticky top-0 z-10 bg-paper">
          <tr style={{ height: headHeight }} aria-rowindex={1} className="align-bottom">
            {columns.map((column) => (
              <Heading
                key={column.id}
                column={column}
                sorted={sort?.id === column.id ? (sort.desc ? "descending" : "ascending") : undefined}
                onSort={() => setSort({ id: column.id, desc: sort?.id === column.id ? !sort.desc : false })}
              />
            ))}
          </tr>
        </thead>
        <tbody onKeyDown={interactive ? onKeyDown : undefined} onPointerLeave={onHover && (() => onHover(null))}>
          <Body
            count={shown.length}
            startAt={at}
            row={(index) => {
              const row = shown[index];
              return row && drawRow(row, index);
            }}
            {...{ rowHeight, headHeight, box, reveal }}
          />
        </tbody>
      </table>
      {shown.length === 0 && (
        <div className="py-6 text-muted">{empty ?? "Nothing matches. Take a word away, or clear the filter."}</div>
      )}
    </div>
  );
}

/** A value short of decimals is filled with spaces, which in mono are as wide as digits. */
function numberText(value: number, { digits = 0, asGiven = false }: { digits?: number; asGiven?: boolean }): string {
  const text = fixed(value, digits);
  if (!asGiven || digits === 0) return text;
  const short = text.replace(/\.?0+$/, "");
  return short.padEnd(text.length, "\u00a0");
}

const rightOf = (column: Column<never>) =>
  (column.align ?? (column.digits === undefined ? "left" : "right")) === "right";
const hidden = (column: { wide?: boolean }) => (column.wide ? "max-lg:hidden" : undefined);

function Heading<Row>({
  column,
  sorted,
  onSort,
}: {
  column: Column<Row>;
  sorted: "ascending" | "descending" | undefined;
  onSort: () => void;
}) {
  const right = rightOf(column);
  return (
    <th
      scope="col"
      aria-sort={sorted}
      className={classes(
        "border-b border-ink px-2 pb-0.5 font-mono text-xs font-bold",
        right ? "text-right" : "text-left",
        hidden(column),
      )}
    >
      {column.sortable === false ? (
        column.header
      ) : (
        <button type="button" onClick={onSort} className="max-w-full truncate align-bottom hover:text-verdigris">
          {sorted && (
            <span aria-hidden className="text-verdigris">
              {sorted === "ascending" ? "↑ " : "↓ "}
            </span>
          )}
          {column.header}
        </button>
      )}
      {column.unit && <span className="block truncate font-normal text-muted">{column.unit}</span>}
    </th>
  );
}

function Cell<Row>({ column, row }: { column: Column<Row>; row: Row }) {
  const value = column.value(row);
  const number = column.digits !== undefined;
  const plain = typeof value === "number" ? numberText(value, column) : (value ?? "");
  const content = column.cell ? column.cell(row) : plain;
  return (
    <td
      role="gridcell"
      className={classes(
        "px-2",
        !column.wrap && "truncate",
        rightOf(column) && "text-right",
        number && "font-mono",
        hidden(column),
      )}
    >
      {column.wrap ? <div className="line-clamp-2">{content}</div> : content}
    </td>
  );
}
