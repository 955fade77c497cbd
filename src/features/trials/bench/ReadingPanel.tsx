import { useState } from "react";
import { Dialog } from "../../../components/Dialog";
import { fixed, withUnit } from "../../../lib/format";
import { electrodeName, electrodeOptions } from "../model/electrodes";
import { orpOf } from "../model/orp";
import { useRecording } from "../record/context";
import { BigButton, BigField } from "./BigField";
import {
  benchProblems,
  hasText,
  pHSaid,
  placeSaid,
  readingIn,
  stepFromLast,
  temperatureSaid,
  typed,
  type BenchField,
  type Said,
} from "./benchModel";
import type { BenchForm, FilledForm } from "./benchShelf";
import { elapsed } from "./elapsed";
import { Keypad } from "./Keypad";

interface ReadingPanelProps {
  form: FilledForm;
  /** the electrode's temperature is that of the last reading: the first key types anew */
  carried: boolean;
  change: (part: Partial<BenchForm>) => void;
  /** since the start, now */
  minutes: number | null;
  busy: boolean;
  onKeep: () => void;
}

/** pH, ORP and temperature in big digits; what they mean stands under them before they are kept. */
export function ReadingPanel({ form, carried, change, minutes, busy, onKeep }: ReadingPanelProps) {
  const { values, electrodes, solved } = useRecording();
  const [field, setField] = useState<BenchField>("pH");
  const [pressed, setPressed] = useState(false);
  const [choosing, setChoosing] = useState(false);
  const { readings } = values.measured;
  const reading = readingIn(form, minutes, readings.at(-1)?.at.unit);
  const problems = benchProblems(reading);
  const shown = (name: BenchField) =>
    problems[name] !== undefined && (pressed || (name !== field && hasText(form[name]))) ? problems[name] : undefined;
  const orp = orpOf(reading, electrodes);
  const said = placeSaid(reading, values, electrodes, solved);
  const order: BenchField[] = form.cooled
    ? ["pH", "pHTemperature", "orp", "electrodeTemperature", "temperature", "at"]
    : ["pH", "orp", "electrodeTemperature", "temperature", "at"];
  const go = (name: BenchField) => {
    setField(name);
    document.querySelector<HTMLInputElement>(`[data-bench="${name}"]`)?.focus();
  };
  const next = () => go(order[(order.indexOf(field) + 1) % order.length] ?? "pH");
  const keep = () => {
    setPressed(true);
    if (Object.keys(problems).length > 0) return;
    setPressed(false);
    onKeep();
    go("pH");
  };
  const big = (name: BenchField, label: string, more: Partial<Parameters<typeof BigField>[0]> = {}) => (
    <BigField
      name={name}
      label={label}
      value={form[name]}
      onChange={(text) => change({ [name]: text })}
      onFocus={() => setField(name)}
      onEnter={name === order.at(-1) ? keep : next}
      active={field === name}
      error={shown(name)}
      {...more}
    />
  );
  const orpWords: Said | null =
    orp.kind === "read"
      ? {
          text: `= ${withUnit(fixed(orp.point.Eh, 3), "V")} vs SHE${orp.point.EhUncertainty > 0 ? ` ±${withUnit(fixed(orp.point.EhUncertainty * 1000, 0), "mV")}` : ""}`,
          tone: "quiet",
        }
      : orp.kind === "open"
        ? { text: orp.why, tone: "bad" }
        : null;
  const step = stepFromLast(reading, readings, electrodes);
  return (
    <>
      {/* Wide: pH and ORP side by side, so that the whole question stands above the fold. */}
      <div className="grid content-start gap-3 lg:grid-cols-2">
        <div className="space-y-3">
          {big("pH", "pH", {
            aside: form.cooled ? "of a cooled sample" : "in the pulp",
            said: [pHSaid(form, readings), said?.held ?? null, said?.place ?? null],
          })}
          <div className="grid grid-cols-2 gap-3">
            <BigButton pressed={form.cooled} onClick={() => change({ cooled: !form.cooled })}>
              Cooled sample
            </BigButton>
            {form.cooled ? (
              big("pHTemperature", "Its temperature", { unit: "°C" })
            ) : (
              <p className="self-center text-sm text-muted">
                A pH is kept as read, with the temperature it was read at.
              </p>
            )}
          </div>
        </div>
        <div className="space-y-3">
          {big("orp", "ORP as read", {
            unit: "mV",
            aside: electrodeName(electrodes, form.electrode),
            said: [orpWords, step === null ? null : { text: step, tone: "quiet" }],
            error: shown("orp") ?? (pressed || hasText(form.orp) ? problems.electrode : undefined),
          })}
          <div className="grid grid-cols-2 gap-3">
            <BigButton onClick={() => setChoosing(true)}>
              {form.electrode === null ? "Choose the electrode" : "Other electrode"}
            </BigButton>
            {big("electrodeTemperature", "Electrode at", { unit: "°C", placeholder: "as the pulp" })}
          </div>
        </div>
        <div className="grid grid-cols-2 gap-3 lg:col-span-2">
          {big("temperature", "Pulp temperature", { unit: "°C", said: [temperatureSaid(form, values)] })}
          {big("at", "Minutes since the start", {
            unit: "min",
            placeholder: minutes === null ? "" : String(minutes),
            said: [
              {
                text: minutes === null ? "not started" : form.at === "" ? "now" : `now it is ${elapsed(minutes)}`,
                tone: "quiet",
              },
            ],
          })}
        </div>
        {pressed && problems.none !== undefined && (
          <p role="alert" className="text-base font-bold text-signal lg:col-span-2">
            {problems.none}
          </p>
        )}
      </div>
      <div>
        <Keypad
          onKey={(key) => {
            const anew = field === "electrodeTemperature" && carried && key !== "delete";
            change({ [field]: typed(anew ? "" : form[field], key) });
          }}
          onNext={next}
        />
        <BigButton primary className="mt-2 min-h-[76px] w-full text-[21px]!" disabled={busy} onClick={keep}>
          Keep reading
        </BigButton>
      </div>
      <Dialog open={choosing} onOpenChange={setChoosing} title="Which electrode was it read against?" width={560}>
        <div className="grid gap-2">
          {electrodeOptions(electrodes).map(({ value, label }) => (
            <BigButton
              key={value}
              pressed={value === form.electrode}
              className="text-left!"
              onClick={() => {
                change({ electrode: value });
                setChoosing(false);
              }}
            >
              {label}
            </BigButton>
          ))}
        </div>
      </Dialog>
    </>
  );
}
