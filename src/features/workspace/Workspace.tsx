import { useCallback, useMemo, useState } from "react";
import { useNavigate } from "react-router-dom";
import { freeAcidOf } from "../../../shared/plan/freeAcidOf";
import { cautionsFor, hazardContext } from "../../../shared/hazards/rules";
import type { PlanRow, RevisionRow } from "../../../shared/schemas/plan";
import type { Outline, Point } from "../../../shared/solution";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { DataChanged } from "../../components/DataChanged";
import { FormulaText } from "../../components/FormulaText";
import { Remark } from "../../components/text";
import { messageOf } from "../../lib/failure";
import { usePotentialScale } from "../../lib/potential";
import { useMay } from "../../lib/session";
import { printColours, useThemeColours } from "../../lib/theme";
import { CursorStore } from "../../map/cursorStore";
import { ProposalStore } from "../../map/proposalStore";
import { useTold } from "../../map/trialStore";
import { AnswersPanel } from "./answers/AnswersPanel";
import { ChooseReagents } from "./answers/ChooseReagents";
import { GasLayers, PracticeList } from "./asks/GasLayers";
import { AsksPanel } from "./asks/AsksPanel";
import { AskingContext } from "./asks/context";
import { Dialogs, type DialogName } from "./header/Dialogs";
import { type ExportKind, FrozenBanner, WorkspaceHeader } from "./header/WorkspaceHeader";
import { MapPanel } from "./MapPanel";
import { applyOpening, holdSetPoint } from "./model/adviceEdit";
import { useAdvice, useRobust } from "./model/useAsked";
import { useDraft } from "./model/useDraft";
import { useKeys } from "./model/useKeys";
import { useMapModel } from "./model/useMapModel";
import { useMapSettings, useReagents } from "./model/useMapSettings";
import { useAnalysis, useGases, useHeld } from "./model/usePoint";
import { usePrinting } from "./model/usePrinting";
import { useSolved } from "./model/useSolved";
import { dropDraft, keepDraft } from "./model/draftShelf";
import { Sheet } from "./Sheet";
import { NextTrials } from "../trials/nextTrials/NextTrials";
import { AnswersOrTrials } from "../trials/planTrials/AnswersOrTrials";
import { usePlanTrials } from "../trials/planTrials/usePlanTrials";

export interface WorkspaceProps {
  plan: PlanRow;
  /** a saved state that is looked at; without it the plan is worked on */
  frozen: RevisionRow | null;
  data: ChemicalData;
}

const NONE: readonly Outline[] = [];

