import type { Interval } from "../../entry/interval";
import { numberIn } from "../../entry/measure";
import { readEntry } from "../../entry/readEntry";
import type { Trial } from "../../schemas/trial";
import { censoredInputs, onceEach, type Figure } from "./ledger";
import type { RecordedVessel } from "./liquor";
import { say, sayRange } from "./words";

export type AccountFlagCode =
  | "ACCOUNT_LOW" // less metal found than fed
  | "ACCOUNT_HIGH"
  | "BASES_APART" // solution and residue tell different stories
  | "BEYOND_BOUNDS" // a recovery under 0 or over 100 % by more than two standard deviations
  | "CENSORED"
  | "ASSUMED"
  | "WITHDRAWN"; // samples took a large part of the liquor

export interface AccountFlag {
  readonly code: AccountFlagCode;
  readonly text: string;
  /** likeliest first: what the record itself points at, then the usual ones */
  readonly causes: readonly string[];
}

/** Precious metals of low grade close less tightly: common practice, no source. */
const LOOSE = { metals: ["Au", "Ag", "Pd", "Pt"], belowGrade: 10e-6, range: [90, 110] as const };
const TIGHT = [95, 105] as const;

/** Range an account should close in: 95 to 105 %, 90 to 110 % for gold and its like under 10 g/t.
 *  @param metal  element     @param head  g/g     @returns  %     @source  common practice, no source
 *  @example closingRange("Zn", 0.5)[0] // => 95 */
export const closingRange = (metal: string, head: number | null): readonly [lo: number, hi: number] =>
  head !== null && LOOSE.metals.includes(metal) && head < LOOSE.belowGrade ? LOOSE.range : TIGHT;

const blank = (text: string) => readEntry(text).kind === "blank";
const hottest = (trial: Trial): number =>
  Math.max(
    -Infinity,
    ...[...trial.measured.readings.map((r) => r.temperature), trial.planned.temperature].flatMap(
      (t) => numberIn(t, "temperature") ?? [],
    ),
  );

/** What makes an account find too little, as seen in spreadsheets and benches: common practice, no source. */
function causesOfLow(trial: Trial): string[] {
  const { products } = trial;
  const seen = [
    blank(products.washVolume.text) && "the wash was not recorded: its metal is not in the account",
    !trial.samples.length && "no sample is recorded: withdrawn metal is left out",
    trial.samples.some((s) => blank(s.makeUpVolume.text)) && "what was put back after a sample is not recorded",
  ].filter((t) => t !== false);
  return [
    ...seen,
    "solids lost: stuck on the wall, through the filter, in slurry samples",
    "the solution vial was not acidified and iron hydrolysed in it, taking metal down",
    "the head assay is high or the charge is not of the sample assayed",
    "filtrate assayed after the wash had diluted it",
  ];
}

function causesOfHigh(trial: Trial): string[] {
  const { products, charge } = trial;
  const seen = [
    blank(products.vesselVolume.text) &&
      hottest(trial) >= 50 &&
      "the final volume was worked out, not measured: at this temperature evaporation concentrates the liquor",
    (blank(products.washVolume.text) || numberIn(products.washVolume, "volume") === 0) &&
      "the residue was not washed: the liquor in the cake is counted twice",
    blank(charge.dryMass.text) && "the dry mass was worked out from the moisture: wet and dry may be mixed",
  ].filter((t) => t !== false);
  return [
    ...seen,
    "the head assay is low or the charge is not of the sample assayed",
    "the residue was weighed wet",
    "evaporation, or a volume read warm",
    "the lixiviant or the make-up brought metal that is not in the record",
  ];
}

function closureFlag(trial: Trial, metal: string, accountability: Interval, head: number | null): AccountFlag[] {
  const [lo, hi] = closingRange(metal, head);
  const found = sayRange(accountability, 4);
  const text = `${found} % of the ${metal} fed was found again, outside ${lo} to ${hi} %: repeat the assay or the trial`;
  if (accountability.hi < lo) return [{ code: "ACCOUNT_LOW", text, causes: causesOfLow(trial) }];
  if (accountability.lo > hi) return [{ code: "ACCOUNT_HIGH", text, causes: causesOfHigh(trial) }];
  return [];
}

/** Two bases that cannot both be right. Five points, since each alone is good for about two (metallurgy/recoveryError.ts). */
function basesApart(solution: Interval, residue: Interval): AccountFlag[] {
  const gap = Math.max(solution.lo - residue.hi, residue.lo - solution.hi);
  if (!(gap > 5)) return [];
  const text = `by solution ${sayRange(solution, 4)} %, by residue ${sayRange(residue, 4)} %: ${say(gap, 2)} points apart, so neither may be quoted alone`;
  return [{ code: "BASES_APART", text, causes: [] }];
}

function withdrawnFlag(withdrawn: number, volume: number): AccountFlag[] {
  const share = (100 * withdrawn) / volume;
  if (share <= 10) return [];
  const text = `samples took ${say(share, 3)} % of the liquor; under 10 % keeps the trial itself undisturbed`;
  return [{ code: "WITHDRAWN", text, causes: [] }];
}

/** Everything that stands out in an account.
 *  @param bases  recoveries by id     @param head  g/g as measured     @param vessel  as recorded     @returns  worst first */
export function accountFlags(
  trial: Trial,
  metal: string,
  accountability: Figure,
  bases: readonly (Figure & { readonly id: string; readonly name: string; readonly error: number | null })[],
  head: number | null,
  vessel: RecordedVessel | null,
): AccountFlag[] {
  const valueOn = (id: string) => bases.find((b) => b.id === id)?.value ?? null;
  const [bySolution, byResidue] = [valueOn("solution"), valueOn("residue")];
  const used = onceEach(...bases.map((b) => b.used));
  const list = (code: AccountFlagCode, items: readonly string[], text: (joined: string) => string): AccountFlag[] =>
    items.length === 0 ? [] : [{ code, text: text(items.join("; ")), causes: [] }];
  return [
    ...(accountability.value ? closureFlag(trial, metal, accountability.value, head) : []),
    ...(bySolution && byResidue ? basesApart(bySolution, byResidue) : []),
    ...bases.flatMap(({ name, value, error }) =>
      value !== null && (value.hi < -2 * (error ?? 0) || value.lo > 100 + 2 * (error ?? 0))
        ? list(
            "BEYOND_BOUNDS",
            [`${sayRange(value, 4)} % by ${name}`],
            (t) => `${t}: further outside 0 to 100 % than measuring errors explain`,
          )
        : [],
    ),
    ...(vessel
      ? withdrawnFlag(
          vessel.taken.reduce((sum, t) => sum + t.volume, 0),
          vessel.volume,
        )
      : []),
    ...list(
      "CENSORED",
      censoredInputs(used).map((u) => `${u.label} ${u.typed}`),
      (t) => `kept as intervals: ${t}`,
    ),
    ...list(
      "ASSUMED",
      used.filter((u) => u.assumed).map((u) => `${u.label}: ${u.typed}`),
      (t) => t,
    ),
  ];
}
