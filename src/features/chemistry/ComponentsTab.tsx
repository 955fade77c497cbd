import { Link } from "react-router-dom";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { Formula } from "../../components/Formula";
import { FormulaText } from "../../components/FormulaText";
import { PlainTable } from "../../components/PlainTable";
import { SectionHead } from "../../components/text";
import { fixed } from "../../lib/format";

/** What species are made of: elements, and groups that the solver never takes apart. */
export function ComponentsTab({ data }: { data: ChemicalData }) {
  const rows = [...data.components].map(([component, entry]) => ({
    component,
    ...entry,
    mass: data.molarMass.get(component) ?? null,
    count: data.tables.species.filter((row) => data.species.get(row.id)?.composition[component] !== undefined).length,
  }));
  const names = new Map(data.tables.elements.map(({ symbol, name }) => [symbol, name]));
  const groups = rows.filter(({ kind }) => kind === "ligand_group");
  const elements = rows.filter(({ kind }) => kind === "element");
  const species = {
    header: "species",
    number: true,
    width: "5em",
    cell: ({ component, count }: (typeof rows)[number]) => (
      <Link to={`/chemistry?of=${encodeURIComponent(component)}`}>{count}</Link>
    ),
  };
  const mass = {
    header: "M",
    unit: "g/mol",
    number: true,
    width: "7em",
    cell: ({ mass: m }: (typeof rows)[number]) => (m === null ? "" : fixed(m, 3)),
  };
  return (
    <div className="max-w-[1000px] space-y-6 pb-10">
      <section>
        <SectionHead>Ligand groups</SectionHead>
        <p className="measure py-2">
          A ligand group counts as one component. It binds metals and protons, but the solver never oxidises it or takes
          it apart, because that does not happen in the hours of a leach. Where it does happen, the note says so: a plan
          then reads its map with care.
        </p>
        <PlainTable
          caption="Ligand groups"
          rows={groups}
          rowKey={(row) => row.component}
          columns={[
            { header: "group", width: "6em", cell: ({ component }) => <b className="font-mono">{component}</b> },
            {
              header: "atoms",
              width: "9em",
              cell: ({ elements: parts }) => (
                <Formula
                  className="font-mono"
                  formula={Object.entries(parts)
                    .map(([e, n]) => (n === 1 ? e : `${e}${n}`))
                    .join("")}
                />
              ),
            },
            mass,
            species,
            { header: "what it means", cell: ({ note }) => <FormulaText text={note} /> },
          ]}
        />
      </section>
      <section>
        <SectionHead>Elements</SectionHead>
        <PlainTable
          caption="Elements"
          rows={elements}
          rowKey={(row) => row.component}
          columns={[
            { header: "symbol", width: "6em", cell: ({ component }) => <b className="font-mono">{component}</b> },
            { header: "name", width: "9em", cell: ({ component }) => names.get(component) },
            mass,
            species,
            { header: "note", cell: ({ note }) => <FormulaText text={note} /> },
          ]}
        />
      </section>
    </div>
  );
}
