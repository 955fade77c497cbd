import { electrodeSeries } from "../../shared/electrodes/series";
import { useChemistry } from "../lib/chemistry";
import { celsius, fixed, withUnit } from "../lib/format";
import { usePotentialScale } from "../lib/potential";
import { useScaleChoice } from "../lib/scaleChoice";
import { Segmented } from "./choice";
import { FormulaText } from "./FormulaText";
import { NumberField } from "./NumberField";
import { Select } from "./Select";
import { Remark, Row } from "./text";

/** The scale on which potentials are shown, remembered for the member: unit, electrode, and the electrode's temperature.
 *  @param liquorC  of the plan on the screen, where there is one */
export function PotentialScaleFields({ liquorC }: { liquorC?: number }) {
  const [preferences, change] = useScaleChoice();
  const { data } = useChemistry();
  const scale = usePotentialScale(liquorC);
  const series = data ? electrodeSeries(data.tables) : [];
  const chosen = series.find(({ id }) => id === preferences.potentialScale);
  const own = preferences.electrodeTemperatureC;
  return (
    <>
      <Row label="Unit">
        <Segmented
          label="Unit of potential"
          value={preferences.potentialUnit}
          onChange={(potentialUnit) => change({ potentialUnit })}
          options={[
            { value: "V", label: "V" },
            { value: "mV", label: "mV" },
          ]}
        />
      </Row>
      <Select
        label="Electrode"
        value={preferences.potentialScale}
        onChange={(potentialScale) => change({ potentialScale })}
        options={[
          { value: "SHE", label: "SHE, standard hydrogen electrode", text: "SHE" },
          ...series.map(({ id, label }) => ({ value: id, label: <FormulaText text={label} />, text: label })),
        ]}
      />
      {chosen && (
        <>
          <Row label="Electrode stands">
            <Segmented
              label="Temperature of the electrode"
              value={own === null ? "liquor" : "own"}
              onChange={(where) => change({ electrodeTemperatureC: where === "liquor" ? null : 25 })}
              options={[
                { value: "own", label: "outside, at its own T" },
                { value: "liquor", label: "in the liquor" },
              ]}
            />
          </Row>
          {own !== null && (
            <NumberField
              label="Temperature of the electrode"
              value={own}
              onCommit={(electrodeTemperatureC) => change({ electrodeTemperatureC })}
              unit="°C"
              min={0}
              max={100}
            />
          )}
          <Row
            label="It reads 0 at"
            below={scale.electrode === "SHE" ? undefined : <FormulaText text={scale.electrode} />}
          >
            {withUnit(fixed(-scale.toShown(0) / (scale.unit === "mV" ? 1000 : 1), 3), "V vs SHE")}
          </Row>
          {liquorC === undefined && own === null && (
            <p className="py-1 text-sm text-muted">
              In each plan at the temperature of its liquor; shown here at {celsius(25)}.
            </p>
          )}
          {scale.remark !== null && <Remark className="my-1">{scale.remark}</Remark>}
        </>
      )}
    </>
  );
}
