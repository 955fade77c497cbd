import type { ReactNode } from "react";
import { capital } from "../lib/format";
import { Segmented } from "./choice";
import { SearchField } from "./SearchField";
import { ErrorNote, Loading } from "./status";

/** The left of a list screen: a filter and the shelf that is looked at, and under them the list, or why there is none. */
export function ListPane<Shelf extends string>({
  records,
  sought,
  filter,
  onFilter,
  shelf,
  onShelf,
  shelves,
  query,
  said,
  empty,
  children,
}: {
  /** what is listed, in the plural: "feeds" */
  records: string;
  /** what the filter looks at: "name, element" */
  sought: string;
  filter: string;
  onFilter: (filter: string) => void;
  shelf: Shelf;
  onShelf: (shelf: Shelf) => void;
  shelves: readonly { value: Shelf; label: string }[];
  query: { data: readonly unknown[] | undefined; error: unknown; refetch: () => unknown };
  /** on what was just done to one of them */
  said?: ReactNode;
  /** in place of the list while the shelf is empty */
  empty: ReactNode;
  /** the list */
  children: ReactNode;
}) {
  return (
    <section aria-label={`${capital(records)} of the project`} className="flex min-w-0 flex-1 flex-col px-5 pt-3">
      <div className="flex flex-wrap items-center gap-4 pb-2">
        <SearchField label={`Filter ${records}`} placeholder={sought} value={filter} onChange={onFilter} />
        <Segmented label={`Which ${records}`} value={shelf} onChange={onShelf} options={shelves} />
      </div>
      {said}
      {query.error ? (
        <ErrorNote doing={`The ${records} could not be read`} error={query.error} retry={() => void query.refetch()} />
      ) : !query.data ? (
        <Loading label={`Reading the ${records}`} />
      ) : query.data.length === 0 ? (
        empty
      ) : (
        children
      )}
    </section>
  );
}
