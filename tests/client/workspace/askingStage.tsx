import { render } from "@testing-library/react";
import { useState, type ReactNode } from "react";
import type { Failure } from "../../../shared/outcome";
import type { PlanInputs } from "../../../shared/schemas/plan";
import { AskingContext } from "../../../src/features/workspace/asks/context";
import type { Edit } from "../../../src/features/workspace/model/edit";
import { potentialScale } from "../../../src/lib/potential";
import { library } from "../../support/solver";

interface Stage {
  from: PlanInputs;
  readOnly?: boolean;
  /** the solver's refusal of the inputs, where a question shows it */
  failureOf?: (inputs: PlanInputs) => Failure | null;
}

/** Draws one question of the left panel over inputs that it may change.
 *  @returns  the inputs as they stand */
export function renderAsking(question: ReactNode, { from, readOnly = false, failureOf = () => null }: Stage) {
  let now = from;
  function Asking() {
    const [inputs, setInputs] = useState(from);
    const asking = {
      ...{ inputs, data: library, solution: null, setPoint: null, scale: potentialScale("V"), readOnly, focus: null },
      edit: (change: Edit) => {
        now = change(now);
        setInputs(now);
      },
      settle: () => {},
      failure: failureOf(inputs),
      onFocus: () => {},
    };
    return <AskingContext value={asking}>{question}</AskingContext>;
  }
  render(<Asking />);
  return () => now;
}
