import { lazy, Suspense, useMemo, useRef } from "react";
import type { ReactionValues } from "../../../shared/reactions/atTemperature";
import { Loading } from "../../components/status";
import { useThemeColours } from "../../lib/theme";
import { useSize } from "../../map/useSize";
import { type CurveName, curveFigure, curveWords } from "./curveFigure";

const Plot = lazy(() => import("../../map/Plot"));
const HEIGHT = 260;
const nothing = () => undefined;

export function Curve({ rows, name }: { rows: readonly ReactionValues[]; name: CurveName }) {
  const holder = useRef<HTMLDivElement>(null);
  const size = useSize(holder);
  const colours = useThemeColours();
  const width = size?.width ?? 0;
  const figure = useMemo(
    () => (width > 0 ? curveFigure(rows, name, colours, { width, height: HEIGHT }) : null),
    [rows, name, colours, width],
  );
  return (
    <div
      ref={holder}
      role="img"
      aria-label={`${curveWords[name].label} against temperature`}
      style={{ height: HEIGHT }}
    >
      {figure && (
        <Suspense fallback={<Loading label="Drawing" />}>
          <Plot figure={figure} onRelayout={nothing} />
        </Suspense>
      )}
    </div>
  );
}
