import { DAVIES_LIMIT } from "../../../../shared/activity/davies";
import { gammaOf } from "../../../../shared/plan/toProblem";
import type { PlanMetal } from "../../../../shared/schemas/plan";
import { type Requirement, requirements, roles } from "../../../../shared/schemas/problem";
import { tenorInput, tenorText } from "../../../../shared/words/tenor";
import { Button } from "../../../components/Button";
import { Segmented } from "../../../components/choice";
import { Term } from "../../../components/Help";
import { NumberField } from "../../../components/NumberField";
import { Quantity } from "../../../components/Quantity";
import { MethodLink } from "../../../components/SourceLink";
import { Select } from "../../../components/Select";
import { LogSlider } from "../../../components/Slider";
import { Note, Remark } from "../../../components/text";
import { fixed, significant } from "../../../lib/format";
import { amountWord, requirementWord } from "../../../lib/planWords";
import { moveMetal, removeMetal, setMetal } from "../model/edit";
import { useAsking } from "./context";
import { Refusal } from "./Refusal";

const requirementNote: Readonly<Record<Requirement, string>> = {
  dissolved: "as ions or complexes",
  solid: "as a compound or as the metal",
  metal: "as the metal, cemented or won",
  compound: "as an oxide, hydroxide, salt or sulfide",
  free: "anything; asks nothing",
};

const capital = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);
const explains = { carry: "carry", "at most": "atMost", "leave at most": "leaveAtMost", at: "watched" } as const;

/** Role, requirement and amount of one metal. */
export default function MetalEditor({
  metal,
  index,
  onRemoved,
}: {
  metal: PlanMetal;
  index: number;
  onRemoved: () => void;
}) {
  const { inputs, edit, settle, readOnly } = useAsking();
  const about = `${metal.element} amount`;
  const change = (part: Partial<PlanMetal>, gesture?: string) => edit(setMetal(index, part), gesture);
  const word = amountWord(metal);
  const label = `${metal.element}: ${word}`;
  return (
    <div className="mb-1 border-l-2 border-rule pl-3" role="group" aria-label={`Metal ${metal.element}`}>
      {!readOnly && (
        <Segmented
          label={`Role of ${metal.element}`}
          value={metal.role}
          onChange={(role) => change({ role })}
          options={roles.map((role) => ({ value: role, label: role }))}
          className="my-1"
        />
      )}
      {metal.role === "watched" ? (
        <Note>Drawn and named, but it neither opens nor shuts ground.</Note>
      ) : (
        <Select
          label={`Requirement for ${metal.element}`}
          labelText="Must be"
          readOnly={readOnly}
          value={metal.requirement}
          onChange={(requirement) => change({ requirement })}
          options={requirements
            .filter((r) => r !== "free")
            .map((r) => ({ value: r, label: requirementWord[r], note: requirementNote[r] }))}
        />
      )}
      <LogSlider
        label={label}
        labelText={<Term word={explains[word]}>{capital(word)}</Term>}
        value={metal.value}
        readOnly={readOnly}
        {...(metal.entry === "gPerL"
          ? { min: 1e-4, max: 200, typedMax: 1000, unit: "g/L", show: tenorInput }
          : { min: 1e-8, max: 10, typedMax: 100, noun: "activity" })}
        onChange={(value) => change({ value }, about)}
        onCommit={settle}
        width={8}
      />
      {!readOnly && (
        <Segmented
          label={`How the amount of ${metal.element} is given`}
          value={metal.entry}
          onChange={(entry) => change(switched(metal, entry))}
          options={[
            { value: "activity", label: "activity" },
            { value: "gPerL", label: "tenor, g/L" },
          ]}
          className="my-1"
        />
      )}
      {metal.entry === "activity" && <AsTenor metal={metal} />}
      {metal.entry === "gPerL" && <Gamma metal={metal} change={change} />}
      <Refusal path={`metals.${index}`} />
      {!readOnly && (
        <div className="flex gap-3">
          <Button kind="quiet" disabled={index === 0} onClick={() => edit(moveMetal(index, -1))}>
            move up
          </Button>
          <Button kind="quiet" disabled={index === inputs.metals.length - 1} onClick={() => edit(moveMetal(index, 1))}>
            move down
          </Button>
          <span className="flex-1" />
          <Button
            kind="quiet"
            disabled={inputs.metals.length === 1}
            title={inputs.metals.length === 1 ? "A plan needs one metal" : undefined}
            onClick={() => {
              edit(removeMetal(index));
              onRemoved();
            }}
          >
            remove
          </Button>
        </div>
      )}
    </div>
  );
}

