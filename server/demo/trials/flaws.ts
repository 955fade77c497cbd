import type { DemoTrial } from "./trials";

type Assay = NonNullable<NonNullable<DemoTrial["products"]>["finalAssays"]>[number];

/** A number multiplied where it stands, with its figures and its decimal sign. */
function scaled(text: string, factor: number): string {
  const value = Number(text.replace(",", "."));
  if (text.startsWith("<") || Number.isNaN(value)) return text;
  const decimals = text.split(/[.,]/)[1]?.length ?? 0;
  const written = (value * factor).toFixed(decimals);
  return text.includes(",") ? written.replace(".", ",") : written;
}
const assaysTimes = (list: Assay[] | undefined, factor: number): Assay[] =>
  (list ?? []).map((a) => ({ ...a, value: a.value && { ...a.value, text: scaled(a.value.text, factor) } }));

const finalTimes =
  (factor: number) =>
  (t: DemoTrial): DemoTrial => ({
    ...t,
    status: "balanced",
    products: { ...t.products, finalAssays: assaysTimes(t.products?.finalAssays, factor) },
  });

/** The converted potential's scale written against the raw reading: 207 mV off. */
const asIfSHE = (t: DemoTrial): DemoTrial => ({
  ...t,
  status: "balanced",
  measured: {
    ...t.measured,
    readings: (t.measured?.readings ?? []).map((r) => ({
      ...r,
      orp: { ...r.orp, electrode: "SHE", electrodeTemperature: { text: "", unit: "C" } },
    })),
  },
});

const rejected =
  (reason: string) =>
  (t: DemoTrial): DemoTrial => ({ ...t, status: "rejected", statusReason: reason });

const awaitingAssay = (t: DemoTrial): DemoTrial => ({
  ...t,
  status: "awaiting assay",
  products: { ...t.products, finalAssays: [], washAssays: [], residueAssays: [] },
  samples: (t.samples ?? []).map((s) => ({ ...s, assays: [] })),
});
const running = (t: DemoTrial): DemoTrial => ({ ...awaitingAssay(t), status: "running", endedAt: null, products: {} });
const onlyPlanned = (t: DemoTrial): DemoTrial => ({
  ...t,
  status: "planned",
  startedAt: null,
  endedAt: null,
  measured: {},
  charge: {},
  samples: [],
  products: {},
});

/** What went wrong, as it does: the record alone shows it. */
const flaws: Record<string, (t: DemoTrial) => DemoTrial> = {
  "NL-1-06": finalTimes(0.94), // the filtrate was assayed after the wash had gone in
  "NL-1-15": asIfSHE,
  "NL-2-04": finalTimes(1.06), // evaporated in the vial
  "NL-2-07": rejected("Reactor overflowed at 40 minutes; volumes unknown."),
  "OX-1-20": asIfSHE,
  "OX-1-21": (t) => ({
    ...t,
    status: "balanced",
    products: { ...t.products, vesselVolume: { text: "1.150", unit: "L" } },
  }),
  "NL-2-19": awaitingAssay,
  "NL-2-20": running,
  "OX-1-22": onlyPlanned,
  "ZD-1-22": awaitingAssay,
};

/** The trial with its flaw, where it has one. */
export const spoil = (trial: DemoTrial): DemoTrial => flaws[trial.code]?.(trial) ?? trial;
