import type { HeldSetPoint } from "../../../../shared/setpoint/held";
import type { Problem } from "../../../../shared/schemas/problem";
import { limitSentences, marginWords, type Naming } from "../../../../shared/windows/limitWords";
import { Button } from "../../../components/Button";
import { fixed } from "../../../lib/format";
import { marginInUnits } from "../model/distances";

/** A set point placed by hand: what is nearest, and the way back. */
export function HeldNote({
  held,
  band,
  naming,
  onLetGo,
}: {
  held: HeldSetPoint;
  band: Problem["controlBand"];
  naming: Naming;
  /** absent where the plan is only looked at */
  onLetGo?: () => void;
}) {
  const { window, inside, here } = held;
  const nearest = here && limitSentences({ ...window, limits: [here.nearest] }, naming)[0];
  const words = marginWords(window.setPoint);
  return (
    <div className="py-1 text-sm" role="status" data-testid="held">
      <b>Placed by hand.</b>{" "}
      {inside ? (
        nearest ? (
          <>
            Nearest limit{window.setPoint.mixedPotential && " along pH"}: <b>{nearest.side}</b>, {nearest.what}.
          </>
        ) : (
          "No limit lies along pH here."
        )
      ) : (
        <span className="text-signal">
          Outside the window
          {here &&
            `, by ${fixed(Math.abs(here.margin), 1)} ${words} (${marginInUnits({ ...window.setPoint, margin: Math.abs(here.margin) }, band)})`}
          {nearest && `: ${nearest.what}`}.
        </span>
      )}
      {onLetGo && (
        <div className="no-print">
          <Button kind="quiet" className="h-auto!" onClick={onLetGo}>
            back to the deepest point
          </Button>
        </div>
      )}
    </div>
  );
}