/** A number keeps its order of magnitude when it starts to be read the other way: 1 g/L and 0.01 are near enough for a start. */
const switched = (metal: PlanMetal, entry: PlanMetal["entry"]): Partial<PlanMetal> => {
  if (entry === metal.entry) return {};
  const value = entry === "gPerL" ? metal.value * 60 : metal.value / 60;
  return { entry, value: Number(Math.min(1000, Math.max(1e-9, value)).toPrecision(2)) };
};

/** What total an activity stands for, which is not its own number of moles: gamma decides, and is not given here. */
function AsTenor({ metal: { element, value } }: { metal: PlanMetal }) {
  const { data } = useAsking();
  const molar = data.molarMass.get(element);
  if (molar === undefined) return null;
  return (
    <Note className="py-1">
      An activity, not a total. At γ = 1 it is {tenorText(value * molar, 2)} of {element}; at γ = 0.1,{" "}
      {tenorText(value * molar * 10, 2)}. In sulfate liquors above 0.1 mol/L take 0.05 to 0.2 of the tenor (
      <MethodLink to="activity">why</MethodLink>).
    </Note>
  );
}

/** From tenor to activity: which gamma, what it comes to, and what that gives. */
function Gamma({ metal, change }: { metal: PlanMetal; change: (part: Partial<PlanMetal>) => void }) {
  const { inputs, edit, data, readOnly } = useAsking();
  const gamma = gammaOf(data, metal, inputs.ionicStrength, inputs.temperatureC);
  const molar = data.molarMass.get(metal.element);
  const I = inputs.ionicStrength;
  return (
    <div>
      {!readOnly && (
        <Segmented
          label={`Activity coefficient of ${metal.element}`}
          value={metal.gammaFrom}
          onChange={(gammaFrom) =>
            change({ gammaFrom, ...(gammaFrom === "typed" ? { gamma: metal.gamma ?? gamma } : {}) })
          }
          options={[
            { value: "one", label: "γ = 1" },
            { value: "davies", label: "Davies" },
            { value: "typed", label: "typed" },
          ]}
          className="my-1"
        />
      )}
      {metal.gammaFrom === "one" && <Note>Gamma is taken as 1, which is no estimate.</Note>}
      {metal.gammaFrom === "typed" && (
        <NumberField
          label={`Gamma of ${metal.element}`}
          labelText="γ"
          value={metal.gamma}
          above={0}
          max={100}
          factor={1.05}
          readOnly={readOnly}
          onCommit={(value) => change({ gamma: value })}
        />
      )}
      {metal.gammaFrom === "davies" && (
        <>
          <NumberField
            label="Ionic strength of the liquor"
            labelText="Ionic strength"
            unit="mol/kg"
            value={I}
            above={0}
            max={20}
            step={0.05}
            width={6}
            readOnly={readOnly}
            onCommit={(value) => edit((p) => ({ ...p, ionicStrength: value }))}
            onClear={() => edit((p) => ({ ...p, ionicStrength: null }))}
            hint={I === null ? "Not given: gamma is 1 until it is." : undefined}
          />
          {I !== null && I > DAVIES_LIMIT && (
            <Remark>
              Davies is meant for ionic strengths up to {fixed(DAVIES_LIMIT, 1)}; at {significant(I)} it turns upward.
              Type a gamma instead.
            </Remark>
          )}
        </>
      )}
      <p className="py-1 text-sm">
        γ <span className="font-mono">{significant(gamma, 3)}</span>
        {molar !== undefined && (
          <>
            , so the activity is <Quantity value={(metal.value / molar) * gamma} />
          </>
        )}
      </p>
    </div>
  );
}
