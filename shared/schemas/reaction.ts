import { z } from "./z";
import { TEMPERATURE_RANGE_C } from "./problem";

const { min, max } = TEMPERATURE_RANGE_C;
const temperature = z.number().min(min).max(max);
/** A table longer than this is no longer read. */
export const SERIES_POINTS = 501;

export const temperatureSeries = z
  .object({ fromC: temperature, toC: temperature, stepC: z.number().positive().max(max) })
  .refine((s) => s.fromC <= s.toC, { message: "the series must run upwards", path: ["toC"] })
  .refine((s) => (s.toC - s.fromC) / s.stepC < SERIES_POINTS, {
    message: `more than ${SERIES_POINTS} temperatures: take a larger step`,
    path: ["stepC"],
  });
export type TemperatureSeries = z.infer<typeof temperatureSeries>;

/** The reaction desk's question: coefficients by species id (products positive, `e^-` for electrons), or the reaction as text. */
export const reactionInput = z
  .object({
    species: z
      .record(
        z.string().min(1),
        z
          .number()
          .min(-1e6)
          .max(1e6)
          .refine((n) => n !== 0, { message: "a coefficient must not be zero" }),
      )
      .refine((s) => Object.keys(s).length > 0, { message: "a reaction needs species" })
      .optional(),
    reaction: z.string().min(1).max(1000).optional(),
    temperatureC: temperature,
    /** the same reaction over a range of temperatures */
    series: temperatureSeries.optional(),
  })
  .refine((r) => (r.species === undefined) !== (r.reaction === undefined), {
    message: "give either species or reaction, not both and not neither",
    path: ["species"],
  });
export type ReactionInput = z.infer<typeof reactionInput>;
