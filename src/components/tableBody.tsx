import type { ReactNode, RefObject } from "react";

/** How a table's rows get into the page. `reveal` scrolls a row into the page, if it is not there. */
export interface TableBodyProps {
  count: number;
  row: (index: number) => ReactNode;
  rowHeight: number;
  headHeight: number;
  /** the box that scrolls */
  box: RefObject<HTMLDivElement | null>;
  /** row to show when the table first stands there, -1 for none */
  startAt: number;
  reveal: RefObject<(index: number) => void>;
}

/** Every row in the page: for tables of up to a hundred rows or so. */
export function PlainBody({ count, row }: TableBodyProps) {
  return <>{Array.from({ length: count }, (_, index) => row(index))}</>;
}
