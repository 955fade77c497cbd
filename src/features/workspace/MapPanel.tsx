import { lazy, Suspense } from "react";
import type { PlanInputs } from "../../../shared/schemas/plan";
import type { Frame } from "../../../shared/schemas/problem";
import type { Point } from "../../../shared/solution";
import { Button } from "../../components/Button";
import { Loading } from "../../components/status";
import { fixed } from "../../lib/format";
import type { PotentialScale } from "../../lib/potential";
import { solidsBasisWord } from "../../lib/planWords";
import type { CursorStore } from "../../map/cursorStore";
import { ReadOut } from "../../map/ReadOut";
import type { ProposalStore } from "../../map/proposalStore";
import type { ShownTrials } from "../../map/TrialsLayer";
import { windowName } from "../../map/view";
import type { MapModel } from "./model/useMapModel";

const loadMap = () => import("../../map/WindowMap");
const WindowMap = lazy(loadMap);
// Plotly is the largest file there is: it comes in while the plan and the chemistry are read. A failure shows when the map is due.
void loadMap().catch(() => undefined);

export interface MapPanelProps {
  model: MapModel;
  inputs: PlanInputs;
  scale: PotentialScale;
  onPlain: (plain: boolean) => void;
  onFocus: (element: string | null) => void;
  pinned: Point | null;
  onPin: (at: Point | null) => void;
  cursor: CursorStore;
  /** moves the set point by hand; absent where the plan is only looked at */
  onMoveSetPoint?: ((at: Point) => void) | undefined;
  onSettle: () => void;
  trials: ShownTrials | null;
  /** null while nobody asked */
  proposals: ProposalStore | null;
  /** what is in sight; null: the whole frame */
  zoom: Frame | null;
  onZoom: (to: Frame | null) => void;
}

/** The middle: what stands under the cursor, and the map. */
export function MapPanel(props: MapPanelProps) {
  const { model, inputs, scale, onPlain, onFocus, pinned, onPin, cursor, onMoveSetPoint, onSettle, trials, proposals } =
    props;
  const { asked, view, metals, through } = model;
  const { solution } = asked;
  const { plain, focus, window: chosen } = view;
  const hasWindow = solution.windows.length > 0;
  const setPoint = solution.windows[chosen]?.setPoint;
  const where = pinned
    ? "at the pinned point"
    : hasWindow
      ? `at the set point of window ${windowName(chosen)}`
      : "in the middle of the frame";
  return (
    <div className="flex min-h-0 flex-1 flex-col">
      <div className="flex items-start gap-3 px-4 pt-2">
        <div className="min-w-0 flex-1">
          <ReadOut
            store={cursor}
            solution={solution}
            metals={metals}
            scale={scale}
            rest={{ at: through, words: where }}
            freeAcid={asked.freeAcid ?? null}
          />
        </div>
        <div className="no-print flex shrink-0 gap-3 leading-none">
          {pinned && (
            <Button kind="quiet" className="h-auto!" onClick={() => onPin(null)}>
              {hasWindow ? "back to the set point" : "unpin"}
            </Button>
          )}
          {focus !== null && (
            <Button kind="quiet" className="h-auto!" onClick={() => onFocus(null)}>
              all metals
            </Button>
          )}
          <Button kind="quiet" className="h-auto!" title="Key f" onClick={() => onPlain(!plain)}>
            {plain ? "shut and open ground" : "all fields"}
          </Button>
        </div>
      </div>
      <div className="min-h-0 flex-1 px-2 pb-2">
        <Suspense fallback={<Loading label="Opening the map" />}>
          <WindowMap
            asked={asked}
            view={view}
            cursor={cursor}
            onPick={onPin}
            trials={trials}
            proposals={proposals}
            zoom={props.zoom}
            onZoom={props.onZoom}
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
            label={`Window map of ${metals.map((m) => m.element).join(", ")}, solids ${solidsBasisWord[inputs.solidsBasis]}. Arrow keys move the cursor, Enter pins the crosscuts there, Escape lets go.`}
          />
        </Suspense>
      </div>
    </div>
  );
}
