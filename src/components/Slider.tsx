import { Slider as Radix } from "radix-ui";
import type { ReactNode } from "react";
import { classes } from "../lib/classes";
import { inputTextExact, withUnit } from "../lib/format";
import { NumberField } from "./NumberField";

interface SliderBase {
  label: string;
  labelText?: ReactNode;
  value: number;
  min: number;
  max: number;
  /** runs along while the thumb is dragged */
  onChange: (value: number) => void;
  /** once, when the hand lets go or a number is typed: the place for a step of undo */
  onCommit?: (value: number) => void;
  unit?: string;
  /** what a number without a unit is */
  noun?: string;
  show?: (value: number) => string;
  hint?: ReactNode;
  readOnly?: boolean;
  /** width of the number in characters */
  width?: number;
  className?: string;
}

export interface SliderProps extends SliderBase {
  step?: number;
  /** marked by a short line under the track */
  marks?: number[];
}

export interface LogSliderProps extends SliderBase {
  /** thumb positions a decade */
  stepsPerDecade?: number;
  /** what may be typed, where it is wider than the track; above 0 by default */
  typedMax?: number;
}

/** A quantity on an even scale: label and number above, track below. Both ends of the track say where they stand. */
export function Slider({ step = 1, marks = [], ...p }: SliderProps) {
  return (
    <div className={classes("hairline pb-2", p.className)}>
      <Entry {...p} step={step} min={p.min} max={p.max} />
      {!p.readOnly && (
        <Track
          label={p.label}
          position={p.value}
          low={p.min}
          high={p.max}
          step={step}
          marks={marks}
          said={withUnit((p.show ?? inputTextExact)(p.value), p.unit)}
          onMove={(x) => p.onChange(tidy(x))}
          onRest={(x) => p.onCommit?.(tidy(x))}
        />
      )}
    </div>
  );
}

const tidy = (x: number) => Number(x.toPrecision(10));
/** The nearest thumb position: from one between two, a key would only go to its neighbour, whose two figures may be the same. */
const onGrid = (x: number, low: number, high: number, step: number) =>
  tidy(Math.min(high, Math.max(low, low + Math.round((x - low) / step) * step)));
/** a dragged activity has two figures, as its label shows */
const antilog = (x: number) => Number((10 ** x).toPrecision(2));

/** A positive quantity on a log10 scale: a mark a decade, the number typed or dragged. */
export function LogSlider({ stepsPerDecade = 20, typedMax, ...p }: LogSliderProps) {
  const low = Math.log10(p.min);
  const high = Math.log10(p.max);
  const marks = Array.from({ length: Math.floor(high) - Math.ceil(low) + 1 }, (_, i) => Math.ceil(low) + i);
  return (
    <div className={classes("hairline pb-2", p.className)}>
      <Entry {...p} above={0} max={typedMax ?? p.max} factor={10 ** (1 / stepsPerDecade)} />
      {!p.readOnly && (
        <Track
          label={p.label}
          position={onGrid(Math.log10(p.value), low, high, 1 / stepsPerDecade)}
          low={low}
          high={high}
          step={1 / stepsPerDecade}
          marks={marks}
          said={withUnit((p.show ?? inputTextExact)(p.value), p.unit)}
          onMove={(x) => p.onChange(antilog(x))}
          onRest={(x) => p.onCommit?.(antilog(x))}
        />
      )}
    </div>
  );
}

function Entry(p: SliderBase & { min?: number; above?: number; step?: number; factor?: number }) {
  const {
    label,
    labelText,
    value,
    onChange,
    onCommit,
    unit,
    noun,
    min,
    max,
    above,
    step,
    factor,
    show,
    hint,
    readOnly,
  } = p;
  return (
    <NumberField
      className="border-b-0!"
      {...{ label, labelText, value, unit, noun, max, show, hint, readOnly, width: p.width ?? 9 }}
      {...(above === undefined ? { min } : { above })}
      {...(factor === undefined ? { step } : { factor })}
      onCommit={(x) => {
        onChange(x);
        onCommit?.(x);
      }}
    />
  );
}

interface TrackProps {
  label: string;
  position: number;
  low: number;
  high: number;
  step: number;
  marks: number[];
  /** the value as spoken */
  said: string;
  onMove: (position: number) => void;
  onRest: (position: number) => void;
}

function Track({ label, position, low, high, step, marks, said, onMove, onRest }: TrackProps) {
  return (
    <Radix.Root
      className="relative flex h-5 w-full pointer-coarse:h-11 touch-none items-center select-none"
      value={[position]}
      min={low}
      max={high}
      step={step}
      onValueChange={([x]) => x !== undefined && onMove(x)}
      onValueCommit={([x]) => x !== undefined && onRest(x)}
    >
      <Radix.Track className="relative h-1 w-full bg-rule">
        {marks.map((mark) => (
          <span
            key={mark}
            aria-hidden
            className="absolute top-1 h-1 w-px bg-muted"
            style={{ left: `${(100 * (mark - low)) / (high - low)}%` }}
          />
        ))}
      </Radix.Track>
      <Radix.Thumb
        aria-label={`${label}, slider`}
        aria-valuetext={said}
        className="block h-4 w-2 rounded-sm bg-verdigris pointer-coarse:h-7 pointer-coarse:w-4"
      />
    </Radix.Root>
  );
}
