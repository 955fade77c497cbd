import { Link } from "react-router-dom";
import type { AccountFlag } from "../../../../shared/metallurgy/account/flags";
import { onceEach, type Figure, type MissingInput } from "../../../../shared/metallurgy/account/ledger";
import type { RecoveryBasis } from "../../../../shared/metallurgy/account/metalAccount";
import { PlainTable } from "../../../components/PlainTable";
import { SectionHead } from "../../../components/text";
import { classes } from "../../../lib/classes";
import { capital, fixed, MINUS, significant } from "../../../lib/format";
import { sectionOf } from "../model/trialWords";
import { Value, Working } from "./figures";

/** All bases side by side, the one to quote first. */
export function BasesTable({ bases, word }: { bases: readonly RecoveryBasis[]; word: string }) {
  const quoted = bases.find(({ value }) => value !== null);
  return (
    <PlainTable
      caption={`${word} on every basis`}
      rows={bases}
      rowKey={({ id }) => id}
      columns={[
        {
          header: "basis",
          width: "11em",
          cell: (b) => <span className={classes(b === quoted && "font-bold")}>{b.name}</span>,
        },
        {
          header: word,
          unit: "%",
          number: true,
          width: "9em",
          cell: (b) => (
            <span className={classes("whitespace-nowrap", b === quoted && "text-lg font-bold")}>
              <Value figure={b} digits={2} />
            </span>
          ),
        },
        {
          header: "±",
          number: true,
          width: "4em",
          cell: (b) => (b.error === null ? "" : fixed(b.error, 2)),
        },
        { header: "formula, and the numbers in it", cell: (b) => <Working figure={b} /> },
      ]}
    />
  );
}

const alarming = new Set<AccountFlag["code"]>(["ACCOUNT_LOW", "ACCOUNT_HIGH", "BEYOND_BOUNDS", "BASES_APART"]);

/** What stands out, worst first, with the likeliest causes in sentences. */
export function Flags({ flags }: { flags: readonly AccountFlag[] }) {
  return (
    <>
      {flags.map(({ code, text, causes }) => (
        <div
          key={`${code} ${text}`}
          className={classes(
            "mt-2 max-w-[860px] border-l-4 bg-sheet px-3 py-1.5 text-sm",
            alarming.has(code) ? "border-signal" : "border-ink",
          )}
        >
          <p className={alarming.has(code) ? "font-bold" : undefined}>{capital(text)}.</p>
          {causes.length > 0 && (
            <>
              <p className="pt-1 text-muted">Likeliest first:</p>
              <ol className="list-decimal pl-5">
                {causes.map((cause) => (
                  <li key={cause}>{capital(cause)}.</li>
                ))}
              </ol>
            </>
          )}
        </div>
      ))}
    </>
  );
}

/** What the account still needs; each leads to where it is entered. */
export function Missing({ missing }: { missing: readonly MissingInput[] }) {
  if (missing.length === 0) return null;
  return (
    <>
      <SectionHead className="mt-6" aside={String(missing.length)}>
        Still missing
      </SectionHead>
      <ul className="max-w-[860px]">
        {missing.map(({ path, label, why }) => (
          <li key={path} className="hairline py-1 text-sm">
            <Link to={{ search: "", hash: sectionOf(path) }} className="no-underline hover:underline">
              {label}
            </Link>
            <span className="text-muted">: {why}</span>
          </li>
        ))}
      </ul>
    </>
  );
}

/** Every number the account used: as typed, and what it is in the base unit. */
export function NumbersUsed({ figures }: { figures: readonly Pick<Figure, "used">[] }) {
  const used = onceEach(...figures.map((f) => f.used));
  if (used.length === 0) return null;
  return (
    <details className="mt-6">
      <summary className="font-mono text-sm font-bold">The {used.length} numbers behind it</summary>
      <div className="max-w-[860px] pt-1">
        <PlainTable
          caption="Numbers used"
          rows={used}
          rowKey={({ path }) => path}
          columns={[
            { header: "what", cell: ({ label, assumed }) => (assumed ? <i>{label}, assumed</i> : label) },
            { header: "as typed", number: true, width: "16em", cell: ({ typed }) => typed },
            {
              header: "taken as",
              number: true,
              width: "14em",
              cell: ({ value, unit }) =>
                `${significant(value.lo, 6)}${value.lo === value.hi ? "" : ` to ${significant(value.hi, 6)}`} ${unit}`.replace(
                  "-",
                  MINUS,
                ),
            },
          ]}
        />
      </div>
    </details>
  );
}
