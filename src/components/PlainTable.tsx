import type { ReactNode } from "react";
import { classes } from "../lib/classes";
import { headerText } from "./tableModel";

export interface PlainColumn<Row> {
  header: string;
  unit?: string;
  cell: (row: Row) => ReactNode;
  /** numbers: right and in mono */
  number?: boolean;
  width?: string;
}

/** A short table that is read, not worked: text wraps, rows grow. */
export function PlainTable<Row>({
  caption,
  columns,
  rows,
  rowKey,
  className,
}: {
  caption: string;
  columns: readonly PlainColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  className?: string;
}) {
  const side = (column: PlainColumn<Row>) => (column.number ? "text-right" : "text-left");
  return (
    <table className={classes("w-full border-collapse text-sm", className)}>
      <caption className="sr-only">{caption}</caption>
      <thead>
        <tr>
          {columns.map((column) => (
            <th
              key={headerText(column)}
              scope="col"
              style={{ width: column.width }}
              className={classes(
                "border-b border-ink px-2 py-1 font-mono text-xs font-bold whitespace-nowrap first:pl-0 last:pr-0",
                side(column),
              )}
            >
              {headerText(column)}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={rowKey(row)} className="border-b border-rule align-baseline">
            {columns.map((column) => (
              <td
                key={headerText(column)}
                className={classes("px-2 py-1 first:pl-0 last:pr-0", side(column), column.number && "font-mono")}
              >
                {column.cell(row)}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
