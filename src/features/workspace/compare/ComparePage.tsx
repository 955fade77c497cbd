import { useEffect, useLayoutEffect, useMemo, useRef, useState } from "react";
import { Link, useLocation, useNavigate, useParams, useSearchParams } from "react-router-dom";
import { groundDifference } from "../../../../shared/compare/ground";
import { limitMoves } from "../../../../shared/compare/limits";
import type { PlanInputs, PlanRow } from "../../../../shared/schemas/plan";
import type { Frame } from "../../../../shared/schemas/problem";
import { Button } from "../../../components/Button";
import { Select } from "../../../components/Select";
import { ErrorNote, Loading } from "../../../components/status";
import { Note } from "../../../components/text";
import { savedAt } from "../../../lib/format";
import { usePlan, useRevisions } from "../../../lib/plans";
import { usePotentialScale } from "../../../lib/potential";
import { bringScale, useScaleChoice } from "../../../lib/scaleChoice";
import { useMay } from "../../../lib/session";
import { useThemeColours } from "../../../lib/theme";
import { usePageTitle } from "../../../lib/title";
import { decodeView, encodeView, queryText } from "../address/codec";
import { TAKE_SETTINGS } from "../address/useOpened";
import { encodeSettings } from "../address/settings";
import { bareView } from "../address/view";
import { ChangeB } from "./ChangeB";
import { CompareMaps, type ShownMap } from "./CompareMaps";
import { CompareWords } from "./CompareWords";
import { MY_DRAFT, type Side, useSide, useSolvedSide } from "./sides";

/** Two states of a plan side by side: revisions, the draft, or settings tried here. */
export default function ComparePage() {
  const { planId = "" } = useParams();
  const plan = usePlan(planId);
  const [search] = useSearchParams();
  usePageTitle(plan.data ? `${plan.data.name}, compared` : undefined);
  if (plan.error)
    return (
      <div className="p-5">
        <ErrorNote doing="The plan could not be opened" error={plan.error} retry={() => void plan.refetch()} />
      </div>
    );
  if (!plan.data)
    return (
      <div className="px-5">
        <Loading label="Opening the plan" />
      </div>
    );
  const latest = plan.data.latest.number;
  return (
    <Sides
      plan={plan.data}
      a={search.get("a") ?? String(Math.max(1, latest - 1))}
      b={search.get("b") ?? (latest > 1 ? String(latest) : "draft")}
    />
  );
}

function Sides({ plan, a, b }: { plan: PlanRow; a: string; b: string }) {
  const [one, two] = [useSide(plan, a), useSide(plan, b)];
  const wrong = [one, two].find((s) => s.state === "wrong");
  if (one.state === "there" && two.state === "there")
    return <Compared plan={plan} texts={[a, b]} a={one.side} b={two.side} />;
  return (
    <div className="p-5">
      {wrong ? (
        <>
          <ErrorNote doing="One side could not be read" error={new Error(wrong.why)} />
          <p className="mt-3">
            <Link to={`/plans/${plan.id}`}>Back to the plan</Link>
          </p>
        </>
      ) : (
        <Loading label="Reading both sides" />
      )}
    </div>
  );
}

const rangeIn = (text: string | null): [number, number] | null => {
  const [lo, hi] = (text ?? "").split("..").map(Number);
  return lo !== undefined && hi !== undefined && lo < hi ? [lo, hi] : null;
};
const round = (x: number) => Number(x.toFixed(4));
const isShown = (text: string | null): text is ShownMap => text === "a" || text === "b" || text === "difference";

