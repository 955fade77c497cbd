import type { Colour } from "./pen";

export const roleColour = { target: "copper", gangue: "ink", watched: "muted" } as const satisfies Record<
  string,
  Colour
>;

/** The weightier drawn later, and named first. */
export const roleOrder = { target: 0, gangue: 1, watched: 2 } as const;
