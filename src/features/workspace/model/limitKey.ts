import type { LimitSentence } from "../../../../shared/windows/limitWords";

/** By which map and ledger mean the same limit. */
export const limitKey = ({ side, what }: Pick<LimitSentence, "side" | "what">): string => `${side} ${what}`;
