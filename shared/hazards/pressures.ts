import type { Analysis } from "../analysis";
import { LN10 } from "../constants";
import type { Convex } from "../geometry/convex";
import { valueAt, type Line } from "../geometry/line";
import { formationOf } from "../planes/formation";
import { STEPS_PER_JOULE, type Basis } from "../planes/grid";
import { SULFIDE_SULFUR } from "../selection/components";
import { hazardGases, type HazardGas } from "./gases";

export { hazardGases, type HazardGas };

/** What pressures rest on: a problem as far as ligand cells and fields. */
export type Liquor = Pick<Analysis, "prepared" | "basis" | "cells" | "metals">;

/** The element or group a gas takes from the liquor; hydrogen needs nothing but water. */
const carrier: Readonly<Record<HazardGas, string | null>> = {
  HCN: "CN",
  H2S: "S",
  AsH3: "As",
  SbH3: "Sb",
  Cl2: "Cl",
  NH3: "NH3",
  H2: null,
};

/** A convex piece of the frame on which R T ln p is linear: value of `line` over `scale`, in steps of the grid. */
export interface PressurePiece {
  readonly piece: Convex;
  /** ligand cell it lies in, and where a metal carries the gas its ruling species there, as an index */
  readonly cell: number;
  readonly plane: number | null;
  readonly line: Line;
  readonly scale: number;
}

/** Equilibrium pressure of one gas over the frame. */
export interface GasPressure {
  readonly gas: HazardGas;
  /** R T in steps of the grid */
  readonly thermal: number;
  readonly pieces: readonly PressurePiece[];
  /** what stands for the gas's element in the plan: component or metal, and its total activity; null for hydrogen */
  readonly of: { readonly component: string; readonly activity: number } | null;
}

const id = (gas: HazardGas): string => `${gas}(g)`;

/** From a ligand: each cell's potential times the atoms the gas holds, less the gas itself. */
function overLigand(analysis: Liquor, gas: HazardGas, main: string, component: string): PressurePiece[] {
  const { basis, cells, prepared } = analysis;
  const { plane } = formationOf(gasSpecies(analysis, gas), main, 1, [], basis);
  return cells.flatMap(({ piece, holders }, cell) => {
    const held = holders.get(component)?.potential;
    if (held === undefined) throw new Error(`${component} of ${prepared.problem.temperatureC} C holds no cell`);
    const n = plane.atoms;
    const line: Line = [n * held.k - plane.k, n * held.x - plane.x, n * held.y - plane.y];
    return [{ piece, cell, plane: null, line, scale: 1 }];
  });
}

/** From a metal of the plan: the ruling species' plane per atom. */
function overMetal(analysis: Liquor, gas: HazardGas, element: string): PressurePiece[] {
  const metal = analysis.metals.find((m) => m.metal.element === element);
  const { plane: g } = formationOf(gasSpecies(analysis, gas), element, 1, [], analysis.basis);
  return (metal?.cells ?? []).flatMap(({ planes, pieces }, cell) =>
    pieces.flatMap(({ plane, piece }) => {
      const p = planes[plane];
      if (p === undefined) return [];
      const line: Line = [g.atoms * p.k - p.atoms * g.k, g.atoms * p.x - p.atoms * g.x, g.atoms * p.y - p.atoms * g.y];
      return [{ piece, cell, plane, line, scale: p.atoms }];
    }),
  );
}

function gasSpecies({ prepared }: Liquor, gas: HazardGas) {
  const species = prepared.data.species.get(id(gas));
  if (species === undefined) throw new Error(`the library holds no ${id(gas)}`);
  return species;
}

/** 2 H^+ + 2 e^- = H2: the gas's own energy cancels against the electron's. */
const hydrogen = (basis: Basis): Line => [0, -2 * basis.proton, -2 * basis.electron];

/** Totals that decide which gases a liquor can give off. */
export interface GasSources {
  readonly components: readonly string[];
  readonly metals: readonly string[];
  /** sulfate reduction: one pool of sulfur */
  readonly onePool: boolean;
}

const sourcesOf = ({ prepared }: Liquor): GasSources => ({
  components: prepared.components.map((c) => c.component),
  metals: prepared.metals.map((m) => m.element),
  onePool: prepared.sulfateReduction,
});

/** What stands for a gas's element in a liquor: a component, a metal, or nothing but water; or, in words, why there is nothing.
 *  @param sources  totals of the problem     @param gas  one of hazardGases
 *  @returns  `carrier`, null for hydrogen; or `absent` */
