import { useSearchParams } from "react-router-dom";
import { trialStatuses, trialSorts, type TrialStatus } from "../../../shared/schemas/trial";
import type { Sort } from "../../components/tableModel";
import type { TrialsQuery } from "../../lib/trials";

const LIMIT = 50;

/** What the table of trials asks the server for; it stands in the address, so that a link shows the same list. */
export function useTrialList(campaignId: string) {
  const [search, setSearch] = useSearchParams();
  const sortId = trialSorts.find((id) => id === search.get("sort")) ?? "code";
  const desc = search.get("order") === "desc";
  const offset = Math.max(0, Math.floor(Number(search.get("from") ?? 0))) || 0;
  const asked = {
    stage: search.get("stage") ?? "all",
    status: trialStatuses.find((s) => s === search.get("status")) ?? "all",
    feed: search.get("feed") ?? "all",
    find: search.get("find") ?? "",
    deleted: search.get("deleted") === "true" ? ("true" as const) : ("false" as const),
  };
  const query: TrialsQuery = {
    campaignId,
    limit: LIMIT,
    offset,
    sort: sortId,
    order: desc ? "desc" : "asc",
    deleted: asked.deleted,
    ...(asked.stage === "all" ? {} : { stage: asked.stage }),
    ...(asked.status === "all" ? {} : { status: asked.status as TrialStatus }),
    ...(asked.feed === "all" ? {} : { feedId: asked.feed }),
    ...(asked.find.trim() === "" ? {} : { search: asked.find.trim() }),
  };
  const put = (changes: Readonly<Record<string, string>>, keepPage = false) =>
    setSearch(
      (before) => {
        if (!keepPage) before.delete("from");
        for (const [name, value] of Object.entries(changes)) {
          if (value === "" || value === "all" || value === "false" || value === "0") before.delete(name);
          else before.set(name, value);
        }
        return before;
      },
      { replace: true },
    );
  const sort: Sort = { id: sortId, desc };
  const filtered = Object.keys(query).some((key) => ["stage", "status", "feedId", "search"].includes(key));
  return { query, asked, sort, offset, limit: LIMIT, put, filtered };
}
