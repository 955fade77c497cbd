import { lazy, Suspense, useCallback, useEffect, useMemo, useState } from "react";
import { useLocation, useNavigate } from "react-router-dom";
import { freeAcidOf } from "../../../shared/plan/freeAcidOf";
import { cautionsFor, hazardContext } from "../../../shared/hazards/rules";
import type { PlanRow, RevisionRow } from "../../../shared/schemas/plan";
import type { Outline, Point } from "../../../shared/solution";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { FormulaText } from "../../components/FormulaText";
import { Loading } from "../../components/status";
import { Remark } from "../../components/text";
import { usePotentialScale } from "../../lib/potential";
import { useMay } from "../../lib/session";
import { printColours, useThemeColours } from "../../lib/theme";
import { CursorStore } from "../../map/cursorStore";
import { LimitStore } from "../../map/limitStore";
import { ProposalStore } from "../../map/proposalStore";
import { useTold } from "../../map/trialStore";
import { AnswersPanel } from "./answers/AnswersPanel";
import { ChooseReagents } from "./answers/ChooseReagents";
import { GasLayers, PracticeList } from "./asks/GasLayers";
import { AsksPanel } from "./asks/AsksPanel";
import { AskingContext } from "./asks/context";
import { Dialogs, type DialogName } from "./header/Dialogs";
import { type Said, WorkspaceHeader } from "./header/WorkspaceHeader";
import { MapPanel } from "./map/MapPanel";
import { useLink } from "./address/useLink";
import { takesSettings, type Opened } from "./address/useOpened";
import { applyOpening, holdSetPoint } from "./model/adviceEdit";
import { sameInputs } from "./model/history";
import { useAdvice, useRobust } from "./model/useAsked";
import { useExport } from "./model/useExport";
import { useDraft } from "./model/useDraft";
import { useLook } from "./model/useLook";
import { useWorkspaceKeys } from "./model/useWorkspaceKeys";
import { useMapModel } from "./model/useMapModel";
import { useGases, useHeld } from "./model/usePoint";
import { usePrinting } from "./model/usePrinting";
import { useSight } from "./model/useSight";
import { useSolved } from "./model/useSolved";
import { dropDraft, keepDraft } from "./model/draftShelf";
import { Sheet } from "./Sheet";
import { NextTrials } from "../trials/nextTrials/NextTrials";
import { AnswersOrTrials } from "../trials/planTrials/AnswersOrTrials";
import { usePlanTrials } from "../trials/planTrials/usePlanTrials";

const loadFilm = () => import("./film/Film");
const Film = lazy(async () => ({ default: (await loadFilm()).Film }));
const loadBanners = () => import("./address/LinkBanners");
const ProposalBanner = lazy(async () => ({ default: (await loadBanners()).ProposalBanner }));
const IgnoredBanner = lazy(async () => ({ default: (await loadBanners()).IgnoredBanner }));

const FrozenBanner = lazy(async () => ({ default: (await import("./header/FrozenBanner")).FrozenBanner }));
const DataChanged = lazy(async () => ({ default: (await import("../../components/DataChanged")).DataChanged }));
const CommentsPanel = lazy(() => import("./comments/CommentsPanel"));

export interface WorkspaceProps {
  plan: PlanRow;
  /** a saved state that is looked at; without it the plan is worked on */
  frozen: RevisionRow | null;
  data: ChemicalData;
  /** what the address brought */
  start: Opened;
}

const NONE: readonly Outline[] = [];

/** Small maps, curves and what opens and closes, on a tablet, px. */
const FILM_ROOM = 780;
/** Strips of many metals would else eat up the map. */
const mapRoom = (metals: number): number => 560 + 24 * Math.max(0, metals - 4);

