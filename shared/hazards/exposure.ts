import { LIMITS_ARE, SCREENING } from "./deference";
/** US exposure values, as the agencies publish them. `fromMemory`: not re-read when recorded. */
interface Limit {
  readonly authority: "NIOSH" | "OSHA" | "IDLH";
  readonly kind: "average" | "short-term" | "ceiling" | "peak" | "";
  readonly value: number;
  readonly unit: "ppm" | "mg/m3";
  /** averaging time of a ceiling or peak */
  readonly minutes?: number;
  readonly skin?: true;
  readonly fromMemory?: true;
}

export interface ExposureLimits {
  /** as it would be typed */
  readonly agent: string;
  readonly where: string;
  readonly limits: readonly Limit[];
  /** flammable range in air, % by volume */
  readonly flammable?: readonly [low: number, high: number];
  readonly source: string;
}

/** When the values below were recorded; they change, and other countries have others. */
export const EXPOSURE_RECORDED = "December 2026";

/** Stands beside every caution, region and limit. */
export const DEFERENCE = `${SCREENING} ${LIMITS_ARE}`;

const niosh = (value: number, kind: Limit["kind"] = "average", more: Partial<Limit> = {}): Limit => ({
  ...{ authority: "NIOSH", kind, value, unit: "ppm" },
  ...more,
});
const osha = (value: number, kind: Limit["kind"] = "average", more: Partial<Limit> = {}): Limit => ({
  ...niosh(value, kind, more),
  authority: "OSHA",
});
const idlh = (value: number, more: Partial<Limit> = {}): Limit => ({ ...niosh(value, "", more), authority: "IDLH" });
const memory = { fromMemory: true } as const;
const dust = { unit: "mg/m3" } as const;
const NIOSH_PAGES = "NIOSH and OSHA values";

/** Exposure values of what a leach circuit can give off.
 *  @source  NIOSH Pocket Guide and documentation, OSHA 29 CFR 1910.1000 and 1910.1026, as restated in the source of each row */
