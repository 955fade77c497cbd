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
  frame: Frame;
  through: Point;
  plain: boolean;
  onPlain: (plain: boolean) => void;
  moving: boolean;
  onMoving: (moving: boolean) => void;
  asText: boolean;
  onAsText: (open: boolean) => void;
  /** one setting varied, in place of the map */
  onFilm: () => void;
}

/** Words over the map: which metals are drawn, what is in sight, and the map as text. */
export function MapTools(props: MapToolsProps) {
  const { sight, change, metals, frame, through, plain, onPlain, moving, onMoving, asText, onAsText } = props;
  const button = useRef<HTMLButtonElement>(null);
  const { Part: Sheet, failed, open, close, near } = useLate(loadSheet);
  const view = { hidden: new Set(sight.hidden), pair: sight.pair };
  const drawn = metals.filter((m) => isDrawn(m.element, view)).length;
  const zoom = (factor: number) => change({ zoom: zoomedRound(through, factor, sight.zoom ?? frame, frame) });
  return (
    <div className="no-print flex shrink-0 flex-col items-end gap-1 text-sm">
      <div className="flex gap-x-3">
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
        <Word onClick={() => onPlain(!plain)} title="Key f">
          {plain ? "shut and open ground" : "all fields"}
        </Word>
      </div>
      <div className="flex gap-x-3" role="group" aria-label="What is in sight">
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
    </div>
  );
}

const word =
  "leading-none underline decoration-rule underline-offset-4 hover:decoration-ink disabled:text-muted disabled:no-underline [@media(pointer:coarse)]:min-h-8 [@media(pointer:coarse)]:min-w-8";

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
