import type { MetalAccount } from "../../../../shared/metallurgy/account/metalAccount";
import { PlainTable } from "../../../components/PlainTable";
import { Note, SectionHead } from "../../../components/text";
import { fixed, significant, withUnit } from "../../../lib/format";
import { ExtractionCurve } from "./ExtractionCurve";
import { Grade, massText, rangeText, Value, Working } from "./figures";
import { BasesTable, Flags, Missing, NumbersUsed } from "./parts";

/** The in = out balance of one metal in a leach. */
export function LeachSheet({ account }: { account: MetalAccount }) {
  const { metal, bases, accountability, measuredHead, calculatedHead, closed, curve, flags, missing } = account;
  const quoted = bases.find(({ value }) => value !== null);
  return (
    <>
      <p className="measure text-lg">
        {quoted?.value ? (
          <>
            {withUnit(rangeText(quoted.value, 1), "%")} of the {metal} dissolved, by {quoted.name}.{" "}
            {accountability.value
              ? `${withUnit(rangeText(accountability.value, 1), "%")} of what was fed was found again.`
              : "Whether the account closes is still open."}
          </>
        ) : (
          <>No recovery of {metal} can be worked out yet.</>
        )}
      </p>
      <Flags flags={flags} />

      <SectionHead className="mt-6" aside="calculated head first: tightest at high recovery">
        Extraction
      </SectionHead>
      <BasesTable bases={bases} word="extraction" />
      {account.withoutSamples && quoted && (
        <Note className="pt-1">
          By the final liquor alone, withdrawn samples forgotten, it would read{" "}
          {withUnit(rangeText(account.withoutSamples, 2), "%")}.
        </Note>
      )}

      <div className="grid gap-x-10 lg:grid-cols-2">
        <div>
          <SectionHead className="mt-6" aside="95 to 105 % is good, common practice">
            Account
          </SectionHead>
          <PlainTable
            caption="Account"
            rows={[
              { name: "Accountability", figure: accountability, shown: <Value figure={accountability} digits={2} /> },
              { name: "Head, as assayed", figure: measuredHead, shown: <Grade figure={measuredHead} /> },
              { name: "Head, calculated", figure: calculatedHead, shown: <Grade figure={calculatedHead} /> },
            ]}
            rowKey={({ name }) => name}
            columns={[
              { header: "what", width: "10em", cell: ({ name }) => name },
              {
                header: "value",
                unit: "%",
                number: true,
                width: "8em",
                cell: ({ shown }) => shown,
              },
              { header: "formula, and the numbers in it", cell: ({ figure }) => <Working figure={figure} /> },
            ]}
          />
          <Balance account={account} />
          {closed && (
            <Note className="pt-1">
              Adjusted by least squares, each number moved by its own uncertainty; it closed at{" "}
              {withUnit(fixed(closed.closure, 2), "%")}. The raw numbers stay as they are.
            </Note>
          )}
        </div>
        {curve.length > 0 && (
          <div>
            <SectionHead className="mt-6" aside="measured head, samples counted">
              Extraction by sample
            </SectionHead>
            <ExtractionCurve curve={curve} metal={metal} />
          </div>
        )}
      </div>
      <Missing missing={missing} />
      <NumbersUsed figures={[...bases, accountability, calculatedHead]} />
    </>
  );
}

/** Fed, dissolved, left: raw, and adjusted so that in equals out. */
function Balance({ account }: { account: MetalAccount }) {
  const { metal, fed, dissolved, inResidue, closed } = account;
  const adjusted = (x: number | undefined) => (x === undefined ? "" : withUnit(significant(x, 5), "g"));
  return (
    <div className="pt-3">
      <PlainTable
        caption="Balance"
        rows={[
          { name: `${metal} fed`, raw: massText(fed), adjusted: adjusted(closed?.feed) },
          { name: "dissolved", raw: massText(dissolved), adjusted: adjusted(closed?.solution) },
          { name: "left in the residue", raw: massText(inResidue), adjusted: adjusted(closed?.residue) },
        ]}
        rowKey={({ name }) => name}
        columns={[
          { header: "balance", cell: ({ name }) => name },
          { header: "raw", number: true, width: "10em", cell: ({ raw }) => raw },
          { header: "adjusted", number: true, width: "10em", cell: (row) => row.adjusted },
        ]}
      />
    </div>
  );
}
