import { exactly, isExact, minus, over, plus, spanOf, times, type Interval } from "../../entry/interval";
import { numberIn } from "../../entry/measure";
import type { Trial } from "../../schemas/trial";
import { cementationElectrons, stoichiometricRatio } from "../cementation";
import { molarMass, type MolarMasses } from "../molarMass";
import { calculatedHeadError, residueError, solutionError, usualErrors, type RelativeErrors } from "../recoveryError";
import { consumedSplit, type ConsumedShare } from "./consumedSplit";
import { accountFlags, type AccountFlag } from "./flags";
import { Ledger, type Figure, type MissingInput } from "./ledger";
import { dissolvedRange, finalAssay, finalVolume, recordedVessel, type RecordedVessel } from "./liquor";
import type { RecoveryBasis } from "./metalAccount";
import { joined, percent, residuePart, usable, type Part } from "./parts";
import { inProduct, say, sayRange } from "./words";

/** What became of one metal and of the metal that won it. */
export interface CementationAccount {
  readonly metal: string;
  readonly cementing: string | null;
  /** calculated feed first: won / (won + left) from the cement's own assay, then by solution, then by cement */
  readonly bases: readonly RecoveryBasis[];
  /** g: in the liquor at the start with what make-up brought, still in solution, in the cement, won by solution */
  readonly fed: Interval | null;
  readonly left: Interval | null;
  readonly inCement: Interval | null;
  readonly won: Interval | null;
  readonly accountability: Figure;
  /** kg cementing metal per kg won: dosed, and consumed (dosed less unreacted) */
  readonly ratioDosed: Figure;
  readonly ratioConsumed: Figure;
  /** g of cementing metal dosed per L of starting liquor */
  readonly dosedPerLitre: number | null;
  /** kg/kg by stoichiometry for this metal alone */
  readonly stoichiometric: number | null;
  /** g by stoichiometry for everything the liquor lost */
  readonly theoretical: Figure;
  /** dosed and consumed over theoretical */
  readonly excessDosed: Interval | null;
  readonly excessConsumed: Interval | null;
  /** where the consumed metal went, g */
  readonly split: readonly ConsumedShare[];
  readonly flags: readonly AccountFlag[];
  readonly missing: readonly MissingInput[];
}

interface InLiquor extends Part {
  readonly vessel: RecordedVessel | null;
  readonly fed: Interval | null;
  readonly left: Interval | null;
  readonly fedWorked: string;
}

/** Metal in the liquor at the start and what of it is still dissolved, samples counted as still dissolved. */
function inLiquor(trial: Trial, metal: string, masses: MolarMasses): InLiquor {
  const ledger = new Ledger();
  const vessel = recordedVessel(trial, metal, 0, masses, ledger, true);
  const volume = vessel && finalVolume(trial, vessel, ledger);
  const final = finalAssay(trial, metal, masses, ledger);
  if (!vessel || volume === null || !final)
    return { value: null, ledger, worked: "", vessel, fed: null, left: null, fedWorked: "" };
  const brought = vessel.taken.map(({ makeUpVolume, makeUp }) => times(makeUp, makeUpVolume));
  const fed = plus(times(vessel.start, vessel.liquor), ...brought);
  const left = plus(times(final, volume), ...vessel.taken.map((t) => times(t.assay, t.volume)));
  const samples = vessel.taken.map((t) => ` + ${say(t.volume)} × ${inProduct(t.assay)}`).join("");
  const makeUps = vessel.taken
    .filter((t) => t.makeUp.hi > 0)
    .map((t) => ` + ${say(t.makeUpVolume)} × ${inProduct(t.makeUp)}`);
  return {
    value: times(dissolvedRange(vessel, volume, final), -1),
    ledger,
    vessel,
    fed,
    left,
    worked: `${say(volume)} × ${inProduct(final)}${samples}`,
    fedWorked: `${say(vessel.liquor)} × ${inProduct(vessel.start)}${makeUps.join("")}`,
  };
}

