import type { SolidAssay, SolutionAssay } from "../../../../shared/schemas/entry";
import { commonUnit, relabelled, typedIn } from "./columnUnit";
import type { TrialValues } from "./trialValues";

type Assay = SolutionAssay | SolidAssay;

/** A line of the matrix of assays: one liquor or one solid of the trial. */
export interface AssayLine<A extends Assay> {
  id: string;
  name: string;
  /** quiet words behind the name: how much of it there is */
  note: string;
  assays: readonly A[];
  /** the trial with these assays on this line */
  put: (trial: TrialValues, assays: A[]) => TrialValues;
}

const volumeNote = ({ text, unit }: { text: string; unit: string }) =>
  text.trim() === "" ? "" : `${text.trim()} ${unit}`;

/** The liquors of a trial in the order they come: start, each sample and its make-up, final, wash. */
export function liquorsOf(trial: TrialValues): AssayLine<SolutionAssay>[] {
  const { charge, samples, products } = trial;
  return [
    {
      id: "start",
      name: trial.kind === "leach" ? "Lixiviant" : "Starting liquor",
      note: volumeNote(charge.liquorVolume),
      assays: charge.liquorAssays,
      put: (t, liquorAssays) => ({ ...t, charge: { ...t.charge, liquorAssays } }),
    },
    ...samples.flatMap((sample, i): AssayLine<SolutionAssay>[] => [
      {
        id: `sample-${i}`,
        name: `Sample ${i + 1}`,
        note: [volumeNote(sample.at), volumeNote(sample.volume)].filter(Boolean).join(", "),
        assays: sample.assays,
        put: (t, assays) => ({ ...t, samples: t.samples.map((s, k) => (k === i ? { ...s, assays } : s)) }),
      },
    ]),
    ...samples.flatMap((sample, i): AssayLine<SolutionAssay>[] =>
      Number(sample.makeUpVolume.text.replace(",", ".")) === 0
        ? []
        : [
            {
              id: `make-up-${i}`,
              name: `Make-up ${i + 1}`,
              note: volumeNote(sample.makeUpVolume),
              assays: sample.makeUpAssays,
              put: (t, makeUpAssays) => ({
                ...t,
                samples: t.samples.map((s, k) => (k === i ? { ...s, makeUpAssays } : s)),
              }),
            },
          ],
    ),
    {
      id: "final",
      name: trial.kind === "leach" ? "Final liquor" : "Barren liquor",
      note: volumeNote(products.vesselVolume),
      assays: products.finalAssays,
      put: (t, finalAssays) => ({ ...t, products: { ...t.products, finalAssays } }),
    },
    {
      id: "wash",
      name: "Wash",
      note: volumeNote(products.washVolume),
      assays: products.washAssays,
      put: (t, washAssays) => ({ ...t, products: { ...t.products, washAssays } }),
    },
  ];
}

/** The solids of a trial: residue or cement, and what went with slurry samples. */
export function solidsOf(trial: TrialValues): AssayLine<SolidAssay>[] {
  return [
    {
      id: "residue",
      name: trial.kind === "leach" ? "Residue" : "Cement",
      note: volumeNote(trial.products.residueDryMass),
      assays: trial.products.residueAssays,
      put: (t, residueAssays) => ({ ...t, products: { ...t.products, residueAssays } }),
    },
    ...trial.samples.flatMap((sample, i): AssayLine<SolidAssay>[] =>
      sample.drySolids.text.trim() === "" && sample.solidsAssays.length === 0
        ? []
        : [
            {
              id: `solids-${i}`,
              name: `Solids of sample ${i + 1}`,
              note: volumeNote(sample.drySolids),
              assays: sample.solidsAssays,
              put: (t, solidsAssays) => ({
                ...t,
                samples: t.samples.map((s, k) => (k === i ? { ...s, solidsAssays } : s)),
              }),
            },
          ],
    ),
  ];
}

/** Analytes that stand anywhere on the lines, first those expected, each once. */
export const analytesOf = <A extends Assay>(lines: readonly AssayLine<A>[], expected: readonly string[]): string[] => [
  ...new Set([...expected, ...lines.flatMap(({ assays }) => assays.map(({ analyte }) => analyte))]),
];

/** The unit most of a column was typed in; `usual` while it is empty. */
export const columnUnit = <A extends Assay>(lines: readonly AssayLine<A>[], analyte: string, usual: string): string =>
  commonUnit(
    lines.flatMap(({ assays }) => assays.filter((a) => a.analyte === analyte).map(({ value }) => value)),
    usual,
  );

/** One cell typed: an empty one takes its assay out, for a blank is no assay. */
export function withAssay<A extends Assay>(assays: readonly A[], analyte: string, text: string, unit: string): A[] {
  const at = assays.findIndex((a) => a.analyte === analyte);
  if (text === "") return assays.filter((_, i) => i !== at);
  if (at < 0) return [...assays, { analyte, value: { text, unit }, method: "" } as A];
  return assays.map((a, i) => (i === at ? { ...a, value: typedIn(a.value, text, unit) } : a));
}

/** Another unit for a column: the numbers stay as they were typed, and what had a unit of its own keeps it. */
export const withUnit = <A extends Assay>(assays: readonly A[], analyte: string, from: string, to: string): A[] =>
  assays.map((a) => (a.analyte === analyte ? { ...a, value: relabelled(a.value, from, to) } : a));
