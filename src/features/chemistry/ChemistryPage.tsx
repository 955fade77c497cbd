import { useSearchParams } from "react-router-dom";
import { PageHead } from "../../components/PageHead";
import { Tabs } from "../../components/choice";
import { ErrorNote, Loading } from "../../components/status";
import { Note } from "../../components/text";
import { useChemistry } from "../../lib/chemistry";
import { counted } from "../../lib/format";
import { usePageTitle } from "../../lib/title";
import { ComponentsTab } from "./ComponentsTab";
import { ElectrodesTab } from "./ElectrodesTab";
import { LeftOutTab } from "./LeftOutTab";
import { PresetsTab } from "./PresetsTab";
import { SourcesTab } from "./SourcesTab";
import { AddSpecies } from "../speciesEdits/AddSpecies";
import { SpeciesTab } from "./SpeciesTab";

const shelves = ["species", "components", "lixiviants", "left-out", "electrodes", "sources"] as const;
type Shelf = (typeof shelves)[number];

/** The chemistry library: every number the solver stands on, with where it came from. */
export default function ChemistryPage() {
  usePageTitle("Chemistry");
  const chemistry = useChemistry();
  const [search, setSearch] = useSearchParams();
  const shown = shelves.find((shelf) => shelf === search.get("show")) ?? "species";
  const show = (shelf: Shelf) => setSearch(shelf === "species" ? {} : { show: shelf }, { replace: true });
  if (chemistry.error) {
    return (
      <div className="measure p-5">
        <ErrorNote
          doing="The chemistry library could not be read"
          error={chemistry.error}
          retry={() => void chemistry.refetch()}
        />
      </div>
    );
  }
  if (!chemistry.data) {
    return (
      <div className="px-5">
        <Loading label="Reading the chemistry library" />
      </div>
    );
  }
  const data = chemistry.data;
  return (
    <>
      <PageHead
        title="Chemistry"
        about={
          <Note>
            {counted(data.species.size, "species", "species")}, {counted(data.tables.references.length, "source")}. Data
            version{" "}
            <span className="font-mono text-ink" title={data.version}>
              {data.version.slice(0, 12)}
            </span>
            <span className="max-lg:hidden">; a saved revision of a plan keeps the version it used</span>.
          </Note>
        }
      >
        <AddSpecies data={data} />
      </PageHead>
      <Tabs
        label="Tables of the library"
        className="flex min-h-0 flex-1 flex-col px-5 pt-2"
        value={shown}
        onChange={show}
        panels={[
          { value: "species", label: "Species", content: <SpeciesTab data={data} />, fill: true },
          { value: "components", label: "Components and ligand groups", content: <ComponentsTab data={data} /> },
          { value: "lixiviants", label: "Lixiviants", content: <PresetsTab data={data} /> },
          { value: "left-out", label: "Left out, and why", content: <LeftOutTab data={data} /> },
          { value: "electrodes", label: "Electrodes", content: <ElectrodesTab data={data} /> },
          { value: "sources", label: "Sources", content: <SourcesTab data={data} /> },
        ]}
      />
    </>
  );
}
