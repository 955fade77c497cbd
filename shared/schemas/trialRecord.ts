import { z } from "./z";
import { readEntry } from "../entry/readEntry";
import { entryOf, solidAssays, solutionAssays } from "./entry";

const text = (max: number) => z.string().trim().max(max);

/** Potential as the meter showed it, with the reference it was read against. */
export const orpReading = z
  .object({
    value: entryOf("potential"),
    /** a series of electrodes.csv as `AGCL-3M`, or `SHE` for a meter that converts by itself */
    electrode: text(40).min(1).nullable().default(null),
    /** of the reference itself, which a cooled bridge keeps apart from the pulp; blank: that of the pulp */
    electrodeTemperature: entryOf("temperature"),
  })
  .superRefine(({ value, electrode }, context) => {
    if (electrode === null && readEntry(value.text).kind !== "blank")
      context.addIssue({
        code: "custom",
        path: ["electrode"],
        message: `ORP ${value.text.trim()} ${value.unit} has no reference electrode; name the one it was read against, as AGCL-3M, or SHE`,
      });
  });

/** pH with the temperature it was read at: of the pulp, or of a sample that had cooled. */
export const pHReading = z.object({
  value: entryOf("pH"),
  temperature: entryOf("temperature"),
  /** read in a cooled sample: plotted at its own temperature with a mark, never corrected */
  cooledSample: z.boolean().default(false),
});

const blankPH = { value: { text: "", unit: "pH" }, temperature: { text: "", unit: "C" }, cooledSample: false };
const blankOrp = {
  value: { text: "", unit: "mV" },
  electrode: null,
  electrodeTemperature: { text: "", unit: "C" },
};

/** One look at the vessel. */
export const reading = z.object({
  /** since the start */
  at: entryOf("time", "h"),
  /** of the pulp */
  temperature: entryOf("temperature"),
  pH: pHReading.default(blankPH),
  orp: orpReading.default(blankOrp),
  note: text(500).default(""),
});

export const doseRoles = ["acid", "base", "oxidant", "reductant", "lixiviant", "other"] as const;

/** A reagent added: the whole of it is the sum of its doses. */
export const dose = z.object({
  role: z.enum(doseRoles),
  /** what it is, by formula where it has one: `H2SO4`, `NaCN`, `NaClO3`, `air` */
  reagent: text(60).min(1),
  amount: entryOf("amount"),
  /** blank: as pure */
  strength: entryOf("strength"),
  /** of the reagent, where it was measured by volume */
  density: entryOf("density"),
  at: entryOf("time", "h"),
  /** initial, pH control, ORP control, top-up */
  reason: text(120).default(""),
});

/** Zinc dust, scrap iron and the like. */
export const cementingMetal = z.object({
  metal: text(20).min(1),
  dosed: entryOf("mass"),
  /** metal in it; blank: all of it */
  active: entryOf("share"),
  /** left over, as found in the cement */
  unreacted: entryOf("mass"),
});

export const ligandTotal = z.object({
  /** as the plan names it: `S`, `NH3`, `CN`, `Cl` */
  component: text(20).min(1),
  value: entryOf("solutionAssay", "mol/L"),
});

const conditions = {
  ligands: z.array(ligandTotal).max(20).default([]),
  doses: z.array(dose).max(200).default([]),
  cementingMetal: cementingMetal.nullable().default(null),
  /** solids in the pulp; measured: blank, it follows from the charge */
  solids: entryOf("solids"),
  p80: entryOf("size"),
  duration: entryOf("time", "h"),
};

export const planned = z.object({
  temperature: entryOf("temperature"),
  pH: entryOf("pH"),
  orp: orpReading.default(blankOrp),
  /** as H2SO4 or what the acid is */
  freeAcid: entryOf("solutionAssay"),
  /** of the stage's target in the final liquor */
  tenor: entryOf("solutionAssay"),
  ...conditions,
});
/** What held. T, pH and ORP stand in the readings, free acid and tenor among the assays. */
export const measured = z.object({ readings: z.array(reading).max(500).default([]), ...conditions });

export const charge = z.object({
  wetMass: entryOf("mass"),
  /** water of the wet mass; blank: that of the feed */
  moisture: entryOf("share"),
  /** blank: worked out from wet mass and moisture */
  dryMass: entryOf("mass"),
  /** liquor at the start: the lixiviant, or the solution to be purified; water carried by the feed counts beside it */
  liquorVolume: entryOf("volume", "L"),
  liquorDensity: entryOf("density"),
  liquorAssays: solutionAssays,
});

/** Liquor taken out of the vessel, and what was put back. */
export const sample = z.object({
  at: entryOf("time", "h"),
  volume: entryOf("volume"),
  assays: solutionAssays,
  /** "" and 0 differ: blank is not known, 0 is nothing put back */
  makeUpVolume: entryOf("volume"),
  /** of the make-up liquor; an analyte not listed is taken as absent from it */
  makeUpAssays: solutionAssays,
  /** dry solids that went with a slurry sample, kept in the account as a small residue */
  drySolids: entryOf("mass"),
  solidsAssays: solidAssays,
});

export const products = z.object({
  /** liquor in the vessel at the end, before filtering; blank: start less samples plus make-up */
  vesselVolume: entryOf("volume", "L"),
  filtrateVolume: entryOf("volume", "L"),
  /** density of the final liquor, for ppm */
  liquorDensity: entryOf("density"),
  finalAssays: solutionAssays,
  washVolume: entryOf("volume", "L"),
  washAssays: solutionAssays,
  /** residue of a leach, cement of a cementation */
  residueDryMass: entryOf("mass"),
  residueAssays: solidAssays,
});

export type OrpReading = z.output<typeof orpReading>;
export type PHReading = z.output<typeof pHReading>;
export type TrialReading = z.output<typeof reading>;
export type Dose = z.output<typeof dose>;
export type DoseRole = (typeof doseRoles)[number];
export type CementingMetal = z.output<typeof cementingMetal>;
export type LigandTotal = z.output<typeof ligandTotal>;
export type Planned = z.output<typeof planned>;
export type Measured = z.output<typeof measured>;
export type Charge = z.output<typeof charge>;
export type Sample = z.output<typeof sample>;
export type Products = z.output<typeof products>;
