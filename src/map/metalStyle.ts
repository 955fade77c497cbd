import type { ThemeColours } from "../lib/theme";
import type { PatternFill } from "./plotTypes";
import type { MapMetal, MapView } from "./view";

export interface Hatch {
  shape: "/" | "\\" | "-" | "|" | "x" | "+" | ".";
  /** spacing in px */
  size: number;
  solidity: number;
}

/** Angle, spacing and weight tell the metals apart in a grey print; colour only says the role a second time. */
const hatches: Readonly<Record<MapMetal["role"], readonly Hatch[]>> = {
  target: [
    { shape: "-", size: 8, solidity: 0.18 },
    { shape: "|", size: 8, solidity: 0.18 },
    { shape: "+", size: 11, solidity: 0.12 },
  ],
  gangue: [
    { shape: "/", size: 9, solidity: 0.12 },
    { shape: "\\", size: 9, solidity: 0.12 },
    { shape: "x", size: 13, solidity: 0.08 },
  ],
  watched: [
    { shape: ".", size: 7, solidity: 0.16 },
    { shape: "|", size: 14, solidity: 0.06 },
    { shape: "\\", size: 15, solidity: 0.06 },
  ],
};

/** The hatch of each metal in the order of the plan; a fourth of one role repeats the angle at a wider spacing. */
export function hatchesOf(metals: readonly MapMetal[]): Map<string, Hatch> {
  const seen = { target: 0, gangue: 0, watched: 0 };
  return new Map(
    metals.map(({ element, role }) => {
      const list = hatches[role];
      const n = seen[role]++;
      const round = Math.floor(n / list.length);
      const base = list[n % list.length] ?? { shape: "/", size: 9, solidity: 0.12 };
      return [element, { ...base, size: base.size + 6 * round, solidity: base.solidity / (1 + round) }];
    }),
  );
}

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

const weight = { target: 0.85, gangue: 0.5, watched: 0.4 } as const;

export function patternOf(metal: MapMetal, hatch: Hatch, view: Pick<MapView, "colours" | "focus">): PatternFill {
  return {
    ...hatch,
    fgcolor: metalColour(metal, view),
    fgopacity: weight[metal.role] * emphasis(metal.element, view),
    bgcolor: "rgba(0,0,0,0)",
  };
}
