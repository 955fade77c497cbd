import { limitSentences, type Naming } from "../../../../shared/windows/limitWords";
import type { Limit, Window } from "../../../../shared/solution";
import { fixed, withUnit } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import type { NamedLimit } from "../../../map/LimitHover";
import { Reaction } from "../answers/Reaction";
import { limitKey } from "../model/limitKey";

/** Way from the set point to an edge: along pH and along Eh where the lines through it meet the edge, else in control bands. */
function ways(limit: Limit, scale: PotentialScale): string {
  const parts = [
    limit.distancePH === null ? null : withUnit(fixed(Math.abs(limit.distancePH), 2), "pH"),
    limit.distanceEh === null
      ? null
      : withUnit(fixed(Math.abs(scale.differenceToShown(limit.distanceEh)), scale.digits), scale.unit),
  ].filter((part) => part !== null);
  return parts.length > 0
    ? `${parts.join(" or ")} from the set point`
    : `${withUnit(fixed(limit.distance, 1), "control bands")} from the set point`;
}

/** Every edge of a window with what the pointer is told of it. */
export function namedLimits(window: Window | undefined, naming: Naming, scale: PotentialScale): NamedLimit[] {
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
          <div className="font-mono">{ways(limit, scale)}</div>
        </>
      ),
    })),
  );
}
