import type { TrialRow } from "../../../../shared/schemas/trial";
import { Formula } from "../../../components/Formula";
import { PlainTable } from "../../../components/PlainTable";
import { fixed } from "../../../lib/format";
import { orpOf } from "../model/orp";
import { useRecording } from "../record/context";
import { placeSaid } from "./benchModel";
import { elapsed, minutesOf } from "./elapsed";

interface Line {
  key: string;
  minutes: number | null;
  pH: string;
  E: string;
  T: string;
  remark: React.ReactNode;
  /** not on the server yet */
  here: boolean;
}

/** "pH 0.21 below its planned 2.20" */
const offWords = (sentence: string): string => sentence.replace(/^[^:]*: /, "").replace(/\.$/, "");

/** Everything kept so far, newest first: readings, doses, samples in one list. */
export function EntryLog({ saved }: { saved: TrialRow }) {
  const { values, electrodes, solved } = useRecording();
  const { readings, doses } = values.measured;
  const lines: Line[] = [
    ...readings.map((r, i): Line => {
      const orp = orpOf(r, electrodes);
      const said = placeSaid(r, values, electrodes, solved);
      const off = said?.held?.tone === "bad";
      return {
        key: `reading ${i}`,
        minutes: minutesOf(r.at),
        pH: `${r.pH.value.text}${r.pH.cooledSample ? "*" : ""}`,
        E: orp.kind === "read" ? fixed(orp.point.Eh, 3) : "",
        T: r.temperature.text,
        remark: (
          <>
            {off && <b className="text-signal">{offWords(said?.held?.text ?? "")}</b>}
            {said && !said.inside && (
              <span className={said.laidOutside ? "text-muted" : ""}>
                {off && "; "}
                {said.laidOutside ? "outside the window, as laid out" : "outside the window"}
              </span>
            )}
            {(off || said?.inside === false) && r.note !== "" && ", "}
            {r.note}
          </>
        ),
        here: i >= saved.measured.readings.length,
      };
    }),
    ...doses.map((d, i): Line => ({
      key: `dose ${i}`,
      minutes: minutesOf(d.at),
      pH: "",
      E: "",
      T: "",
      remark: (
        <>
          <Formula formula={d.reagent} /> {d.amount.text} {d.amount.unit}
          {d.reason !== "" && `, ${d.reason}`}
        </>
      ),
      here: i >= saved.measured.doses.length,
    })),
    ...values.samples.map((s, i): Line => ({
      key: `sample ${i}`,
      minutes: minutesOf(s.at),
      pH: "",
      E: "",
      T: "",
      remark: `sample ${i + 1}, ${s.volume.text} ${s.volume.unit}`,
      here: i >= saved.samples.length,
    })),
  ].sort((a, b) => (b.minutes ?? -1) - (a.minutes ?? -1));
  if (lines.length === 0) return <p className="py-4 text-base text-muted">Nothing kept yet.</p>;
  return (
    <PlainTable
      caption="Kept so far, newest first"
      className="text-base!"
      rows={lines}
      rowKey={({ key }) => key}
      columns={[
        {
          header: "time",
          number: true,
          width: "7em",
          cell: ({ minutes }) =>
            minutes === null ? "" : <span className="whitespace-nowrap">{elapsed(minutes)}</span>,
        },
        { header: "pH", number: true, width: "4em", cell: ({ pH }) => pH },
        { header: "E", unit: "V", number: true, width: "5em", cell: ({ E }) => E },
        { header: "T", unit: "°C", number: true, width: "4.5em", cell: ({ T }) => T },
        {
          header: "remark",
          cell: ({ remark, here }) => (
            <>
              {remark} {here && <span className="text-muted">kept on this device</span>}
            </>
          ),
        },
      ]}
    />
  );
}
