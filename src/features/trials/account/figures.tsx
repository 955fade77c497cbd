import { isExact, type Interval } from "../../../../shared/entry/interval";
import type { Figure } from "../../../../shared/metallurgy/account/ledger";
import { fixed, significant, withUnit } from "../../../lib/format";

/** An interval with fixed digits: "86.26", "84.10 to 88.20", "12.3 or more". */
export function rangeText({ lo, hi }: Interval, digits: number): string {
  if (lo === hi) return fixed(lo, digits);
  return hi === Infinity ? `${fixed(lo, digits)} or more` : `${fixed(lo, digits)} to ${fixed(hi, digits)}`;
}

/** Five figures, for masses one wants to check by hand. */
export const massText = (i: Interval | null): string =>
  i === null
    ? "open"
    : isExact(i)
      ? withUnit(significant(i.lo, 5), "g")
      : `${significant(i.lo, 4)} to ${i.hi === Infinity ? "any" : withUnit(significant(i.hi, 4), "g")}`;

const Open = () => <span className="font-sans text-muted">open</span>;

/** A figure of an account, or that it is still open. */
export const Value = ({ figure: { value }, digits }: { figure: Pick<Figure, "value">; digits: number }) =>
  value === null ? <Open /> : <>{rangeText(value, digits)}</>;

/** A grade in %, with no more figures than it has. */
export function Grade({ figure: { value } }: { figure: Pick<Figure, "value"> }) {
  if (value === null) return <Open />;
  const text = (x: number) => String(Number((100 * x).toPrecision(5)));
  return <>{value.lo === value.hi ? text(value.lo) : `${text(value.lo)} to ${text(value.hi)}`}</>;
}

const lowered: Readonly<Record<string, string>> = { "\u2080": "0", "\u2098": "m" };

/** The formulas of the core write V₀ and cₘ; on the page those are true subscripts. */
const Formula = ({ text }: { text: string }) => (
  <>{text.split(/([\u2080\u2098])/).map((part, i) => (lowered[part] ? <sub key={i}>{lowered[part]}</sub> : part))}</>
);

/** How a figure was come by: the formula, and the same with the numbers in. */
export function Working({ figure }: { figure: Pick<Figure, "formula" | "worked" | "missing"> }) {
  return (
    <div className="font-mono text-xs leading-4">
      <div className="text-muted">
        <Formula text={figure.formula} />
      </div>
      {figure.worked !== null ? (
        <div className="break-words">{figure.worked}</div>
      ) : (
        <div className="font-sans text-sm text-muted">
          {figure.missing.length === 0
            ? "cannot be worked out from these numbers"
            : `missing: ${figure.missing.map(({ label }) => label).join(", ")}`}
        </div>
      )}
    </div>
  );
}
