import { useState } from "react";
import { judge } from "../../../../shared/trials/judge";
import { EntryGrid } from "../../../components/EntryGrid";
import { Note } from "../../../components/text";
import { commonUnit, relabelled } from "../model/columnUnit";
import { isBlank, nextReading } from "../model/trialValues";
import { rowProblems, useRecording } from "./context";
import { readingColumns } from "./readingColumns";
import { Section } from "./Section";

const columnOf = (rest: string): string =>
  rest.startsWith("orp.electrodeTemperature")
    ? "electrodeTemperature"
    : rest.startsWith("orp.electrode")
      ? "electrode"
      : rest.startsWith("pH.temperature")
        ? "pHTemperature"
        : (rest.split(".")[0] ?? "");

/** Everything read off the vessel, in the order it was read. */
export function ReadingsSection() {
  const { values, edit, problems, readOnly, electrodes, solved } = useRecording();
  const { readings } = values.measured;
  const [wished, setWished] = useState({ time: "h", orp: "mV" });
  const timeUnit = commonUnit(
    readings.map(({ at }) => at),
    wished.time,
  );
  const orpUnit = commonUnit(
    readings.map(({ orp }) => orp.value),
    wished.orp,
  );
  const put = (next: typeof readings) =>
    edit((t) => ({ ...t, measured: { ...t.measured, readings: next } }), "measured.readings");
  const columns = readingColumns({
    electrodes,
    timeUnit,
    orpUnit,
    readOnly,
    onTimeUnit: (unit) => {
      setWished((old) => ({ ...old, time: unit }));
      put(readings.map((r) => ({ ...r, at: relabelled(r.at, timeUnit, unit) })));
    },
    onOrpUnit: (unit) => {
      setWished((old) => ({ ...old, orp: unit }));
      put(readings.map((r) => ({ ...r, orp: { ...r.orp, value: relabelled(r.orp.value, orpUnit, unit) } })));
    },
    place: (pH, Eh, EhUncertainty) => {
      if (!solved?.solution) return "";
      const { verdict, unsure } = judge({ pH, Eh, EhUncertainty }, solved.solution, solved.inputs.controlBand);
      return unsure ? "at a limit" : verdict;
    },
  });
  const hot = readings.some(
    (r) => !isBlank(r.orp.value) && hotter(r.orp.electrodeTemperature.text || r.temperature.text),
  );
  return (
    <Section
      id="readings"
      title="Readings"
      aside={readOnly ? undefined : "Enter goes down, Ctrl+D repeats, a block can be pasted"}
    >
      <EntryGrid
        caption="Readings"
        rowName="reading"
        rows={readings}
        columns={columns}
        blank={nextReading}
        onChange={put}
        readOnly={readOnly}
        problems={rowProblems(problems, "measured.readings", columnOf).filter(({ column }) => column !== "electrode")}
        emptyText="Nothing read yet."
      />
      <Note className="pt-1">
        ORP is kept as read; Eh is worked out beside it. Without a temperature of its own the electrode is taken at the
        pulp’s.{hot && " Above 40 °C the reference is known to ±10 mV only."}
      </Note>
    </Section>
  );
}

const hotter = (text: string) => Number(text.replace(",", ".")) > 40;
