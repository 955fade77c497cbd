import type { ChemicalTables } from "../schemas/chemistry";

/** One potential of a table: C, mV versus SHE. */
export interface ElectrodePoint {
  readonly tC: number;
  readonly mV: number;
  readonly source: string;
  readonly grade: string;
}

/** A reference electrode or a check solution with its table. */
export interface ElectrodeSeries {
  /** of the rows, without the temperature: `AGCL-3M` */
  readonly id: string;
  /** for a list: `Ag/AgCl, 3 mol/L KCl` */
  readonly label: string;
  readonly points: readonly ElectrodePoint[];
  readonly note: string;
  /** table whose change with temperature stands in where this one has a single temperature, and says so */
  readonly changesLike: readonly ElectrodePoint[] | null;
}

type Rows = ChemicalTables["electrodes"];
/** The standard potential of Ag/AgCl: no half-cell one can buy, but the change with temperature that others borrow. */
const standard = "AGCL-E0";

const seriesId = (row: Rows[number]): string => row.id.replace(/-[^-]*$/, "");

function grouped(rows: Rows, kind: string): Map<string, Rows> {
  const groups = new Map<string, Rows>();
  for (const row of rows) {
    if (row.kind !== kind || row.versus !== "SHE") continue;
    const id = seriesId(row);
    groups.set(
      id,
      [...(groups.get(id) ?? []), row].sort((p, q) => p.T_C - q.T_C),
    );
  }
  return groups;
}

const pointsOf = (rows: Rows | undefined): ElectrodePoint[] =>
  (rows ?? []).map((r) => ({ tC: r.T_C, mV: r.E_mV, source: r.source, grade: r.grade }));

function seriesOf(rows: Rows, kind: string): ElectrodeSeries[] {
  const groups = grouped(rows, kind);
  const change = pointsOf(groups.get(standard));
  return [...groups].flatMap(([id, group]) => {
    const [first] = group;
    if (first === undefined || id === standard) return [];
    const borrows = group.length === 1 && first.note.includes(standard);
    return [
      {
        id,
        label: `${first.name}, ${first.filling_or_solution}`,
        points: pointsOf(group),
        note: [...new Set(group.map((r) => r.note).filter((n) => n !== ""))].join("; "),
        changesLike: borrows ? change : null,
      },
    ];
  });
}

const electrodeCache = new WeakMap<Rows, readonly ElectrodeSeries[]>();

/** The reference electrodes of the tables, in their order; the standard Ag/AgCl potential is none and left out.
 *  @param tables  of the library     @returns  series, at least one point each, by rising temperature
 *  @source  shared/data/electrodes.csv
 *  @example electrodeSeries(chemistry().tables).find((s) => s.id === "AGCL-3M").points.length // => 13 */
export function electrodeSeries(tables: Pick<ChemicalTables, "electrodes">): readonly ElectrodeSeries[] {
  let found = electrodeCache.get(tables.electrodes);
  if (found === undefined)
    electrodeCache.set(tables.electrodes, (found = seriesOf(tables.electrodes, "reference_electrode")));
  return found;
}

/** The ORP check solutions whose potential versus SHE is tabled.
 *  @param tables  of the library     @returns  series as `electrodeSeries`     @source  shared/data/electrodes.csv
 *  @example checkSolutions(chemistry().tables).find((s) => s.id === "ZOBELL").points.length // => 10 */
export const checkSolutions = (tables: Pick<ChemicalTables, "electrodes">): readonly ElectrodeSeries[] =>
  seriesOf(tables.electrodes, "redox_standard");
