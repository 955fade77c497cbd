/** Where the method speaks of what the plan screen says: a document of docs/ and the anchor of its section or paragraph. A test holds every
 *  line against the documents, so that none leads into nothing. */
export const sources = {
  gibbs: ["method", "1-gibbs-energies-at-t", "Gibbs energies at T"],
  trustedRange: ["method", "trusted-range", "trusted range"],
  measuredErrors: ["method", "measured-errors", "measured errors"],
  planes: ["method", "2-planes", "planes"],
  drawnDown: ["method", "totals-are-not-drawn-down", "totals are not drawn down"],
  fields: ["method", "4-fields", "fields"],
  windows: ["method", "5-windows", "windows"],
  noWindow: ["method", "no-window", "no window"],
  opens: ["method", "what-would-open-one", "what would open one"],
  overRanges: ["method", "7-over-ranges", "over ranges"],
  setPoint: ["method", "6-set-point", "set point"],
  mixedPotential: ["method", "eh-that-nothing-holds", "Eh that nothing holds"],
  overall: ["method", "overall-reaction", "overall reactions"],
  reach: ["method", "9-reach", "reach"],
  hazards: ["method", "10-hazards", "hazards"],
  freeAcid: ["method", "11-free-acid", "free acid"],
  saturation: ["method", "saturation-pressure", "saturation pressure"],
  slow: ["method", "what-is-slow", "what is slow"],
  activity: ["method", "activity-not-concentration", "activity, not concentration"],
  grades: ["data", "grades", "grades"],
  solidsBasis: ["data", "the-tables", "the tables"],
} as const satisfies Record<string, readonly [document: string, anchor: string, words: string]>;

export type Source = keyof typeof sources;

export const sourcePath = (source: Source): string => {
  const [document, anchor] = sources[source];
  return `/method${document === "method" ? "" : `/${document}`}#${anchor}`;
};
