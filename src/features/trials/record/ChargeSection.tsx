import type { QuantityName } from "../../../../shared/entry/quantities";
import type { Entry } from "../../../../shared/entry/readEntry";
import { chargedSolids } from "../../../../shared/metallurgy/account/solids";
import { Ledger } from "../../../../shared/metallurgy/account/ledger";
import { EntryField } from "../../../components/EntryField";
import { Note } from "../../../components/text";
import { significant, withUnit } from "../../../lib/format";
import { problemAt, useRecording } from "./context";
import { Section } from "./Section";

type ChargeField = "wetMass" | "moisture" | "dryMass" | "liquorVolume" | "liquorDensity";
type ConditionField = "solids" | "p80" | "duration";

interface Line<Key> {
  key: Key;
  label: string;
  quantity: QuantityName;
  hint?: string;
}
const solids: readonly Line<ChargeField>[] = [
  { key: "wetMass", label: "Wet mass", quantity: "mass" },
  { key: "moisture", label: "Moisture", quantity: "share", hint: "Empty: that of the feed." },
  { key: "dryMass", label: "Dry mass", quantity: "mass", hint: "Empty: wet mass less moisture." },
];
const liquor: readonly Line<ChargeField>[] = [
  { key: "liquorVolume", label: "Liquor at the start", quantity: "volume" },
  { key: "liquorDensity", label: "Its density", quantity: "density", hint: "Needed for assays in ppm by mass." },
];
const held: readonly Line<ConditionField>[] = [
  { key: "p80", label: "P80 of the charge", quantity: "size" },
  { key: "solids", label: "Solids in the pulp", quantity: "solids", hint: "Empty: it follows from the charge." },
  { key: "duration", label: "Duration", quantity: "time" },
];

/** What went into the vessel. */
export function ChargeSection() {
  const { values, edit, problems, readOnly, feed } = useRecording();
  const field = (part: "charge" | "measured", { key, label, quantity, hint }: Line<string>) => {
    const path = `${part}.${key}`;
    return (
      <EntryField
        key={path}
        label={label}
        quantity={quantity}
        hint={readOnly ? undefined : hint}
        value={(values[part] as unknown as Record<string, Entry>)[key]!}
        onChange={(entry) => edit((t) => ({ ...t, [part]: { ...t[part], [key]: entry } }), path)}
        error={problemAt(problems, path)}
        readOnly={readOnly}
      />
    );
  };
  const charged = feed && values.kind === "leach" ? chargedSolids(values, feed, new Ledger()) : null;
  return (
    <Section id="charge" title="Charge">
      <div className="grid gap-x-10 md:grid-cols-2">
        <div>
          {(values.kind === "leach" || values.charge.wetMass.text !== "") &&
            solids.map((line) => field("charge", line))}
          {liquor.map((line) => field("charge", line))}
        </div>
        <div>{held.map((line) => field("measured", line))}</div>
      </div>
      {charged && (
        <Note className="pt-2">
          {withUnit(significant(charged.dry, 5), "g")} dry
          {charged.water > 0 && `, ${withUnit(significant(charged.water, 4), "g")} of water with it`}.
        </Note>
      )}
    </Section>
  );
}
