import { cautionsFor, hazardContext } from "../../../../shared/hazards/rules";
import type { Reach } from "../../../../shared/reach/reach";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Solution } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import type { PotentialScale } from "../../../lib/potential";
import { windowName } from "../../../map/view";
import { namingOf } from "../model/exports";
import { CautionsBlock } from "./CautionsBlock";
import { LimitsBlock } from "./LimitsBlock";
import { ReachBlock } from "./ReachBlock";
import { SetPointBlock } from "./SetPointBlock";
import { WarningsBlock } from "./WarningsBlock";
import { ConflictsBlock, WindowsBlock } from "./WindowsBlock";

export interface AnswersProps {
  inputs: PlanInputs;
  solution: Solution;
  data: ChemicalData;
  scale: PotentialScale;
  /** index of the window the answers speak of */
  chosen: number;
  onChoose: (index: number) => void;
  reaches: readonly Reach[];
  /** where the crosscuts run, and the equilibria are read */
  pH: number;
  chooseReagents: React.ReactNode;
  procedures: Readonly<Record<string, string>>;
  onProcedure: (code: string, procedure: string) => void;
}

/** The right side: where to run, what shuts the window, what reaches it, and what to beware of. */
export function AnswersPanel(props: AnswersProps) {
  const { inputs, solution, data, scale, chosen, onChoose, reaches } = props;
  const window = solution.windows[chosen] ?? null;
  const naming = namingOf(data, solution);
  const name = windowName(chosen);
  const cautions = cautionsFor(hazardContext(inputs, window?.setPoint ?? null));
  const said = (
    <CautionsBlock
      cautions={cautions}
      preset={inputs.preset}
      procedures={props.procedures}
      onProcedure={props.onProcedure}
    />
  );
  return (
    <>
      <WindowsBlock solution={solution} chosen={chosen} onChoose={onChoose} scale={scale} />
      {window ? (
        <>
          <SetPointBlock window={window} data={data} scale={scale} name={`window ${name}`} />
          {cautions.length > 0 && said}
          <LimitsBlock window={window} name={name} naming={naming} scale={scale} />
        </>
      ) : (
        <>
          <ConflictsBlock solution={solution} metalName={naming.metalName} />
          {cautions.length > 0 && said}
        </>
      )}
      <ReachBlock
        reaches={reaches}
        window={window}
        data={data}
        liquor={inputs}
        pH={props.pH}
        scale={scale}
        choose={props.chooseReagents}
      />
      <WarningsBlock warnings={solution.warnings} />
      {cautions.length === 0 && said}
    </>
  );
}
