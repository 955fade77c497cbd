import { useRef, type ReactNode } from "react";
import type { Frame } from "../../../../shared/schemas/problem";
import type { Point } from "../../../../shared/solution";
import { classes } from "../../../lib/classes";
import { lateFailure, useLate } from "../../../components/useLate";
import { type MapMetal, isDrawn } from "../../../map/view";
import { zoomedRound } from "../../../map/zoom";
import type { SightInHand } from "../model/useSight";

const loadSheet = () => import("./MetalsSheet");

export interface MapToolsProps extends SightInHand {
  metals: readonly MapMetal[];
  plain: boolean;
  onPlain: (plain: boolean) => void;
  asText: boolean;
  onAsText: (open: boolean) => void;
  /** one setting varied, in place of the map */
  onFilm: () => void;
}

/** Words over the map: which metals are drawn, which view of it, and the map as text. */
export function MapTools(props: MapToolsProps) {
  const { sight, change, metals, plain, onPlain, asText, onAsText } = props;
  const button = useRef<HTMLButtonElement>(null);
  const { Part: Sheet, failed, open, close, near } = useLate(loadSheet);
  const view = { hidden: new Set(sight.hidden), pair: sight.pair };
  const drawn = metals.filter((m) => isDrawn(m.element, view)).length;
  return (
    <div className="no-print flex shrink-0 gap-x-3 text-sm">
      <button
        ref={button}
        type="button"
        aria-haspopup="dialog"
        aria-expanded={Sheet !== null}
        className={word}
        title={failed ? lateFailure : "Hide metals, or compare two"}
        onClick={Sheet ? close : open}
        {...near}
      >
        {sight.pair
          ? sight.pair.join(" with ")
          : drawn < metals.length
            ? `${drawn} of ${metals.length} metals`
            : "metals"}
      </button>
      {Sheet && <Sheet anchor={button} onClose={close} metals={metals} sight={sight} change={change} />}
      {sight.focus !== null && <Word onClick={() => change({ focus: null })}>all metals</Word>}
      {sight.pinned && <Word onClick={() => change({ pinned: null })}>unpin</Word>}
      <Word onClick={() => onAsText(!asText)} pressed={asText}>
        {asText ? "as a map" : "as text"}
      </Word>
      <Word onClick={props.onFilm} title="One setting varied: small maps and curves">
        what if
      </Word>
      <Word
        onClick={() => onPlain(!plain)}
        title={plain ? "Shut ground hatched, open ground lit: key f" : "Every field named, nothing hatched: key f"}
      >
        {plain ? "open ground" : "all fields"}
      </Word>
    </div>
  );
}

export interface ZoomToolsProps extends SightInHand {
  frame: Frame;
  through: Point;
  moving: boolean;
  onMoving: (moving: boolean) => void;
}

/** What part of the map is in sight: a line of its own in the margin over the plot, so that it never pushes the read-out about. */
export function ZoomTools({ sight, change, frame, through, moving, onMoving }: ZoomToolsProps) {
  const zoom = (factor: number) => change({ zoom: zoomedRound(through, factor, sight.zoom ?? frame, frame) });
  return (
    <div
      className="no-print relative z-10 -mb-3.5 ml-[70px] flex w-max gap-x-3 text-sm"
      role="group"
      aria-label="What is in sight"
    >
      <Word
        onClick={() => change({ zoom: null })}
        disabled={sight.zoom === null}
        title="Home, or a double click on the map"
      >
        whole frame
      </Word>
      <Word onClick={() => onMoving(!moving)} pressed={moving} title="A drag moves the map in place of zooming in">
        move
      </Word>
      <Word onClick={() => zoom(1 / 0.7)} disabled={sight.zoom === null} label="Zoom out" title="Key − on the map">
        −
      </Word>
      <Word onClick={() => zoom(0.7)} label="Zoom in" title="Key + on the map">
        +
      </Word>
    </div>
  );
}

const word =
  "leading-none whitespace-nowrap underline decoration-rule underline-offset-4 hover:decoration-ink disabled:text-muted disabled:no-underline pointer-coarse:min-h-11 pointer-coarse:min-w-11";

function Word({
  children,
  label,
  pressed,
  title,
  disabled = false,
  onClick,
}: {
  children: ReactNode;
  label?: string;
  pressed?: boolean;
  title?: string;
  disabled?: boolean;
  onClick: () => void;
}) {
  return (
    <button
      type="button"
      aria-label={label}
      aria-pressed={pressed}
      title={title}
      disabled={disabled}
      onClick={onClick}
      className={classes(word, pressed && "font-bold decoration-verdigris!", label && "w-4 font-mono")}
    >
      {children}
    </button>
  );
}
