import { DAVIES_LIMIT } from "../../../../shared/activity/davies";
import { FREE_ACID_BELOW, type FreeAcidCurve } from "../../../../shared/activity/freeAcid";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { HeldSetPoint } from "../../../../shared/setpoint/held";
import type { SetPoint } from "../../../../shared/solution";
import { limitSentences, marginWords, type Naming } from "../../../../shared/windows/limitWords";
import { AcidAmount } from "../../../components/AcidAmount";
import { Button } from "../../../components/Button";
import { Help } from "../../../components/Help";
import { MethodLink } from "../../../components/SourceLink";
import { Note, Row } from "../../../components/text";
import { celsius, fixed } from "../../../lib/format";

/** A set point placed by hand: what is nearest, and the way back. */
export function HeldNote({
  held,
  naming,
  onLetGo,
}: {
  held: HeldSetPoint;
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
          Outside the window{here && `, by ${fixed(Math.abs(here.margin), 1)} ${words}`}
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

/** g/L of sulfuric acid beside a pH that no electrode holds. */
export function FreeAcidRow({
  at,
  inputs,
  curve,
}: {
  at: Pick<SetPoint, "pH">;
  inputs: Pick<PlanInputs, "temperatureC">;
  curve: FreeAcidCurve | null;
}) {
  if (at.pH >= FREE_ACID_BELOW || curve === null) return null;
  const { gPerL, ionicStrength, withinDavies, withinSulfate } = curve.at(at.pH);
  return (
    <>
      <Row
        label={
          <Help title="Free acid" trigger="Free acid">
            <p>
              H⁺ and the proton of bisulfate at {celsius(inputs.temperatureC)} and this total of sulfate, counted as
              sulfuric acid. It rests on the second dissociation of sulfuric acid at this temperature and on activity
              coefficients by Davies, here at an ionic strength of {fixed(ionicStrength, 2)} mol/kg; they are meant for
              up to {DAVIES_LIMIT} and held at their value there.
            </p>
            <p>Sulfate bound by metals is not taken off. Titrate it: this is the order of things, not a reading.</p>
            <p>
              <MethodLink to="freeAcid">The method, free acid</MethodLink>
            </p>
          </Help>
        }
      >
        {withinSulfate ? (
          <AcidAmount gPerL={gPerL} />
        ) : (
          <>
            over <AcidAmount gPerL={curve.most} sure />
          </>
        )}
      </Row>
      {!withinSulfate ? (
        <Note>
          This pH takes more acid than this total of sulfate balances, since acid brings its own sulfate: raise the
          total.
        </Note>
      ) : (
        !withinDavies && (
          <Note>
            Indicative: the ionic strength is beyond what the activity coefficients hold for. Control on a titration.
          </Note>
        )
      )}
    </>
  );
}
