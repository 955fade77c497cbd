import type { CampaignPairAnswer } from "../../../shared/schemas/campaignSummary";
import type { Spread } from "../../../shared/trials/spread";
import type { StageSummary } from "../../../shared/trials/summary";
import { PlainTable, type PlainColumn } from "../../components/PlainTable";
import { fixed } from "../../lib/format";
import { difference } from "./compareModel";
import { rangeOf } from "../../lib/tallyWords";

interface Line {
  key: string;
  stage: string;
  name: string;
  summary: StageSummary | null;
  /** the line that holds differences of means */
  differences: { recovery: number | null; gangueDissolved: number | null; reagentPerKg: number | null } | null;
}

const figure = (
  header: string,
  unit: string,
  digits: number,
  of: (summary: StageSummary) => Spread | null,
  less?: (differences: NonNullable<Line["differences"]>) => number | null,
): PlainColumn<Line> => ({
  header,
  unit,
  number: true,
  cell: ({ summary, differences }) => {
    if (differences) return <b>{less ? difference(less(differences), digits) : ""}</b>;
    const found = summary && of(summary);
    return found ? (
      <>
        {fixed(found.mean, digits)}
        <span className="block text-xs whitespace-nowrap text-muted">{rangeOf(found, digits)}</span>
      </>
    ) : null;
  },
});

/** Stage by stage: one line a campaign, and under two the difference of their means. */
export function PairTable({ pair: { left, right, stages } }: { pair: CampaignPairAnswer }) {
  const lines = stages.flatMap(({ code, left: l, right: r, ...differences }): Line[] => [
    { key: `${code} left`, stage: code, name: left.campaign.code, summary: l, differences: null },
    { key: `${code} right`, stage: "", name: right.campaign.code, summary: r, differences: null },
    ...(l && r ? [{ key: `${code} less`, stage: "", name: "difference", summary: null, differences }] : []),
  ]);
  const has = (of: (s: StageSummary) => Spread | null) =>
    lines.some(({ summary }) => summary !== null && of(summary) !== null);
  const acid = has((s) => s.acidPerTonne);
  return (
    <PlainTable
      className="block overflow-x-auto"
      caption="Per campaign"
      rows={lines}
      rowKey={({ key }) => key}
      columns={[
        { header: "stage", cell: ({ stage }) => <b className="font-mono">{stage}</b> },
        { header: "campaign", cell: ({ name, differences }) => (differences ? <i>{name}</i> : name) },
        { header: "n", number: true, cell: ({ summary }) => summary?.n ?? "" },
        figure(
          "target",
          "%",
          1,
          (s) => s.recovery,
          (d) => d.recovery,
        ),
        ...(has((s) => s.gangueDissolved)
          ? [
              figure(
                "gangue",
                "%",
                1,
                (s) => s.gangueDissolved,
                (d) => d.gangueDissolved,
              ),
            ]
          : []),
        figure("account", "%", 1, (s) => s.accountability),
        acid
          ? figure("acid", "kg/t", 0, (s) => s.acidPerTonne)
          : figure(
              "metal",
              "kg/kg",
              2,
              (s) => s.reagentPerKg,
              (d) => d.reagentPerKg,
            ),
        {
          header: "inside",
          number: true,
          cell: ({ summary }) =>
            summary ? `${summary.places.inside.n} of ${summary.places.inside.n + summary.places.outside.n}` : "",
        },
      ]}
    />
  );
}
