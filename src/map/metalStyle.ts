import { type Hatch, hatchWeight } from "../../shared/drawing/hatches";
import type { ThemeColours } from "../lib/theme";
import type { PatternFill } from "./plotTypes";
import type { MapMetal, MapView } from "./view";

export { type Hatch, hatchesOf } from "../../shared/drawing/hatches";

type RoleColours = Pick<ThemeColours, "copper" | "ink" | "muted">;

/** Colour of a metal's lines and names. */
export const metalColour = ({ role }: Pick<MapMetal, "role">, { colours }: { colours: RoleColours }): string =>
  role === "target" ? colours.copper : role === "gangue" ? colours.ink : colours.muted;

/** The same for what stands outside Plotly and can follow the style sheet, on paper too. */
export const cssMetalColour = (metal: Pick<MapMetal, "role">): string =>
  metalColour(metal, {
    colours: { copper: "var(--color-copper)", ink: "var(--color-ink)", muted: "var(--color-muted)" },
  });

/** 1 for the metal in focus or without a focus, else what steps back. */
export const emphasis = (element: string, view: Pick<MapView, "focus">): number =>
  view.focus === null || view.focus === element ? 1 : 0.22;

/** A requirement "free" asks nothing, so such a metal shuts no ground. */
export const shuts = (metal: MapMetal): boolean => metal.requirement !== "free";

export function patternOf(metal: MapMetal, hatch: Hatch, view: Pick<MapView, "colours" | "focus">): PatternFill {
  return {
    ...hatch,
    fgcolor: metalColour(metal, view),
    fgopacity: hatchWeight[metal.role] * emphasis(metal.element, view),
    bgcolor: "rgba(0,0,0,0)",
  };
}
