import { useCallback, useDeferredValue, useMemo, useState } from "react";
import { Link } from "react-router-dom";
import { FREE_ACID_BELOW } from "../../../../shared/activity/freeAcid";
import { acidPlan, trialAcid, type TrialAcid } from "../../../../shared/trials/trialAcid";
import { acidFigures } from "../../../components/AcidAmount";
import { Button } from "../../../components/Button";
import { Check, Segmented } from "../../../components/choice";
import { DataTable } from "../../../components/DataTable";
import { ErrorNote, Loading } from "../../../components/status";
import type { Column } from "../../../components/tableModel";
import { Empty, Note, SectionHead } from "../../../components/text";
import { VirtualBody } from "../../../components/VirtualBody";
import { fixed, signed } from "../../../lib/format";
import type { PlacedTrial } from "../../../lib/judgedTrials";
import type { PotentialScale } from "../../../lib/potential";
import { inBrush, useTold } from "../../../map/trialStore";
import { countWords } from "../../../lib/tallyWords";
import { Legend } from "./Legend";
import { colouringWords, colourings } from "./planTrialsModel";
import { Tried } from "./Tried";
import type { PlanTrials } from "./usePlanTrials";

/** Beside the map: which trials it shows, what colours them, the tally in words, and the table linked with the points. */
export function TrialsPanel({ trials, scale }: { trials: PlanTrials; scale: PotentialScale }) {
  const { answer, error, scope, setScope, hidden, toggle, colouring, setColouring, marks } = trials;
  const scopes = (
    <Segmented
      label="Which trials"
      value={scope}
      onChange={setScope}
      options={[
        { value: "plan", label: "of this plan" },
        { value: "project", label: "of the project" },
      ]}
    />
  );
  if (error !== null) return <ErrorNote doing="The trials could not be read" error={error} retry={trials.retry} />;
  if (!answer) return <Loading label="Reading the trials" />;
  return (
    <>
      {scopes}
      {answer.rows.length === 0 ? (
        <Empty title="No trial here yet">
          {scope === "plan" ? "No campaign was laid out on this plan. " : "No campaign of this project has a trial. "}
          <Link to="/campaigns">Campaigns</Link> are where trials are planned.
        </Empty>
      ) : (
        <>
          <SectionHead className="mt-3">Campaigns</SectionHead>
          {answer.campaigns.map(({ id, code, title }) => (
            <Check key={id} label={`${code}, ${title}`} checked={!hidden.has(id)} onChange={() => toggle(id)}>
              <span className="font-mono">{code}</span> <span className="text-sm text-muted">{title}</span>
            </Check>
          ))}
          <SectionHead className="mt-3">Coloured by</SectionHead>
          <Segmented
            className="mt-1.5"
            label="What colours the points"
            value={colouring}
            onChange={setColouring}
            options={colourings.map((value) => ({
              value,
              label: value === "gangueDissolvedPct" ? "gangue" : colouringWords[value],
              title: colouringWords[value],
            }))}
          />
          <Legend
            scale={trials.scale}
            unit={colouring === "selectivityPct" ? "points" : "%"}
            markers={trials.markers}
            open={marks.some((m) => m.open)}
            cooled={marks.some((m) => m.cooled)}
          />
          <Tried trials={trials} />
          <LinkedTable trials={trials} scale={scale} />
        </>
      )}
    </>
  );
}

const columnsOf = (
  scale: PotentialScale,
  trials: readonly PlacedTrial[],
  acidOf: (trial: PlacedTrial) => TrialAcid | null,
): readonly Column<PlacedTrial>[] => [
  {
    id: "code",
    header: "trial",
    value: (t) => t.code,
    cell: (t) => <span className="font-mono">{t.code}</span>,
  },
  {
    id: "recovery",
    header: "rec",
    unit: "%",
    digits: 0,
    width: "32px",
    filtered: false,
    value: (t) => t.figures.recoveryPct,
  },
  {
    id: "gangue",
    header: "gan",
    unit: "%",
    digits: 1,
    width: "38px",
    filtered: false,
    value: (t) => t.figures.gangueDissolvedPct,
  },
  {
    id: "pH",
    header: acidic(trials) ? "pH · acid" : "pH",
    ...(acidic(trials) ? { unit: "g/L" } : {}),
    digits: 2,
    width: acidic(trials) ? "84px" : "42px",
    filtered: false,
    value: (t) => t.figures.pH,
    cell: (t) => (
      <>
        {t.figures.pH !== null && fixed(t.figures.pH, 2)}
        <Acid acid={acidOf(t)} />
      </>
    ),
  },
  {
    id: "place",
    header: "is",
    width: "40px",
    value: (t) => t.count,
    cell: (t) => (
      <span
        title={`${countWords[t.count]}; Eh ${t.figures.Eh === null ? "not read" : `${fixed(scale.toShown(t.figures.Eh), scale.digits)} ${scale.label}`}${t.comparability.comparable ? "" : `; ${t.comparability.reasons.join("; ")}`}`}
      >
        {t.count === "inside"
          ? "in"
          : t.count === "outside"
            ? "out"
            : t.count === "apart"
              ? "other"
              : t.count === "rejected"
                ? "rej."
                : "none"}
      </span>
    ),
  },
];

