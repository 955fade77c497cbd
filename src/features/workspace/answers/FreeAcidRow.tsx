import { DAVIES_LIMIT } from "../../../../shared/activity/davies";
import type { FreeAcidCurve } from "../../../../shared/activity/freeAcid";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { SetPoint } from "../../../../shared/solution";
import { AcidAmount } from "../../../components/AcidAmount";
import { Help } from "../../../components/Help";
import { MethodLink } from "../../../components/SourceLink";
import { Note, Row } from "../../../components/text";
import { celsius, fixed } from "../../../lib/format";

/** g/L of sulfuric acid beside a pH that no electrode holds. */
export default function FreeAcidRow({
  at,
  inputs,
  curve,
}: {
  at: Pick<SetPoint, "pH">;
  inputs: Pick<PlanInputs, "temperatureC">;
  curve: FreeAcidCurve;
}) {
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