export function carrierOf(
  { components, metals, onePool }: GasSources,
  gas: HazardGas,
): { readonly carrier: string | null } | { readonly absent: string } {
  const main = carrier[gas];
  if (main === null || metals.includes(main)) return { carrier: main };
  const own = gas === "H2S" && (!onePool || components.includes(SULFIDE_SULFUR)) ? SULFIDE_SULFUR : main;
  return components.includes(own) ? { carrier: own } : { absent: `the plan holds no ${missing[gas]}` };
}

/** Equilibrium partial pressure of a gas over the plan's liquor at every point of the frame, R T ln p = sum of the potentials of its parts
 *  less G of the gas: linear on each ligand cell (or field of arsenic or antimony), so the pieces are exact. The totals are those of the
 *  plan: a liquor that has lost its gas, or a vessel that is swept, stands lower; a dead corner may stand there.
 *  @param liquor  of the plan     @param gas  one of hazardGases
 *  @returns  pieces that cover the frame, or in words why the plan gives no pressure
 *  @source  docs/method.md, section 10; the same planes as fields and cells */
export function gasPressure(liquor: Liquor, gas: HazardGas): GasPressure | { readonly absent: string } {
  const { basis, cells, prepared } = liquor;
  const thermal = basis.thermal * STEPS_PER_JOULE;
  const found = carrierOf(sourcesOf(liquor), gas);
  if ("absent" in found) return found;
  const { carrier: source } = found;
  if (source === null) {
    const pieces = cells.map(({ piece }, cell) => ({ piece, cell, plane: null, line: hydrogen(basis), scale: 1 }));
    return { gas, thermal, of: null, pieces };
  }
  const metal = prepared.metals.find((m) => m.element === source);
  if (metal !== undefined)
    return {
      gas,
      thermal,
      of: { component: source, activity: metal.activity },
      pieces: overMetal(liquor, gas, source),
    };
  const activity = prepared.components.find((c) => c.component === source)?.activity ?? 0;
  const main = source === SULFIDE_SULFUR ? "S" : source;
  return { gas, thermal, of: { component: source, activity }, pieces: overLigand(liquor, gas, main, source) };
}

const missing: Readonly<Record<HazardGas, string>> = {
  HCN: "cyanide",
  H2S: "sulfide sulfur",
  AsH3: "arsenic among its metals",
  SbH3: "antimony among its metals",
  Cl2: "chloride",
  NH3: "ammonia",
  H2: "water",
};

/** How far R T ln p stands above a threshold on one piece, in steps of the grid times `scale`. The threshold is rounded to the grid once, so
 *  that the heights of neighbouring pieces agree exactly on what they share.
 *  @param pressure  of a gas     @param piece  one of its pieces     @param bar  threshold, above zero
 *  @returns  a line, at least zero where the pressure reaches the threshold     @source  arithmetic */
export const heightOver = ({ thermal }: GasPressure, { line, scale }: PressurePiece, bar: number): Line => [
  line[0] - scale * Math.round(thermal * Math.log(bar)),
  line[1],
  line[2],
];

/** log10 of the pressure at one point: what is far below any limit would be no number in bar.
 *  @param pressure  of a gas     @param pH, Eh  V vs SHE at T     @returns  for p in bar; null outside the frame
 *  @source  as `gasPressure` */
export function logPressureAt(pressure: GasPressure, pH: number, Eh: number): number | null {
  const here = pressure.pieces.find(({ piece }) => piece.lines.every((l) => valueAt(l, pH, Eh) >= 0));
  return here === undefined ? null : valueAt(logPressureLine(pressure, here), pH, Eh);
}

/** The pressure at one point.
 *  @param pressure  of a gas     @param pH, Eh  V vs SHE at T     @returns  bar; null outside the frame
 *  @source  as `gasPressure` */
export function pressureAt(pressure: GasPressure, pH: number, Eh: number): number | null {
  const log = logPressureAt(pressure, pH, Eh);
  return log === null ? null : 10 ** log;
}

/** log10 of a pressure as a line on one piece: k + x pH + y Eh.
 *  @param pressure  of a gas     @param piece  one of its pieces     @returns  coefficients for p in bar     @source  arithmetic */
export const logPressureLine = ({ thermal }: GasPressure, { line, scale }: PressurePiece): Line => {
  const unit = thermal * scale * LN10;
  return [line[0] / unit, line[1] / unit, line[2] / unit];
};
