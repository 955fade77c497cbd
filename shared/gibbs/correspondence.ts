import { T_REFERENCE } from "../constants";
import type { ChemicalTables } from "../schemas/chemistry";
import { monotoneCubic, type MonotoneCubic } from "./monotone";

export type IonClass = "cation" | "anion" | "oxyanion" | "acid_oxyanion";
const classes: readonly IonClass[] = ["cation", "anion", "oxyanion", "acid_oxyanion"];

/** Conventional entropy as a + b S25 - z h, S25 being the absolute entropy at 25 C: the three factors at one T, or their integrals. */
export interface Correspondence {
  readonly a: number;
  readonly b: number;
  readonly h: number;
}

interface Nodes {
  readonly a: MonotoneCubic;
  readonly b: MonotoneCubic;
  /** at 60 C, for the mean below 25 C */
  readonly a60: number;
  readonly b60: number;
}
interface Table {
  readonly ofClass: Readonly<Record<IonClass, Nodes>>;
  readonly h: MonotoneCubic;
  readonly h25: number;
  readonly h60: number;
}

const T60 = 333.15; // K
const parsed = new WeakMap<ChemicalTables["correspondence"], Table>();

function tableOf(rows: ChemicalTables["correspondence"]): Table {
  const known = parsed.get(rows);
  if (known !== undefined) return known;
  const column = (ionClass: string, pick: "a_T_J_mol_K" | "b_T" | "S_abs_H_J_mol_K") => {
    const nodes = rows.filter((r) => r.ion_class === ionClass).sort((p, q) => p.T_K - q.T_K);
    const x = nodes.map((r) => r.T_K);
    const y = nodes.map((r) => r[pick] ?? Number.NaN);
    return {
      cubic: monotoneCubic(x, y),
      at60: y[x.indexOf(T60)] ?? Number.NaN,
      at25: y[x.indexOf(T_REFERENCE)] ?? Number.NaN,
    };
  };
  const nodesOf = (ionClass: IonClass): Nodes => {
    const a = column(ionClass, "a_T_J_mol_K");
    const b = column(ionClass, "b_T");
    return { a: a.cubic, b: b.cubic, a60: a.at60, b60: b.at60 };
  };
  const h = column("H^+", "S_abs_H_J_mol_K");
  const ofClass = Object.fromEntries(classes.map((c) => [c, nodesOf(c)])) as Record<IonClass, Nodes>;
  const table = { ofClass, h: h.cubic, h25: h.at25, h60: h.at60 };
  parsed.set(rows, table);
  return table;
}

/** Absolute entropy at 25 C of an ion from the conventional one of the tables.
 *  @param S  J/(mol K), S of H^+ = 0     @param z  charge     @returns  J/(mol K)
 *  @source  C. M. Criss and J. W. Cobble, J. Am. Chem. Soc. 86, 5385 (1964): absolute S of H^+(aq) -5.0 cal/(mol K)
 *  @example absoluteEntropy(-99.6, 2) // => -141.44 */
export const absoluteEntropy = (S: number, z: number): number => S - 20.92 * z;

/** The factors of the entropy correspondence at T: S_conv(T) = a + b S_abs(25) - z h. Above 25 C a(T), b(T) and the absolute entropy of H^+
 *  are monotone cubics through the table's nodes; below it the heat capacity is the mean over 25 to 60 C.
 *  @param rows  criss-cobble.csv     @param ionClass  of the ion     @param T  K, 273.15 to 523.15 (extrapolated beyond 473.15)
 *  @returns  a and h in J/(mol K), b without unit
 *  @source  C. M. Criss and J. W. Cobble, J. Am. Chem. Soc. 86, 5385 and 5390 (1964) */
export function correspondenceAt(
  rows: ChemicalTables["correspondence"],
  ionClass: IonClass,
  T: number,
): Correspondence {
  const table = tableOf(rows);
  const nodes = table.ofClass[ionClass];
  if (T >= T_REFERENCE) return { a: nodes.a.at(T), b: nodes.b.at(T), h: table.h.at(T) };
  return towards60(table, nodes, Math.log(T / T_REFERENCE) / Math.log(T60 / T_REFERENCE), 1);
}

/** The same factors integrated from 298.15 K to T, exactly: the integral of S_conv dT is a + b S_abs(25) - z h.
 *  @param rows  criss-cobble.csv     @param ionClass  of the ion     @param T  K, 273.15 to 523.15
 *  @returns  a and h in J/mol, b in K     @source  as `correspondenceAt` */
export function correspondenceIntegral(
  rows: ChemicalTables["correspondence"],
  ionClass: IonClass,
  T: number,
): Correspondence {
  const table = tableOf(rows);
  const nodes = table.ofClass[ionClass];
  if (T >= T_REFERENCE) return { a: nodes.a.integral(T), b: nodes.b.integral(T), h: table.h.integral(T) };
  const weight = (T * Math.log(T / T_REFERENCE) - T + T_REFERENCE) / Math.log(T60 / T_REFERENCE);
  return towards60(table, nodes, weight, T - T_REFERENCE);
}

/** From the values at 25 C (a = 0, b = 1) a share of the way to those at 60 C. */
const towards60 = (table: Table, nodes: Nodes, share: number, whole: number): Correspondence => ({
  a: nodes.a60 * share,
  b: whole + (nodes.b60 - 1) * share,
  h: table.h25 * whole + (table.h60 - table.h25) * share,
});
