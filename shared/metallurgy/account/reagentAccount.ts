import { minus, over, times, type Interval } from "../../entry/interval";
import type { Feed } from "../../schemas/feed";
import type { Trial } from "../../schemas/trial";
import { acidPerMetal } from "../acid";
import { cementationElectrons } from "../cementation";
import { molarMass, type MolarMasses } from "../molarMass";
import { Ledger, onceEach, type Figure, type MissingInput } from "./ledger";
import { reagentUse, type ReagentUse } from "./reagentUse";
import { chargedSolids } from "./solids";
import { say, sayRange } from "./words";

export interface ReagentRow extends ReagentUse {
  /** kg/t of dry feed; added counts what the starting liquor brought */
  readonly addedPerTonne: Figure;
  readonly consumedPerTonne: Figure;
  /** kg/kg of the metal dissolved or won */
  readonly addedPerKg: Figure;
  readonly consumedPerKg: Figure;
}

/** Where the acid went, kg/t of dry feed. */
export interface AcidShares {
  readonly gross: Interval;
  /** to bring the metal out of its oxide */
  readonly metal: Interval;
  /** gangue and iron: what is left of the gross; iron that hydrolysed gave some back */
  readonly gangueAndIron: Interval;
  /** gross less what solvent extraction gives back with the metal; for copper only */
  readonly netAfterExtraction: Interval | null;
}

export interface ReagentAccount {
  readonly rows: readonly ReagentRow[];
  /** null without acid, dry feed or dissolved metal */
  readonly acid: AcidShares | null;
  readonly missing: readonly MissingInput[];
}

/** Assayed in a liquor these are reagents, whether dosed or not. */
const reagentAnalytes = new Set(["H2SO4", "HCl", "HNO3", "NaCN", "NaOH", "NH3", "NaClO3", "H2O2", "Na2CO3"]);

function perFigure(
  grams: Interval | null,
  per: Interval | null,
  factor: number,
  unit: string,
  formula: string,
  ledgers: Ledger[],
): Figure {
  const ledger = new Ledger();
  ledger.used.push(...onceEach(...ledgers.map((l) => l.used)));
  ledger.missing.push(...onceEach(...ledgers.map((l) => l.missing)));
  const value = grams && per && per.lo > 0 ? times(over(grams, per), factor) : null;
  const shown = factor === 1 ? "" : `${say(factor)} × `;
  return ledger.figure(
    unit,
    formula,
    value,
    value && `${shown}${sayRange(grams!)} / ${sayRange(per!)} = ${sayRange(value, 4)} ${unit}`,
  );
}

const ledgerOf = ({ used, missing }: Figure): Ledger => {
  const ledger = new Ledger();
  ledger.used.push(...used);
  ledger.missing.push(...missing);
  return ledger;
};

/** Reagents of a trial: added, left and consumed, per tonne of dry feed and per kg of metal; always both and always said which.
 *  @param trial, feed  records; the solids count in a leach only
 *  @param metal  dissolved or won, with how much: g, from the metal's own account     @param masses  g/mol
 *  @returns  g as pure, kg/t, kg/kg; what is missing is listed     @source  docs/accounts.md; practice-checks.json, F10 and F18 */
export function reagentAccount(
  trial: Trial,
  feed: Feed,
  metal: { readonly name: string; readonly grams: Interval | null },
  masses: MolarMasses,
): ReagentAccount {
  const solids = new Ledger();
  const charged = trial.kind === "leach" ? chargedSolids(trial, feed, solids) : null;
  const dry = charged && { lo: charged.dry, hi: charged.dry };
  const names = new Set([
    ...trial.measured.doses.map((d) => d.reagent),
    ...trial.charge.liquorAssays.map((a) => a.analyte).filter((a) => reagentAnalytes.has(a)),
  ]);
  const rows = [...names].map((name): ReagentRow => {
    const use = reagentUse(trial, name, charged?.water ?? 0, masses);
    const [added, consumed] = [ledgerOf(use.dosed), ledgerOf(use.consumed)];
    return {
      ...use,
      addedPerTonne: perFigure(use.available, dry, 1000, "kg/t", "added / dry feed", [added, solids]),
      consumedPerTonne: perFigure(use.consumed.value, dry, 1000, "kg/t", "consumed / dry feed", [consumed, solids]),
      addedPerKg: perFigure(use.available, metal.grams, 1, "kg/kg", `added / ${metal.name}`, [added]),
      consumedPerKg: perFigure(use.consumed.value, metal.grams, 1, "kg/kg", `consumed / ${metal.name}`, [consumed]),
    };
  });
  const acid = rows.find((r) => r.reagent === "H2SO4")?.consumedPerTonne.value ?? null;
  return {
    rows,
    acid: acid && dry && metal.grams ? acidShares(acid, dry, metal.name, metal.grams, masses) : null,
    missing: onceEach(...rows.map((r) => r.consumed.missing), rows.length > 0 ? solids.missing : []),
  };
}

function acidShares(
  gross: Interval,
  dry: Interval,
  metal: string,
  grams: Interval,
  masses: MolarMasses,
): AcidShares | null {
  const charge = cementationElectrons[metal];
  if (charge === undefined || !molarMass(metal, masses).ok) return null;
  const demand = times(over(grams, dry), 1000 * acidPerMetal(metal, charge, masses));
  const rest = minus(gross, demand);
  return { gross, metal: demand, gangueAndIron: rest, netAfterExtraction: metal === "Cu" ? rest : null };
}
