import { useMemo, useState } from "react";
import { useNavigate, useParams, useSearchParams } from "react-router-dom";
import type { SpeciesRow } from "../../../shared/schemas/chemistry";
import { phases } from "../../../shared/schemas/chemistry";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { Button } from "../../components/Button";
import { Segmented } from "../../components/choice";
import { DataTable } from "../../components/DataTable";
import { SearchField } from "../../components/SearchField";
import { Select } from "../../components/Select";
import { tableCsv } from "../../components/tableModel";
import { Note, Remark } from "../../components/text";
import { VirtualBody } from "../../components/VirtualBody";
import { downloadText } from "../../lib/csv";
import { useEditedSpecies } from "../../lib/speciesEdits";
import { phaseWord } from "./phases";
import { SpeciesDetail } from "./SpeciesDetail";
import { exportedColumns, markedColumns } from "./speciesColumns";

type PhaseFilter = SpeciesRow["phase"] | "all";
const phaseFilters = [
  { value: "all", label: "all phases" },
  ...phases.map((value) => ({ value, label: phaseWord[value] })),
] as const;

/** Species by element, phase and words; the one in focus in full beside the table. What is asked for stands in the address. */
export function SpeciesTab({ data }: { data: ChemicalData }) {
  const [search, setSearch] = useSearchParams();
  const { speciesId } = useParams();
  const navigate = useNavigate();
  const find = search.get("find") ?? "";
  const element = search.get("of") ?? "all";
  const phase = phaseFilters.find(({ value }) => value === search.get("phase"))?.value ?? "all";
  const [shown, setShown] = useState<readonly SpeciesRow[]>([]);

  const ask = (name: string, value: string) =>
    setSearch(
      (before) => {
        if (value === "" || value === "all") before.delete(name);
        else before.set(name, value);
        return before;
      },
      { replace: true },
    );

  const elements = useMemo(() => elementOptions(data), [data]);
  const rows = useMemo(
    () =>
      data.tables.species.filter(
        (row) =>
          (phase === "all" || row.phase === phase) &&
          (element === "all" || data.species.get(row.id)?.composition[element] !== undefined),
      ),
    [data, element, phase],
  );
  const edited = useEditedSpecies().data;
  const columns = useMemo(() => markedColumns(edited), [edited]);
  const unknown = speciesId !== undefined && !data.species.has(speciesId);
  const id = speciesId !== undefined && !unknown ? speciesId : shown[0]?.id;

  return (
    <div className="flex min-h-0 flex-1">
      <section aria-label="Species" className="flex min-w-0 flex-1 flex-col">
        <div className="flex flex-wrap items-center gap-x-3 gap-y-2 pr-3 pb-2">
          <SearchField
            label="Find a species"
            placeholder="formula, name or source"
            value={find}
            onChange={(text) => ask("find", text)}
            className="w-52"
          />
          <Select
            label="Element or ligand group"
            layout="bare"
            value={element}
            onChange={(value) => ask("of", value)}
            options={elements}
          />
          <Segmented<PhaseFilter>
            label="Phase"
            value={phase}
            onChange={(value) => ask("phase", value)}
            options={phaseFilters}
          />
          <Note className="ml-auto">{shown.length === data.species.size ? "all shown" : `${shown.length} shown`}</Note>
          <Button
            disabled={shown.length === 0}
            onClick={() =>
              downloadText(`gangueway-species-${data.version.slice(0, 12)}.csv`, tableCsv(shown, exportedColumns))
            }
          >
            Export CSV
          </Button>
        </div>
        {unknown && (
          <Remark className="mb-2">
            The library has no species “{speciesId}”. It may stand in another version of the data.
          </Remark>
        )}
        <DataTable
          caption="Species of the library, at 298.15 K and 1 bar"
          rows={rows}
          columns={columns}
          rowKey={(row) => row.id}
          filter={find}
          selectedKey={id}
          onSelect={(row) =>
            void navigate(
              { pathname: `/chemistry/${encodeURIComponent(row.id)}`, search: search.toString() },
              { replace: true },
            )
          }
          onShown={setShown}
          Body={VirtualBody}
          className="min-h-0 flex-1 basis-0 pr-3"
          empty="No species has all of that. Take a word away, or choose another element or phase."
        />
      </section>
      {id !== undefined && <SpeciesDetail key={id} data={data} id={id} />}
    </div>
  );
}

function elementOptions(data: ChemicalData) {
  const names = new Map(data.tables.elements.map(({ symbol, name }) => [symbol, name]));
  const options = [...data.components].map(([component, { kind }]) => {
    const text = kind === "element" ? `${component}, ${names.get(component) ?? ""}` : `${component}, ligand group`;
    return { value: component, label: text, text };
  });
  return [{ value: "all", label: "any element", text: "any element" }, ...options];
}
