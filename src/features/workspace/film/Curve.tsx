import { lazy, Suspense, useMemo, useRef } from "react";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Sweep } from "../../../../shared/whatif/sweep";
import { Loading } from "../../../components/status";
import { useThemeColours } from "../../../lib/theme";
import { useSize } from "../../../map/useSize";
import { sweepFigure } from "./sweepFigure";
import { settingName } from "./settingWords";

const Plot = lazy(() => import("../../../map/Plot"));
const HEIGHT = 250;
const nothing = () => undefined;

export function Curve({ sweep, inputs, here }: { sweep: Sweep; inputs: PlanInputs; here: number | null }) {
  const holder = useRef<HTMLDivElement>(null);
  const size = useSize(holder);
  const colours = useThemeColours();
  const width = size?.width ?? 0;
  const name = settingName(inputs, sweep.varied);
  const figure = useMemo(
    () => (width > 0 ? sweepFigure(sweep, name, here, colours, { width, height: HEIGHT }) : null),
    [sweep, name, here, colours, width],
  );
  return (
    <div ref={holder} role="img" aria-label={`Margin and open ground against ${name}`} style={{ height: HEIGHT }}>
      {figure && (
        <Suspense fallback={<Loading label="Drawing" />}>
          <Plot figure={figure} onRelayout={nothing} />
        </Suspense>
      )}
    </div>
  );
}
