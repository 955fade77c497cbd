import { z } from "./z";
import { pageQuery } from "./api";
import { charge, measured, planned, products, sample } from "./trialRecord";

const text = (max: number) => z.string().trim().max(max);
/** ISO 8601 with an offset: a bench in another time zone is still the same instant. */
const instant = z.iso.datetime({ offset: true }).nullable();

export const trialKinds = ["leach", "cementation"] as const;
export type TrialKind = (typeof trialKinds)[number];
export const trialStatuses = ["planned", "running", "awaiting assay", "balanced", "approved", "rejected"] as const;
export type TrialStatus = (typeof trialStatuses)[number];

const rejectionHasReason = (
  { status, statusReason }: { status?: TrialStatus; statusReason?: string },
  context: z.RefinementCtx,
): void => {
  if (status === "rejected" && !statusReason)
    context.addIssue({ code: "custom", path: ["statusReason"], message: "a rejected trial needs the reason" });
};

const trialFields = {
  feedId: z.string().min(1),
  /** unique within the campaign: "NL-07" */
  code: text(24).min(1),
  kind: z.enum(trialKinds),
  /** code of a stage of the campaign */
  stage: text(12).min(1),
  status: z.enum(trialStatuses),
  statusReason: text(500),
  operator: text(120),
  startedAt: instant,
  endedAt: instant,
  /** id of the trial this one repeats */
  replicateOf: z.string().min(1).nullable(),
  planned,
  measured,
  charge,
  samples: z.array(sample).max(200),
  products,
  notes: text(4000),
};

/** A trial may be saved half complete; accounts list what they still need. */
export const trialCreate = z
  .object({
    campaignId: z.string().min(1),
    ...trialFields,
    status: trialFields.status.default("planned"),
    statusReason: trialFields.statusReason.default(""),
    operator: trialFields.operator.default(""),
    startedAt: instant.default(null),
    endedAt: instant.default(null),
    replicateOf: trialFields.replicateOf.default(null),
    planned: planned.prefault({}),
    measured: measured.prefault({}),
    charge: charge.prefault({}),
    samples: trialFields.samples.default([]),
    products: products.prefault({}),
    notes: trialFields.notes.default(""),
  })
  .superRefine(rejectionHasReason);

/** Only what is given changes; `planned`, `measured`, `charge`, `samples` and `products` are each replaced as a whole. */
export const trialUpdate = z.object(trialFields).partial().superRefine(rejectionHasReason);

export type TrialCreate = z.output<typeof trialCreate>;
/** A create row as a client or a generator writes it, blanks left away. */
export type TrialInput = z.input<typeof trialCreate>;
/** What accounts and maps need of a trial. */
export type Trial = Omit<TrialCreate, "campaignId" | "feedId">;

/** The figures a list sorts by, worked out with the trial's own numbers; null where the record is not complete enough. */
export interface TrialFigures {
  /** of the stage's target, on `recoveryBasis`; % */
  recoveryPct: number | null;
  /** both ends of the interval where an assay was censored, else null */
  recoveryRangePct: [number, number] | null;
  recoveryBasis: string | null;
  /** of the stage's gangue metal, same default basis; % */
  gangueDissolvedPct: number | null;
  /** target recovery less gangue dissolved, in points */
  selectivityPct: number | null;
  accountabilityPct: number | null;
  /** kg/t of dry feed, gross */
  acidPerTonne: number | null;
  /** leach: kg acid per kg of target dissolved; cementation: kg cementing metal per kg of target won */
  reagentPerKg: number | null;
  pH: number | null;
  pHCooled: boolean;
  /** V vs SHE */
  Eh: number | null;
  /** +- V */
  EhUncertainty: number | null;
  temperatureC: number | null;
  /** what stands out: account outside 95 to 105 %, missing electrode and the like, in sentences */
  flags: string[];
}

/** As the server answers. */
export interface TrialRow extends TrialCreate {
  id: string;
  campaignCode: string;
  feedName: string;
  invented: boolean;
  version: number;
  createdAt: string; // ISO 8601
  updatedAt: string;
  deletedAt: string | null;
  figures: TrialFigures;
}

export const trialSorts = [
  "code",
  "status",
  "stage",
  "operator",
  "startedAt",
  "updatedAt",
  "recoveryPct",
  "gangueDissolvedPct",
  "selectivityPct",
  "accountabilityPct",
  "acidPerTonne",
  "reagentPerKg",
  "pH",
  "Eh",
  "temperatureC",
] as const;

export const trialsQuery = pageQuery.extend({
  projectId: z.string().min(1).optional(),
  campaignId: z.string().min(1).optional(),
  feedId: z.string().min(1).optional(),
  kind: z.enum(trialKinds).optional(),
  stage: z.string().min(1).optional(),
  status: z.enum(trialStatuses).optional(),
  /** part of a code, an operator or the notes */
  search: z.string().trim().max(80).optional(),
  deleted: z.enum(["true", "false", "all"]).default("false"),
  sort: z.enum(trialSorts).default("updatedAt"),
  order: z.enum(["asc", "desc"]).default("desc"),
});
