import { z } from "./z";
import { hazardGases } from "../hazards/gases";
import { speciesRow } from "./chemistry";

export const roles = ["target", "gangue", "watched"] as const;
export const requirements = ["dissolved", "solid", "metal", "compound", "free"] as const;
export type Requirement = (typeof requirements)[number];
/** Range of the temperature models, C (docs/method.md, section 1). */
export const TEMPERATURE_RANGE_C = { min: 0, max: 250 } as const;
export const solidsBases = ["feed", "fresh", "aged"] as const;

/** A species a problem brings along: the columns of the tables, the unknown ones left away. */
const ownSpecies = z.preprocess(
  (row) =>
    typeof row === "object" && row !== null
      ? {
          name: "",
          grade: "C",
          source: "",
          note: "",
          ion_class: "",
          dHf_kJ: "",
          S_J: "",
          Cp_J: "",
          Cp_a: "",
          Cp_b: "",
          Cp_c: "",
          Cp_Tmax_K: "",
          ...row,
        }
      : row,
  speciesRow,
);

const positive = z.number().positive();
/** A side of the frame: within what any liquor could be asked about, and not thinner than a reading can tell. */
const range = (low: number, high: number, least: number) => {
  const end = z.number().min(low).max(high);
  return z
    .tuple([end, end])
    .refine(([lo, hi]) => lo < hi, { message: "the lower end must stand below the upper end" })
    .refine(([lo, hi]) => !(lo < hi) || hi - lo >= least, { message: `the ends must stand at least ${least} apart` });
};

export const metalInput = z
  .strictObject({
    element: z.string().min(1),
    requirement: z.enum(requirements),
    role: z.enum(roles).optional(),
    /** what the liquor must carry (target), the most that may dissolve (gangue), the most that may remain (won out) */
    activity: positive.max(100).optional(),
    /** tenor in g/L instead of an activity; molality x gamma becomes the activity */
    gPerL: positive.min(1e-12).max(1000).optional(),
    /** activity coefficient for gPerL; 1 when absent */
    gamma: positive.min(1e-6).max(100).optional(),
  })
  .refine((m) => (m.activity === undefined) !== (m.gPerL === undefined), {
    message: "give either activity or gPerL, not both and not neither",
    path: ["activity"],
  });

export const componentTotal = z.object({ component: z.string().min(1), activity: positive.max(100) });

export const frameSchema = z.object({ pH: range(-10, 30, 0.01), Eh: range(-10, 10, 0.001) });
export const waterSchema = z.object({
  /** which lines bound windows; the band is always drawn */
  bound: z.enum(["both", "upper", "lower", "none"]),
  /** overpotential of oxygen evolution, V, raises the upper line */
  oxygenV: z.number().min(0).max(2).optional(),
  /** overpotential of hydrogen on the named cementing metal, V, lowers the lower line */
  hydrogenV: z.number().min(0).max(2).optional(),
});
/** how far a real loop strays, to either side */
export const controlBandSchema = z.object({ pH: positive.min(0.001).max(5), Eh: positive.min(0.0001).max(1) });

/** A gas whose ground is kept out of windows: where its equilibrium pressure over the liquor reaches `bar` (absent: the usual threshold of
 *  hazards/thresholds.ts), or, for HCN, below the pH a site never goes under. */
export const excludedHazard = z
  .strictObject({
    gas: z.enum(hazardGases),
    bar: positive.min(1e-30).max(1e4).optional(),
    pHAtLeast: z.number().min(7).max(14).optional(),
  })
  .refine((h) => h.bar === undefined || h.pHAtLeast === undefined, {
    message: "give either bar or pHAtLeast, not both",
    path: ["pHAtLeast"],
  })
  .refine((h) => h.pHAtLeast === undefined || h.gas === "HCN", {
    message: "a pH rule is for HCN alone; other gases are kept out by a pressure in bar",
    path: ["pHAtLeast"],
  });
export type ExcludedHazard = z.infer<typeof excludedHazard>;
export const excludedHazards = z.array(excludedHazard).superRefine((list, context) => {
  for (const [i, { gas }] of list.entries())
    if (list.findIndex((h) => h.gas === gas) < i)
      context.addIssue({ code: "custom", path: [i, "gas"], message: `${gas} is kept out twice` });
});

/** The solver's question. Same body for the CLI, POST /api/solve, the browser and a frozen revision. Potentials in V vs SHE at T.
 *  A key it does not know is refused, so that a misspelt option cannot pass for its default. */
export const problemSchema = z.strictObject({
  temperatureC: z.number().min(TEMPERATURE_RANGE_C.min).max(TEMPERATURE_RANGE_C.max),
  metals: z.array(metalInput).min(1).max(16),
  ligands: z.array(componentTotal.strict()),
  others: z.array(componentTotal.strict()).optional(),
  sulfateReduction: z.boolean().optional(),
  solidsBasis: z.enum(solidsBases).optional(),
  /** minerals named for the feed: stay in whatever the basis says */
  feedMinerals: z.array(z.string()).optional(),
  /** reagents dosed, as defaults.csv names them: persulfate, chlorate, peroxide, sulfite, nitrate, dithionite */
  dosed: z.array(z.string()).optional(),
  leftOut: z.array(z.string()).optional(),
  /** put back whatever the basis or the defaults leave out */
  putBack: z.array(z.string()).optional(),
  only: z.array(z.string()).optional(),
  species: z.array(ownSpecies).optional(),
  frame: frameSchema.strict(),
  water: waterSchema.strict().optional(),
  /** gases whose ground windows keep out of; absent: none */
  excludedHazards: excludedHazards.optional(),
  controlBand: controlBandSchema.strict(),
});
export type Problem = z.infer<typeof problemSchema>;
export type MetalInput = z.infer<typeof metalInput>;
export type ComponentTotal = z.infer<typeof componentTotal>;
export type Frame = z.infer<typeof frameSchema>;
