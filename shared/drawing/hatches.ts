import type { roles } from "../schemas/problem";

type Role = (typeof roles)[number];

/** A hatch: pattern of strokes that repeats every `size` px. */
export interface Hatch {
  shape: "/" | "\\" | "-" | "|" | "x" | "+" | ".";
  /** spacing in px */
  size: number;
  solidity: number;
}

type Shape = Hatch["shape"];

/** Angle, spacing and weight tell the metals apart in a grey print; colour only says the role a second time. */
const shapes: Readonly<Record<Role, readonly Shape[]>> = {
  target: ["-", "|", "+", "/", "\\", "x", "."],
  gangue: ["/", "\\", "x", ".", "+", "|", "-"],
  watched: [".", "|", "\\", "/", "-", "x", "+"],
};

const close: Readonly<Record<Shape, Omit<Hatch, "shape">>> = {
  "-": { size: 8, solidity: 0.18 },
  "|": { size: 8, solidity: 0.18 },
  "+": { size: 11, solidity: 0.12 },
  "/": { size: 9, solidity: 0.12 },
  "\\": { size: 9, solidity: 0.12 },
  x: { size: 13, solidity: 0.08 },
  ".": { size: 7, solidity: 0.16 },
};

/** Spacings of one shape that the eye tells apart: close, wide, widest. Lines keep their thickness. */
const SPACINGS = [1, 1.8, 3];
/** A role's own shapes are used close and wide before those of the others come in. */
const OWN = 3;

/** How strongly a hatch is drawn, by role. */
export const hatchWeight: Readonly<Record<Role, number>> = { target: 0.85, gangue: 0.5, watched: 0.4 };

/** Lines between the fields of a metal, weighted by its role; widths and dashes in px. */
export const boundaryStyle = {
  target: { width: 1.7, dash: "solid" },
  gangue: { width: 1.5, dash: "solid" },
  watched: { width: 1, dash: "5px,3px" },
} as const;

/** Hatches in the order in which a role takes them. */
const listOf = (role: Role): Hatch[] => {
  const [own, others] = [shapes[role].slice(0, OWN), shapes[role].slice(OWN)];
  const spaced = (list: readonly Shape[], times: number): Hatch[] =>
    list.map((shape) => {
      const { size, solidity } = close[shape];
      return { shape, size: Math.round(size * times), solidity: solidity / times };
    });
  return [own, others]
    .flatMap((list) => SPACINGS.slice(0, 2).flatMap((times) => spaced(list, times)))
    .concat(spaced(shapes[role], SPACINGS[2] ?? 3));
};

/** The hatch of each metal in the order of the plan. No two metals of a plan have the same shape at the same spacing, whatever their roles:
 *  there are 21, and a plan has at most 16 metals.
 *  @param metals  with their roles     @returns  by element     @source  the product's own */
export function hatchesOf(metals: readonly { element: string; role: Role }[]): Map<string, Hatch> {
  const taken = new Set<string>();
  return new Map(
    metals.map(({ element, role }) => {
      const list = listOf(role);
      const hatch = list.find((h) => !taken.has(`${h.shape} ${h.size}`)) ?? list[0]!;
      taken.add(`${hatch.shape} ${hatch.size}`);
      return [element, hatch];
    }),
  );
}
