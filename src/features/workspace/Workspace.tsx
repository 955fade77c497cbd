import { useCallback, useMemo, useState } from "react";
import { cautionsFor, hazardContext } from "../../../shared/hazards/rules";
import type { PlanRow, RevisionRow } from "../../../shared/schemas/plan";
import type { Outline } from "../../../shared/solution";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { usePotentialScale } from "../../lib/potential";
import { useMay } from "../../lib/session";
import { printColours, useThemeColours } from "../../lib/theme";
import { CursorStore } from "../../map/cursorStore";
import { LimitStore } from "../../map/limitStore";
import { ProposalStore } from "../../map/proposalStore";
import { useTold } from "../../map/trialStore";
import { usePlanTrials } from "../trials/planTrials/usePlanTrials";
import type { Opened } from "./address/useOpened";
import { useLink } from "./address/useLink";
import { AnswersSide } from "./answers/AnswersSide";
import { AsksPanel } from "./asks/AsksPanel";
import { AskingContext } from "./asks/context";
import { GasLayers, PracticeList } from "./asks/GasLayers";
import { Dialogs, type DialogName } from "./header/Dialogs";
import { Top } from "./header/Top";
import type { Said } from "./header/WorkspaceHeader";
import { MapOrFilm } from "./map/MapOrFilm";
import { useAnswers } from "./model/useAnswers";
import { useExport } from "./model/useExport";
import { useLook } from "./model/useLook";
import { useMapModel } from "./model/useMapModel";
import { usePrinting } from "./model/usePrinting";
import { useSight } from "./model/useSight";
import { useTable } from "./model/useTable";
import { useWorkspaceKeys } from "./model/useWorkspaceKeys";
import { Sheet } from "./Sheet";

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
  const mayWrite = useMay("writePlans");
  const table = useTable(plan, frozen, data, start);
  const { draft, inputs, fixed } = table;
  const look = useLook(start.view, plan.id, inputs, table.proposal !== null);
  const answers = useAnswers(table, look);
  const { problem, solution, failure, window, chosen, robust, gases, freeAcid } = answers;

  const scale = usePotentialScale(inputs.temperatureC);
  const theme = useThemeColours();
  const printing = usePrinting();
  const { layers, setLayer, plain, setPlain } = look.map;
  const { sight, change: see } = useSight(inputs, look.view, look.change);
  const [limitStore] = useState(() => new LimitStore());
  const [cursor] = useState(() => new CursorStore());
  const [proposals] = useState(() => new ProposalStore());
  const proposing = useTold(proposals.asked) !== null;
  const trials = usePlanTrials(
    plan.id,
    inputs,
    solution,
    data,
    layers.trials || proposing,
    look.trials,
    look.lookAtTrials,
  );
  const drawnGases = useMemo(() => gases?.map.regions.filter((r) => gases.shown.has(r.gas)) ?? [], [gases]);
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
    reagents: look.reagents,
    // the same empty list at every step of a search, so that the map stands still meanwhile
    robust: robust.state === "there" ? robust.value.windows : NONE,
    gases: drawnGases,
    freeAcid,
  });

  const [dialog, setDialog] = useState<DialogName | null>(null);
  const [said, setSaid] = useState<Said | null>(null);
  const link = useLink(plan, frozen, inputs, look.seen, setSaid);
  const onExport = useExport(table, { problem, solution, model: map, trials: trials.shown, proposals, scale }, setSaid);
  const { comments } = look.view;
  const changeLook = look.change;
  const toggleComments = useCallback(() => changeLook({ comments: !comments }), [changeLook, comments]);
  useWorkspaceKeys(table, look, answers, see, {
    mayWrite,
    open: setDialog,
    copyLink: link.copy,
    comments: toggleComments,
  });

  const setPoint = window?.setPoint ?? null;
  const { edit, settle } = draft;
  const { focus, setFocus } = look;
  const asking = useMemo(
    () => ({
      inputs,
      edit,
      settle,
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
    [inputs, edit, settle, data, solution, failure, setPoint, scale, fixed, printing, focus, setFocus],
  );
  const unconfirmed = cautionsFor(hazardContext(inputs, setPoint))
    .filter((c) => c.confirm !== null && (draft.procedures[c.code] ?? "").trim() === "")
    .map((c) => c.code);

  return (
    <AskingContext value={asking}>
      <Top
        table={table}
        ignored={start.ignored}
        mayWrite={mayWrite}
        said={said}
        onUnsay={() => setSaid(null)}
        onExport={onExport}
        onComments={toggleComments}
        onOpen={setDialog}
        onCopyLink={link.copy}
      />
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
                {layers.hazard && gases && <GasLayers gases={gases} onChoose={answers.chooseGas} />}
              </>
            }
          />
        }
        map={
          map && (
            <MapOrFilm
              {...{ table, look, scale, sight, limitStore, cursor }}
              model={map}
              change={see}
              trials={trials.shown}
              proposals={proposing ? proposals : null}
            />
          )
        }
        answers={
          <AnswersSide
            {...{ table, answers, look, map, trials, scale, limitStore, proposals }}
            onCloseComments={toggleComments}
          />
        }
      />
      <Dialogs open={dialog} onOpen={setDialog} table={table} unconfirmed={unconfirmed} />
      {link.dialog}
    </AskingContext>
  );
}