function Compared({ plan, texts: [aText, bText], a, b }: { plan: PlanRow; texts: [string, string]; a: Side; b: Side }) {
  const navigate = useNavigate();
  const [search, setSearch] = useSearchParams();
  const [trying, setTrying] = useState(false);
  const [tried, setTried] = useState<PlanInputs | null>(null);
  const sideB = useMemo(() => (tried ? { ...b, name: "settings tried here", inputs: tried } : b), [b, tried]);
  useScaleOfAddress(search, a.inputs);
  const scale = usePotentialScale(a.inputs.temperatureC);
  const [scaleChoice] = useScaleChoice();
  const colours = useThemeColours();
  const [one, two] = [useSolvedSide(a, scale, colours, false), useSolvedSide(sideB, scale, colours, false)];
  const difference = useMemo(
    () => (one.analysis && two.analysis ? groundDifference(one.analysis, two.analysis) : null),
    [one.analysis, two.analysis],
  );
  const moves = useMemo(() => {
    if (!one.window || !two.window) return [];
    const { pH, Eh } = one.window.setPoint;
    return limitMoves(one.window, two.window, [pH, Eh]);
  }, [one.window, two.window]);
  const zoom = useMemo((): Frame | null => {
    const [pH, Eh] = [rangeIn(search.get("pH")), rangeIn(search.get("Eh"))];
    return pH && Eh ? { pH, Eh } : null;
  }, [search]);
  const map = search.get("map");
  const mayWrite = useMay("writePlans");
  const { pathname } = useLocation();
  const change = (parts: Record<string, string | null>) => {
    // A link was followed and the next screen is still coming: its address is not ours to write.
    if (window.location.pathname !== pathname) return;
    setSearch(
      (old) => {
        for (const [key, value] of Object.entries({ a: aText, b: bText, ...parts }))
          if (value === null) old.delete(key);
          else old.set(key, value);
        return old;
      },
      { replace: true, preventScrollReset: true },
    );
  };
  const changeLater = useRef(change);
  useEffect(() => {
    changeLater.current = change;
  });
  // The address says what is compared, whoever opens it: a draft as settings, the scale in force.
  const scaleText = encodeView({ ...bareView, scale: scaleChoice }).find(([key]) => key === "scale")?.[1] ?? null;
  const said = {
    a: aText === "draft" ? encodeSettings(plan.latest, a.inputs) : aText,
    b: bText === "draft" ? encodeSettings(plan.latest, b.inputs) : bText,
    scale: scaleText,
  };
  const unsaid = Object.entries(said).some(([key, value]) => search.get(key) !== value);
  useEffect(() => {
    if (unsaid) changeLater.current(said);
  });
  // Settings tried go into the address when the hand rests.
  useEffect(() => {
    if (!tried) return;
    const timer = setTimeout(() => changeLater.current({ b: encodeSettings(plan.latest, tried) }), 350);
    return () => clearTimeout(timer);
  }, [tried, plan.latest]);
  // Asked for here, they need not be proposed there once more; Undo brings back what stood before.
  const take = (side: Side) =>
    void navigate(`/plans/${plan.id}${queryText([["settings", encodeSettings(plan.latest, side.inputs)]])}`, {
      state: TAKE_SETTINGS,
    });
  const pair = { a: { side: a, solved: one }, b: { side: sideB, solved: two } };
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-3 gap-y-1 border-b border-rule px-5 py-1.5">
        <Link to={`/plans/${plan.id}`} className="no-print text-sm text-muted">
          {plan.name}
        </Link>
        <h1 className="text-lg">A against B</h1>
        <Choose plan={plan} label="A" value={aText} name={a.name} onChange={(value) => change({ a: value })} />
        <Button
          title="A becomes B and B becomes A"
          onClick={() => {
            setTried(null);
            change({ a: tried ? encodeSettings(plan.latest, tried) : bText, b: aText });
          }}
        >
          Swap
        </Button>
        <Choose
          plan={plan}
          label="B"
          value={bText}
          name={sideB.name}
          onChange={(value) => {
            setTried(null);
            change({ b: value });
          }}
        />
        <span className="flex-1" />
        <span className="no-print flex gap-2">
          <Button aria-expanded={trying} onClick={() => setTrying(!trying)}>
            {trying ? "Close the settings" : "Change B"}
          </Button>
          {mayWrite ? (
            <Button kind="primary" onClick={() => take(sideB)}>
              Take B into the plan
            </Button>
          ) : (
            <Button title="On your screen alone; a metallurgist saves" onClick={() => take(sideB)}>
              Try B in the plan
            </Button>
          )}
        </span>
      </div>
      <div className="grid min-h-0 flex-1 grid-cols-1 lg:grid-cols-2 lg:grid-rows-2">
        <CompareMaps
          {...pair}
          difference={difference}
          scale={scale}
          zoom={zoom}
          onZoom={(to) =>
            change({
              pH: to && `${round(to.pH[0])}..${round(to.pH[1])}`,
              Eh: to && `${round(to.Eh[0])}..${round(to.Eh[1])}`,
            })
          }
          shown={isShown(map) ? map : "difference"}
          onShow={(shown) => change({ map: shown })}
        />
        <div
          className="px-5 pt-3 pb-8 -outline-offset-2 lg:min-h-0 lg:overflow-y-auto"
          role="region"
          aria-label="The difference in words"
          tabIndex={0}
        >
          {trying && (
            <section aria-label="Settings of B" className="mb-4">
              <ChangeB inputs={sideB.inputs} start={b.inputs} onChange={setTried} />
              <Note className="py-1">Tried here only: the plan keeps its settings until you take B into it.</Note>
            </section>
          )}
          <CompareWords {...pair} difference={difference} moves={moves} scale={scale} />
        </div>
      </div>
    </>
  );
}

/** A scale that the address names stands over the member's own while the comparison is open. */
function useScaleOfAddress(search: URLSearchParams, inputs: PlanInputs) {
  const [brought] = useState(() => (search.has("scale") ? decodeView(search, inputs).view.scale : null));
  useLayoutEffect(() => {
    if (!brought) return;
    bringScale(brought);
    return () => bringScale(null);
  }, [brought]);
}

/** One side: the draft, or a revision. */
function Choose({
  plan,
  label,
  value,
  name,
  onChange,
}: {
  plan: PlanRow;
  label: string;
  value: string;
  name: string;
  onChange: (value: string) => void;
}) {
  const revisions = useRevisions(plan.id).data ?? [plan.latest];
  const draft = name.startsWith(MY_DRAFT);
  const listed = draft || /^\d+$/.test(value);
  return (
    <span className="inline-flex items-baseline gap-2">
      <b className="font-mono">{label}</b>
      <Select
        label={`Side ${label}`}
        layout="bare"
        value={draft ? "draft" : listed && name !== "settings tried here" ? value : "settings"}
        onChange={(next) => next !== "settings" && onChange(next)}
        options={[
          ...(listed && name !== "settings tried here" ? [] : [{ value: "settings", label: name, text: name }]),
          { value: "draft", label: "my draft", text: "my draft", note: "the plan as it stands in this browser" },
          ...revisions.map((r) => ({
            value: String(r.number),
            label: `revision ${r.number}`,
            text: `revision ${r.number}`,
            note: `${savedAt(r.createdAt)} by ${r.author}${r.note ? `: ${r.note}` : ""}`,
          })),
        ]}
      />
    </span>
  );
}
