/** The sheet in pixels: map, strips under it along pH, strips beside it along Eh, reach bars between map and strips. */
export interface SheetBox {
  x0: number;
  /** from the bottom of the figure, as Plotly counts domains */
  y0: number;
  x1: number;
  y1: number;
}
export interface Sheet {
  width: number;
  height: number;
  margin: { l: number; r: number; t: number; b: number; pad: 0 };
  map: SheetBox;
  reach: SheetBox | null;
  alongPH: SheetBox | null;
  alongEh: SheetBox | null;
}

/** From the figure's top, as SVG counts. */
export const fromTop = ({ height }: Pick<Sheet, "height">, { x0, x1, y0, y1 }: SheetBox): SheetBox => ({
  x0,
  x1,
  y0: height - y1,
  y1: height - y0,
});

export interface SheetWishes {
  metals: number;
  reagents: number;
  crosscuts: boolean;
  reach: boolean;
  /** a second row under the pH axis */
  freeAcid?: boolean;
  /** a second pair of crosscuts, through a pinned point, beside the first */
  pinned?: boolean;
}

const LEFT = 62;
const TOP = 22;
const RIGHT = 6;
const AXIS = { plain: 42, withFreeAcid: 60 };
/** Room beyond the strips for the distances to the limits. */
const DISTANCES = 17;
const REACH_COLUMN = 18;
const GAP = 14;
/** In front of the reach bars: the last figure of the pH axis stands half beyond the map, beside their names. */
const REACH_GAP = 20;

/** Thickness of a metal's strip: thinner where there are many metals, double where two points are compared. */
export function stripThickness(metals: number, pinned: boolean): number {
  const one = Math.min(22, Math.max(13, Math.floor(190 / Math.max(1, metals))));
  return pinned ? Math.min(36, Math.round(1.6 * one)) : one;
}

/** Where everything stands; strips keep their thickness whatever the sheet's size, the map takes the rest.
 *  @param width, height  of the whole figure, px     @returns  boxes in px from the figure's lower left corner */
export function sheetBoxes(width: number, height: number, wishes: SheetWishes): Sheet {
  const { metals, reagents, crosscuts, reach, pinned = false, freeAcid = false } = wishes;
  const axisBelow = freeAcid ? AXIS.withFreeAcid : AXIS.plain;
  const strip = stripThickness(metals, pinned);
  const columns = crosscuts ? metals * strip : 0;
  const rows = crosscuts ? metals * strip : 0;
  const bars = reach && reagents > 0 ? reagents * REACH_COLUMN : 0;
  const margin = { l: LEFT, r: RIGHT, t: TOP, b: crosscuts ? DISTANCES : axisBelow, pad: 0 as const };
  const mapRight = Math.max(
    LEFT + 120,
    width - RIGHT - columns - (columns > 0 ? GAP + DISTANCES : 0) - bars - (bars > 0 ? REACH_GAP : 0),
  );
  const mapBottom = Math.min(height - TOP - 120, crosscuts ? margin.b + rows + axisBelow : axisBelow);
  const map = { x0: LEFT, x1: mapRight, y0: mapBottom, y1: height - TOP };
  const barsLeft = mapRight + REACH_GAP;
  const columnsLeft = bars > 0 ? barsLeft + bars + GAP : mapRight + GAP;
  return {
    width,
    height,
    margin,
    map,
    reach: bars > 0 ? { x0: barsLeft, x1: barsLeft + bars, y0: map.y0, y1: map.y1 } : null,
    alongPH: crosscuts ? { x0: map.x0, x1: map.x1, y0: margin.b, y1: margin.b + rows } : null,
    alongEh: crosscuts ? { x0: columnsLeft, x1: columnsLeft + columns, y0: map.y0, y1: map.y1 } : null,
  };
}

/** Plotly wants domains as shares of the area inside the margins. */
export function domains(sheet: Sheet, box: SheetBox): { x: [number, number]; y: [number, number] } {
  const { margin, width, height } = sheet;
  const inner = { w: width - margin.l - margin.r, h: height - margin.t - margin.b };
  const share = (v: number) => Math.min(1, Math.max(0, v));
  return {
    x: [share((box.x0 - margin.l) / inner.w), share((box.x1 - margin.l) / inner.w)],
    y: [share((box.y0 - margin.b) / inner.h), share((box.y1 - margin.b) / inner.h)],
  };
}

/** Pixels of the map, y downwards from the figure's top, to pH and shown or SHE potential and back. */
export function mapPixels(sheet: Sheet, visible: { pH: readonly [number, number]; Eh: readonly [number, number] }) {
  const { map, height } = sheet;
  const top = height - map.y1;
  const [w, h] = [map.x1 - map.x0, map.y1 - map.y0];
  const [p0, p1] = visible.pH;
  const [e0, e1] = visible.Eh;
  return {
    box: { x0: map.x0, y0: top, x1: map.x1, y1: top + h },
    toPixel: (pH: number, Eh: number): [number, number] => [
      map.x0 + ((pH - p0) / (p1 - p0)) * w,
      top + h - ((Eh - e0) / (e1 - e0)) * h,
    ],
    toPoint: (x: number, y: number): [number, number] => [
      p0 + ((x - map.x0) / w) * (p1 - p0),
      e0 + ((top + h - y) / h) * (e1 - e0),
    ],
  };
}
