import { useId, useRef, useState, type ClipboardEvent, type KeyboardEvent } from "react";
import { classes } from "../lib/classes";
import { Button } from "./Button";
import { clipboardBlock, getText, layBlock, setText, type GridColumn } from "./entryGridModel";
import { EntryCell, listId } from "./EntryGridCell";

export interface EntryGridProps<Row> {
  /** what the grid holds, for those who hear it */
  caption: string;
  /** what a row is called in messages: "reading" */
  rowName: string;
  /** what this row is called, where a number says too little: "Final liquor" */
  rowLabel?: (row: Row) => string;
  rows: readonly Row[];
  columns: readonly GridColumn<Row>[];
  onChange: (rows: Row[]) => void;
  /** makes the row after these; without it rows are neither added nor removed */
  blank?: (rows: readonly Row[]) => Row;
  readOnly?: boolean;
  /** refusals from elsewhere, such as the whole record's check: row, column id, sentence */
  problems?: readonly { row: number; column: string; message: string }[];
  emptyText?: string;
}

/** Entry as in a ledger: every cell is open, Enter goes down, Tab and arrows go on, a block is pasted from where one stands,
 *  Ctrl+D repeats the cell above. The last row is always free. */
export function EntryGrid<Row>(props: EntryGridProps<Row>) {
  const { caption, rowName, rows, columns, onChange, blank, readOnly = false } = props;
  const id = useId();
  const box = useRef<HTMLDivElement>(null);
  const [said, setSaid] = useState("");
  const removable = blank !== undefined && !readOnly;
  const shown = removable ? [...rows, blank(rows)] : rows;
  const here = [
    ...(props.problems ?? []),
    ...rows.flatMap((row, r) =>
      columns.flatMap((column) => {
        const message = column.kind === "text" || column.kind === "choice" ? (column.problem?.(row) ?? null) : null;
        return message === null ? [] : [{ row: r, column: column.id, message }];
      }),
    ),
  ];
  // The record's own check may say the same of the same cell.
  const problems = here.filter((p, i) => here.findIndex((q) => q.row === p.row && q.message === p.message) === i);
  const named = (r: number) => {
    const row = shown[r];
    return props.rowLabel && row !== undefined ? props.rowLabel(row) : `${rowName} ${r + 1}`;
  };
  const wrong = new Set(problems.map((p) => `${p.row} ${p.column}`));

  const put = (r: number, row: Row) => {
    const next = [...rows];
    next[r] = row;
    onChange(next);
  };

  function focus(r: number, c: number): boolean {
    const cell = box.current?.querySelector<HTMLElement>(`[data-cell="${r} ${c}"]`);
    cell?.focus();
    return cell !== null && cell !== undefined;
  }
  /** The next open cell that way; a closed one is passed over. */
  function go(r: number, c: number, dr: number, dc: number): boolean {
    for (let [y, x] = [r + dr, c + dc]; y >= 0 && y < shown.length && x >= 0 && x < columns.length; y += dr, x += dc) {
      if (focus(y, x)) return true;
    }
    return false;
  }

  function onKeyDown(event: KeyboardEvent<HTMLElement>) {
    const place = placeOf(event.target);
    if (!place) return;
    const [r, c] = place;
    const column = columns[c];
    const step = stepOf(event);
    if (event.key.toLowerCase() === "d" && (event.ctrlKey || event.metaKey) && column) {
      event.preventDefault();
      const [above, row] = [rows[r - 1], shown[r]];
      if (above !== undefined && row !== undefined && !readOnly) put(r, setText(column, row, getText(column, above)));
    } else if (step && go(r, c, step[0], step[1])) {
      event.preventDefault();
    } else if (event.key === "Enter") event.preventDefault();
  }

  function onPaste(event: ClipboardEvent<HTMLElement>) {
    const place = placeOf(event.target);
    const block = clipboardBlock(event.clipboardData.getData("text/plain"));
    if (!place || readOnly || (block.length === 1 && block[0]?.length === 1)) return;
    event.preventDefault();
    const laid = layBlock(rows, columns, { row: place[0], column: place[1] }, block, blank ?? null);
    onChange(laid.rows);
    setSaid(
      `${block.length} × ${Math.max(...block.map((cells) => cells.length))} pasted` +
        (laid.lost > 0 ? `; ${laid.lost} ${laid.lost === 1 ? "cell" : "cells"} found no place and were left out` : ""),
    );
  }

  return (
    <div>
      <div ref={box} className="overflow-x-auto" onKeyDown={onKeyDown} onPaste={onPaste}>
        <table className="border-collapse text-sm" aria-describedby={`${id}-said`}>
          <caption className="sr-only">{caption}</caption>
          <thead>
            <tr className="align-bottom">
              {removable && <th className="w-7 border-b border-ink" aria-label={rowName} />}
              {columns.map((column) => (
                <th
                  key={column.id}
                  scope="col"
                  style={{ minWidth: column.width, width: column.width }}
                  className={classes(
                    "border-b border-ink px-1 pb-0.5 font-mono text-xs font-bold",
                    leftOf(column) ? "text-left" : "text-right",
                    // Over the words of its boxes, and clear of the number before it.
                    column.kind === "choice" && !readOnly && "pl-2.5",
                  )}
                >
                  {column.header}
                  {column.under !== undefined && <span className="block font-normal text-muted">{column.under}</span>}
                </th>
              ))}
              {removable && <th className="border-b border-ink" aria-label="remove" />}
            </tr>
          </thead>
          <tbody>
            {shown.map((row, r) => (
              // What the free row would begin with is no entry yet.
              <tr key={r} className={classes("border-b border-rule", r >= rows.length && "text-muted")}>
                {removable && (
                  <td className="pr-1 text-right font-mono text-xs text-muted">{r < rows.length ? r + 1 : "new"}</td>
                )}
                {columns.map((column, c) => (
                  <EntryCell
                    key={column.id}
                    column={column}
                    row={row}
                    index={r}
                    place={`${r} ${c}`}
                    label={`${named(r)}, ${column.label}`}
                    wrong={wrong.has(`${r} ${column.id}`)}
                    readOnly={readOnly}
                    onChange={(next) => put(r, next)}
                  />
                ))}
                {removable && (
                  <td className="pl-2">
                    {r < rows.length && (
                      <Button
                        kind="quiet"
                        className="h-auto! text-xs text-muted!"
                        aria-label={`remove ${rowName} ${r + 1}`}
                        onClick={() => onChange(rows.filter((_, i) => i !== r))}
                      >
                        remove
                      </Button>
                    )}
                  </td>
                )}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {!readOnly &&
        columns.map(
          (column) =>
            column.kind === "text" &&
            column.usual && (
              <datalist key={column.id} id={listId(column.id)}>
                {column.usual.map((word) => (
                  <option key={word} value={word} />
                ))}
              </datalist>
            ),
        )}
      {shown.length === 0 && <p className="py-2 text-sm text-muted">{props.emptyText ?? "None recorded."}</p>}
      {problems.length > 0 && (
        <ul role="alert" className="pt-1 text-sm text-signal">
          {problems.map((p) => (
            <li key={`${p.row} ${p.column} ${p.message}`}>
              {named(p.row)}: {p.message}
            </li>
          ))}
        </ul>
      )}
      <p id={`${id}-said`} role="status" className="text-sm text-muted">
        {said}
      </p>
    </div>
  );
}

const leftOf = <Row,>(column: GridColumn<Row>) =>
  column.kind === "choice" ||
  column.kind === "check" ||
  (column.kind === "text" && column.words === true) ||
  (column.kind === "shown" && !column.right);

function placeOf(target: EventTarget): [row: number, column: number] | null {
  const text = target instanceof HTMLElement ? target.dataset.cell : undefined;
  if (text === undefined) return null;
  const [r = 0, c = 0] = text.split(" ").map(Number);
  return [r, c];
}

/** Where a key goes. Left and right stay in the text until the caret stands at its end. */
function stepOf(event: KeyboardEvent): [rows: number, columns: number] | null {
  if (event.altKey || event.ctrlKey || event.metaKey) return null;
  const input = event.target instanceof HTMLInputElement && event.target.type === "text" ? event.target : null;
  const choosing = event.target instanceof HTMLElement && event.target.getAttribute("role") === "combobox";
  const [from, to, length] = [input?.selectionStart ?? 0, input?.selectionEnd ?? 0, input?.value.length ?? 0];
  const whole = from === 0 && to === length;
  switch (event.key) {
    case "Enter":
      return choosing ? null : [event.shiftKey ? -1 : 1, 0];
    case "ArrowDown":
      return choosing ? null : [1, 0];
    case "ArrowUp":
      return choosing ? null : [-1, 0];
    case "ArrowLeft":
      return whole || to === 0 ? [0, -1] : null;
    case "ArrowRight":
      return whole || from === length ? [0, 1] : null;
    default:
      return null;
  }
}
