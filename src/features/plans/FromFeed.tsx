import { useMemo, useState } from "react";
import { headsOfFeed, likelyTarget, mineralsOfFeed, suggestedLines } from "../../../shared/plan/fromFeed";
import { presetCaution } from "../../../shared/hazards/presetCautions";
import { presetNames, type PresetName } from "../../../shared/schemas/plan";
import type { FeedRow } from "../../../shared/schemas/feed";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { Caution } from "../../components/Caution";
import { Term } from "../../components/Help";
import { NumberField } from "../../components/NumberField";
import { Select } from "../../components/Select";
import { ErrorNote } from "../../components/status";
import { Note } from "../../components/text";
import { TextField } from "../../components/TextField";
import { feedPlanInputs } from "../../lib/newPlan";
import { presetLigands } from "../../lib/presetLigands";
import { lixiviantName } from "../../lib/planWords";
import type { CreatePlanDialogProps } from "./CreatePlanDialog";
import { FeedMetals } from "./FeedMetals";
import { lineOf, sulfateBrought, type LineEdits } from "./feedLines";
import { useCreateAndOpen } from "./useCreateAndOpen";

interface FromFeedProps extends CreatePlanDialogProps {
  data: ChemicalData;
  feeds: readonly FeedRow[];
  wanted: string | undefined;
  step: 1 | 2;
  onStep: (step: 1 | 2) => void;
}

/** Feed, liquor and pulp, then the metals that follow from them; every suggestion says where it comes from and can be changed. */
export function FromFeed({ data, feeds, wanted, projects, projectId, step, onStep, onOpenChange }: FromFeedProps) {
  const create = useCreateAndOpen(() => onOpenChange(false));
  const [feedId, setFeedId] = useState(feeds.find((f) => f.id === wanted)?.id ?? feeds[0]?.id ?? "");
  const [typedName, setName] = useState<string | null>(null);
  const [preset, setPreset] = useState<PresetName>("sulfate");
  const [temperatureC, setTemperature] = useState(25);
  const [solidsPct, setSolids] = useState(20);
  const [chosen, setTarget] = useState<string | null>(null);
  const [edits, setEdits] = useState<LineEdits>({});
  const [typedSulfate, setSulfate] = useState<number | null>(null);
  const [without, setWithout] = useState<ReadonlySet<string>>(new Set());
  const feed = feeds.find(({ id }) => id === feedId);
  const found = useMemo(() => (feed ? headsOfFeed(feed, data) : { heads: [], skipped: [] }), [feed, data]);
  const minerals = useMemo(() => (feed ? mineralsOfFeed(feed, data) : { known: [], unknown: [] }), [feed, data]);
  const target = found.heads.find((h) => h.element === chosen)?.element ?? likelyTarget(found.heads, preset);
  const name = typedName ?? (feed ? `${feed.name.replace(" (invented)", "")}, leach` : "");
  const lines = useMemo(
    () =>
      target === null
        ? []
        : suggestedLines(found.heads, target).map((s) => lineOf(s, found.heads, solidsPct / 100, edits[s.element])),
    [found.heads, target, solidsPct, edits],
  );
  const sulfate = useMemo(() => {
    const preset0 = presetLigands(data, preset).find((l) => l.component === "S");
    return preset === "sulfate" && preset0 ? (typedSulfate ?? sulfateBrought(lines, data, preset0.activity)) : null;
  }, [data, preset, lines, typedSulfate]);
  const inputs = useMemo(() => {
    const drawn = lines.filter((l) => l.drawn);
    if (drawn.length === 0) return null;
    return feedPlanInputs(
      { preset, temperatureC, lines: drawn, minerals: minerals.known.filter((id) => !without.has(id)), sulfate },
      data,
    );
  }, [lines, preset, temperatureC, minerals, without, sulfate, data]);

  function submit() {
    if (target === null || name.trim() === "") return;
    if (step === 1) onStep(2);
    else if (inputs && !create.busy) create.start({ projectId, name: name.trim(), inputs });
  }
  const project = projects.find(({ id }) => id === projectId);
  return (
    <form
      id="new-plan"
      noValidate
      className="space-y-4"
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      {step === 1 ? (
        <>
          <Select
            label="Feed"
            layout="stacked"
            value={feedId}
            onChange={(id) => {
              setFeedId(id);
              setTarget(null);
              setEdits({});
              setWithout(new Set());
            }}
            options={feeds.map(({ id, name: label, heads }) => ({
              value: id,
              label,
              text: label,
              note: [...new Set(heads.map((h) => h.element))].slice(0, 8).join(", ") || "no assay yet",
            }))}
            hint={project && `of ${project.siteName} / ${project.name}`}
          />
          <TextField
            label="Name of the plan"
            value={name}
            maxLength={120}
            error={name.trim() === "" ? "A name of 1 to 120 characters" : null}
            onChange={(event) => setName(event.target.value)}
          />
          <div className="grid grid-cols-2 gap-4">
            <Select
              label="Lixiviant"
              layout="stacked"
              value={preset}
              onChange={setPreset}
              options={presetNames.map((value) => ({ value, label: lixiviantName[value] }))}
            />
            <Select
              label="Metal to dissolve"
              layout="stacked"
              value={target ?? ""}
              onChange={(element) => {
                setTarget(element);
                setEdits({});
              }}
              options={found.heads.map(({ element, typed }) => ({
                value: element,
                label: `${element}, head ${typed}`,
              }))}
              error={target === null ? "This feed has no assay of a metal: enter one under Feeds" : null}
            />
            <NumberField
              label="Temperature of the liquor"
              layout="stacked"
              value={temperatureC}
              onCommit={setTemperature}
              unit="°C"
              min={0}
              max={250}
              step={5}
            />
            <NumberField
              label="Solids in the pulp"
              labelText={<Term word="pulpDensity">Solids in the pulp</Term>}
              layout="stacked"
              value={solidsPct}
              onCommit={setSolids}
              unit="% w/w"
              min={1}
              max={80}
              step={5}
            />
          </div>
          <Caution defer={false}>{presetCaution[preset]}</Caution>
        </>
      ) : (
        <FeedMetals
          lines={lines}
          edit={(element, change) => setEdits((old) => ({ ...old, [element]: { ...old[element], ...change } }))}
          minerals={minerals}
          without={without}
          onMineral={(id, on) =>
            setWithout((old) => {
              const next = new Set(old);
              if (on) next.delete(id);
              else next.add(id);
              return next;
            })
          }
          inputs={inputs}
          data={data}
          solidsPct={solidsPct}
          sulfate={sulfate === null ? null : { total: sulfate, typed: typedSulfate !== null, onChange: setSulfate }}
        />
      )}
      {step === 2 && found.skipped.length > 0 && (
        <Note>Not taken over: {found.skipped.map(({ element, why }) => `${element}, ${why}`).join("; ")}.</Note>
      )}
      {create.error && <ErrorNote doing="Not created" error={create.error} />}
    </form>
  );
}
