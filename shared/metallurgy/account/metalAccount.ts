import { exactly, isExact, minus, over, plus, spanOf, times, type Interval } from "../../entry/interval";
import type { Feed } from "../../schemas/feed";
import type { Trial } from "../../schemas/trial";
import { closeAccount, type ClosedAccount } from "../closure";
import { extractionOnCalculatedHead } from "../extraction";
import type { MolarMasses } from "../molarMass";
import { calculatedHeadError, residueError, solutionError, usualErrors, type RelativeErrors } from "../recoveryError";
import { extractionCurve, type CurvePoint } from "./curve";
import { accountFlags, type AccountFlag } from "./flags";
import type { Figure, MissingInput } from "./ledger";
import { byFiltrate, bySolution, fedPart, joined, percent, residuePart, usable, type Part } from "./parts";
import { inProduct, say, sayRange } from "./words";

export type BasisId = "calculatedHead" | "residue" | "solution" | "filtrate" | "cement";

/** A recovery on one basis. */
export interface RecoveryBasis extends Figure {
  readonly id: BasisId;
  readonly name: string;
  /** one standard deviation in % absolute, first order; null without a value */
  readonly error: number | null;
}

/** The in = out balance of one metal in one trial, all bases side by side, the calculated head first. */
export interface MetalAccount {
  readonly metal: string;
  readonly bases: readonly RecoveryBasis[];
  /** g of metal: fed by the measured head, dissolved, left in the residue */
  readonly fed: Interval | null;
  readonly dissolved: Interval | null;
  readonly inResidue: Interval | null;
  readonly measuredHead: Figure;
  readonly calculatedHead: Figure;
  readonly accountability: Figure;
  /** raw and adjusted masses; null while something is missing or censored */
  readonly closed: (ClosedAccount & { readonly raw: { feed: number; solution: number; residue: number } }) | null;
  /** for contrast: what the final liquor alone would say, samples forgotten; % */
  readonly withoutSamples: Interval | null;
  readonly curve: readonly CurvePoint[];
  readonly flags: readonly AccountFlag[];
  /** what is still needed to close this account; empty when it is closed */
  readonly missing: readonly MissingInput[];
}

const errorOf = (value: Interval | null, s: (recovery: number) => number): number | null =>
  value !== null && isExact(value) ? s(value.lo) : null;

function basis(
  id: BasisId,
  name: string,
  formula: string,
  parts: readonly Part[],
  value: Interval | null,
  worked: string,
  error: (recovery: number) => number,
): RecoveryBasis {
  const found = joined(...parts).figure("%", formula, value, value && `${worked} = ${sayRange(value, 4)} %`);
  return { ...found, id, name, error: errorOf(found.value, error) };
}

/** The account of one metal in a leach trial: recoveries on the calculated head, by residue, by solution (withdrawn samples and
 *  their make-up counted) and by filtrate plus wash; calculated head, accountability, closure by weighted least squares,
 *  extraction at every sample; and what stands out. Censored assays give intervals. Nothing is thrown: what is not there is
 *  listed as missing.
 *  @param trial, feed  records     @param metal  element     @param masses  g/mol     @param errors  relative, for the error of each basis
 *  @returns  masses in g, recoveries in %, heads in g/g     @source  docs/accounts.md; practice-checks.json, F01 to F09 and F29 */
export function metalAccount(
  trial: Trial,
  feed: Feed,
  metal: string,
  masses: MolarMasses,
  errors: RelativeErrors = usualErrors,
): MetalAccount {
  const fed = fedPart(trial, feed, metal);
  const solution = bySolution(trial, metal, fed.water, masses);
  const filtrate = byFiltrate(trial, metal, fed.water, masses);
  const residue = residuePart(trial, metal);
  // The vessel balance unless only the filtrate was measured.
  const dissolved: Part = usable(solution.value) || !usable(filtrate.value) ? solution : filtrate;
  const [F, S, T] = [fed.value, dissolved.value, residue.value];

  const onHead =
    usable(S) && usable(T) ? spanOf([S], [T], ([s = 0], [t = 0]) => extractionOnCalculatedHead(s, t)) : null;
  const share = (part: Interval | null) => (usable(part) && F && F.lo > 0 ? percent(over(part, F)) : null);
  const left = share(T);
  const bases: RecoveryBasis[] = [
    basis("calculatedHead", "calculated head", "100 M / (M + T)", [dissolved, residue], onHead,
      S && T ? `M = ${dissolved.worked} = ${sayRange(S)} g; T = ${residue.worked} = ${sayRange(T)} g; 100 × ${inProduct(S)} / (${sayRange(S)} + ${sayRange(T)})` : "",
      (x) => calculatedHeadError(x, errors)),
    basis("residue", "residue", "100 (1 − T / F)", [fed, residue], left && minus(exactly(100), left),
      `100 × (1 − (${residue.worked}) / (${fed.worked}))`, (x) => residueError(x, errors)),
    basis("solution", "solution", "100 M / F, M = V c + Σ v c − V₀ c₀ − Σ u cₘ", [fed, solution], share(solution.value),
      `100 × (${solution.worked}) / (${fed.worked})`, (x) => solutionError(x, errors)),
    basis("filtrate", "filtrate and wash", "100 M / F, M = V c + W w + Σ v c − V₀ c₀ − Σ u cₘ", [fed, filtrate], share(filtrate.value),
      `100 × (${filtrate.worked}) / (${fed.worked})`, (x) => solutionError(x, errors)),
  ]; // prettier-ignore

  const out = usable(S) && usable(T) ? plus(S, T) : null;
  const head = joined(dissolved, residue, fed).figure("g/g", "(M + T) / m", out && fed.dry ? times(out, 1 / fed.dry) : null,
    out && fed.dry ? `(${sayRange(S!)} + ${sayRange(T!)}) / ${say(fed.dry)} = ${sayRange(times(out, 100 / fed.dry))} %` : null); // prettier-ignore
  const found = out && share(out);
  const account = joined(fed, dissolved, residue).figure("%", "100 (M + T) / F", found,
    found && `100 × (${sayRange(S!)} + ${sayRange(T!)}) / ${sayRange(F!)} = ${sayRange(found, 4)} %`); // prettier-ignore
  const measured = fed.ledger.figure("g/g", "as assayed", fed.head, fed.head && `${sayRange(percent(fed.head))} %`);

  return {
    metal,
    bases,
    fed: F,
    dissolved: S,
    inResidue: T,
    measuredHead: measured,
    calculatedHead: head,
    accountability: account,
    closed: closedOf(F, S, T, errors),
    withoutSamples: share(solution.withoutSamples),
    curve: solution.vessel && F && F.lo > 0 ? extractionCurve(solution.vessel, F) : [],
    flags: accountFlags(trial, metal, account, bases, fed.head?.lo ?? null, solution.vessel),
    missing: account.missing,
  };
}

function closedOf(
  F: Interval | null,
  S: Interval | null,
  T: Interval | null,
  e: RelativeErrors,
): MetalAccount["closed"] {
  if (!usable(F) || !usable(S) || !usable(T) || ![F, S, T].every(isExact) || F.lo <= 0) return null;
  const weighed = (value: number, ...r: number[]) => ({ value, s: Math.abs(value) * Math.hypot(...r) });
  return {
    ...closeAccount(
      weighed(F.lo, e.feedMass, e.head),
      weighed(S.lo, e.volume, e.solutionAssay),
      weighed(T.lo, e.residueMass, e.residueAssay),
    ),
    raw: { feed: F.lo, solution: S.lo, residue: T.lo },
  };
}
