import { type PlotTrace, trace } from "./plotTypes";

/** A word that stands on the map or in a strip along pH. */
export interface PlacedText {
  html: string;
  x: number;
  /** on the shown scale, or the row of a strip */
  y: number;
  colour: string;
  size: number;
}

/** Names as one text trace a ground: cheap to redraw, where annotations would each be measured again at every step of a drag.
 *  The halo that lifts them off the hatching comes from the style sheet, by the trace's uid (styles/map.css). */
export const textTrace = (
  uid: string,
  name: string,
  texts: readonly PlacedText[],
  axes: { xaxis?: "x"; yaxis?: "y" | "y2" } = {},
): PlotTrace =>
  trace({
    uid,
    name,
    mode: "text",
    ...axes,
    x: texts.map((t) => t.x),
    y: texts.map((t) => t.y),
    text: texts.map((t) => t.html),
    textposition: "middle center",
    textfont: { color: texts.map((t) => t.colour), size: texts.map((t) => t.size) },
  });

/** Style of the halos; also written into exported pictures. Uids end in the ground the names stand on. */
export const haloStyle = (sheet: string, tint: string): string =>
  ["sheet", "lit"]
    .map((ground) => {
      const selector = `.scatterlayer [class*="-on-${ground}"] .textpoint text`;
      return `${selector}{paint-order:stroke;stroke:${ground === "lit" ? tint : sheet};stroke-width:3.5px;stroke-linejoin:round}`;
    })
    .join("");
