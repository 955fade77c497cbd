import { Link } from "react-router-dom";
import type { PlanRow } from "../../../shared/schemas/plan";
import { MetalLine } from "../../components/MetalLine";
import type { Column } from "../../components/tableModel";
import { fullTime, savedAt } from "../../lib/format";
import { lixiviantName, requirementWord } from "../../lib/planWords";

const metalsText = ({ latest }: PlanRow) =>
  latest.inputs.metals
    .map((m) => `${m.element} ${m.role === "watched" ? "watched" : requirementWord[m.requirement]}`)
    .join(", ");

export const planColumns: readonly Column<PlanRow>[] = [
  {
    id: "name",
    header: "plan",
    value: (plan) => plan.name,
    cell: (plan) => (
      <>
        <Link
          to={`/plans/${plan.id}`}
          tabIndex={-1}
          className="text-base font-bold no-underline hover:text-verdigris hover:underline"
          onClick={(event) => event.stopPropagation()}
        >
          {plan.name}
        </Link>
        <div className="truncate text-sm text-muted">
          {plan.invented && "invented"}
          {plan.archived && (plan.invented ? ", archived" : "archived")}
          {plan.dataOutdated && (
            <b className="text-ink">{plan.invented || plan.archived ? ", " : ""}chemistry changed</b>
          )}
        </div>
      </>
    ),
  },
  {
    id: "metals",
    header: "metals",
    width: "26%",
    wrap: true,
    value: metalsText,
    cell: (plan) => <MetalLine metals={plan.latest.inputs.metals} />,
  },
  {
    id: "lixiviant",
    header: "lixiviant",
    width: "9.5em",
    value: (plan) => lixiviantName[plan.latest.inputs.preset],
    wide: true,
  },
  {
    id: "temperature",
    header: "T",
    unit: "°C",
    width: "5.2em",
    digits: 0,
    value: (plan) => plan.latest.inputs.temperatureC,
  },
  { id: "revisions", header: "rev.", width: "4em", digits: 0, value: (plan) => plan.revisionCount, filtered: false },
  {
    id: "saved",
    header: "saved",
    width: "12.4em",
    align: "right",
    filtered: false,
    wide: true,
    value: (plan) => plan.latest.createdAt,
    cell: (plan) => (
      <span title={fullTime(plan.latest.createdAt)}>
        {savedAt(plan.latest.createdAt)}
        <span className="block truncate text-muted">{plan.latest.author}</span>
      </span>
    ),
  },
];