/** A plan on the table: left asks, middle shows, right answers. */
export function Workspace({ plan, frozen, data, start }: WorkspaceProps) {
  const navigate = useNavigate();
  const mayWrite = useMay("writePlans");
  const draft = useDraft(plan.id, plan.latest, frozen === null);
  const taking = takesSettings(useLocation().state) ? start.settings : null;
  const [proposal, setProposal] = useState(() =>
    start.settings && !taking && !sameInputs(start.settings, draft.inputs) ? start.settings : null,
  );
  const { edit } = draft;
  useEffect(() => {
    if (taking) edit((now) => (sameInputs(now, taking) ? now : taking));
  }, [taking, edit]);
  const [ignored, setIgnored] = useState(start.ignored);
  const inputs = frozen?.inputs ?? proposal ?? draft.inputs;
  const fixed = frozen !== null || proposal !== null;
  const look = useLook(start.view, plan.id, inputs, proposal !== null);
  const { problem, solution: solved, analysis, failure } = useSolved(inputs, data);
  const { solution, held } = useHeld(inputs, solved, analysis);
  const advice = useAdvice(problem, inputs, data, failure === null && solution?.windows.length === 0);
  const robust = useRobust(problem, inputs, data);
  const scale = usePotentialScale(inputs.temperatureC);
  const theme = useThemeColours();
  const printing = usePrinting();
  const { layers, setLayer, plain, setPlain } = look.map;
  const { reagents, choose, focus, setFocus } = look;
  const { sight, change: see } = useSight(inputs, look.view, look.change);
  const [limitStore] = useState(() => new LimitStore());
  const [cursor] = useState(() => new CursorStore());
  const [proposals] = useState(() => new ProposalStore());
  const proposing = useTold(proposals.asked) !== null;
  const { comments: talking, asText } = look.view;
  const changeLook = look.change;
  const toggleTalk = useCallback(() => changeLook({ comments: !talking }), [changeLook, talking]);
  const [dialog, setDialog] = useState<DialogName | null>(null);
  const [said, setSaid] = useState<Said | null>(null);
  const link = useLink(plan, frozen, inputs, look.seen, setSaid);
  const count = solution?.windows.length ?? 0;
  const chosen = held?.index ?? Math.min(look.view.window, Math.max(0, count - 1));
  const { gases, choose: chooseGas } = useGases(analysis, solution?.windows[chosen] ?? null, look.switched);
  const drawnGases = useMemo(() => gases?.map.regions.filter((r) => gases.shown.has(r.gas)) ?? [], [gases]);
  // the same empty list at every step of a search, so that the map stands still meanwhile
  const robustOutlines = robust.state === "there" ? robust.value.windows : NONE;

  function chooseWindow(index: number) {
    look.setWindow(index);
    // A point held elsewhere would bring its own window back.
    if (held && held.index !== index && !fixed) draft.edit(holdSetPoint(null));
  }

  useWorkspaceKeys(
    draft,
    look,
    see,
    inputs.metals.map((m) => m.element),
    fixed,
    mayWrite,
    { count, chosen, choose: chooseWindow },
    setDialog,
    link.copy,
    toggleTalk,
  );

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
      readOnly: fixed || printing,
      focus,
      onFocus: setFocus,
    }),
    [inputs, draft.edit, draft.settle, data, solution, failure, setPoint, scale, fixed, printing, focus, setFocus],
  );

  const { ligands, temperatureC } = inputs;
  const freeAcid = useMemo(() => freeAcidOf(data, { ligands, temperatureC }), [data, ligands, temperatureC]);
  const trials = usePlanTrials(
    plan.id,
    inputs,
    solution,
    data,
    layers.trials || proposing,
    look.trials,
    look.lookAtTrials,
  );
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
    sight,
    chosen,
    reagents,
    robust: robustOutlines,
    gases: drawnGases,
    freeAcid,
  });
  const mayMove = !fixed;
  const moveSetPoint = useCallback((at: Point) => edit(holdSetPoint(at), "set point"), [edit]);

  const unconfirmed = cautionsFor(hazardContext(inputs, solution?.windows[chosen]?.setPoint ?? null))
    .filter((c) => c.confirm !== null && (draft.procedures[c.code] ?? "").trim() === "")
    .map((c) => c.code);

  const onExport = useExport(
    {
      plan,
      frozen,
      draft,
      inputs,
      problem,
      solution,
      model: map,
      trials: shownTrials,
      proposals,
      scale,
      data,
    },
    setSaid,
  );

  function restore(revision: RevisionRow) {
    dropDraft(plan.id);
    keepDraft(plan.id, { basedOn: plan.latest.number, inputs: revision.inputs, procedures: {} });
    void navigate(`/plans/${plan.id}`);
  }

  return (
    <AskingContext value={asking}>
      {ignored.length > 0 && (
        <Suspense fallback={null}>
          <IgnoredBanner ignored={ignored} onClose={() => setIgnored([])} />
        </Suspense>
      )}
      {frozen ? (
        <Suspense fallback={<div className="min-h-11 shrink-0 border-b border-ink" />}>
          <FrozenBanner
            {...frozen}
            plan={plan}
            onRestore={() => restore(frozen)}
            onCopyLink={link.copy}
            said={said}
            onSheet={() => onExport("sheet")}
            onComments={toggleTalk}
          />
        </Suspense>
      ) : proposal ? (
        <Suspense fallback={null}>
          <ProposalBanner
            plan={plan}
            mine={draft.inputs}
            unsaved={draft.changed}
            settings={proposal}
            onKeep={() => {
              edit(() => proposal);
              setProposal(null);
            }}
            onLeave={() => setProposal(null)}
          />
        </Suspense>
      ) : (
        <WorkspaceHeader
          plan={plan}
          draft={draft}
          mayWrite={mayWrite}
          said={said}
          onExport={onExport}
          onComments={toggleTalk}
          onOpen={setDialog}
          onCopyLink={link.copy}
        />
      )}
      <Sheet
        room={look.view.film ? FILM_ROOM : mapRoom(inputs.metals.length)}
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
          map && look.view.film ? (
            <Suspense fallback={<Loading label="Opening the filmstrip" />}>
              <Film
                wish={look.view.film}
                onWish={look.setFilm}
                {...{ inputs, data, setPoint }}
                metals={map.metals}
                edit={fixed ? undefined : edit}
              />
            </Suspense>
          ) : map ? (
            <MapPanel
              model={map}
              inputs={inputs}
              scale={scale}
              onPlain={setPlain}
              data={data}
              sight={sight}
              change={see}
              asText={asText}
              onAsText={(open) => changeLook({ asText: open })}
              limitStore={limitStore}
              cursor={cursor}
              onMoveSetPoint={mayMove ? moveSetPoint : undefined}
              onSettle={draft.settle}
              trials={shownTrials}
              proposals={proposing ? proposals : null}
              onFilm={() => void loadFilm().then(({ firstFilm }) => look.setFilm(firstFilm(inputs)))}
            />
          ) : null
        }
        answers={
          talking ? (
            <Suspense fallback={<Loading label="Opening the comments" />}>
              <CommentsPanel
                {...{ plan, solution, data, chosen, scale }}
                revision={frozen?.number ?? null}
                through={map?.through ?? null}
                onShow={look.setPinned}
                onClose={toggleTalk}
              />
            </Suspense>
          ) : (
            <AnswersOrTrials
              trials={layers.trials ? trials : null}
              scale={scale}
              next={
                solution &&
                count > 0 && (
                  <NextTrials
                    store={proposals}
                    plan={plan}
                    revision={frozen?.number ?? draft.basedOn}
                    unsaved={frozen === null && draft.changed}
                    {...{ inputs, solution, data, chosen, trials, scale }}
                    reaches={map?.reaches ?? []}
                    procedures={draft.procedures}
                  />
                )
              }
              shown={look.view.side}
              onShow={look.setSide}
            >
              {frozen === null && plan.dataOutdated && (
                <Suspense fallback={null}>
                  <DataChanged plan={plan} className="mb-3" />
                </Suspense>
              )}
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
                  analysis={analysis}
                  limitStore={limitStore}
                  freeAcid={freeAcid}
                  onApply={mayMove ? (opening) => edit(applyOpening(opening)) : undefined}
                  onInputs={mayMove ? edit : undefined}
                  onLetGo={mayMove ? () => edit(holdSetPoint(null)) : undefined}
                />
              )}
            </AnswersOrTrials>
          )
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
      {link.dialog}
    </AskingContext>
  );
}
