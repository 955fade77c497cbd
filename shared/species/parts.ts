/** An id of the tables taken apart. */
export interface SpeciesParts {
  formula: string;
  phase: string;
  /** polymorph, where the tables name one */
  form: string;
}

/** Takes an id of the tables apart: `FeOOH(s,goethite)` → FeOOH, s, goethite. */
export function speciesParts(id: string): SpeciesParts {
  const [, formula = id, phase = "", form = ""] = /^(.*)\((aq|s|l|g)(?:,([^)]*))?\)$/.exec(id) ?? [];
  return { formula, phase, form };
}

/** Neutral dissolved species say so, since the formula alone could be a solid; ions and solids do not. */
export const needsPhase = ({ formula, phase }: SpeciesParts): boolean => phase === "aq" && !formula.includes("^");
