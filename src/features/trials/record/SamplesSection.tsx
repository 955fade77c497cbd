import { useState } from "react";
import { unitsOf, type QuantityName } from "../../../../shared/entry/quantities";
import { refusalOf } from "../../../../shared/schemas/entry";
import type { Sample } from "../../../../shared/schemas/trialRecord";
import { EntryGrid } from "../../../components/EntryGrid";
import type { GridColumn } from "../../../components/entryGridModel";
import { UnitSelect } from "../../../components/UnitSelect";
import { Note } from "../../../components/text";
import { commonUnit, otherUnit, relabelled, typedIn } from "../model/columnUnit";
import { nextSample } from "../model/trialValues";
import { rowProblems, useRecording } from "./context";
import { Section } from "./Section";

type Field = "at" | "volume" | "makeUpVolume" | "drySolids";
const fields: readonly { key: Field; header: string; quantity: QuantityName; usual: string; width: string }[] = [
  { key: "at", header: "time", quantity: "time", usual: "h", width: "5em" },
  { key: "volume", header: "liquor out", quantity: "volume", usual: "mL", width: "6em" },
  { key: "makeUpVolume", header: "put back", quantity: "volume", usual: "mL", width: "6em" },
  { key: "drySolids", header: "dry solids out", quantity: "mass", usual: "g", width: "7em" },
];

/** Liquor taken out of the vessel and what was put back; the assays stand in the matrix of solutions. */
export function SamplesSection() {
  const { values, edit, problems, readOnly } = useRecording();
  const { samples } = values;
  const [wished, setWished] = useState<Partial<Record<Field, string>>>({});
  const unitOf = ({ key, usual }: { key: Field; usual: string }) =>
    commonUnit(
      samples.map((s) => s[key]),
      wished[key] ?? usual,
    );
  const put = (next: Sample[]) => edit((t) => ({ ...t, samples: next }), "samples");
  const columns = fields.map(({ key, header, quantity, width, usual }): GridColumn<Sample> => ({
    id: key,
    kind: "text",
    header,
    label: header,
    width,
    under: (
      <UnitSelect
        label={`Unit of ${header}`}
        units={unitsOf(quantity)}
        value={unitOf({ key, usual })}
        readOnly={readOnly}
        onChange={(unit) => {
          const from = unitOf({ key, usual });
          setWished((old) => ({ ...old, [key]: unit }));
          put(samples.map((s) => ({ ...s, [key]: relabelled(s[key], from, unit) })));
        }}
      />
    ),
    get: (s) => s[key].text,
    set: (s, text) => ({ ...s, [key]: typedIn(s[key], text, unitOf({ key, usual })) }),
    suffix: (s) => otherUnit(s[key], unitOf({ key, usual })),
    problem: (s) => refusalOf(s[key], quantity),
  }));
  return (
    <Section id="samples" title="Samples withdrawn" aside="assays go into the solutions below">
      <EntryGrid
        caption="Samples withdrawn"
        rowName="sample"
        rows={samples}
        columns={columns}
        blank={nextSample}
        onChange={put}
        readOnly={readOnly}
        problems={rowProblems(problems, "samples", (rest) => rest.split(".")[0] ?? "")}
        emptyText="None withdrawn."
      />
      <Note className="pt-1">
        Nothing put back is 0, not empty: an empty field is not known, and the account says so.
      </Note>
    </Section>
  );
}
