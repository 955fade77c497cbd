import type { roles } from "../schemas/problem";

type Role = (typeof roles)[number];

/** A hatch: pattern of strokes that repeats every `size` px. */
export interface Hatch {
  shape: "/" | "\\" | "-" | "|" | "x" | "+" | ".";
  /** spacing in px */
  size: number;
  solidity: number;
}

/** Angle, spacing and weight tell the metals apart in a grey print; colour only says the role a second time. */
const hatches: Readonly<Record<Role, readonly Hatch[]>> = {
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

/** How strongly a hatch is drawn, by role. */
export const hatchWeight: Readonly<Record<Role, number>> = { target: 0.85, gangue: 0.5, watched: 0.4 };

/** Lines between the fields of a metal, weighted by its role; widths and dashes in px. */
export const boundaryStyle = {
  target: { width: 1.7, dash: "solid" },
  gangue: { width: 1.5, dash: "solid" },
  watched: { width: 1, dash: "5px,3px" },
} as const;

/** The hatch of each metal in the order of the plan; a fourth of one role repeats the angle at a wider spacing. */
export function hatchesOf(metals: readonly { element: string; role: Role }[]): Map<string, Hatch> {
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