/** Metals of the starting liquor that can be won, with what was won of each; one that was not assayed at the end is left out. */
function everythingWon(trial: Trial, masses: MolarMasses, cementing: string): { metal: string; won: Interval }[] {
  return trial.charge.liquorAssays.flatMap(({ analyte }) => {
    if (analyte === cementing || cementationElectrons[analyte] === undefined || !molarMass(analyte, masses).ok)
      return [];
    const { value } = inLiquor(trial, analyte, masses);
    return usable(value) && value.hi > 0 ? [{ metal: analyte, won: { lo: Math.max(0, value.lo), hi: value.hi } }] : [];
  });
}

interface Cementing {
  readonly ledger: Ledger;
  readonly metal: string | null;
  readonly dosed: number | null;
}

/** Metal in what was dosed: mass times active share. */
function dosedMetal({ measured }: Trial): Cementing {
  const ledger = new Ledger();
  const cementing = measured.cementingMetal;
  if (cementing === null) {
    ledger.miss("measured.cementingMetal", "cementing metal", "not recorded");
    return { ledger, metal: null, dosed: null };
  }
  const mass = ledger.takeNumber("measured.cementingMetal.dosed", `${cementing.metal} dosed`, cementing.dosed, "mass");
  const active = numberIn(cementing.active, "share");
  if (active === null)
    ledger.assume(
      "measured.cementingMetal.active",
      "metal in what was dosed",
      1,
      "g/g",
      "not measured, taken as all of it",
    );
  else ledger.take("measured.cementingMetal.active", "metal in what was dosed", cementing.active, "share");
  return { ledger, metal: cementing.metal, dosed: mass === null ? null : mass * (active ?? 1) };
}

/** The account of one metal in a cementation trial: recovery on the calculated feed, by solution and by cement; accountability;
 *  metal ratio, excess and where the consumed metal went. Hydrogen is made where acid is left, and arsine or stibine where
 *  arsenic or antimony is about: site procedures and licensed practice decide.
 *  @param trial  record     @param metal  won     @param masses  g/mol     @param errors  relative     @returns  g, %, kg/kg
 *  @source  docs/accounts.md; practice-checks.json, F15 and F16: recovery = 100 (1 - V_f c_f / (V_0 c_0)), ratio = consumed / won, excess = ratio / stoichiometry */
