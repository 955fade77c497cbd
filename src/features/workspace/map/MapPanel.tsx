import { type ComponentType, lazy, Suspense, useCallback, useEffect, useId, useMemo, useState } from "react";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Frame } from "../../../../shared/schemas/problem";
import type { Point } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { namingOf } from "../../../../shared/windows/limitWords";
import { SpeciesName } from "../../../components/Formula";
import { MetalName } from "../../../components/MetalLine";
import { Loading } from "../../../components/status";
import { fixed } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import { solidsBasisWord } from "../../../lib/planWords";
import type { CursorStore } from "../../../map/cursorStore";
import type { LimitStore } from "../../../map/limitStore";
import type { ProposalStore } from "../../../map/proposalStore";
import { ReadOut } from "../../../map/ReadOut";
import type { ShownTrials } from "../../../map/TrialsLayer";
import { drawnMetals, windowName } from "../../../map/view";
import type { WindowMapProps } from "../../../map/WindowMap";
import type { MapModel } from "../model/useMapModel";
import type { SightInHand } from "../model/useSight";
import { MapAsText } from "./MapAsText";
import { differences } from "./mapText";
import { MapTools, ZoomTools } from "./MapTools";
import { namedLimits } from "./namedLimits";

const loadMap = () => import("../../../map/WindowMap");
const LateMap = lazy(loadMap);
let map: ComponentType<WindowMapProps> = LateMap;
// The map comes in while the plan and the chemistry are read, and is then drawn with the rest at once, without a picture of the page
// around it first. A failure shows when it is due.
loadMap().then(
  (module) => (map = module.default),
  () => undefined,
);

export interface MapPanelProps extends SightInHand {
  /** one setting varied, in place of the map */
  onFilm: () => void;
  model: MapModel;
  inputs: PlanInputs;
  data: ChemicalData;
  scale: PotentialScale;
  onPlain: (plain: boolean) => void;
  /** the map stands as text */
  asText: boolean;
  onAsText: (open: boolean) => void;
  cursor: CursorStore;
  limitStore: LimitStore;
  /** moves the set point by hand; absent where the plan is only looked at */
  onMoveSetPoint?: ((at: Point) => void) | undefined;
  onSettle: () => void;
  trials: ShownTrials | null;
  /** null while nobody asked */
  proposals: ProposalStore | null;
}

/** The middle: what stands under the cursor, the tools of the map, and the map. */
export function MapPanel(props: MapPanelProps) {
  const {
    model,
    inputs,
    data,
    scale,
    onPlain,
    sight,
    change,
    asText,
    onAsText,
    cursor,
    limitStore,
    onMoveSetPoint,
    onSettle,
    trials,
    proposals,
  } = props;
  const { asked, view, metals, through } = model;
  const { solution } = asked;
  const { plain, window: chosen } = view;
  const [moving, setMoving] = useState(false);
  const [Map] = useState(() => map);
  const textId = useId();
  const window = solution.windows[chosen];
  const setPoint = window?.setPoint;
  const naming = useMemo(() => namingOf(data, solution), [data, solution]);
  const limits = useMemo(() => namedLimits(window, naming, inputs.controlBand), [window, naming, inputs.controlBand]);
  // Another window's limit of the same words is another limit.
  useEffect(() => limitStore.named.set(null), [limitStore, chosen]);
  const inWords = useMemo(
    () => ({ solution, metals, scale, band: inputs.controlBand, naming, chosen, through, sight }),
    [solution, metals, scale, inputs.controlBand, naming, chosen, through, sight],
  );
  const drawn = useMemo(() => drawnMetals(view), [view]);
  const onSight = useCallback((zoom: Frame | null) => change({ zoom }), [change]);
  const onPick = useCallback((pinned: Point | null) => change({ pinned }), [change]);
  const several = solution.windows.length > 1 ? ` ${windowName(chosen)}` : "";
  const where = setPoint ? `at the set point${several}` : "in the middle of the frame";
  return (
    <div className="flex min-h-0 flex-1 flex-col">
      <div className="px-4 pt-2">
        <div className="float-right ml-3">
          <MapTools
            onFilm={props.onFilm}
            sight={sight}
            change={change}
            metals={metals}
            plain={plain}
            onPlain={onPlain}
            asText={asText}
            onAsText={onAsText}
          />
        </div>
        <ReadOut
          store={cursor}
          solution={solution}
          metals={drawn}
          all={metals}
          scale={scale}
          rest={{ at: through, words: where }}
          freeAcid={asked.freeAcid ?? null}
          trust={view.trust}
        />
        {sight.pinned && (
          <PinnedLine differs={differences(solution, metals, through, sight.pinned)} at={sight.pinned} scale={scale} />
        )}
      </div>
      {!asText && (
        <ZoomTools
          sight={sight}
          change={change}
          frame={view.frame}
          through={through}
          moving={moving}
          onMoving={setMoving}
        />
      )}
      <div className="relative min-h-0 flex-1 px-2 pb-2">
        <MapAsText id={textId} open={asText} asked={inWords} />
        <Suspense fallback={<Loading label="Opening the map" />}>
          <Map
            asked={asked}
            view={view}
            onSight={onSight}
            dragMode={moving ? "pan" : "zoom"}
            cursor={cursor}
            onPick={onPick}
            trials={trials}
            proposals={proposals}
            limits={limits}
            limitStore={limitStore}
            handle={
              setPoint && onMoveSetPoint
                ? {
                    at: [setPoint.pH, setPoint.Eh],
                    label: `Set point, pH ${fixed(setPoint.pH, 2)}, ${scale.format(setPoint.Eh)}, margin ${fixed(setPoint.margin, 1)} control bands`,
                    onMove: onMoveSetPoint,
                    onSettle,
                  }
                : null
            }
            describedBy={textId}
            label={`Window map of ${metals.map((m) => m.element).join(", ")}, solids ${solidsBasisWord[inputs.solidsBasis]}. Arrow keys move the cursor, plus and minus zoom, Home shows the whole frame, Enter pins a second pair of crosscuts there, Escape lets go.`}
          />
        </Suspense>
      </div>
    </div>
  );
}

/** What is otherwise at the pinned point. */
function PinnedLine({
  differs,
  at,
  scale,
}: {
  differs: ReturnType<typeof differences>;
  at: Point;
  scale: PotentialScale;
}) {
  return (
    <p className="flex flex-wrap gap-x-3 text-sm" data-testid="pinned-line">
      <span className="font-mono whitespace-nowrap">
        pinned pH {fixed(at[0], 2)}, {scale.format(at[1])}
      </span>
      {differs.length === 0 ? (
        <span className="text-muted">every metal is the same there</span>
      ) : (
        differs.map(({ metal, there, turns }) => (
          <span key={metal.element} className="whitespace-nowrap">
            <MetalName {...metal} />{" "}
            <span className={turns ? "font-bold" : undefined}>
              <SpeciesName id={there} withPhase />
            </span>
          </span>
        ))
      )}
    </p>
  );
}
