import type { CementationAccount } from "../../../../shared/metallurgy/account/cementationAccount";
import type { Interval } from "../../../../shared/entry/interval";
import { FormulaText } from "../../../components/FormulaText";
import { PlainTable } from "../../../components/PlainTable";
import { Note, SectionHead } from "../../../components/text";
import { capital, fixed, withUnit } from "../../../lib/format";
import { massText, rangeText, Value, Working } from "./figures";
import { BasesTable, Flags, Missing, NumbersUsed } from "./parts";

/** What became of one metal in a cementation, and of the metal that won it. */
export function CementationSheet({ account }: { account: CementationAccount }) {
  const { metal, cementing, bases, accountability, ratioDosed, ratioConsumed, stoichiometric, theoretical } = account;
  const quoted = bases.find(({ value }) => value !== null);
  const fold = (x: Interval | null) => (x === null ? "open" : rangeText(x, 2));
  return (
    <>
      <p className="measure text-lg">
        {quoted?.value ? (
          <>
            {withUnit(rangeText(quoted.value, 1), "%")} of the {metal} was won, by {quoted.name}
            {ratioConsumed.value && cementing !== null && (
              <>
                , for {withUnit(rangeText(ratioConsumed.value, 2), "kg")} of {cementing} a kilogram
              </>
            )}
            .
          </>
        ) : (
          <>No recovery of {metal} can be worked out yet.</>
        )}
      </p>
      <Flags flags={account.flags} />

      <SectionHead className="mt-6">Recovery</SectionHead>
      <BasesTable bases={bases} word="recovery" />

      <div className="grid gap-x-10 lg:grid-cols-2">
        <div>
          <SectionHead className="mt-6" aside="95 to 105 % is good, common practice">
            Account
          </SectionHead>
          <PlainTable
            caption="Account"
            rows={[{ name: "Accountability", figure: accountability }]}
            rowKey={({ name }) => name}
            columns={[
              { header: "what", width: "9em", cell: ({ name }) => name },
              {
                header: "value",
                unit: "%",
                number: true,
                width: "8em",
                cell: ({ figure }) => <Value figure={figure} digits={2} />,
              },
              { header: "formula, and the numbers in it", cell: ({ figure }) => <Working figure={figure} /> },
            ]}
          />
          <div className="pt-3">
            <PlainTable
              caption="Balance"
              rows={[
                { name: `${metal} fed`, grams: account.fed },
                { name: "still in solution", grams: account.left },
                { name: "in the cement", grams: account.inCement },
                { name: "won, by solution", grams: account.won },
              ]}
              rowKey={({ name }) => name}
              columns={[
                { header: "balance", cell: ({ name }) => name },
                { header: "raw", number: true, width: "14em", cell: ({ grams }) => massText(grams) },
              ]}
            />
          </div>
        </div>
        <div>
          <SectionHead className="mt-6">{cementing ?? "Cementing metal"}</SectionHead>
          <PlainTable
            caption="Cementing metal"
            rows={[
              { name: "dosed", figure: ratioDosed, excess: account.excessDosed },
              { name: "consumed", figure: ratioConsumed, excess: account.excessConsumed },
            ]}
            rowKey={({ name }) => name}
            columns={[
              { header: "per kg won", width: "7em", cell: ({ name }) => name },
              {
                header: "ratio",
                unit: "kg/kg",
                number: true,
                cell: ({ figure }) => <Value figure={figure} digits={3} />,
              },
              { header: "excess", unit: "× theory", number: true, cell: ({ excess }) => fold(excess) },
              { header: "formula, and the numbers in it", cell: ({ figure }) => <Working figure={figure} /> },
            ]}
          />
          <Note className="pt-1">
            {stoichiometric !== null && cementing !== null && (
              <>
                By stoichiometry {withUnit(fixed(stoichiometric, 3), `kg ${cementing}/kg ${metal}`)} for this metal
                alone; theory counts everything the liquor lost
                {theoretical.value && `: ${massText(theoretical.value)}`}.
              </>
            )}
          </Note>
          {account.split.length > 0 && (
            <div className="pt-3">
              <PlainTable
                caption={`Where the ${cementing ?? "metal"} went`}
                rows={account.split}
                rowKey={({ by }) => by ?? "rest"}
                columns={[
                  {
                    header: `where the ${cementing ?? "metal"} went`,
                    cell: ({ by, note }) => (
                      <>
                        {by !== null && <FormulaText text={by} />}{" "}
                        <span className="text-muted">{by === null ? capital(note) : note}</span>
                      </>
                    ),
                  },
                  { header: "grams", number: true, width: "14em", cell: ({ grams }) => massText(grams) },
                ]}
              />
            </div>
          )}
        </div>
      </div>
      <Missing missing={account.missing} />
      <NumbersUsed figures={[...bases, accountability, ratioDosed, ratioConsumed]} />
    </>
  );
}
