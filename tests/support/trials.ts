import { feedCreate, type Feed } from "../../shared/schemas/feed";
import { trialCreate, type Trial, type TrialInput } from "../../shared/schemas/trial";

/** "3.95 g/L" → { text, unit } */
export const typed = (words: string) => {
  const [, text = "", unit = ""] = /^(\S*) (.+)$/.exec(words) ?? [];
  return { text, unit };
};
/** { Cu: "3.95 g/L" } → a list of assays */
export const assays = (of: Record<string, string>) =>
  Object.entries(of).map(([analyte, words]) => ({ analyte, value: typed(words) }));

export const feedOf = (heads: Record<string, string>, more: Record<string, unknown> = {}): Feed =>
  feedCreate.parse({
    projectId: "p",
    name: "invented",
    heads: Object.entries(heads).map(([element, words]) => ({ element, value: typed(words), head: true })),
    ...more,
  });

export const trialOf = (record: Partial<TrialInput>): Trial =>
  trialCreate.parse({ campaignId: "c", feedId: "f", code: "T", kind: "leach", stage: "NL", ...record });

/** The worked example of the trade (practice-checks.json, F01 to F07): 250 g at 1.52 % Cu in 0.800 L, four samples of 10 mL. */
export const exampleFeed = feedOf({ Cu: "1.52 %" });
export const exampleSamples = (makeUp: string, makeUpAssays: Record<string, string> = {}) =>
  (["1.85", "2.62", "3.21", "3.60"] as const).map((Cu, i) => ({
    at: typed(`${2 ** i} h`),
    volume: typed("10 mL"),
    assays: assays({ Cu: `${Cu} g/L` }),
    makeUpVolume: typed(makeUp),
    makeUpAssays: assays(makeUpAssays),
  }));
export const exampleRecord = (): Partial<TrialInput> => ({
  charge: { dryMass: typed("250.0 g"), liquorVolume: typed("0.800 L") },
  samples: exampleSamples("10 mL"),
  products: {
    filtrateVolume: typed("0.712 L"),
    finalAssays: assays({ Cu: "3.95 g/L" }),
    washVolume: typed("0,600 L"),
    washAssays: assays({ Cu: "558 mg/L" }),
    residueDryMass: typed("231.6 g"),
    residueAssays: assays({ Cu: "0.225 %" }),
  },
});