export function cementationAccount(
  trial: Trial,
  metal: string,
  masses: MolarMasses,
  errors: RelativeErrors = usualErrors,
): CementationAccount {
  const liquor = inLiquor(trial, metal, masses);
  const cement = residuePart(trial, metal);
  const dust = dosedMetal(trial);
  const [F, left, T] = [liquor.fed, liquor.left, cement.value];
  const won = usable(liquor.value) ? liquor.value : null;

  const share = (part: Interval | null) => (usable(part) && F && F.lo > 0 ? percent(over(part, F)) : null);
  const lost = share(left);
  const bySolution = lost && minus(exactly(100), lost);
  const byCement = share(T);
  const onFeed =
    left && usable(T) && T.hi + left.hi > 0 ? spanOf([T], [left], ([t = 0], [l = 0]) => (100 * t) / (t + l)) : null;
  const error = (value: Interval | null, s: (x: number) => number) => (value && isExact(value) ? s(value.lo) : null);
  const basis = (id: RecoveryBasis["id"], name: string, formula: string, parts: Part[], value: Interval | null, worked: string, s: (x: number) => number): RecoveryBasis => {
    const figure = joined(...parts).figure("%", formula, value, value && `${worked} = ${sayRange(value, 4)} %`);
    return { ...figure, id, name, error: error(figure.value, s) };
  }; // prettier-ignore
  const bases = [
    basis("calculatedHead", "calculated feed", "100 T / (T + S)", [liquor, cement], onFeed,
      T && left ? `T = ${cement.worked} = ${sayRange(T)} g; S = ${liquor.worked} = ${sayRange(left)} g; 100 × ${inProduct(T)} / (${sayRange(T)} + ${sayRange(left)})` : "",
      (x) => calculatedHeadError(x, errors)),
    // What is left is a small assay: its error is that of a residue.
    basis("solution", "solution", "100 (1 − S / F), S = V c + Σ v c, F = V₀ c₀ + Σ u cₘ", [liquor], bySolution,
      `100 × (1 − (${liquor.worked}) / (${liquor.fedWorked}))`,
      (x) => residueError(x, { ...errors, residueMass: errors.volume, residueAssay: errors.solutionAssay, feedMass: errors.volume, head: errors.solutionAssay })),
    basis("cement", "cement", "100 T / F", [liquor, cement], byCement, `100 × (${cement.worked}) / (${liquor.fedWorked})`,
      (x) => solutionError(x, { ...errors, solutionAssay: errors.residueAssay, volume: errors.residueMass, feedMass: errors.volume, head: errors.solutionAssay })),
  ]; // prettier-ignore

  const found = left && usable(T) ? share(plus(left, T)) : null;
  const accountability = joined(liquor, cement).figure("%", "100 (S + T) / F", found,
    found && `100 × (${sayRange(left!)} + ${sayRange(T!)}) / ${sayRange(F!)} = ${sayRange(found, 4)} %`); // prettier-ignore

  const { metal: cementing, dosed } = dust;
  const consumption = consumedOf(trial, dust);
  const perWon = (mass: number | null) => (mass !== null && won && won.lo > 0 ? over(exactly(mass), won) : null);
  const ratio = (formula: string, parts: Part[], mass: number | null): Figure => {
    const value = perWon(mass);
    return joined(...parts).figure(
      "kg/kg",
      formula,
      value,
      value && `${say(mass!)} / ${sayRange(won!)} = ${sayRange(value, 4)} kg/kg`,
    );
  };
  const dustPart: Part = { value: null, ledger: dust.ledger, worked: "" };
  const everything = cementing === null ? [] : everythingWon(trial, masses, cementing);
  const theory = plus(...everything.map((e) => times(e.won, stoichiometricRatio(cementing!, e.metal, masses))));
  const theoretical = joined(liquor, dustPart).figure("g", "Σ won × stoichiometric ratio", everything.length > 0 ? theory : null,
    everything.map((e) => `${sayRange(e.won)} × ${say(stoichiometricRatio(cementing!, e.metal, masses))}`).join(" + ") + ` = ${sayRange(theory)} g`); // prettier-ignore
  const excess = (mass: number | null) => (mass !== null && theory.lo > 0 ? over(exactly(mass), theory) : null);
  const stoichiometric = cementing === null ? Number.NaN : stoichiometricRatio(cementing, metal, masses);

  return {
    metal,
    cementing,
    bases,
    fed: F,
    left,
    inCement: T,
    won,
    accountability,
    ratioDosed: ratio("dosed / won", [liquor, dustPart], dosed),
    ratioConsumed: ratio("consumed / won", [liquor, consumption], consumption.consumed),
    dosedPerLitre: dosed !== null && liquor.vessel ? dosed / liquor.vessel.liquor : null,
    stoichiometric: Number.isNaN(stoichiometric) ? null : stoichiometric,
    theoretical,
    excessDosed: excess(dosed),
    excessConsumed: excess(consumption.consumed),
    split:
      cementing === null || consumption.consumed === null
        ? []
        : consumedSplit(trial, cementing, consumption.consumed, everything, masses),
    flags: accountFlags(trial, metal, accountability, bases, null, liquor.vessel),
    missing: joined(liquor, consumption).missing,
  };
}

function consumedOf({ measured }: Trial, dust: Cementing): Part & { consumed: number | null } {
  const ledger = new Ledger();
  ledger.used.push(...dust.ledger.used);
  ledger.missing.push(...dust.ledger.missing);
  const cementing = measured.cementingMetal;
  const unreacted =
    cementing &&
    ledger.takeNumber("measured.cementingMetal.unreacted", `${cementing.metal} left over`, cementing.unreacted, "mass");
  const consumed = dust.dosed === null || unreacted === null ? null : dust.dosed - unreacted;
  return { value: null, ledger, worked: "", consumed };
}
