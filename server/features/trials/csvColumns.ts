import type { Entry } from "../../../shared/entry/readEntry";
import { headOf } from "../../../shared/metallurgy/account/solids";
import type { CampaignStage } from "../../../shared/schemas/campaign";
import type { FeedRow } from "../../../shared/schemas/feed";
import type { TrialRow } from "../../../shared/schemas/trial";
import type { TrialAcid } from "../../../shared/trials/trialAcid";
import type { Cell } from "../../http/csv";

/** A trial as exports read it. */
export interface ExportedTrial extends TrialRow {
  projectName: string;
  stageOf: CampaignStage | null;
  feedOf: Pick<FeedRow, "heads" | "moisture"> | null;
  replicateOfCode: string | null;
  electrode: string | null;
  /** "450 mV + 207 mV (Ag/AgCl, 3 mol/L KCl at 25 °C) = 657 mV vs SHE" */
  conversion: string | null;
  /** below pH 1.5: what was titrated, and what the pH stands for by the trial's own sulfate */
  acid: TrialAcid | null;
  formulaVersion: string;
}

interface Column {
  header: string;
  cell: (trial: ExportedTrial) => Cell;
}

const plain = (header: string, cell: Column["cell"]): Column[] => [{ header, cell }];

/** A typed number is two columns: the text to the character, and the unit it was typed in. */
const typed = (header: string, entry: (trial: ExportedTrial) => Entry | undefined): Column[] => [
  { header: `${header}, as typed`, cell: (trial) => entry(trial)?.text ?? null },
  { header: `${header}, unit`, cell: (trial) => (entry(trial)?.text ? (entry(trial)?.unit ?? null) : null) },
];

const identity: Column[][] = [
  plain("project", (t) => t.projectName),
  plain("campaign", (t) => t.campaignCode),
  plain("trial", (t) => t.code),
  plain("stage", (t) => t.stage),
  plain("kind", (t) => t.kind),
  plain("target metal", (t) => t.stageOf?.target ?? null),
  plain("gangue metal", (t) => t.stageOf?.gangue ?? null),
  plain("feed", (t) => t.feedName),
  plain("status", (t) => t.status),
  plain("reason of the status", (t) => t.statusReason),
  plain("operator", (t) => t.operator),
  plain("started", (t) => t.startedAt),
  plain("ended", (t) => t.endedAt),
  plain("repeats trial", (t) => t.replicateOfCode),
  plain("invented", (t) => t.invented),
];

const figures: Column[][] = [
  plain("recovery / %", (t) => t.figures.recoveryPct),
  plain("recovery, least / %", (t) => t.figures.recoveryRangePct?.[0] ?? null),
  plain("recovery, most / %", (t) => t.figures.recoveryRangePct?.[1] ?? null),
  plain("recovery by", (t) => t.figures.recoveryBasis),
  plain("gangue dissolved / %", (t) => t.figures.gangueDissolvedPct),
  plain("selectivity / points", (t) => t.figures.selectivityPct),
  plain("accountability / %", (t) => t.figures.accountabilityPct),
  plain("acid consumed / kg per t dry feed", (t) => t.figures.acidPerTonne),
  plain("acid or cementing metal / kg per kg", (t) => t.figures.reagentPerKg),
  plain("pH", (t) => t.figures.pH),
  plain("pH of a cooled sample", (t) => t.figures.pHCooled),
  plain("free acid at a pH below 1.5, titrated / g/L H2SO4", (t) => t.acid?.titrated ?? null),
  plain("free acid at a pH below 1.5, by pH, indicative / g/L H2SO4", (t) => t.acid?.byPH ?? null),
  plain("free acid, titrated less by pH / g/L H2SO4", (t) => t.acid?.difference ?? null),
  plain("Eh / V vs SHE", (t) => t.figures.Eh),
  plain("Eh uncertainty / +- V", (t) => t.figures.EhUncertainty),
  plain("reference electrode", (t) => t.electrode),
  plain("potential, as read and converted", (t) => t.conversion),
  plain("temperature / °C", (t) => t.figures.temperatureC),
  plain("what stands out", (t) => t.figures.flags.join("; ")),
  plain("formula version", (t) => t.formulaVersion),
];