const acidic = (trials: readonly PlacedTrial[]): boolean =>
  trials.some(({ figures: { pH } }) => pH !== null && pH < FREE_ACID_BELOW);

/** Free acid as titrated, below pH 1.5; what the pH stands for, and the difference, behind it. */
function Acid({ acid }: { acid: TrialAcid | null }) {
  if (acid === null) return null;
  const { titrated, byPH, difference } = acid;
  const words = [
    titrated === null ? "not titrated" : `titrated ${acidFigures(titrated)} g/L H2SO4`,
    byPH === null ? "by pH not known" : `about ${acidFigures(byPH)} g/L by pH, indicative`,
    ...(difference === null ? [] : [`titration less pH ${signed(difference, 1)} g/L, neither corrected`]),
  ].join("; ");
  return (
    <span title={words} aria-label={words} role="text" className="text-muted">
      {" · "}
      {titrated === null ? (byPH === null ? "?" : `~${acidFigures(byPH)}`) : acidFigures(titrated)}
    </span>
  );
}

/** The trials as rows: pointing at a row rings its point, pointing at a point lights its row; a brush on the map narrows the table. */
function LinkedTable({
  trials: { trials, store, open, ground },
  scale,
}: {
  trials: PlanTrials;
  scale: PotentialScale;
}) {
  const hovered = useTold(store.hovered);
  // The box follows the hand; the rows follow the box when there is time.
  const brush = useDeferredValue(useTold(store.brush));
  const brushing = useTold(store.brushing);
  const [chosen, setChosen] = useState<string>();
  const acidOf = useCallback(
    ({ compared, figures }: PlacedTrial) => {
      // A cooled sample has a temperature of its own, which a point on the map does not carry.
      const at = { pH: figures.pH, temperatureC: figures.pHCooled ? null : figures.temperatureC };
      return trialAcid(compared, at, compared.freeAcid ?? null, acidPlan(ground.inputs), ground.data);
    },
    [ground],
  );
  const columns = useMemo(() => columnsOf(scale, trials, acidOf), [scale, trials, acidOf]);
  const rows = useMemo(
    () =>
      brush === null
        ? trials
        : trials.filter(
            ({ figures: { pH, Eh }, count }) =>
              pH !== null && Eh !== null && count !== "rejected" && inBrush({ pH, Eh }, brush),
          ),
    [trials, brush],
  );
  return (
    <section aria-label="Trials on the map" className="mt-4">
      <SectionHead
        aside={
          brush === null ? (
            <Button
              kind="quiet"
              className="h-auto!"
              aria-pressed={brushing}
              onClick={() => store.brushing.set(!brushing)}
            >
              {brushing ? "drag on the map" : "brush"}
            </Button>
          ) : (
            <Button kind="quiet" className="h-auto!" onClick={() => store.brush.set(null)}>
              show all {trials.length}
            </Button>
          )
        }
      >
        {brush === null ? `${rows.length} trials` : `${rows.length} in the box`}
      </SectionHead>
      <DataTable
        caption="Trials on the map"
        rows={rows}
        columns={columns}
        rowKey={({ id }) => id}
        initialSort={{ id: "code" }}
        selectedKey={chosen}
        hoveredKey={hovered}
        onHover={(row) => store.hovered.set(row?.id ?? null)}
        onSelect={({ id }) => {
          setChosen(id);
          store.hovered.set(id);
        }}
        onOpen={({ id }) => open(id)}
        muted={({ count }) => count === "rejected"}
        Body={VirtualBody}
        rowHeight={26}
        // The column is narrow; a code cut off names no trial.
        className="h-[300px] [&_table]:text-xs! [&_td]:px-1 [&_th]:px-1"
        empty="No trial lies in the box."
      />
      <Note className="pt-1">
        Shift and drag on the map brushes; a click on a point, Enter or a double click on a row opens the trial.
      </Note>
    </section>
  );
}
