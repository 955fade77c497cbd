import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import type { MeasuredPoint } from "../../../../shared/trials/measuredPoint";
import { acidPlan, titratedAcid, trialAcid, type TrialAcid } from "../../../../shared/trials/trialAcid";
import { AcidAmount, acidFigures } from "../../../components/AcidAmount";
import { Help } from "../../../components/Help";
import { MethodLink } from "../../../components/SourceLink";
import { Note, Row } from "../../../components/text";
import { signed, withUnit } from "../../../lib/format";
import type { TrialValues } from "../model/trialValues";

/** Free acid of the record as it stands, where its pH is below 1.5. */
export function trialAcidOf(
  record: TrialValues,
  point: Pick<MeasuredPoint, "pH" | "pHTemperatureC"> | null,
  data: ChemicalData,
  inputs: Pick<PlanInputs, "ligands" | "sulfateReduction"> | undefined,
): TrialAcid | null {
  if (point === null) return null;
  const at = { pH: point.pH, temperatureC: point.pHTemperatureC };
  return trialAcid(record, at, titratedAcid(record, data.molarMass), inputs ? acidPlan(inputs) : null, data);
}

const whose = { measured: "measured here", planned: "planned here", plan: "of the plan" } as const;

/** Free acid titrated and free acid by pH, side by side, with their difference; neither corrects the other. */
export function AcidNote({ acid: { titrated, byPH, difference, sulfate, doubts } }: { acid: TrialAcid }) {
  if (titrated === null && byPH === null && doubts.length === 0) return null;
  return (
    <>
      <Row label="Free acid, titrated">
        {titrated === null ? (
          <span className="font-sans text-muted">not assayed</span>
        ) : (
          <AcidAmount gPerL={titrated} sure />
        )}
      </Row>
      <Row
        label={
          <Help title="Free acid by pH" trigger="Free acid, by pH">
            <p>
              H⁺ and the proton of bisulfate at this pH and temperature, with the sulfate{" "}
              {sulfate && whose[sulfate.from]}, activity coefficients by Davies. Indicative beyond an ionic strength of
              0.5.
            </p>
            <p>
              A titration counts hydrolysing metals as acid unless they were masked. Where the two differ, neither
              corrects the other.
            </p>
            <p>
              <MethodLink to="freeAcid">The method, free acid</MethodLink>
            </p>
          </Help>
        }
      >
        {byPH === null ? <span className="font-sans text-muted">open</span> : <AcidAmount gPerL={byPH} />}
      </Row>
      {difference !== null && (
        <Note>
          Titration {withUnit(signed(difference, Math.abs(difference) < 9.95 ? 1 : 0), "g/L")} against pH,{" "}
          {acidFigures(Math.abs(100 * (difference / (byPH ?? 1))))}&#8239;%.
        </Note>
      )}
      {doubts.length > 0 && <Note>By pH: {doubts.join("; ")}.</Note>}
      {byPH === null && doubts.length === 0 && (
        <Note>
          {sulfate === null ? "No sulfate total is on record." : "The temperature of the pH is not on record."}
        </Note>
      )}
    </>
  );
}
