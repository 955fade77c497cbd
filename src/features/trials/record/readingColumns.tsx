import type { ElectrodeSeries } from "../../../../shared/electrodes/series";
import { unitsOf } from "../../../../shared/entry/quantities";
import { refusalOf } from "../../../../shared/schemas/entry";
import type { TrialReading } from "../../../../shared/schemas/trialRecord";
import type { GridColumn } from "../../../components/entryGridModel";
import { UnitSelect } from "../../../components/UnitSelect";
import { fixed, withUnit } from "../../../lib/format";
import { electrodeOptions } from "../model/electrodes";
import { otherUnit, typedIn } from "../model/columnUnit";
import { orpOf } from "../model/orp";
import { isBlank } from "../model/trialValues";

export interface ReadingColumnWishes {
  electrodes: readonly ElectrodeSeries[];
  timeUnit: string;
  onTimeUnit: (unit: string) => void;
  orpUnit: string;
  onOrpUnit: (unit: string) => void;
  readOnly: boolean;
  /** "inside" and the like, for a reading with a place on the map */
  place: (pH: number, Eh: number, uncertainty: number) => string;
}

const noElectrode = "ORP without its electrode cannot be saved: choose the one it was read against";

/** What is written of one look at the vessel; the potential on the SHE scale stands beside what was read. */
export function readingColumns(w: ReadingColumnWishes): GridColumn<TrialReading>[] {
  return [
    {
      id: "at",
      kind: "text",
      header: "time",
      label: "time",
      under: (
        <UnitSelect
          label="Unit of time"
          units={unitsOf("time")}
          value={w.timeUnit}
          onChange={w.onTimeUnit}
          readOnly={w.readOnly}
        />
      ),
      width: "4.4em",
      get: (r) => r.at.text,
      set: (r, text) => ({ ...r, at: typedIn(r.at, text, w.timeUnit) }),
      suffix: (r) => otherUnit(r.at, w.timeUnit),
      problem: (r) => refusalOf(r.at, "time"),
    },
    {
      id: "temperature",
      kind: "text",
      header: "T",
      label: "temperature",
      under: "°C",
      width: "3.8em",
      get: (r) => r.temperature.text,
      set: (r, text) => ({ ...r, temperature: { ...r.temperature, text } }),
      problem: (r) => refusalOf(r.temperature, "temperature"),
    },
    {
      id: "pH",
      kind: "text",
      header: "pH",
      label: "pH",
      width: "3.8em",
      get: (r) => r.pH.value.text,
      set: (r, text) => ({ ...r, pH: { ...r.pH, value: { ...r.pH.value, text } } }),
      problem: (r) => refusalOf(r.pH.value, "pH"),
    },
    {
      id: "pHTemperature",
      kind: "text",
      header: "pH at",
      label: "temperature of the pH",
      under: "°C",
      width: "3.8em",
      get: (r) => r.pH.temperature.text,
      set: (r, text) => ({ ...r, pH: { ...r.pH, temperature: { ...r.pH.temperature, text } } }),
      problem: (r) => refusalOf(r.pH.temperature, "temperature"),
    },
    {
      id: "cooled",
      kind: "check",
      header: "cooled",
      label: "read in a cooled sample",
      width: "4em",
      get: (r) => r.pH.cooledSample,
      set: (r, cooledSample) => ({ ...r, pH: { ...r.pH, cooledSample } }),
    },
    {
      id: "orp",
      kind: "text",
      header: "ORP read",
      label: "ORP as read",
      under: (
        <UnitSelect
          label="Unit of ORP"
          units={unitsOf("potential")}
          value={w.orpUnit}
          onChange={w.onOrpUnit}
          readOnly={w.readOnly}
        />
      ),
      width: "5em",
      get: (r) => r.orp.value.text,
      set: (r, text) => ({ ...r, orp: { ...r.orp, value: typedIn(r.orp.value, text, w.orpUnit) } }),
      suffix: (r) => otherUnit(r.orp.value, w.orpUnit),
      problem: (r) => refusalOf(r.orp.value, "potential"),
    },
    {
      id: "electrode",
      kind: "choice",
      header: "electrode",
      label: "electrode",
      width: "10.5em",
      options: electrodeOptions(w.electrodes),
      get: (r) => r.orp.electrode ?? "",
      set: (r, electrode) => ({ ...r, orp: { ...r.orp, electrode } }),
      problem: (r) => (r.orp.electrode === null && !isBlank(r.orp.value) ? noElectrode : null),
    },
    {
      id: "electrodeTemperature",
      kind: "text",
      header: "its T",
      label: "temperature of the electrode",
      under: "°C",
      width: "3.8em",
      get: (r) => r.orp.electrodeTemperature.text,
      set: (r, text) => ({ ...r, orp: { ...r.orp, electrodeTemperature: { ...r.orp.electrodeTemperature, text } } }),
      problem: (r) => refusalOf(r.orp.electrodeTemperature, "temperature"),
    },
    {
      id: "Eh",
      kind: "shown",
      header: "Eh",
      label: "Eh",
      under: "V vs SHE",
      width: "6.4em",
      right: true,
      show: (r) => <ShownEh reading={r} electrodes={w.electrodes} />,
    },
    {
      id: "place",
      kind: "shown",
      header: "window",
      label: "window",
      width: "5em",
      show: (r) => {
        const orp = orpOf(r, w.electrodes);
        if (orp.kind !== "read" || isBlank(r.pH.value)) return null;
        return <span className="text-muted">{w.place(orp.point.pH, orp.point.Eh, orp.point.EhUncertainty)}</span>;
      },
    },
    {
      id: "note",
      kind: "text",
      header: "note",
      label: "note",
      width: "clamp(8.5em, 12vw, 14em)",
      words: true,
      get: (r) => r.note,
      set: (r, note) => ({ ...r, note }),
    },
  ];
}

function ShownEh({ reading, electrodes }: { reading: TrialReading; electrodes: readonly ElectrodeSeries[] }) {
  const orp = orpOf(reading, electrodes);
  if (orp.kind === "none") return null;
  if (orp.kind === "open")
    return (
      <span className="text-signal" title={orp.why}>
        open
      </span>
    );
  const { Eh, EhUncertainty, conversion, marks } = orp.point;
  const title = [conversion, ...marks.map(({ text }) => text)].join("; ");
  return (
    <span className="font-mono" title={title}>
      {fixed(Eh, 3)}
      {EhUncertainty > 0 && (
        <span className="block text-xs leading-3 text-muted">±{withUnit(fixed(EhUncertainty * 1000, 0), "mV")}</span>
      )}
    </span>
  );
}
