import { FormulaText } from "../../../components/FormulaText";
import { failureAt, useAsking } from "./context";

/** What the solver cannot take, beside the control that asked for it. The map keeps the last answer. */
export function Refusal({ path }: { path: string }) {
  const message = failureAt(useAsking().failure, path);
  if (message === null) return null;
  return (
    <p role="alert" className="py-1 text-sm text-signal">
      <FormulaText text={message} />
    </p>
  );
}
