/** A tablet is read from further off than a screen on a desk: its pointer is a finger. Asked once; a page keeps its kind of pointer. */
const factor =
  typeof window !== "undefined" &&
  typeof window.matchMedia === "function" &&
  window.matchMedia("(pointer: coarse)").matches
    ? 1.15
    : 1;

/** Size of the map's words, px, from the size they have on a desk. */
export const typeSize = (px: number): number => Math.round(px * factor);
