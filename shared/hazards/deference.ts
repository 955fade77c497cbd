/** Stands with every caution: the product screens, it does not clear. */
export const SCREENING =
  "Screening information. It does not replace a hazard study, the safety data sheets, local law and exposure limits, or the judgement of a licensed engineer or industrial hygienist.";

/** Beside exposure limits. */
export const LIMITS_ARE = "Limits shown are US values as of the stated date; check the values in force where you work.";
