import type { ReagentAccount, ReagentRow } from "../../../../shared/metallurgy/account/reagentAccount";
import { Formula } from "../../../components/Formula";
import { PlainTable, type PlainColumn } from "../../../components/PlainTable";
import { Note, SectionHead } from "../../../components/text";
import { withUnit } from "../../../lib/format";
import { massText, rangeText, Value, Working } from "./figures";

/** Acid and reagents: per tonne of dry feed and per kg of metal, always added and consumed, and always said which. */
export function ReagentTable({
  account: { rows, acid },
  metal,
  kind,
}: {
  account: ReagentAccount;
  metal: string;
  kind: "leach" | "cementation";
}) {
  const perTonne: PlainColumn<ReagentRow>[] =
    kind === "leach"
      ? [
          { header: "added", unit: "kg/t", number: true, cell: (r) => <Value figure={r.addedPerTonne} digits={2} /> },
          {
            header: "consumed",
            unit: "kg/t",
            number: true,
            cell: (r) => <Value figure={r.consumedPerTonne} digits={2} />,
          },
        ]
      : [];
  return (
    <>
      <SectionHead
        className="mt-8"
        aside={kind === "leach" ? `per tonne of dry feed, per kg ${metal} dissolved` : `per kg ${metal} won`}
      >
        Acid and reagents
      </SectionHead>
      {rows.length === 0 ? (
        <Note className="pt-1">No reagent was dosed, and none stands among the assays of the starting liquor.</Note>
      ) : (
        <>
          <PlainTable
            caption="Acid and reagents"
            rows={rows}
            rowKey={({ reagent }) => reagent}
            columns={[
              { header: "reagent", cell: ({ reagent }) => <Formula formula={reagent} className="font-bold" /> },
              { header: "dosed", number: true, cell: (r) => massText(r.dosed.value) },
              { header: "available", number: true, cell: (r) => massText(r.available) },
              { header: "left", number: true, cell: (r) => massText(r.left) },
              { header: "in samples", number: true, cell: (r) => massText(r.inSamples) },
              { header: "consumed", number: true, cell: (r) => massText(r.consumed.value) },
              ...perTonne,
              { header: "added", unit: "kg/kg", number: true, cell: (r) => <Value figure={r.addedPerKg} digits={3} /> },
              {
                header: "consumed",
                unit: "kg/kg",
                number: true,
                cell: (r) => <Value figure={r.consumedPerKg} digits={3} />,
              },
            ]}
          />
          <details className="pt-2">
            <summary className="text-sm">Formulas, and the numbers in them</summary>
            {rows.map((r) => (
              <div key={r.reagent} className="hairline grid gap-x-6 py-2 sm:grid-cols-[8em_1fr]">
                <b>
                  <Formula formula={r.reagent} />
                </b>
                <div className="space-y-1">
                  <Working figure={r.dosed} />
                  <Working figure={r.consumed} />
                  {kind === "leach" && <Working figure={r.consumedPerTonne} />}
                  <Working figure={r.consumedPerKg} />
                </div>
              </div>
            ))}
          </details>
          {acid && (
            <Note className="pt-2">
              Acid, gross {withUnit(rangeText(acid.gross, 2), "kg/t")}: {withUnit(rangeText(acid.metal, 2), "kg/t")} to
              bring {metal} out of its oxide, {withUnit(rangeText(acid.gangueAndIron, 2), "kg/t")} for gangue and iron
              (iron that hydrolysed gave some back).
              {acid.netAfterExtraction &&
                ` Net after solvent extraction gives its acid back: ${withUnit(rangeText(acid.netAfterExtraction, 2), "kg/t")}.`}
            </Note>
          )}
          <Note className="pt-1">
            Available counts what the starting liquor and the make-up brought; consumed is what is gone at the end,
            samples not counted as consumed.
          </Note>
        </>
      )}
    </>
  );
}
