import type { LabelWish, Pixel } from "../../../shared/drawing/labels";
import type { FormulaPart } from "../../../shared/species/typeset";
import type { Field, Point, Solution } from "../../../shared/solution";
import { convexOverlap } from "../geometry/convexOverlap";
import { metalColour } from "../metalStyle";
import { plainText, speciesText, textWidth } from "../speciesText";
import type { TextLine } from "../texts";
import { BEYOND, isBeyond } from "../trust";
import { drawnMetals, type MapMetal, type MapView, windowName } from "../view";
import { typeSize } from "../typeSize";

export const NAME_SIZE = typeSize(11);
const LINE_HEIGHT = 15;
const WINDOW_SIZE = typeSize(13);
const NOTE_SIZE = typeSize(10);

/** A name that asks for room in a field, and how it is to be set. */
export interface NameWish extends LabelWish {
  lines: readonly TextLine[];
  colour: string;
}

type ToPixel = (pH: number, Eh: number) => Pixel;
const pixels = (polygon: readonly Point[], toPixel: ToPixel): Pixel[] => polygon.map(([pH, Eh]) => toPixel(pH, Eh));

/** Pieces of one metal's fields by species. */
function piecesBySpecies(fields: readonly Field[], metal: string): Map<string, (readonly Point[])[]> {
  const found = new Map<string, (readonly Point[])[]>();
  for (const f of fields) if (f.metal === metal) found.set(f.species, [...(found.get(f.species) ?? []), f.polygon]);
  return found;
}

/** The fields of one species gathered; weightier roles first, so that they find room before the watched ones. */
export function fieldWishes(fields: readonly Field[], view: MapView, toPixel: ToPixel): NameWish[] {
  const order = { target: 0, gangue: 1, watched: 2 };
  const metals = drawnMetals(view)
    .filter(({ element }) => view.focus === null || view.focus === element)
    .sort((a, b) => order[a.role] - order[b.role]);
  return metals.flatMap((metal) =>
    [...piecesBySpecies(fields, metal.element)].map(([species, pieces]): NameWish => {
      const parts = marked(species, view);
      return {
        id: `${metal.element} ${species}`,
        pieces: pieces.map((p) => pixels(p, toPixel)),
        width: textWidth(parts, NAME_SIZE) + 6,
        height: LINE_HEIGHT + 1,
        lines: [{ parts, size: NAME_SIZE, bold: metal.role === "target" }],
        colour: metalColour(metal, view),
      };
    }),
  );
}

/** A species' name, with a mark where its energy is beyond its trusted temperatures. */
const marked = (species: string, { trust }: MapView): FormulaPart[] => [
  ...speciesText(species),
  ...(isBeyond(trust, species) ? [{ text: BEYOND, kind: "sup" } as const] : []),
];

const named = (metal: MapMetal, species: string, view: MapView): FormulaPart[] => [
  ...plainText(`${metal.element} `),
  ...marked(species, view),
];

/** Of two metals that are compared: what both are on each piece of ground, one above the other. */
export function pairWishes(fields: readonly Field[], view: MapView, toPixel: ToPixel): NameWish[] {
  const [first, second] = drawnMetals(view);
  if (!first || !second) return [];
  const others = [...piecesBySpecies(fields, second.element)];
  return [...piecesBySpecies(fields, first.element)].flatMap(([a, pieces]) =>
    others.flatMap(([b, more]): NameWish[] => {
      const shared = pieces.flatMap((p) => more.map((q) => convexOverlap(p, q))).filter((p) => p.length > 0);
      if (shared.length === 0) return [];
      const lines = [named(first, a, view), named(second, b, view)].map((parts) => ({ parts, size: NAME_SIZE }));
      return [
        {
          id: `${first.element} ${a}, ${second.element} ${b}`,
          pieces: shared.map((p) => pixels(p, toPixel)),
          width: Math.max(...lines.map((l) => textWidth(l.parts, NAME_SIZE))) + 6,
          height: 2 * LINE_HEIGHT + 1,
          lines,
          colour: view.colours.ink,
        },
      ];
    }),
  );
}

/** "Window A", with a word on what is to be known of it. */
export function windowWishes(solution: Pick<Solution, "windows">, view: MapView, toPixel: ToPixel): NameWish[] {
  return solution.windows.map((window, i): NameWish => {
    const lines: TextLine[] = [{ parts: plainText(`Window ${windowName(i)}`), size: WINDOW_SIZE, bold: true }];
    const note = !window.controllable
      ? "narrower than the control bands"
      : window.setPoint.cutByFrame
        ? "cut by the frame"
        : null;
    if (note !== null) lines.push({ parts: plainText(note), size: NOTE_SIZE });
    return {
      id: `window ${i}`,
      pieces: window.polygons.map(({ outer }) => pixels(outer, toPixel)),
      holes: window.polygons.flatMap(({ holes }) => holes.map((hole) => pixels(hole, toPixel))),
      width: Math.max(...lines.map((l) => textWidth(l.parts, l.size))) + 8,
      height: lines.length > 1 ? 32 : 18,
      lines,
      colour: view.colours.verdigris,
    };
  });
}