export const exposureLimits: readonly ExposureLimits[] = [
  {
    agent: "HCN",
    where: "cyanide below pH about 10-10.5; any acid",
    limits: [niosh(4.7, "short-term", { skin: true }), osha(10, "average", { skin: true }), idlh(50, memory)],
    source: "NIOSH 1988 PEL documentation, 74-90-8; OSHA value as restated in a hazard text",
  },
  {
    agent: "H2S",
    where: "acid on sulfides, sulfide precipitation",
    limits: [niosh(10, "ceiling", { minutes: 10 }), osha(20, "ceiling"), osha(50, "peak", { minutes: 10 }), idlh(100)],
    source: "NIOSH and OSHA limits tabulated in PMC5777517, table 3",
  },
  {
    agent: "AsH3",
    where: "zinc, iron or aluminium with acid and arsenic; arsenic-activated purification",
    limits: [niosh(0.002, "ceiling", { ...dust, minutes: 15 }), osha(0.05), idlh(3, memory)],
    source: "NIOSH IDLH documentation, arsine 7784-42-1",
  },
  {
    agent: "SbH3",
    where: "zinc, iron or aluminium with acid and antimony",
    limits: [niosh(0.1), osha(0.1), idlh(5)],
    source: "NIOSH Pocket Guide, stibine",
  },
  {
    agent: "Cl2",
    where: "chloride with a strong oxidant and acid; hydrochloric acid on lithium metal oxides",
    limits: [niosh(0.5, "ceiling", { minutes: 15 }), osha(1, "ceiling"), idlh(10)],
    source: "NIOSH Pocket Guide values as restated by a safety text",
  },
  {
    agent: "NH3",
    where: "ammoniacal circuits, hot, high pH",
    limits: [niosh(25), niosh(35, "short-term"), osha(50), idlh(300)],
    source: "NIOSH and OSHA values as restated by a state agricultural department",
  },
  {
    agent: "SO2",
    where: "reductive leach, cyanide destruction",
    limits: [
      niosh(2, "average", memory),
      niosh(5, "short-term", memory),
      osha(5, "average", memory),
      idlh(100, memory),
    ],
    source: NIOSH_PAGES,
  },
  {
    agent: "NO2",
    where: "nitric or nitrate leach",
    limits: [niosh(1, "short-term", memory), osha(5, "ceiling", memory), idlh(13, memory)],
    source: NIOSH_PAGES,
  },
  {
    agent: "H2SO4",
    where: "mist of electrowinning, curing, hot leach",
    limits: [
      niosh(1, "average", { ...dust, ...memory }),
      osha(1, "average", { ...dust, ...memory }),
      idlh(15, { ...dust, ...memory }),
    ],
    source: NIOSH_PAGES,
  },
  {
    agent: "O3",
    where: "ozone leach",
    limits: [niosh(0.1, "ceiling", memory), osha(0.1, "average", memory), idlh(5, memory)],
    source: NIOSH_PAGES,
  },
  {
    agent: "Cr(VI)",
    where: "chromite ores, oxidised alkaline liquors",
    limits: [
      niosh(0.0002, "average", { ...dust, ...memory }),
      osha(0.005, "average", { ...dust, ...memory }),
      idlh(15, { ...dust, ...memory }),
    ],
    source: "29 CFR 1910.1026; NIOSH 2013-128",
  },
  {
    agent: "Hg",
    where: "gold, amalgam residues, zinc-dust filters and retorts",
    limits: [
      niosh(0.05, "average", { ...dust, ...memory }),
      osha(0.1, "average", { ...dust, ...memory }),
      idlh(10, { ...dust, ...memory }),
    ],
    source: NIOSH_PAGES,
  },
  {
    agent: "As",
    where: "residues, cements, dried cakes",
    limits: [niosh(0.002, "ceiling", { ...dust, minutes: 15 }), osha(0.01, "average", dust), idlh(5, dust)],
    source: NIOSH_PAGES,
  },
  {
    agent: "Cd",
    where: "residues, cements, dried cakes",
    limits: [osha(0.005, "average", { ...dust, ...memory })],
    source: NIOSH_PAGES,
  },
  {
    agent: "Pb",
    where: "residues, cements, dried cakes",
    limits: [osha(0.05, "average", { ...dust, ...memory })],
    source: NIOSH_PAGES,
  },
  {
    agent: "H2",
    where: "cementation, acid on metals, electrowinning",
    limits: [],
    flammable: [4, 75],
    source: "from memory",
  },
];

export const exposureOf: ReadonlyMap<string, ExposureLimits> = new Map(exposureLimits.map((e) => [e.agent, e]));

/** The values of an agent in one sentence: "HCN: NIOSH 4.7 ppm short-term (skin), OSHA 10 ppm (skin), IDLH 50 ppm (from memory)."
 *  @param agent  as typed     @returns  the sentence with its date; null for an agent without values
 *  @source  the table above */
export function limitsText(agent: string): string | null {
  const row = exposureOf.get(agent);
  if (row === undefined) return null;
  const words = row.limits.map((l, i) => {
    const again = i > 0 && row.limits[i - 1]?.authority === l.authority;
    const time = l.minutes === undefined ? "" : ` (${l.minutes} min)`;
    const kind = l.kind === "average" || l.kind === "" ? "" : ` ${l.kind}`;
    const value = `${again ? "" : `${l.authority} `}${l.value} ${l.unit}${kind}${time}`;
    return `${value}${l.skin ? " (skin)" : ""}${l.fromMemory ? " (from memory)" : ""}`;
  });
  if (row.flammable)
    words.push(`flammable from ${row.flammable[0]} to ${row.flammable[1]} % by volume in air (from memory)`);
  return `${row.agent}: ${words.join(", ")}. US values, recorded ${EXPOSURE_RECORDED}.`;
}
