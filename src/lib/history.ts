import { useQuery } from "@tanstack/react-query";
import type { HistoryRow } from "../../shared/schemas/history";
import { allRows } from "./pages";

/** Every write to a row, newest first. `path` is that of the row: "/trials/abc". Asked anew whenever it is opened. */
export const useHistory = (path: string, enabled = true) =>
  useQuery({
    queryKey: ["history", path],
    queryFn: ({ signal }) => allRows<HistoryRow>(`${path}/history`, signal),
    enabled,
    staleTime: 0,
  });
