import { memo, useId, useMemo } from "react";
import { hatchWeight } from "../../../shared/drawing/hatches";
import { mapPixels, type Sheet } from "../boxes";
import type { MapContent } from "../content";
import { emphasis, hatchesOf, metalColour } from "../metalStyle";
import type { Painting } from "../paintTrials";
import { plainText } from "../speciesText";
import type { PlacedText } from "../texts";
import { drawnMetals, type MapView } from "../view";
import { AcidRow } from "./AcidRow";
import { Axes } from "./Axes";
import { HatchPattern } from "./HatchPattern";
import { ProposalMarks } from "./ProposalMarks";
import { ReachBars } from "./ReachBars";
import { SheetSvg } from "./SheetSvg";
import { limitMarks } from "./stripModel";
import { Strips } from "./Strips";
import { SvgText } from "./SvgText";
import { TrialMarks } from "./TrialMarks";
import { typeSize } from "../typeSize";

export interface OverlayProps {
  content: MapContent;
  sheet: Sheet;
  view: MapView;
  /** placed apart: they may come a moment after what they name */
  names: readonly PlacedText[];
  /** for a picture: trials as shapes */
  trials?: Omit<Painting, "toPixel" | "box"> | null;
  /** for a picture: proposals as shapes too */
  picture?: boolean;
}

/** What stands over and beside the map: axes, names, crosscuts, reach. Drawn as shapes of its own, since a chart would lay out every
 *  word anew at each step of a drag. The same for the screen and for pictures. */
export function Overlay({ content, sheet, view, names, trials, picture = false }: OverlayProps) {
  const id = useId().replace(/[^\w-]/g, "");
  const { colours, layers, scale } = view;
  const { toPixel, box } = mapPixels(sheet, view.visible);
  const hatches = useMemo(() => hatchesOf(view.metals), [view.metals]);
  const patternOf = (element: string) => `${id}-${element}`;
  const window = content.solution.windows[view.window];
  const { through, pinned, freeAcid } = content;
  const strips = {
    cuts: content.crosscuts,
    pinned: pinned && { cuts: pinned.crosscuts, through: pinned.through },
    sheet,
    view,
    patternOf,
  };
  const marks = useMemo(
    () => (window ? { pH: limitMarks(window, "pH", freeAcid), Eh: limitMarks(window, "Eh") } : { pH: [], Eh: [] }),
    [window, freeAcid],
  );
  return (
    <SheetSvg
      {...{ sheet, box }}
      clip={`${id}-map`}
      testId="map-overlay"
      defs={drawnMetals(view).map((metal) => {
        const hatch = hatches.get(metal.element);
        return (
          hatch && (
            <HatchPattern
              key={metal.element}
              id={patternOf(metal.element)}
              hatch={hatch}
              colour={metalColour(metal, view)}
              opacity={hatchWeight[metal.role] * emphasis(metal.element, view)}
            />
          )
        );
      })}
    >
      <Axes sheet={sheet} visible={view.visible} scale={scale} colour={colours.ink} />
      <g clipPath={`url(#${id}-map)`}>
        {pinned && layers.crosscuts && <Pin at={toPixel(...pinned.through)} box={box} view={view} />}
        {layers.setPoint && layers.crosscuts && through && <Guides at={toPixel(...through)} box={box} view={view} />}
        <Names names={names} sheet={sheet} view={view} />
        {picture && <ProposalMarks marks={content.proposals} toPixel={toPixel} colours={colours} />}
        {trials && <TrialMarks {...trials} toPixel={toPixel} box={box} />}
      </g>
      <SvgText
        label="axis pH"
        lines={[{ parts: plainText(`pH at ${content.temperatures.join(" and ")} °C`), size: typeSize(11) }]}
        x={box.x1}
        y={box.y1 + 33}
        anchor="end"
        colour={colours.muted}
      />
      <SvgText
        label="axis Eh"
        lines={[{ parts: plainText(`Eh / ${scale.unit} vs ${scale.short}`), size: typeSize(11) }]}
        x={box.x0 - 50}
        y={(box.y0 + box.y1) / 2}
        turned
        colour={colours.muted}
      />
      {content.freeAcid && <AcidRow curve={content.freeAcid} sheet={sheet} view={view} />}
      {sheet.alongPH && through && <Strips direction="pH" {...strips} through={through} marks={marks.pH} />}
      {sheet.alongEh && through && <Strips direction="Eh" {...strips} through={through} marks={marks.Eh} />}
      {sheet.reach && (
        <ReachBars reaches={content.reaches} pH={(through ?? [view.frame.pH[0]])[0]} sheet={sheet} view={view} />
      )}
    </SheetSvg>
  );
}

/** Names in their fields. */
export const Names = memo(function Names({
  names,
  sheet,
  view,
}: {
  names: readonly PlacedText[];
  sheet: Sheet;
  view: Pick<MapView, "visible" | "colours">;
}) {
  const { toPixel } = mapPixels(sheet, view.visible);
  return names.map(({ id, lines, pH, Eh, colour, lit }) => {
    const [x, y] = toPixel(pH, Eh);
    const halo = lit ? view.colours.tint : view.colours.sheet;
    return <SvgText key={id} label={id} {...{ x, y, lines, colour, halo }} />;
  });
});

interface PointProps {
  at: [number, number];
  box: { x0: number; y0: number; x1: number; y1: number };
  view: MapView;
}

/** The lines that the crosscuts follow. */
const Guides = ({ at: [x, y], box, view }: PointProps) => (
  <path
    d={`M${box.x0} ${y}H${box.x1}M${x} ${box.y0}V${box.y1}`}
    stroke={view.colours.verdigris}
    strokeWidth={1}
    strokeDasharray="1 3"
    fill="none"
  />
);

/** The pinned point and the lines its crosscuts follow. */
function Pin({ at: [x, y], box, view }: PointProps) {
  const { ink, sheet } = view.colours;
  return (
    <g stroke={ink} data-pin="">
      <path
        d={`M${box.x0} ${y}H${box.x1}M${x} ${box.y0}V${box.y1}`}
        strokeWidth={1}
        strokeDasharray="4 4"
        opacity={0.7}
        fill="none"
      />
      <rect
        x={x - 4}
        y={y - 4}
        width={8}
        height={8}
        transform={`rotate(45 ${x} ${y})`}
        fill={sheet}
        strokeWidth={1.6}
      />
    </g>
  );
}
