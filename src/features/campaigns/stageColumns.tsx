import { Link } from "react-router-dom";
import type { StageSummary } from "../../../shared/trials/summary";
import type { Spread } from "../../../shared/trials/spread";
import type { Column } from "../../components/tableModel";
import { fixed } from "../../lib/format";
import type { StageRow } from "./stageRows";
import { rangeOf } from "../../lib/tallyWords";

const spread = (
  id: string,
  header: string,
  unit: string,
  digits: number,
  of: (summary: StageSummary) => Spread | null,
  more: Partial<Column<StageRow>> = {},
): Column<StageRow> => ({
  id,
  header,
  unit,
  digits,
  width: "6.4em",
  filtered: false,
  value: ({ summary }) => (summary ? (of(summary)?.mean ?? null) : null),
  cell: ({ summary }) => {
    const found = summary && of(summary);
    return found ? (
      <>
        {fixed(found.mean, digits)}
        <span className="block text-xs text-muted">{rangeOf(found, digits)}</span>
      </>
    ) : null;
  },
  ...more,
});

const number = (
  id: string,
  header: string,
  of: (summary: StageSummary) => number,
  more: Partial<Column<StageRow>> = {},
): Column<StageRow> => ({
  id,
  header,
  digits: 0,
  width: "4.6em",
  filtered: false,
  value: ({ summary }) => (summary ? of(summary) : null),
  ...more,
});

/** Per campaign and stage: how many, mean and range of what managers compare, inside and outside. */
export const stageColumns: readonly Column<StageRow>[] = [
  {
    id: "campaign",
    header: "campaign",
    value: ({ campaign }) => `${campaign.code} ${campaign.title}`,
    cell: ({ campaign }) => (
      <>
        <Link
          to={`/campaigns/${campaign.id}`}
          tabIndex={-1}
          className="text-base font-bold no-underline hover:text-verdigris hover:underline"
          onClick={(event) => event.stopPropagation()}
        >
          {campaign.code}
        </Link>
        <div className="truncate text-sm text-muted">{campaign.title}</div>
      </>
    ),
  },
  {
    id: "stage",
    header: "stage",
    width: "10em",
    value: ({ stage }) => `${stage.code} ${stage.name} ${stage.target}`,
    cell: ({ stage }) => (
      <>
        <span className="font-mono">{stage.code}</span> {stage.name}
        <div className="truncate text-sm text-muted">
          <b className="text-copper">{stage.target}</b>
          {stage.gangue !== null && ` against ${stage.gangue}`}
        </div>
      </>
    ),
  },
  number("n", "n", (s) => s.n, { width: "3.2em" }),
  spread("recovery", "recovery", "% target", 1, (s) => s.recovery, { width: "6.8em" }),
  spread("gangue", "dissolved", "% gangue", 1, (s) => s.gangueDissolved, { width: "7em", wide: true }),
  spread("account", "account", "%", 1, (s) => s.accountability, { wide: true }),
  spread("acid", "acid", "kg/t", 0, (s) => s.acidPerTonne, { wide: true }),
  spread("perKg", "reagent", "kg/kg", 2, (s) => s.reagentPerKg, { wide: true }),
  number("inside", "inside", (s) => s.places.inside.n, { width: "4.6em" }),
  number("outside", "outside", (s) => s.places.outside.n, { width: "5.6em" }),
  number("apart", "other", (s) => s.places.apart.n, { width: "4.2em", wide: true }),
];

const ends = (name: string, unit: string, of: (s: StageSummary) => Spread | null): Column<Exported>[] =>
  (["n", "mean", "min", "max"] as const).map((end) => ({
    id: `${name} ${end}`,
    header: end === "n" ? `${name}, n` : `${name}, ${end}`,
    ...(end === "n" ? {} : { unit }),
    value: ({ summary }) => (summary ? (of(summary)?.[end] ?? null) : null),
  }));

/** What a file says of a stage's campaign. */
type Exported = Pick<StageRow, "stage" | "summary"> & {
  campaign: Pick<StageRow["campaign"], "code" | "title" | "planName" | "planRevision">;
};

/** The same in a file: every mean with its n and its ends. */
export const exportedStageColumns: readonly Column<Exported>[] = [
  { id: "campaign", header: "campaign", value: ({ campaign }) => campaign.code },
  { id: "title", header: "title", value: ({ campaign }) => campaign.title },
  { id: "plan", header: "plan", value: ({ campaign }) => `${campaign.planName}, revision ${campaign.planRevision}` },
  { id: "stage", header: "stage", value: ({ stage }) => stage.code },
  { id: "target", header: "target", value: ({ stage }) => stage.target },
  { id: "gangue", header: "gangue", value: ({ stage }) => stage.gangue },
  { id: "n", header: "trials", value: ({ summary }) => summary?.n ?? null },
  { id: "rejected", header: "rejected", value: ({ summary }) => summary?.rejected ?? null },
  ...ends("recovery", "%", (s) => s.recovery),
  ...ends("gangue dissolved", "%", (s) => s.gangueDissolved),
  ...ends("accountability", "%", (s) => s.accountability),
  ...ends("acid consumed", "kg/t dry feed", (s) => s.acidPerTonne),
  ...ends("acid or cementing metal consumed", "kg/kg", (s) => s.reagentPerKg),
  { id: "inside", header: "inside", value: ({ summary }) => summary?.places.inside.n ?? null },
  { id: "outside", header: "outside", value: ({ summary }) => summary?.places.outside.n ?? null },
  { id: "apart", header: "other conditions", value: ({ summary }) => summary?.places.apart.n ?? null },
];
