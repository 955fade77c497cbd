import type { PlanInputs } from "../../../../shared/schemas/plan";
import { solidsBases } from "../../../../shared/schemas/problem";
import { settingBounds, settingOf, usualRange, variedOf, withSetting } from "../../../../shared/whatif/vary";
import { Segmented } from "../../../components/choice";
import { LogSlider, Slider } from "../../../components/Slider";
import { Row } from "../../../components/text";
import { settingName, settingUnit } from "../film/settingWords";

/** Controls of B: every setting that moves a window, tried here and nowhere else. */
export function ChangeB({
  inputs,
  start,
  onChange,
}: {
  inputs: PlanInputs;
  start: PlanInputs;
  onChange: (inputs: PlanInputs) => void;
}) {
  return (
    <>
      {variedOf(inputs).map((varied) => {
        const value = settingOf(inputs, varied);
        if (value === null) return null;
        const [low, high] = settingBounds(inputs, varied);
        const [from, to] = usualRange(start, varied);
        const common = {
          label: `B, ${settingName(inputs, varied)}`,
          labelText: settingName(inputs, varied),
          value,
          unit: settingUnit(inputs, varied),
          onChange: (x: number) => onChange(withSetting(inputs, varied, x)),
        };
        return varied.kind === "temperature" ? (
          <Slider key="temperature" {...common} min={Math.min(low, value)} max={Math.max(value, to)} step={1} />
        ) : (
          <LogSlider
            key={`${varied.kind} ${varied.of}`}
            {...common}
            min={Math.min(from, value)}
            max={Math.max(to, value)}
            typedMax={high}
          />
        );
      })}
      <Row label="Solids">
        <Segmented
          label="B, solids basis"
          value={inputs.solidsBasis}
          onChange={(solidsBasis) => onChange({ ...inputs, solidsBasis })}
          options={solidsBases.map((value) => ({ value, label: value }))}
        />
      </Row>
    </>
  );
}