/** A plan on the table: left asks, middle shows, right answers. */
export function Workspace({ plan, frozen, data }: WorkspaceProps) {
  const navigate = useNavigate();
  const mayWrite = useMay("writePlans");
  const draft = useDraft(plan.id, plan.latest);
  const inputs = frozen ? frozen.inputs : draft.inputs;
  const { problem, solution: solved, failure } = useSolved(inputs, data);
  const analysis = useAnalysis(problem, data);
  const { solution, held } = useHeld(inputs, solved, analysis);
  const advice = useAdvice(problem, data, failure === null && solution?.windows.length === 0);
  const robust = useRobust(problem, inputs.ranges, data);
  const scale = usePotentialScale(inputs.temperatureC);
  const theme = useThemeColours();
  const printing = usePrinting();
  const { layers, setLayer, plain, setPlain } = useMapSettings();
  const { reagents, choose } = useReagents(plan.id, inputs);
  const [cursor] = useState(() => new CursorStore());
  const [proposals] = useState(() => new ProposalStore());
  const proposing = useTold(proposals.asked) !== null;
  const [wantedFocus, setFocus] = useState<string | null>(null);
  const [wantedWindow, setWindow] = useState(0);
  const [pinned, setPinned] = useState<Point | null>(null);
  const [dialog, setDialog] = useState<DialogName | null>(null);
  const [exporting, setExporting] = useState<{ text: string; bad: boolean } | null>(null);
  const focus = inputs.metals.some((m) => m.element === wantedFocus) ? wantedFocus : null;
  const count = solution?.windows.length ?? 0;
  const chosen = held?.index ?? Math.min(wantedWindow, Math.max(0, count - 1));
  const { gases, choose: chooseGas } = useGases(analysis, solution?.windows[chosen] ?? null);
  const drawnGases = useMemo(() => gases?.map.regions.filter((r) => gases.shown.has(r.gas)) ?? [], [gases]);
  // the same empty list at every step of a search, so that the map stands still meanwhile
  const robustOutlines = robust.state === "there" ? robust.value.windows : NONE;

  function chooseWindow(index: number) {
    setWindow(index);
    // A point held elsewhere would bring its own window back.
    if (held && held.index !== index && frozen === null) draft.edit(holdSetPoint(null));
  }

  useKeys([
    { key: "z", ctrl: true, shift: false, run: draft.undo },
    { key: "z", ctrl: true, shift: true, run: draft.redo },
    { key: "y", ctrl: true, run: draft.redo },
    { key: "s", ctrl: true, run: () => mayWrite && !frozen && draft.changed && setDialog("save") },
    { key: "f", run: () => setPlain(!plain) },
    { key: "r", run: () => setDialog("revisions") },
    { key: "w", run: () => count > 1 && chooseWindow((chosen + 1) % count) },
    { key: "?", run: () => setDialog("keys") },
    ...["0", "escape"].map((key) => ({
      key,
      run: () => {
        setFocus(null);
        setPinned(null);
      },
    })),
    ...inputs.metals.slice(0, 9).map(({ element }, i) => ({
      key: String(i + 1),
      run: () => setFocus(focus === element ? null : element),
    })),
  ]);

  const setPoint = solution?.windows[chosen]?.setPoint ?? null;
  const asking = useMemo(
    () => ({
      inputs,
      edit: draft.edit,
      settle: draft.settle,
      data,
      solution,
      failure,
      setPoint,
      scale,
      // on paper a control is only its value
      readOnly: frozen !== null || printing,
      focus,
      onFocus: setFocus,
    }),
    [inputs, draft.edit, draft.settle, data, solution, failure, setPoint, scale, frozen, printing, focus],
  );

  const { ligands, temperatureC } = inputs;
  const freeAcid = useMemo(() => freeAcidOf(data, { ligands, temperatureC }), [data, ligands, temperatureC]);
  const trials = usePlanTrials(plan.id, inputs, solution, data, layers.trials || proposing);
  const shownTrials = trials.shown;
  const map = useMapModel({
    inputs,
    problem,
    solution,
    data,
    scale,
    colours: printing ? printColours : theme,
    layers,
    plain,
    focus,
    chosen,
    pinned,
    reagents,
    robust: robustOutlines,
    gases: drawnGases,
    freeAcid,
  });
  const { edit } = draft;
  const mayMove = frozen === null;
  const moveSetPoint = useCallback((at: Point) => edit(holdSetPoint(at), "set point"), [edit]);

  const unconfirmed = cautionsFor(hazardContext(inputs, solution?.windows[chosen]?.setPoint ?? null))
    .filter((c) => c.confirm !== null && (draft.procedures[c.code] ?? "").trim() === "")
    .map((c) => c.code);

  const onExport = useCallback(
    (kind: ExportKind) => {
      if (!solution || !map) return;
      setExporting({ text: "Making the file …", bad: false });
      const state = frozen
        ? `revision ${frozen.number}`
        : draft.changed
          ? `draft on revision ${draft.basedOn}`
          : `revision ${plan.latest.number}`;
      import("./model/exportPlan")
        .then(({ exportPlan }) =>
          exportPlan(kind, {
            plan,
            state,
            revision: frozen?.number ?? plan.latest.number,
            scale,
            inputs,
            problem,
            solution,
            model: { ...map, asked: { ...map.asked, trials: shownTrials, proposals: proposals.marks.get() } },
            dataVersion: data.version,
          }),
        )
        .then(
          () =>
            setExporting(
              kind === "sheet" && !frozen && draft.changed
                ? {
                    text: `The sheet is that of revision ${plan.latest.number}, without the unsaved changes.`,
                    bad: false,
                  }
                : null,
            ),
          (error: unknown) => setExporting({ text: `Not exported: ${messageOf(error)}`, bad: true }),
        );
    },
    [
      solution,
      map,
      shownTrials,
      proposals,
      frozen,
      draft.changed,
      draft.basedOn,
      plan,
      inputs,
      problem,
      data.version,
      scale,
    ],
  );

  function restore(revision: RevisionRow) {
    dropDraft(plan.id);
    keepDraft(plan.id, { basedOn: plan.latest.number, inputs: revision.inputs, procedures: {} });
    void navigate(`/plans/${plan.id}`);
  }

  return (
    <AskingContext value={asking}>
      {frozen ? (
        <FrozenBanner
          {...frozen}
          plan={plan}
          exporting={exporting}
          onSheet={() => onExport("sheet")}
          onRestore={() => restore(frozen)}
        />
      ) : (
        <WorkspaceHeader
          plan={plan}
          draft={draft}
          mayWrite={mayWrite}
          exporting={exporting}
          onExport={onExport}
          onOpen={setDialog}
        />
      )}
      <Sheet
        asks={
          <AsksPanel
            layers={layers}
            onLayer={setLayer}
            plain={plain}
            onPlain={setPlain}
            more={
              <>
                {layers.practice && map && <PracticeList ranges={map.practice} />}
                {layers.hazard && gases && <GasLayers gases={gases} onChoose={chooseGas} />}
              </>
            }
          />
        }
        map={
          map ? (
            <MapPanel
              model={map}
              inputs={inputs}
              scale={scale}
              onPlain={setPlain}
              onFocus={setFocus}
              pinned={pinned}
              onPin={setPinned}
              cursor={cursor}
              onMoveSetPoint={mayMove ? moveSetPoint : undefined}
              onSettle={draft.settle}
              trials={shownTrials}
              proposals={proposing ? proposals : null}
            />
          ) : null
        }
        answers={
          <AnswersOrTrials
            trials={layers.trials ? trials : null}
            scale={scale}
            next={
              solution &&
              count > 0 && (
                <NextTrials
                  store={proposals}
                  plan={plan}
                  revision={frozen?.number ?? plan.latest.number}
                  unsaved={frozen === null && draft.changed}
                  {...{ inputs, solution, data, chosen, trials, scale }}
                  reaches={map?.reaches ?? []}
                  procedures={draft.procedures}
                />
              )
            }
          >
            {frozen === null && <DataChanged plan={plan} className="mb-3" />}
            {failure && (
              <Remark className="mb-3 border-signal!">
                <p role="alert">
                  <b>This cannot be solved.</b> <FormulaText text={failure.message} />.{" "}
                  <span className="text-muted">
                    At <span className="font-mono">{failure.path || "the plan"}</span>.
                    {solution && " The map still shows the last answer; nothing you entered is lost."}
                  </span>
                </p>
              </Remark>
            )}
            {solution && map && (
              <AnswersPanel
                inputs={inputs}
                solution={solution}
                data={data}
                scale={scale}
                chosen={chosen}
                onChoose={chooseWindow}
                reaches={map.reaches}
                pH={map.through[0]}
                chooseReagents={<ChooseReagents preset={inputs.preset} value={reagents} onChange={choose} />}
                procedures={draft.procedures}
                onProcedure={draft.nameProcedure}
                problem={problem}
                advice={advice}
                robust={robust}
                held={held}
                gases={gases}
                freeAcid={freeAcid}
                onApply={mayMove ? (opening) => edit(applyOpening(opening)) : undefined}
                onInputs={mayMove ? edit : undefined}
                onLetGo={mayMove ? () => edit(holdSetPoint(null)) : undefined}
              />
            )}
          </AnswersOrTrials>
        }
      />
      <Dialogs
        open={dialog}
        onOpen={setDialog}
        plan={plan}
        draft={draft}
        unconfirmed={unconfirmed}
        frozen={frozen !== null}
        onRestore={restore}
      />
    </AskingContext>
  );
}
