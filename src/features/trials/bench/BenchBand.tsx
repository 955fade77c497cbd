import { numberIn } from "../../../../shared/entry/measure";
import { plannedOnElectrode } from "./benchModel";
import { classes } from "../../../lib/classes";
import { elapsed, minutesOf, overdue } from "./elapsed";
import { useRecording } from "../record/context";

/** How long it runs, when it was read last, and what the plan wants, on the electrode in hand. */
export function BenchBand({
  minutes,
  electrode,
  electrodeTemperature,
}: {
  minutes: number | null;
  electrode: string | null;
  electrodeTemperature: string;
}) {
  const { values, electrodes } = useRecording();
  const { planned, measured, status } = values;
  const last = Math.max(-1, ...measured.readings.map((r) => minutesOf(r.at) ?? -1));
  const electrodeC = numberIn({ text: electrodeTemperature, unit: "C" }, "temperature") ?? 25;
  const orp = plannedOnElectrode(values, electrodes, electrode, electrodeC);
  const wants = [
    planned.pH.text !== "" && `pH ${planned.pH.text}`,
    orp,
    planned.temperature.text !== "" && `${planned.temperature.text} °C`,
    planned.duration.text !== "" && `${planned.duration.text} ${planned.duration.unit} in all`,
  ].filter(Boolean);
  const late = status === "running" ? overdue(planned.duration, minutes) : null;
  return (
    <div
      className={classes(
        "flex flex-wrap items-end justify-between gap-x-8 gap-y-1 border-b px-5 py-3",
        late === null ? "border-verdigris bg-tint" : "border-signal",
      )}
    >
      <div>
        <p className="text-base">
          {status === "running" ? "Running for" : status === "planned" ? "Planned" : "Ran for"}
        </p>
        <p
          className={classes(
            "font-mono text-[32px] leading-9 font-bold",
            late === null ? "text-verdigris" : "text-signal",
          )}
        >
          {status === "planned"
            ? "not started"
            : minutes === null
              ? "no start written"
              : status === "running"
                ? elapsed(minutes)
                : ran(values)}
        </p>
        {late !== null && (
          <p role="status" className="text-lg font-bold text-signal">
            {late}
          </p>
        )}
      </div>
      <div className="text-right text-lg">
        <p>{wants.length > 0 ? `Wanted: ${wants.join(", ")}` : "No conditions planned"}</p>
        <p className="text-base text-muted">
          {last >= 0 && minutes !== null && status === "running"
            ? minutes - last < 1
              ? "last reading just now"
              : `last reading ${elapsed(minutes - last)} ago`
            : `${measured.readings.length} ${measured.readings.length === 1 ? "reading" : "readings"}`}
          {late !== null && "; end the trial, or note why it runs on"}
        </p>
      </div>
    </div>
  );
}

function ran({ startedAt, endedAt }: { startedAt: string | null; endedAt: string | null }): string {
  if (startedAt === null || endedAt === null) return "not written";
  return elapsed((Date.parse(endedAt) - Date.parse(startedAt)) / 60_000);
}
