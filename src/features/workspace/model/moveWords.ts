import { NARROW_NO_BREAK } from "../../../../shared/words/numbers";
import type { LimitMove } from "../../../../shared/windows/limitMoves";
import type { LimitSentence } from "../../../../shared/windows/limitWords";
import { signed, THIN_SPACE, withUnit } from "../../../lib/format";
import { mVWords, pHWords } from "./distances";

/** Less than the last figure shown is no move. */
const LEAST = { pH: 0.005, Eh: 0.0005 };

export interface MoveNaming {
  metalName: (element: string) => string;
  componentName: (component: string) => string;
}

/** "Ten times less iron moves it 0.33 pH up and narrows the window; +10 K moves it 0.08 pH down and widens it." Along the axis by which
 *  the limit is told. Null where nothing moves it.
 *  @param sentence  of the ledger     @param moves  of its nearest edge */
export function moveWords(
  { axis, side }: Pick<LimitSentence, "axis" | "side">,
  moves: readonly LimitMove[],
  { metalName, componentName }: MoveNaming,
): string | null {
  let first = true;
  const parts = moves.flatMap(({ by, ...move }) => {
    const far = axis === "pH" ? move.pH : move.Eh;
    if (far === null || Math.abs(far) < LEAST[axis]) return [];
    const what =
      by.kind === "temperature"
        ? withUnit(signed(by.kelvin, 0), "K")
        : `ten times less ${by.kind === "metal" ? metalName(by.component) : componentName(by.component)}`;
    const size = axis === "pH" ? pHWords(far) : mVWords(far);
    const wider = side.startsWith("low") === far < 0;
    const window = first ? "the window" : "it";
    first = false;
    return [`${what} moves it ${size} ${far > 0 ? "up" : "down"} and ${wider ? "widens" : "narrows"} ${window}`];
  });
  if (parts.length === 0) return null;
  // Number and unit stay together where the line breaks.
  const text = parts.join("; ").replaceAll(THIN_SPACE, NARROW_NO_BREAK);
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}
