import type { SpeciesRow } from "../../../shared/schemas/chemistry";
import type { EditedSpecies } from "../../../shared/schemas/speciesEdit";
import { Formula } from "../../components/Formula";
import type { Column } from "../../components/tableModel";
import { phaseWord } from "./phases";

/** What the table on the screen shows. */
export const speciesColumns: readonly Column<SpeciesRow>[] = [
  {
    id: "formula",
    header: "formula",
    width: "10.5rem",
    value: (row) => row.id,
    cell: (row) => <Formula formula={row.formula} className="font-mono" />,
  },
  { id: "name", header: "name", value: (row) => row.name },
  { id: "phase", header: "phase", width: "4.9rem", value: (row) => phaseWord[row.phase] },
  {
    id: "dGf_kJ",
    header: "G",
    unit: "kJ/mol",
    width: "5.1rem",
    digits: 2,
    asGiven: true,
    value: (row) => row.dGf_kJ,
    filtered: false,
  },
  {
    id: "dHf_kJ",
    header: "H",
    unit: "kJ/mol",
    width: "5.1rem",
    digits: 2,
    asGiven: true,
    value: (row) => row.dHf_kJ,
    filtered: false,
    wide: true,
  },
  {
    id: "S_J",
    header: "S",
    unit: "J/mol K",
    width: "4.7rem",
    digits: 2,
    asGiven: true,
    value: (row) => row.S_J,
    filtered: false,
    wide: true,
  },
  {
    id: "Cp_J",
    header: "Cp",
    unit: "J/mol K",
    width: "4.7rem",
    digits: 1,
    asGiven: true,
    value: (row) => row.Cp_J,
    filtered: false,
    wide: true,
  },
  { id: "grade", header: "grade", width: "4rem", value: (row) => row.grade, filtered: false },
  { id: "source", header: "source", width: "5.9rem", value: (row) => row.source, wide: true },
];

const number = (id: keyof SpeciesRow, unit: string): Column<SpeciesRow> => ({
  id,
  header: id.replace(/_(kJ|J|K)$/, ""),
  unit,
  value: (row) => row[id],
});
const text = (id: keyof SpeciesRow): Column<SpeciesRow> => ({ id, header: id, value: (row) => row[id] });

/** What the exported file holds: every column of the data. */
export const exportedColumns: readonly Column<SpeciesRow>[] = [
  ...(["id", "formula", "name", "phase", "charge", "composition"] as const).map(text),
  number("dGf_kJ", "kJ/mol, 298.15 K"),
  number("dHf_kJ", "kJ/mol, 298.15 K"),
  number("S_J", "J/(mol K), 298.15 K"),
  number("Cp_J", "J/(mol K), 298.15 K"),
  number("Cp_a", "J/(mol K)"),
  number("Cp_b", "J/(mol K2)"),
  number("Cp_c", "J K/mol"),
  number("Cp_Tmax_K", "K"),
  ...(["ion_class", "grade", "source", "note"] as const).map(text),
];

/** The same with a word on rows that are not as shipped. */
export const markedColumns = (edited: ReadonlyMap<string, EditedSpecies> | undefined): readonly Column<SpeciesRow>[] =>
  speciesColumns.map((column) =>
    column.id !== "name"
      ? column
      : {
          ...column,
          cell: (row) => {
            const state = edited?.get(row.id)?.state;
            const word = state === "added" ? "added here" : state === "overridden" ? "overridden here" : null;
            return (
              <>
                {word !== null && <b className="text-verdigris">{word} </b>}
                {row.name}
              </>
            );
          },
        },
  );
