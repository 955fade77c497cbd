import type { ReactNode } from "react";

interface Common {
  id: string;
  header: ReactNode;
  /** the heading in plain words, for those who hear it and for messages */
  label: string;
  /** second line of the heading: a unit, or the choice of one */
  under?: ReactNode;
  /** any CSS width */
  width: string;
}

/** What is typed. */
export interface TextColumn<Row> extends Common {
  kind: "text";
  get: (row: Row) => string;
  set: (row: Row, text: string) => Row;
  /** why it cannot stand; null when it can */
  problem?: (row: Row) => string | null;
  /** words are left, numbers right */
  words?: boolean;
  /** what is usually typed here, offered while one types */
  usual?: readonly string[];
  /** stands behind the text: a unit that differs from the column's */
  suffix?: (row: Row) => ReactNode;
  /** the cell is closed: it does not apply to this row */
  closed?: (row: Row) => boolean;
}
export interface ChoiceColumn<Row> extends Common {
  kind: "choice";
  get: (row: Row) => string;
  set: (row: Row, value: string) => Row;
  options: readonly { value: string; label: string }[];
  problem?: (row: Row) => string | null;
}
export interface CheckColumn<Row> extends Common {
  kind: "check";
  get: (row: Row) => boolean;
  set: (row: Row, on: boolean) => Row;
}
/** What follows from the rest of the row. */
export interface ShownColumn<Row> extends Common {
  kind: "shown";
  show: (row: Row, index: number) => ReactNode;
  right?: boolean;
}
export type GridColumn<Row> = TextColumn<Row> | ChoiceColumn<Row> | CheckColumn<Row> | ShownColumn<Row>;

/** A block from a spreadsheet: rows of cells. A last line break is none; quotes are taken off. */
export function clipboardBlock(text: string): string[][] {
  const lines = text.replace(/\r\n?/g, "\n").replace(/\n$/, "").split("\n");
  return lines.map((line) => line.split("\t").map((cell) => cell.trim().replace(/^"(.*)"$/, "$1")));
}

const truthy = new Set(["1", "x", "y", "yes", "true"]);

/** One cell of the clipboard into a row; what a column cannot take is left as it stands. */
export function setText<Row>(column: GridColumn<Row>, row: Row, text: string): Row {
  if (column.kind === "text") return column.closed?.(row) ? row : column.set(row, text);
  if (column.kind === "check") return column.set(row, truthy.has(text.toLowerCase()));
  if (column.kind !== "choice") return row;
  const wanted = text.toLowerCase();
  const found = column.options.find((o) => o.value.toLowerCase() === wanted || o.label.toLowerCase() === wanted);
  return found ? column.set(row, found.value) : row;
}

export const getText = <Row>(column: GridColumn<Row>, row: Row): string =>
  column.kind === "text" || column.kind === "choice"
    ? column.get(row)
    : column.kind === "check" && column.get(row)
      ? "yes"
      : "";

/** A block laid into the rows from one cell on: only into cells one may type into; rows are added where `blank` makes them.
 *  @returns  new rows, and how many cells found no place */
export function layBlock<Row>(
  rows: readonly Row[],
  columns: readonly GridColumn<Row>[],
  at: { row: number; column: number },
  block: readonly (readonly string[])[],
  blank: ((rows: readonly Row[]) => Row) | null,
): { rows: Row[]; lost: number } {
  const open = columns.flatMap((column, i) => (column.kind === "shown" || i < at.column ? [] : [column]));
  const next = [...rows];
  let lost = 0;
  block.forEach((cells, i) => {
    const index = at.row + i;
    if (next[index] === undefined && blank) next[index] = blank(next);
    let row = next[index];
    if (row === undefined) {
      lost += cells.length;
      return;
    }
    cells.forEach((text, j) => {
      const column = open[j];
      if (column && row !== undefined) row = setText(column, row, text);
      else lost += 1;
    });
    next[index] = row;
  });
  return { rows: next, lost };
}
