import { freeAcid } from "../../../../shared/activity/freeAcid";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { HeldSetPoint } from "../../../../shared/setpoint/held";
import type { SetPoint } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { limitSentences, marginWords, type Naming } from "../../../../shared/windows/limitWords";
import { Button } from "../../../components/Button";
import { Help } from "../../../components/Help";
import { Note, Row } from "../../../components/text";
import { celsius, fixed, withUnit } from "../../../lib/format";

/** Below this pH a glass electrode is an index only, and the loop is run on free acid. */
export const FREE_ACID_BELOW = 1.5;

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
  data,
}: {
  at: Pick<SetPoint, "pH">;
  inputs: Pick<PlanInputs, "ligands" | "temperatureC">;
  data: ChemicalData;
}) {
  const sulfate = inputs.ligands.find((l) => l.component === "S")?.activity;
  if (at.pH >= FREE_ACID_BELOW || sulfate === undefined) return null;
  const acid = freeAcid(data, at.pH, sulfate, inputs.temperatureC);
  if (!acid.ok) return null;
  const { gPerL, withinDavies, ionicStrength } = acid.value;
  return (
    <>
      <Row
        label={
          <Help title="Free acid" trigger="Free acid">
            <p>
              H⁺ and the proton of bisulfate at {celsius(inputs.temperatureC)} and this total of sulfate, counted as
              sulfuric acid; activity coefficients by Davies, here at an ionic strength of {fixed(ionicStrength, 2)}
              mol/kg. Titrate it: this is the order of things, not a reading.
            </p>
          </Help>
        }
      >
        {withUnit(`about ${gPerL < 10 ? fixed(gPerL, 1) : fixed(gPerL, 0)}`, "g/L H₂SO₄")}
      </Row>
      {!withinDavies && (
        <Note>
          Indicative: the ionic strength is beyond what the activity coefficients hold for. Control on a titration.
        </Note>
      )}
    </>
  );
}
