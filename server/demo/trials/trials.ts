import type { ElectrodeSeries } from "../../../shared/electrodes/series";
import type { TrialInput } from "../../../shared/schemas/trial";
import { cementationRecord } from "./cementationBench";
import { cementationTrials, leachTrials, type LaidOut } from "./designs";
import { ores } from "./feeds";
import { spoil } from "./flaws";
import { leachRecord } from "./leachBench";
import { seeded, type Random } from "./random";
import type { Hand } from "./typing";

export type DemoTrial = TrialInput & { id: string };

const hands: readonly (Hand & { operator: string })[] = [
  { operator: "Technician, day shift (invented)", comma: false },
  { operator: "Technician, late shift (invented)", comma: true },
];

const idOf = (campaign: string, code: string): string => `demo-trial-${campaign}-${code}`.toLowerCase();

/** Names, dates and status round a record. */
function framed(laid: LaidOut, campaign: string, n: number, hours: number, operator: string): Omit<DemoTrial, "kind"> {
  const code = `${campaign}-${String(n).padStart(2, "0")}`;
  const start = new Date(Date.parse(laid.day) + 6.5 * 3_600_000 + (n % 3) * 2 * 3_600_000);
  const end = new Date(start.getTime() + hours * 3_600_000);
  return {
    id: idOf(campaign, code),
    campaignId: `demo-campaign-${campaign.toLowerCase()}`,
    feedId: laid.feed,
    code,
    stage: laid.stage,
    status: "approved",
    operator,
    startedAt: start.toISOString(),
    endedAt: end.toISOString(),
    replicateOf:
      laid.repeats === undefined ? null : idOf(campaign, `${campaign}-${String(laid.repeats).padStart(2, "0")}`),
    notes: laid.note ?? "",
  };
}

/** Every campaign draws from its own stream, so that one can change without moving the others. */
function streams(seed: number): (campaign: string) => Random {
  const known = new Map<string, Random>();
  return (campaign) => {
    const found = known.get(campaign) ?? seeded(seed + [...campaign].reduce((sum, c) => sum * 31 + c.charCodeAt(0), 0));
    known.set(campaign, found);
    return found;
  };
}

/** The demo's trials as a technician typed them: invented, by the demo's own metallurgy, which knows nothing of diagrams or
 *  windows; a few are flawed, as real ones are.
 *  @param electrodes  of `electrodeSeries`     @param seed  any integer     @returns  create rows with fixed ids */
export function demoTrials(electrodes: readonly ElectrodeSeries[], seed = 2026): DemoTrial[] {
  const random = streams(seed);
  const electrode = (id: string): ElectrodeSeries => {
    const found = electrodes.find((e) => e.id === id);
    if (!found) throw new Error(`the demo needs electrode ${id}`);
    return found;
  };
  const leaches = leachTrials().map(({ laid, campaign, n, ...run }): DemoTrial => {
    const hand = hands[n % 2]!;
    const record = leachRecord(
      { ...run, ore: ores[run.ore], electrode: electrode(run.electrode), hand },
      random(campaign),
    );
    return { ...framed(laid, campaign, n, run.hours, hand.operator), kind: "leach", ...record };
  });
  const cementations = cementationTrials(random("ZD-1 liquor")).map(({ laid, campaign, n, ...run }): DemoTrial => {
    const hand = hands[n % 2]!;
    const record = cementationRecord({ ...run, electrode: electrode("AGCL-3M"), hand }, random(campaign));
    return { ...framed(laid, campaign, n, run.planned.minutes / 60, hand.operator), kind: "cementation", ...record };
  });
  return [...leaches, ...cementations].map(spoil);
}
