import { useState } from "react";
import { unitsOf } from "../../../../shared/entry/quantities";
import { refusalOf, type SolidAssay, type SolutionAssay } from "../../../../shared/schemas/entry";
import { Button } from "../../../components/Button";
import { EntryGrid } from "../../../components/EntryGrid";
import type { GridColumn } from "../../../components/entryGridModel";
import { Formula } from "../../../components/Formula";
import { UnitSelect } from "../../../components/UnitSelect";
import { analytesOf, columnUnit, withAssay, withUnit, type AssayLine } from "../model/liquors";
import { otherUnit } from "../model/columnUnit";
import type { TrialValues } from "../model/trialValues";
import { useRecording } from "./context";

interface AssayMatrixProps<A extends SolutionAssay | SolidAssay> {
  caption: string;
  quantity: "solutionAssay" | "solidAssay";
  usualUnit: string;
  /** columns that stand there before anything is typed */
  expected: readonly string[];
  usual: readonly string[];
  linesOf: (trial: TrialValues) => AssayLine<A>[];
}

/** Assays as laboratories answer them: a line a liquor or solid, a column an analyte. "<0.01" is kept as it stands; an empty cell
 *  is not assayed. */
export function AssayMatrix<A extends SolutionAssay | SolidAssay>(props: AssayMatrixProps<A>) {
  const { caption, quantity, usualUnit, expected, usual, linesOf } = props;
  const { values, edit, readOnly } = useRecording();
  const [added, setAdded] = useState<string[]>([]);
  const [wished, setWished] = useState<Record<string, string>>({});
  const [next, setNext] = useState("");
  const lines = linesOf(values);
  const analytes = analytesOf(lines, [...expected, ...added]);
  const unitOf = (analyte: string) => columnUnit(lines, analyte, wished[analyte] ?? usualUnit);

  const columns: GridColumn<AssayLine<A>>[] = [
    {
      id: "line",
      kind: "shown",
      header: "",
      label: "liquor",
      width: "11em",
      show: ({ name, note }) => (
        <>
          {name} {note !== "" && <span className="text-muted">{note}</span>}
        </>
      ),
    },
    ...analytes.map((analyte): GridColumn<AssayLine<A>> => {
      const unit = unitOf(analyte);
      const assayOn = ({ assays }: AssayLine<A>) => assays.find((a) => a.analyte === analyte);
      return {
        id: analyte,
        kind: "text",
        header: <Formula formula={analyte} />,
        label: analyte,
        under: (
          <UnitSelect
            label={`Unit of ${analyte}`}
            units={unitsOf(quantity)}
            value={unit}
            readOnly={readOnly}
            onChange={(chosen) => {
              setWished((old) => ({ ...old, [analyte]: chosen }));
              edit((t) =>
                linesOf(t).reduce((trial, line) => line.put(trial, withUnit(line.assays, analyte, unit, chosen)), t),
              );
            }}
          />
        ),
        width: "6.2em",
        get: (line) => assayOn(line)?.value.text ?? "",
        set: (line, text) => ({ ...line, assays: withAssay(line.assays, analyte, text, unit) }),
        problem: (line) => {
          const assay = assayOn(line);
          return assay ? refusalOf(assay.value, quantity) : null;
        },
        suffix: (line) => otherUnit(assayOn(line)?.value, unit),
      };
    }),
  ];

  const add = () => {
    const name = next.trim();
    if (name !== "" && !analytes.includes(name)) setAdded((old) => [...old, name]);
    setNext("");
  };
  return (
    <>
      <EntryGrid
        caption={caption}
        rowName="line"
        rowLabel={({ name }) => name}
        rows={lines}
        columns={columns}
        readOnly={readOnly}
        onChange={(rows) =>
          edit(
            (t) =>
              rows.reduce(
                (trial, row, i) => (row.assays === lines[i]?.assays ? trial : row.put(trial, [...row.assays])),
                t,
              ),
            caption,
          )
        }
      />
      {!readOnly && (
        <form
          className="flex items-center gap-2 pt-2"
          onSubmit={(event) => {
            event.preventDefault();
            add();
          }}
        >
          <input
            aria-label={`Another analyte of ${caption.toLowerCase()}`}
            placeholder="another, as Fe(III) or H2SO4"
            list={`analytes-${quantity}`}
            value={next}
            maxLength={20}
            onChange={(event) => setNext(event.target.value)}
            className="h-7 w-56 rounded-sm border border-muted bg-sheet px-2 text-sm"
          />
          <datalist id={`analytes-${quantity}`}>
            {usual
              .filter((a) => !analytes.includes(a))
              .map((a) => (
                <option key={a} value={a} />
              ))}
          </datalist>
          <Button type="submit" disabled={next.trim() === ""}>
            Add a column
          </Button>
        </form>
      )}
    </>
  );
}
