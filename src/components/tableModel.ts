import {
  columnFilteringFeature,
  createColumnHelper,
  createFilteredRowModel,
  createSortedRowModel,
  globalFilteringFeature,
  rowSortingFeature,
  sortFn_alphanumeric,
  sortFn_basic,
  tableFeatures,
  useTable,
} from "@tanstack/react-table";
import { useMemo, useState, type ReactNode } from "react";
import { toCsv } from "../lib/csv";

export interface Column<Row> {
  id: string;
  header: string;
  /** stands after the header as in "G / kJ/mol", and in brackets in the exported header */
  unit?: string;
  /** what sorts, filters and is exported; null is unknown, and sorts last */
  value: (row: Row) => string | number | null;
  /** what is drawn; the value by default */
  cell?: (row: Row) => ReactNode;
  /** what is exported where it differs from `value` */
  exported?: (row: Row) => string | number | null;
  /** decimals of a number, so that the column aligns on its point */
  digits?: number;
  /** draws as many decimals as the value has, up to `digits`, still aligned: no precision is made up */
  asGiven?: boolean;
  /** any CSS width; columns without one share the rest */
  width?: string;
  /** numbers stand right unless told otherwise */
  align?: "left" | "right";
  /** false: the text filter does not look here */
  filtered?: boolean;
  sortable?: boolean;
  /** two lines where one is too short; for tables with tall rows */
  wrap?: boolean;
  /** left out below the `lg` width, where the sheet is narrow */
  wide?: boolean;
}

const features = tableFeatures({
  rowSortingFeature,
  columnFilteringFeature,
  globalFilteringFeature,
  sortedRowModel: createSortedRowModel(),
  filteredRowModel: createFilteredRowModel(),
  sortFns: { alphanumeric: sortFn_alphanumeric, basic: sortFn_basic },
});

export interface Sort {
  id: string;
  desc?: boolean;
}

/** Rows as filtered and sorted. The filter is words: a row stays when each stands somewhere in its filtered columns. */
export function useTableModel<Row extends object>(
  rows: readonly Row[],
  columns: readonly Column<Row>[],
  rowKey: (row: Row) => string,
  filter: string,
  initialSort: Sort | undefined,
) {
  const [sorting, setSorting] = useState(initialSort ? [{ id: initialSort.id, desc: initialSort.desc ?? false }] : []);
  const definitions = useMemo(() => {
    const helper = createColumnHelper<typeof features, Row>();
    return helper.columns(
      columns.map((column) =>
        helper.accessor((row) => (column.value(row) ?? undefined) as unknown, {
          id: column.id,
          header: column.header,
          sortFn: column.digits === undefined ? "alphanumeric" : "basic",
          sortUndefined: "last",
          enableSorting: column.sortable ?? true,
        }),
      ),
    );
  }, [columns]);
  const matches = useMemo(() => {
    const looked = columns.filter((column) => column.filtered !== false);
    const textOf = (row: Row) => looked.map((column) => String(column.value(row) ?? "").toLowerCase()).join("\n");
    return (row: Row, wanted: string) => {
      const text = textOf(row);
      return wanted.split(/\s+/).every((word) => text.includes(word));
    };
  }, [columns]);
  const table = useTable({
    features,
    columns: definitions,
    // the table never writes to its rows
    data: rows,
    getRowId: rowKey,
    state: { sorting, globalFilter: filter.trim().toLowerCase() },
    onSortingChange: setSorting,
    enableSortingRemoval: false,
    globalFilterFn: (row, _column, wanted: string) => matches(row.original, wanted),
    // the function above looks at the whole row, so one column asks for all
    getColumnCanGlobalFilter: (column) => column.id === columns[0]?.id,
  });
  const kept = table.getRowModel().rows;
  const shown = useMemo(() => kept.map((row) => row.original), [kept]);
  return { shown, sorting, setSorting };
}

export const headerText = (column: Pick<Column<never>, "header" | "unit">) =>
  column.unit ? `${column.header} / ${column.unit}` : column.header;

/** The rows as given, all columns, units in brackets behind the headings. */
export function tableCsv<Row>(rows: readonly Row[], columns: readonly Column<Row>[]): string {
  return toCsv(
    columns.map((column) => (column.unit ? `${column.header} (${column.unit})` : column.header)),
    rows.map((row) => columns.map((column) => (column.exported ?? column.value)(row))),
  );
}
