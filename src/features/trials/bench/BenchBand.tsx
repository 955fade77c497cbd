import { numberIn } from "../../../../shared/entry/measure";
import { plannedOnElectrode } from "./benchModel";
import { elapsed, minutesOf } from "./elapsed";
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
  return (
    <div className="flex flex-wrap items-end justify-between gap-x-8 gap-y-1 border-b border-verdigris bg-tint px-5 py-3">
      <div>
        <p className="text-base">
          {status === "running" ? "Running for" : status === "planned" ? "Planned" : "Ran for"}
        </p>
        <p className="font-mono text-[32px] leading-9 font-bold text-verdigris">
          {status === "planned"
            ? "not started"
            : minutes === null
              ? "no start written"
              : status === "running"
                ? elapsed(minutes)
                : ran(values)}
        </p>
      </div>
      <div className="text-right text-lg">
        <p>{wants.length > 0 ? `Wanted: ${wants.join(", ")}` : "No conditions planned"}</p>
        <p className="text-base text-muted">
          {last >= 0 && minutes !== null && status === "running"
            ? minutes - last < 1
              ? "last reading just now"
              : `last reading ${elapsed(minutes - last)} ago`
            : `${measured.readings.length} ${measured.readings.length === 1 ? "reading" : "readings"}`}
        </p>
      </div>
    </div>
  );
}

function ran({ startedAt, endedAt }: { startedAt: string | null; endedAt: string | null }): string {
  if (startedAt === null || endedAt === null) return "not written";
  return elapsed((Date.parse(endedAt) - Date.parse(startedAt)) / 60_000);
}
