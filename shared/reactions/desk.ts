import { energiesAt } from "../gibbs/energies";
import { fail, ok, type Outcome } from "../outcome";
import { reactionInput, type TemperatureSeries } from "../schemas/reaction";
import { failureOf } from "../selection/prepare";
import type { ChemicalData } from "../species/chemicalData";
import { kelvin } from "../units";
import { equationOf, reactionAtT, valuesAt, type ReactionAtT, type ReactionValues } from "./atTemperature";
import { readReaction } from "./readReaction";

/** The same reaction over a range of temperatures.
 *  @param data  the library     @param species  coefficients by id     @param series  C, both ends included where the step fits
 *  @returns  one row a temperature, rising; failures as `reactionAtT`     @source  as `reactionAtT` */
export function reactionSeries(
  data: ChemicalData,
  species: Readonly<Record<string, number>>,
  series: TemperatureSeries,
): Outcome<ReactionValues[]> {
  const input = { species, temperatureC: series.fromC, series };
  const parsed = reactionInput.safeParse(input);
  if (!parsed.success) return failureOf(parsed.error, input);
  const equation = equationOf(data, species);
  if (!equation.ok) return equation;
  const count = Math.floor((series.toC - series.fromC) / series.stepC + 1e-9) + 1;
  return ok(
    Array.from({ length: count }, (_, i) => {
      const temperatureC = Math.min(series.toC, Number((series.fromC + i * series.stepC).toPrecision(12)));
      return valuesAt(data, equation.value, energiesAt(data, kelvin(temperatureC)), temperatureC);
    }),
  );
}

export interface DeskAnswer extends ReactionAtT {
  /** what the reading of a typed reaction chose: "O2 read as O2(g)" */
  readonly assumed: readonly string[];
  readonly series?: readonly ReactionValues[];
}

/** The reaction desk: a question as the command line, the API and the screen send it.
 *  @param data  the library     @param input  anything; must be a `reactionInput`: species or a typed reaction, T, perhaps a series
 *  @returns  numbers with dG_kJ, logK and E0_V first; failures of `readReaction` and `reactionAtT`     @source  as `reactionAtT` */
export function reactionDesk(data: ChemicalData, input: unknown): Outcome<DeskAnswer> {
  const parsed = reactionInput.safeParse(input);
  if (!parsed.success) return failureOf(parsed.error, input);
  const { species: given, reaction, temperatureC, series } = parsed.data;
  const read = given === undefined ? readReaction(data, reaction ?? "") : ok({ species: given, assumed: [] });
  if (!read.ok) return read;
  const { species, assumed } = read.value;
  const single = reactionAtT(data, { species, temperatureC });
  // What was typed as text is wrong in the text.
  if (!single.ok) return given === undefined ? fail(single.error.code, "reaction", single.error.message) : single;
  const rows = series === undefined ? ok(undefined) : reactionSeries(data, species, series);
  if (!rows.ok) return rows;
  return ok({ ...single.value, assumed, ...(rows.value === undefined ? {} : { series: rows.value }) });
}
