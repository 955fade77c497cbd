import { useState } from "react";
import { refusalOf } from "../../../../shared/schemas/entry";
import type { Dose, Sample } from "../../../../shared/schemas/trialRecord";
import { Formula } from "../../../components/Formula";
import { nextDose, nextSample } from "../model/trialValues";
import { useRecording } from "../record/context";
import { BigButton, BigField } from "./BigField";
import { hasText, typed } from "./benchModel";
import type { BenchForm } from "./benchShelf";
import { elapsed, timeEntry } from "./elapsed";
import { Keypad } from "./Keypad";

interface TaskProps {
  form: BenchForm;
  change: (part: Partial<BenchForm>) => void;
  minutes: number | null;
  busy: boolean;
}

const reasons = ["pH control", "ORP control", "top-up", "initial"] as const;

/** What was added, how much, why: the reagent and its strength go on from the dose before. */
export function DosePanel({ form, change, minutes, busy, onKeep }: TaskProps & { onKeep: (dose: Dose) => void }) {
  const { values } = useRecording();
  const known = [...values.measured.doses, ...values.planned.doses];
  const reagents = known.filter((d, i) => known.findIndex((o) => o.reagent === d.reagent) === i);
  const [picked, setPicked] = useState<string | null>(null);
  const [reason, setReason] = useState<string>("pH control");
  const [unit, setUnit] = useState<string | null>(null);
  const [pressed, setPressed] = useState(false);
  const base =
    known.findLast(({ reagent }) => reagent === picked) ??
    known.at(-1) ??
    ({ ...nextDose([]), role: "acid", reagent: "H2SO4" } satisfies Dose);
  const amount = { text: form.amount, unit: unit ?? base.amount.unit };
  const problem = refusalOf(amount, "amount") ?? (hasText(form.amount) ? null : "How much was added?");
  const keep = () => {
    setPressed(true);
    if (problem !== null) return;
    onKeep({ ...base, amount, at: timeEntry(form.at, minutes, values.measured.doses.at(-1)?.at.unit), reason });
  };
  return (
    <>
      <div className="space-y-3">
        <div className="flex flex-wrap gap-2">
          {(reagents.length > 0 ? reagents : [base]).map(({ reagent }) => (
            <BigButton key={reagent} pressed={reagent === base.reagent} onClick={() => setPicked(reagent)}>
              <Formula formula={reagent} />
            </BigButton>
          ))}
        </div>
        <BigField
          name="amount"
          label="Amount"
          aside={
            hasText(base.strength.text)
              ? `${base.strength.text} ${base.strength.unit}`
              : "pure, unless the record says otherwise"
          }
          unit={amount.unit}
          value={form.amount}
          onChange={(text) => change({ amount: text })}
          onFocus={() => undefined}
          onEnter={keep}
          active
          error={pressed && problem !== null ? problem : undefined}
        />
        <div className="grid grid-cols-4 gap-2">
          {["g", "kg", "mL", "L"].map((u) => (
            <BigButton key={u} pressed={u === amount.unit} onClick={() => setUnit(u)}>
              {u}
            </BigButton>
          ))}
        </div>
        <div className="grid grid-cols-2 gap-2">
          {reasons.map((why) => (
            <BigButton key={why} pressed={why === reason} onClick={() => setReason(why)}>
              {why}
            </BigButton>
          ))}
        </div>
        <p className="text-base text-muted">
          {minutes === null ? "Not started: the time stays empty." : `At ${elapsed(minutes)}.`} Another reagent is
          entered at the desk, with its strength.
        </p>
      </div>
      <div>
        <Keypad onKey={(key) => change({ amount: typed(form.amount, key) })} onNext={keep} />
        <BigButton primary className="mt-2 min-h-[76px] w-full text-[21px]!" disabled={busy} onClick={keep}>
          Keep dose
        </BigButton>
      </div>
    </>
  );
}

/** How much liquor was taken and put back: as the sample before, unless something else is typed. */
export function SamplePanel({ form, change, minutes, busy, onKeep }: TaskProps & { onKeep: (sample: Sample) => void }) {
  const { values } = useRecording();
  const { samples } = values;
  const last = samples.at(-1);
  const [field, setField] = useState<"volume" | "makeUp">("volume");
  const [pressed, setPressed] = useState(false);
  const volume = {
    text: hasText(form.volume) ? form.volume : (last?.volume.text ?? ""),
    unit: last?.volume.unit ?? "mL",
  };
  const makeUp = {
    text: hasText(form.makeUp) ? form.makeUp : (last?.makeUpVolume.text ?? ""),
    unit: last?.makeUpVolume.unit ?? "mL",
  };
  const problem = refusalOf(volume, "volume") ?? (hasText(volume.text) ? null : "How much was taken?");
  const makeUpProblem = refusalOf(makeUp, "volume");
  const keep = () => {
    setPressed(true);
    if (problem !== null || makeUpProblem !== null) return;
    onKeep({ ...nextSample(samples), at: timeEntry(form.at, minutes, last?.at.unit), volume, makeUpVolume: makeUp });
  };
  return (
    <>
      <div className="space-y-3">
        <p className="font-mono text-[21px] font-bold">Sample {samples.length + 1}</p>
        <BigField
          name="volume"
          label="Liquor taken"
          unit={volume.unit}
          placeholder={last?.volume.text ?? ""}
          value={form.volume}
          onChange={(text) => change({ volume: text })}
          onFocus={() => setField("volume")}
          onEnter={() => setField("makeUp")}
          active={field === "volume"}
          error={pressed && problem !== null ? problem : undefined}
        />
        <BigField
          name="makeUp"
          label="Put back"
          aside="0 where nothing was"
          unit={makeUp.unit}
          placeholder={last?.makeUpVolume.text ?? ""}
          value={form.makeUp}
          onChange={(text) => change({ makeUp: text })}
          onFocus={() => setField("makeUp")}
          onEnter={keep}
          active={field === "makeUp"}
          error={pressed && makeUpProblem !== null ? makeUpProblem : undefined}
        />
        <p className="text-base text-muted">
          {minutes === null ? "Not started: the time stays empty." : `At ${elapsed(minutes)}.`} Label the vial{" "}
          <b className="text-ink">
            {values.code} / {samples.length + 1}
          </b>
          ; its assays are entered when the laboratory answers.
        </p>
      </div>
      <div>
        <Keypad
          onKey={(key) => change({ [field]: typed(form[field], key) })}
          onNext={() => setField(field === "volume" ? "makeUp" : "volume")}
        />
        <BigButton primary className="mt-2 min-h-[76px] w-full text-[21px]!" disabled={busy} onClick={keep}>
          Keep sample
        </BigButton>
      </div>
    </>
  );
}

/** Words with the time they were written at. */
export function NotePanel({ form, change, minutes, busy, onKeep }: TaskProps & { onKeep: (text: string) => void }) {
  return (
    <div className="col-span-full">
      <label className="block text-base">
        What was seen, at {minutes === null ? "no time yet" : elapsed(minutes)}
        <textarea
          rows={4}
          maxLength={500}
          value={form.note}
          onChange={(event) => change({ note: event.target.value })}
          className="mt-1 block w-full rounded-sm border border-muted bg-sheet p-3 text-lg"
        />
      </label>
      <BigButton
        primary
        className="mt-3 min-h-[76px] w-full text-[21px]!"
        disabled={busy || form.note.trim() === ""}
        onClick={() => onKeep(form.note.trim())}
      >
        Keep note
      </BigButton>
    </div>
  );
}
