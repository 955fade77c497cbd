import { limitSentences, type Naming } from "../../../../shared/windows/limitWords";
import type { Problem } from "../../../../shared/schemas/problem";
import type { Limit, Window } from "../../../../shared/solution";
import type { NamedLimit } from "../../../map/LimitHover";
import { Reaction } from "../answers/Reaction";
import { bandWords, mVWords, pHWords } from "../model/distances";
import { limitKey } from "../model/limitKey";

/** Way from the set point to an edge: along pH and along Eh where the lines through it meet the edge, else in control bands. */
function ways(limit: Limit, band: Problem["controlBand"]): string {
  const parts = [
    limit.distancePH === null ? null : pHWords(limit.distancePH),
    limit.distanceEh === null ? null : mVWords(limit.distanceEh),
  ].filter((part) => part !== null);
  return parts.length > 0
    ? `${parts.join(" or ")} from the set point`
    : `within ${bandWords(limit.distance, band)} of the set point`;
}

/** Every edge of a window with what the pointer is told of it. */
export function namedLimits(window: Window | undefined, naming: Naming, band: Problem["controlBand"]): NamedLimit[] {
  if (!window) return [];
  return limitSentences(window, naming).flatMap((sentence) =>
    [sentence.limit, ...sentence.others].map((limit): NamedLimit => ({
      key: limitKey(sentence),
      from: limit.from,
      to: limit.to,
      words: (
        <>
          <div>
            <b>{sentence.side}</b> {sentence.what}
          </div>
          {limit.reactionTerms && (
            <div className="text-muted">
              <Reaction terms={limit.reactionTerms} />
            </div>
          )}
          <div className="font-mono">{ways(limit, band)}</div>
        </>
      ),
    })),
  );
}
