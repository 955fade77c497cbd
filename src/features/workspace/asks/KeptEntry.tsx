import { askedOf } from "../../../../shared/hazards/excluded";
import { usualThreshold } from "../../../../shared/hazards/thresholds";
import { PPM } from "../../../../shared/hazards/words";
import type { ExcludedHazard } from "../../../../shared/schemas/problem";
import { Button } from "../../../components/Button";
import { Segmented } from "../../../components/choice";
import { Formula } from "../../../components/Formula";
import { NumberField } from "../../../components/NumberField";
import { Note } from "../../../components/text";
import { inputTextExact } from "../../../lib/format";
import { keepOut, letIn } from "../model/edit";
import { useAsking } from "./context";
import { usualRule } from "./usualRule";

const tidy = (x: number): number => Number(x.toPrecision(6));

/** A gas that windows keep out of, with its limit. */
export default function KeptEntry({ hazard, absent }: { hazard: ExcludedHazard; absent: string | null }) {
  const { edit, readOnly } = useAsking();
  const { gas } = hazard;
  const { bar, pHAtLeast } = askedOf(hazard);
  const usual = usualThreshold[gas];
  return (
    <div className="pt-1">
      <div className="flex items-baseline justify-between gap-2">
        <span>
          <Formula formula={gas} className="font-bold" />
          {!readOnly && (
            <Button
              kind="quiet"
              className="ml-2 h-auto! text-xs! font-normal! text-muted"
              aria-label={`No longer keep ${gas} out`}
              onClick={() => edit(letIn(gas))}
            >
              remove
            </Button>
          )}
        </span>
        {gas === "HCN" && !readOnly && (
          <Segmented
            label="HCN is kept out by"
            value={bar === undefined ? "pH" : "pressure"}
            onChange={(by) => edit(keepOut(by === "pH" ? usualRule(gas) : { gas, bar: usual.bar }))}
            options={[
              { value: "pH", label: "by pH" },
              { value: "pressure", label: "by pressure" },
            ]}
          />
        )}
      </div>
      {bar === undefined ? (
        <NumberField
          label={`Lowest pH against ${gas}`}
          labelText="pH at or above"
          value={pHAtLeast}
          min={7}
          max={14}
          step={0.1}
          width={6}
          show={inputTextExact}
          readOnly={readOnly}
          onCommit={(pH) => edit(keepOut({ gas, pHAtLeast: pH }))}
        />
      ) : (
        <NumberField
          label={`Highest pressure of ${gas}`}
          labelText="below"
          unit="ppm"
          value={tidy(bar / PPM)}
          above={0}
          max={1e9}
          factor={1.1}
          width={8}
          show={inputTextExact}
          readOnly={readOnly}
          onCommit={(ppm) => edit(keepOut({ gas, bar: ppm * PPM }))}
          hint={`over the liquor, at 1 atm; ${usual.words}`}
        />
      )}
      {absent !== null && <Note>Cuts nothing: {absent}.</Note>}
    </div>
  );
}
