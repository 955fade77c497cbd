import { Link } from "react-router-dom";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { PlainTable } from "../../components/PlainTable";

/** Every source a row of the library names. */
export function SourcesTab({ data }: { data: ChemicalData }) {
  const uses = new Map<string, number>();
  for (const row of data.tables.species) {
    for (const code of row.source.split(/[;,/]\s*/).filter(Boolean)) uses.set(code, (uses.get(code) ?? 0) + 1);
  }
  return (
    <div className="max-w-[1000px] pb-10">
      <p className="measure pb-2">
        “From memory” means what it says: the value was not looked up again when it was entered, and its grade is lower
        for it. Where sources disagree, the notes of the species say by how much.
      </p>
      <PlainTable
        caption="Sources"
        rows={data.tables.references}
        rowKey={(row) => row.code}
        columns={[
          { header: "code", width: "9em", cell: ({ code }) => <span className="font-mono">{code}</span> },
          { header: "citation", cell: ({ citation }) => citation },
          {
            header: "species",
            number: true,
            width: "5em",
            cell: ({ code }) =>
              uses.has(code) ? <Link to={`/chemistry?find=${encodeURIComponent(code)}`}>{uses.get(code)}</Link> : "",
          },
        ]}
      />
    </div>
  );
}
