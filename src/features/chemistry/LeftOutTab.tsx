import { Link } from "react-router-dom";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { SpeciesName } from "../../components/Formula";
import { FormulaText } from "../../components/FormulaText";
import { Term } from "../../components/Help";
import { PlainTable } from "../../components/PlainTable";
import { SectionHead } from "../../components/text";
import { whenText } from "./leftOutWords";

const Species = ({ data, id }: { data: ChemicalData; id: string }) =>
  data.species.has(id) ? (
    <Link to={`/chemistry/${encodeURIComponent(id)}`} className="no-underline hover:underline">
      <SpeciesName id={id} withPhase className="font-mono" />
    </Link>
  ) : (
    <span className="font-mono">{id.replace(/^rule:/, "couple: ").replaceAll("-", " and ")}</span>
  );

/** What a sensible plan does not count, and the reason; a plan may put each of them back. */
export function LeftOutTab({ data }: { data: ChemicalData }) {
  const { defaults, solidsBasis } = data.tables;
  return (
    <div className="max-w-[1000px] space-y-6 pb-10">
      <p className="measure">
        The most stable species is not always the one that forms. These are left out unless a plan puts them back; every
        solution lists what it left out and why. Common practice, no single source: each line can be overruled in a
        plan.
      </p>
      <section>
        <SectionHead>Left out by default</SectionHead>
        <PlainTable
          caption="Species left out by default"
          rows={defaults}
          rowKey={(row) => `${row.id} ${row.when}`}
          columns={[
            { header: "species", width: "30%", cell: ({ id }) => <Species data={data} id={id} /> },
            { header: "when", width: "24%", cell: ({ when }) => whenText(when) },
            { header: "why", cell: ({ reason }) => <FormulaText text={reason} /> },
          ]}
        />
      </section>
      <section>
        <SectionHead aside={<Term word="solidsBasis" />}>Fresh solids basis</SectionHead>
        <PlainTable
          caption="The fresh solids basis"
          rows={solidsBasis}
          rowKey={(row) => row.id}
          columns={[
            { header: "solid", width: "30%", cell: ({ id }) => <Species data={data} id={id} /> },
            {
              header: "fresh",
              width: "24%",
              cell: ({ fresh, below_C }) =>
                fresh === "in" ? "counted" : below_C === null ? "left out" : `left out below ${below_C} °C`,
            },
            { header: "why", cell: ({ reason }) => <FormulaText text={reason} /> },
          ]}
        />
      </section>
    </div>
  );
}
