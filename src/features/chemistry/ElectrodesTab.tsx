import { useMemo } from "react";
import type { z } from "zod";
import type { electrodeRow } from "../../../shared/schemas/chemistry";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { PlainTable } from "../../components/PlainTable";
import { SectionHead } from "../../components/text";
import { fixed } from "../../lib/format";

type ElectrodeRow = z.infer<typeof electrodeRow>;

const kinds = [
  {
    kind: "reference_electrode",
    title: "Reference electrodes",
    text: "Potential against SHE at the electrode’s own temperature. Eh = reading + this number.",
  },
  {
    kind: "redox_standard",
    title: "Check solutions",
    text: "What a good platinum probe reads in them. A probe is verified with these, not adjusted.",
  },
] as const;

/** The reference electrodes and check solutions, series by series. */
export function ElectrodesTab({ data }: { data: ChemicalData }) {
  const series = useMemo(() => seriesOf(data.tables.electrodes), [data]);
  return (
    <div className="max-w-[1240px] space-y-8 pb-10">
      {kinds.map(({ kind, title, text }) => (
        <section key={kind}>
          <SectionHead>{title}</SectionHead>
          <p className="measure py-2">{text}</p>
          <PlainTable
            caption={title}
            rows={series.filter((one) => one.first.kind === kind)}
            rowKey={(one) => one.id}
            columns={[
              { header: "series", width: "8.5em", cell: ({ id }) => <span className="font-mono">{id}</span> },
              {
                header: "electrode",
                width: "15em",
                cell: ({ first }) => `${first.name}, ${first.filling_or_solution}`,
              },
              {
                header: "E",
                unit: "mV at T in °C",
                cell: ({ rows }) => (
                  <span className="flex flex-wrap gap-x-4 font-mono">
                    {rows.map((row) => (
                      <span key={row.id} className="whitespace-nowrap">
                        {fixed(row.E_mV, 1)}
                        <span className="text-muted"> at {row.T_C}</span>
                      </span>
                    ))}
                  </span>
                ),
              },
              { header: "against", width: "8em", cell: ({ first }) => first.versus },
              {
                header: "source, grade",
                width: "8em",
                cell: ({ rows }) => [...new Set(rows.map((row) => `${row.source} ${row.grade}`))].join(", "),
              },
              {
                header: "note",
                width: "22%",
                cell: ({ rows }) => [...new Set(rows.map((row) => row.note).filter(Boolean))].join("; "),
              },
            ]}
          />
        </section>
      ))}
    </div>
  );
}

function seriesOf(rows: readonly ElectrodeRow[]) {
  const found = new Map<string, ElectrodeRow[]>();
  for (const row of rows) {
    const id = row.id.endsWith(`-${row.T_C}`) ? row.id.slice(0, -`-${row.T_C}`.length) : row.id;
    found.set(id, [...(found.get(id) ?? []), row]);
  }
  return [...found].flatMap(([id, list]) => (list[0] ? [{ id, rows: list, first: list[0] }] : []));
}
