import { z } from "./z";

/** What stands around a leach and the chemistry does not say, but the caution rules ask about. */
export const circuitSchema = z.object({
  /** liquor of this step meets, or is recycled from, a solvent extraction organic */
  sxOrganic: z.boolean().optional(),
  /** oxygen partial pressure in the vessel, kPa absolute */
  oxygenKPa: z.number().min(0).max(10_000).optional(),
  /** oxidants, reductants and cementing metals in use, by the ids of reach/reagents.ts */
  reagents: z.array(z.string()).optional(),
});
export type Circuit = z.infer<typeof circuitSchema>;
