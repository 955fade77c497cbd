import type { ElectrodeSeries } from "../electrodes/series";
import { isExact, middleOf, type Interval } from "../entry/interval";
import { cementationAccount } from "../metallurgy/account/cementationAccount";
import type { AccountFlag } from "../metallurgy/account/flags";
import { metalAccount, type RecoveryBasis } from "../metallurgy/account/metalAccount";
import { reagentAccount } from "../metallurgy/account/reagentAccount";
import type { MolarMasses } from "../metallurgy/molarMass";
import type { CampaignStage } from "../schemas/campaign";
import type { Feed } from "../schemas/feed";
import type { Trial, TrialFigures } from "../schemas/trial";
import { lastTemperature, measuredPoint } from "./measuredPoint";

/** The basis a trial is quoted by: the first that could be worked out, the calculated head before the others. */
export const quotedBasis = (bases: readonly RecoveryBasis[]): RecoveryBasis | null =>
  bases.find((b) => b.value !== null) ?? null;

const shown = (value: Interval | null | undefined): number | null => (value ? middleOf(value) : null);

/** Flags worth a line in a list; what was assumed or censored stands in the account itself. */
const listed = (flags: readonly AccountFlag[]): string[] =>
  flags.filter(({ code }) => code !== "ASSUMED" && code !== "CENSORED").map(({ text }) => text);

interface Quoted {
  readonly recovery: RecoveryBasis | null;
  readonly accountability: number | null;
  readonly gangue: number | null;
  readonly acidPerTonne: number | null;
  readonly reagentPerKg: number | null;
  readonly flags: readonly string[];
}

function leachFigures(trial: Trial, feed: Feed, stage: CampaignStage, masses: MolarMasses): Quoted {
  const account = metalAccount(trial, feed, stage.target, masses);
  const gangue = stage.gangue === null ? null : quotedBasis(metalAccount(trial, feed, stage.gangue, masses).bases);
  const reagents = reagentAccount(trial, feed, { name: stage.target, grams: account.dissolved }, masses);
  const acid = reagents.rows.find((r) => r.reagent === "H2SO4");
  return {
    recovery: quotedBasis(account.bases),
    accountability: shown(account.accountability.value),
    gangue: shown(gangue?.value),
    acidPerTonne: shown(acid?.consumedPerTonne.value),
    reagentPerKg: shown(acid?.consumedPerKg.value),
    flags: listed(account.flags),
  };
}

function cementationFigures(trial: Trial, stage: CampaignStage, masses: MolarMasses): Quoted {
  const account = cementationAccount(trial, stage.target, masses);
  return {
    recovery: quotedBasis(account.bases),
    accountability: shown(account.accountability.value),
    gangue: null,
    acidPerTonne: null,
    reagentPerKg: shown(account.ratioConsumed.value),
    flags: listed(account.flags),
  };
}

/** The figures a list sorts by and a map colours by, worked out from a trial's own record.
 *  @param trial, feed, stage  records     @param masses  g/mol     @param electrodes  of `electrodeSeries`
 *  @returns  null wherever the record is not complete enough; censored values by the middle of their interval, ends beside it
 *  @source  shared/metallurgy; the accounts themselves show every basis */
export function trialFigures(
  trial: Trial,
  feed: Feed,
  stage: CampaignStage,
  masses: MolarMasses,
  electrodes: readonly ElectrodeSeries[],
): TrialFigures {
  const quoted =
    trial.kind === "leach" ? leachFigures(trial, feed, stage, masses) : cementationFigures(trial, stage, masses);
  const { point, missing } = measuredPoint(trial, electrodes);
  const range = quoted.recovery?.value ?? null;
  const recoveryPct = shown(range);
  return {
    recoveryPct,
    recoveryRangePct: range === null || isExact(range) ? null : [range.lo, range.hi],
    recoveryBasis: quoted.recovery?.name ?? null,
    gangueDissolvedPct: quoted.gangue,
    selectivityPct: recoveryPct === null || quoted.gangue === null ? null : recoveryPct - quoted.gangue,
    accountabilityPct: quoted.accountability,
    acidPerTonne: quoted.acidPerTonne,
    reagentPerKg: quoted.reagentPerKg,
    pH: point?.pH ?? null,
    pHCooled: point?.cooledSample ?? false,
    Eh: point?.Eh ?? null,
    EhUncertainty: point?.EhUncertainty ?? null,
    temperatureC: point?.temperatureC ?? lastTemperature(trial),
    flags: [...quoted.flags, ...(trial.measured.readings.length > 0 ? missing.map((m) => `${m.label}: ${m.why}`) : [])],
  };
}
