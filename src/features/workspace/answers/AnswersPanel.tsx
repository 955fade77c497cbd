import { lazy, Suspense, useMemo } from "react";
import { Link } from "react-router-dom";
import { FREE_ACID_BELOW, type FreeAcidCurve } from "../../../../shared/activity/freeAcid";
import type { Advice, Opening } from "../../../../shared/advice/openings";
import type { Analysis } from "../../../../shared/analysis";
import type { Robust } from "../../../../shared/advice/robust";
import { cautionsFor, hazardContext } from "../../../../shared/hazards/rules";
import type { Reach } from "../../../../shared/reach/reach";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Problem } from "../../../../shared/schemas/problem";
import type { HeldSetPoint } from "../../../../shared/setpoint/held";
import type { Solution } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { namingOf } from "../../../../shared/windows/limitWords";
import { later } from "../../../components/later";
import { Loading } from "../../../components/status";
import type { PotentialScale } from "../../../lib/potential";
import type { LimitStore } from "../../../map/limitStore";
import { windowName } from "../../../map/view";
import type { Edit } from "../model/edit";
import type { Awaited } from "../model/useAsked";
import type { Gases } from "../model/usePoint";
import { CautionsBlock } from "./CautionsBlock";
import { CouplesBlock } from "./CouplesBlock";
import { FieldsBlock } from "./FieldsBlock";
import { GasBlock, reachedAtSetPoint } from "./GasBlock";
import { LimitsBlock } from "./LimitsBlock";
import { OverallBlock } from "./OverallBlock";
import { ReachBlock } from "./ReachBlock";
import { SetPointBlock } from "./SetPointBlock";
import { HeldNote } from "./SetPointMore";
import { WarningsBlock } from "./WarningsBlock";

// Most plans have a window, and few hold over ranges.
const RobustBlock = lazy(async () => ({ default: (await import("./RobustBlock")).RobustBlock }));
const WindowsBlock = lazy(async () => ({ default: (await import("./WindowsBlock")).WindowsBlock }));
const FreeAcidRow = lazy(() => import("./FreeAcidRow"));
const NoWindowBlock = lazy(async () => ({ default: (await import("./NoWindowBlock")).NoWindowBlock }));

// Set point and limits follow the hand at once; what takes longer to work out, or stands further down, a moment later.
const Cautions = later(CautionsBlock);
const Couples = later(CouplesBlock);
const Fields = later(FieldsBlock);
const Gas = later(GasBlock);
const Overall = later(OverallBlock);
const Warnings = later(WarningsBlock);

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
  problem: Problem;
  advice: Awaited<Advice>;
  robust: Awaited<Robust>;
  held: HeldSetPoint | null;
  gases: Gases | null;
  /** the exact pieces behind the answer */
  analysis: Analysis | null;
  limitStore: LimitStore;
  /** free acid against pH of a sulfate liquor */
  freeAcid: FreeAcidCurve | null;
  /** both absent where the plan is only looked at */
  onApply?: ((opening: Opening) => void) | undefined;
  onLetGo?: (() => void) | undefined;
  /** any other change of the plan */
  onInputs?: ((edit: Edit) => void) | undefined;
}

/** The right side: where to run, what shuts the window, what reaches it, and what to beware of. */
export function AnswersPanel(props: AnswersProps) {
  const { inputs, solution, data, scale, chosen, onChoose, reaches, problem, held, gases } = props;
  const window = solution.windows[chosen] ?? null;
  const naming = useMemo(() => namingOf(data, solution), [data, solution]);
  const name = windowName(chosen);
  const cautions = cautionsFor(hazardContext(inputs, window?.setPoint ?? null));
  const urgent = window !== null && gases !== null && reachedAtSetPoint(gases);
  const said = (
    <Cautions
      cautions={cautions}
      preset={inputs.preset}
      procedures={props.procedures}
      onProcedure={props.onProcedure}
    />
  );
  return (
    <>
      {solution.windows.length > 1 && (
        <Suspense fallback={null}>
          <WindowsBlock {...{ solution, chosen, onChoose, scale }} band={inputs.controlBand} />
        </Suspense>
      )}
      {window ? (
        <>
          <SetPointBlock window={window} band={inputs.controlBand} data={data} scale={scale} name={`window ${name}`} />
          {held && (
            <HeldNote
              held={held}
              band={inputs.controlBand}
              naming={naming}
              {...(props.onLetGo ? { onLetGo: props.onLetGo } : {})}
            />
          )}
          {props.freeAcid && window.setPoint.pH < FREE_ACID_BELOW && (
            <Suspense fallback={null}>
              <FreeAcidRow at={window.setPoint} inputs={inputs} curve={props.freeAcid} />
            </Suspense>
          )}
          {cautions.length > 0 && said}
          {gases && urgent && <Gas gases={gases} />}
          <LimitsBlock
            window={window}
            name={name}
            naming={naming}
            band={inputs.controlBand}
            freeAcid={props.freeAcid}
            analysis={props.analysis}
            data={data}
            limitStore={props.limitStore}
          />
          {props.robust.state !== "none" && (
            <Suspense fallback={null}>
              <RobustBlock robust={props.robust} band={inputs.controlBand} scale={scale} metalName={naming.metalName} />
            </Suspense>
          )}
        </>
      ) : (
        <>
          <Suspense fallback={<Loading label="No window is open" />}>
            <NoWindowBlock
              solution={solution}
              inputs={inputs}
              metalName={naming.metalName}
              advice={props.advice}
              {...(props.onApply ? { onApply: props.onApply } : {})}
            />
          </Suspense>
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
      <Couples problem={problem} data={data} pH={props.pH} scale={scale} />
      {window && (
        <Overall
          problem={problem}
          inputs={inputs}
          solution={solution}
          window={window}
          data={data}
          onInputs={props.onInputs}
        />
      )}
      {gases && !urgent && <Gas gases={gases} />}
      <Warnings warnings={solution.warnings} />
      <Fields solution={solution} data={data} />
      {cautions.length === 0 && said}
      <p className="no-print mt-5 text-sm">
        <Link to="/method">How this is worked out</Link>
      </p>
    </>
  );
}
