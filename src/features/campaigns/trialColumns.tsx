import { Link } from "react-router-dom";
import type { trialSorts } from "../../../shared/schemas/trial";
import type { TrialListRow } from "../../../shared/schemas/trialRows";
import type { Column } from "../../components/tableModel";
import { fixed, fullTime, savedAt } from "../../lib/format";
import type { PotentialScale } from "../../lib/potential";

type SortKey = (typeof trialSorts)[number];
/** A column's id is what the server sorts by. */
type TrialColumn = Column<TrialListRow> & { id: SortKey | "feed" };

const figure = (
  id: SortKey & keyof TrialListRow["figures"],
  header: string,
  unit: string,
  digits: number,
  width: string,
  more: Partial<TrialColumn> = {},
): TrialColumn => ({ id, header, unit, digits, width, value: ({ figures }) => figures[id], ...more });

/** Trials as a list shows them; potentials on the member's scale. Columns that say the same in every row are left out. */
export const trialColumns = (
  scale: PotentialScale,
  { feeds, leach, cementation }: { feeds: boolean; leach: boolean; cementation: boolean },
): readonly TrialColumn[] => [
  {
    id: "code",
    header: "trial",
    value: (t) => t.code,
    cell: (t) => (
      <>
        <Link
          to={`/trials/${t.id}`}
          tabIndex={-1}
          className="font-mono font-bold no-underline hover:text-verdigris hover:underline"
          onClick={(event) => event.stopPropagation()}
        >
          {t.code}
        </Link>
        {t.replicateOfCode !== null && <span className="text-muted"> repeats {t.replicateOfCode}</span>}
      </>
    ),
  },
  { id: "stage", header: "stage", width: "4.2em", value: (t) => t.stage },
  { id: "status", header: "status", width: "8em", value: (t) => t.status },
  ...(feeds
    ? [
        {
          id: "feed",
          header: "feed",
          width: "8em",
          value: (t: TrialListRow) => t.feedName,
          sortable: false,
          wide: true,
        } as const,
      ]
    : []),
  figure("recoveryPct", "recovery", "% target", 1, "6.8em"),
  ...(leach ? [figure("gangueDissolvedPct", "dissolved", "% gangue", 1, "7em")] : []),
  figure("accountabilityPct", "account", "%", 1, "5.4em", {
    cell: ({ figures: { accountabilityPct: x } }) =>
      x === null ? null : x < 95 || x > 105 ? (
        <span className="font-bold text-signal" title="outside 95 to 105 %">
          {fixed(x, 1)}
        </span>
      ) : (
        fixed(x, 1)
      ),
  }),
  ...(leach ? [figure("acidPerTonne", "acid", "kg/t", 0, "4.4em", { wide: true })] : []),
  ...(cementation ? [figure("reagentPerKg", "dust", "kg/kg", 2, "4.8em", { wide: true })] : []),
  figure("pH", "pH", "", 2, "4.4em", {
    cell: ({ figures: { pH, pHCooled } }) =>
      pH === null ? null : (
        <span title={pHCooled ? "pH of a cooled sample, not corrected" : undefined}>
          {fixed(pH, 2)}
          {pHCooled && <span className="inline-block w-0">*</span>}
        </span>
      ),
  }),
  {
    id: "Eh",
    header: "Eh",
    unit: scale.label,
    digits: scale.digits,
    width: "6.4em",
    value: ({ figures: { Eh } }) => (Eh === null ? null : scale.toShown(Eh)),
  },
  figure("temperatureC", "T", "°C", 0, "3.6em"),
  {
    id: "startedAt",
    header: "started",
    width: "8em",
    align: "right",
    wide: true,
    value: (t) => t.startedAt,
    cell: (t) => t.startedAt && <time title={fullTime(t.startedAt)}>{savedAt(t.startedAt)}</time>,
  },
];
