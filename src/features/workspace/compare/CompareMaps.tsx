import { lazy, Suspense, useMemo, useState } from "react";
import type { GroundDifference } from "../../../../shared/compare/ground";
import type { Frame } from "../../../../shared/schemas/problem";
import type { Point } from "../../../../shared/solution";
import { Segmented } from "../../../components/choice";
import { Loading } from "../../../components/status";
import { classes } from "../../../lib/classes";
import type { PotentialScale } from "../../../lib/potential";
import { CursorStore } from "../../../map/cursorStore";
import { ReadOut } from "../../../map/ReadOut";
import { differenceTraces } from "./overlay";
import type { Side, SolvedSide } from "./sides";

const WindowMap = lazy(() => import("../../../map/WindowMap"));
const nothing = () => undefined;

export type ShownMap = "a" | "b" | "difference";

interface Props {
  a: { side: Side; solved: SolvedSide };
  b: { side: Side; solved: SolvedSide };
  difference: GroundDifference | null;
  scale: PotentialScale;
  zoom: Frame | null;
  onZoom: (to: Frame | null) => void;
  /** the one seen where there is room for one */
  shown: ShownMap;
  onShow: (map: ShownMap) => void;
}

const middle = (f: Frame): Point => [(f.pH[0] + f.pH[1]) / 2, (f.Eh[0] + f.Eh[1]) / 2];

/** Both window maps and the map of their difference, on the axes of A, with one zoom and one cursor. Wide: all three; tablet: one at a time. */
export function CompareMaps({ a, b, difference, scale, zoom, onZoom, shown, onShow }: Props) {
  const [cursor] = useState(() => new CursorStore());
  const one = a.solved.model;
  const two = b.solved.model;
  const frame = one?.view.frame;
  const third = useMemo(() => {
    if (!one || !two || !difference) return null;
    const solution = { ...one.asked.solution, windows: [], shut: [], fields: [] };
    const heats = [...new Set([solution.temperatureC, two.asked.solution.temperatureC])];
    const of = ({ solved }: Props["a"]) => ({
      windows: solved.solution?.windows ?? [],
      setPoint: solved.window?.setPoint ?? null,
    });
    return {
      asked: { ...one.asked, solution, temperatures: heats, metals: [], other: null },
      view: { ...one.view, layers: { ...one.view.layers, setPoint: false } },
      overlay: differenceTraces(difference, of(a), of(b), one.view),
    };
  }, [one, two, difference, a, b]);
  const drawn = (side: Props["a"], letter: "A" | "B") => {
    const { model, window, failure } = side.solved;
    if (!model || !frame) return <p role="alert">{failure?.message ?? "This cannot be solved."}</p>;
    const at: Point = window ? [window.setPoint.pH, window.setPoint.Eh] : middle(frame);
    return (
      <>
        <div className="px-4 pt-2">
          <h2 className="float-left mr-3 font-mono text-sm font-bold">
            {letter}
            <span className="ml-2 font-sans font-normal text-muted">{side.side.name}</span>
          </h2>
          <ReadOut
            store={cursor}
            solution={model.asked.solution}
            metals={model.metals}
            scale={scale}
            rest={{ at, words: window ? "at its set point" : "in the middle of the frame" }}
            trust={model.view.trust}
          />
        </div>
        <div className="min-h-0 flex-1 px-2 pb-1">
          <Suspense fallback={<Loading label="Opening the map" />}>
            <WindowMap
              asked={model.asked}
              view={{ ...model.view, frame, visible: zoom ?? frame }}
              cursor={cursor}
              onPick={nothing}
              onSight={onZoom}
              label={`Window map of ${letter}, ${side.side.name}`}
            />
          </Suspense>
        </div>
      </>
    );
  };
  const cell = (map: ShownMap) =>
    classes("flex min-h-0 min-w-0 flex-col border-rule lg:flex", shown === map ? "flex" : "hidden");
  return (
    <>
      <div className="no-print border-b border-rule px-5 py-1.5 lg:hidden">
        <Segmented
          label="Map shown"
          value={shown}
          onChange={onShow}
          options={[
            { value: "a", label: "A" },
            { value: "b", label: "B" },
            { value: "difference", label: "difference" },
          ]}
        />
      </div>
      <div className={classes(cell("a"), "h-[460px] lg:h-auto lg:border-r lg:border-b")}>{drawn(a, "A")}</div>
      <div className={classes(cell("b"), "h-[460px] lg:h-auto lg:border-b")}>{drawn(b, "B")}</div>
      <div className={classes(cell("difference"), "h-[460px] lg:h-auto lg:border-r")}>
        <div className="flex flex-wrap items-baseline gap-x-4 px-4 pt-2 text-sm">
          <h2 className="font-mono text-sm font-bold">Difference</h2>
          <Key className="bg-tint" words="kept" />
          <Key className="hatch-gained" words="gained by B" />
          <Key className="hatch-lost" words="lost" />
          <span className="text-muted">dashed: border of A; open ring: its set point</span>
        </div>
        <div className="min-h-0 flex-1 px-2 pb-1">
          {third && (
            <Suspense fallback={<Loading label="Opening the map" />}>
              <WindowMap
                asked={third.asked}
                view={{ ...third.view, visible: zoom ?? third.view.frame }}
                overlay={third.overlay}
                cursor={cursor}
                onPick={nothing}
                onSight={onZoom}
                label="Open ground of A and B laid over each other: kept, gained and lost"
              />
            </Suspense>
          )}
        </div>
      </div>
    </>
  );
}

const lines = (angle: number, colour: string) =>
  `repeating-linear-gradient(${angle}deg, transparent 0 3px, var(--color-${colour}) 3px 4px)`;
const fills: Readonly<Record<string, string>> = {
  "hatch-gained": lines(135, "verdigris"),
  "hatch-lost": lines(45, "ink"),
};

function Key({ className, words }: { className: string; words: string }) {
  return (
    <span className="inline-flex items-baseline gap-1.5 whitespace-nowrap">
      <span
        aria-hidden
        className={classes("relative top-px inline-block h-2.5 w-5 border border-ink", className)}
        style={fills[className] ? { backgroundImage: fills[className] } : undefined}
      />
      {words}
    </span>
  );
}