/** What of the feed the figures rest on. */
const feed: Column[][] = [
  typed("head assay of the target metal", (t) => headOf(assaysOf(t, t.stageOf?.target))?.value),
  typed("head assay of the gangue metal", (t) => headOf(assaysOf(t, t.stageOf?.gangue))?.value),
  typed("moisture of the feed", (t) => t.feedOf?.moisture),
];
const assaysOf = ({ feedOf }: ExportedTrial, metal: string | null | undefined) =>
  feedOf?.heads.filter(({ element }) => element === metal) ?? [];

const planned: Column[][] = [
  typed("planned temperature", (t) => t.planned.temperature),
  typed("planned pH", (t) => t.planned.pH),
  typed("planned ORP", (t) => t.planned.orp.value),
  plain("planned ORP, electrode", (t) => t.planned.orp.electrode),
  typed("planned free acid", (t) => t.planned.freeAcid),
  typed("planned tenor", (t) => t.planned.tenor),
  typed("planned solids", (t) => t.planned.solids),
  typed("planned P80", (t) => t.planned.p80),
  typed("planned duration", (t) => t.planned.duration),
];

const recorded: Column[][] = [
  typed("solids", (t) => t.measured.solids),
  typed("P80", (t) => t.measured.p80),
  typed("duration", (t) => t.measured.duration),
  plain("readings", (t) => t.measured.readings.length),
  plain("doses", (t) => t.measured.doses.length),
  plain("samples", (t) => t.samples.length),
  plain("cementing metal", (t) => t.measured.cementingMetal?.metal ?? null),
  typed("cementing metal dosed", (t) => t.measured.cementingMetal?.dosed),
  typed("cementing metal, active share", (t) => t.measured.cementingMetal?.active),
  typed("cementing metal left over", (t) => t.measured.cementingMetal?.unreacted),
  typed("wet mass", (t) => t.charge.wetMass),
  typed("moisture", (t) => t.charge.moisture),
  typed("dry mass", (t) => t.charge.dryMass),
  typed("starting liquor", (t) => t.charge.liquorVolume),
  typed("starting liquor density", (t) => t.charge.liquorDensity),
  typed("liquor in the vessel at the end", (t) => t.products.vesselVolume),
  typed("filtrate", (t) => t.products.filtrateVolume),
  typed("final liquor density", (t) => t.products.liquorDensity),
  typed("wash", (t) => t.products.washVolume),
  typed("residue or cement, dry", (t) => t.products.residueDryMass),
];

const record: Column[][] = [
  plain("notes", (t) => t.notes),
  plain("version", (t) => t.version),
  plain("made at", (t) => t.createdAt),
  plain("changed at", (t) => t.updatedAt),
  plain("deleted at", (t) => t.deletedAt),
  plain("trial id", (t) => t.id),
];

/** What was assayed in the four streams of the account, by analyte. */
export const streams = {
  "starting liquor": (trial: Pick<TrialRow, "charge" | "products">) => trial.charge.liquorAssays,
  "final liquor": (trial: Pick<TrialRow, "charge" | "products">) => trial.products.finalAssays,
  wash: (trial: Pick<TrialRow, "charge" | "products">) => trial.products.washAssays,
  "residue or cement": (trial: Pick<TrialRow, "charge" | "products">) => trial.products.residueAssays,
};
export type Stream = keyof typeof streams;

/** The columns of a file of trials; what was assayed differs from file to file. */
export function trialColumns(analytes: Record<Stream, readonly string[]>): Column[] {
  const assays = (Object.keys(streams) as Stream[]).flatMap((stream) =>
    analytes[stream].flatMap((analyte) =>
      typed(`${stream}, ${analyte}`, (t) => streams[stream](t).find((assay) => assay.analyte === analyte)?.value),
    ),
  );
  return [...identity, ...figures, ...feed, ...planned, ...recorded].flat().concat(assays, record.flat());
}
