import Plotly from "plotly.js-cartesian-dist-min";
import createPlotlyComponent from "react-plotly.js/factory";
import type { Figure } from "./plotTypes";

/** The one place where Plotly comes in; loaded late, once the map stands. The factory is needed: the package's default export
 *  looks for a full Plotly that is not shipped. */
const Plotted = createPlotlyComponent(Plotly);

const config = {
  displayModeBar: false,
  // The map resets itself: a redraw between two clicks would make Plotly see two single ones.
  doubleClick: false,
  scrollZoom: true,
  responsive: false,
  showTips: false,
  showAxisDragHandles: true,
} as const;

export interface PlotProps {
  figure: Figure;
  onRelayout: (change: Record<string, unknown>) => void;
  /** the axes move under the hand, before they settle */
  onRelayouting?: (change: Record<string, unknown>) => void;
}

export default function Plot({ figure, onRelayout, onRelayouting }: PlotProps) {
  return (
    <Plotted
      data={figure.data}
      layout={figure.layout}
      config={config}
      onRelayout={onRelayout as (event: unknown) => void}
      onRelayouting={onRelayouting as ((event: unknown) => void) | undefined}
      style={{ width: figure.layout.width, height: figure.layout.height }}
    />
  );
}
