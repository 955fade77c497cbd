import { Link } from "react-router-dom";
import type { FeedRow } from "../../../shared/schemas/feed";
import type { Column } from "../../components/tableModel";
import { fullTime, savedAt } from "../../lib/format";
import { unitText } from "../../lib/units";
import { headsOf } from "./feedModel";

const headsText = ({ heads }: FeedRow) =>
  headsOf(heads)
    .map(({ element, head }) => (head ? `${element} ${head.value.text} ${unitText(head.value.unit)}` : `${element} ?`))
    .join(", ");

export const feedColumns: readonly Column<FeedRow>[] = [
  {
    id: "name",
    header: "feed",
    width: "34%",
    value: (feed) => feed.name,
    cell: (feed) => (
      <>
        <Link
          to={`/feeds/${feed.id}`}
          tabIndex={-1}
          className="text-base font-bold no-underline hover:text-verdigris hover:underline"
          onClick={(event) => event.stopPropagation()}
        >
          {feed.name}
        </Link>
        <div className="truncate text-sm text-muted">{feed.invented ? "invented" : ""}</div>
      </>
    ),
  },
  {
    id: "heads",
    header: "heads",
    value: headsText,
    wrap: true,
    sortable: false,
    cell: (feed) => <span className="font-mono">{headsText(feed)}</span>,
  },
  { id: "trials", header: "trials", width: "5em", digits: 0, value: (feed) => feed.trialCount, filtered: false },
  {
    id: "saved",
    header: "saved",
    width: "9em",
    align: "right",
    filtered: false,
    wide: true,
    value: (feed) => feed.updatedAt,
    cell: (feed) => <time title={fullTime(feed.updatedAt)}>{savedAt(feed.updatedAt)}</time>,
  },
];
