import type { Inline, Line, Pen, Style } from "./pen";

/** Something laid out for a width: how high it stands, how to draw it from its upper left corner, and how many of its rows found no room. */
export interface Block {
  height: number;
  draw: (x: number, y: number) => void;
  dropped: number;
}

/** Sizes of type to try, points. */
export const SMALLEST = 6.2;
export const SIZES = [8.2, 7.7, 7.2, 6.7, SMALLEST];

const LEADING = 1.28;
export const textStyle = (size: number): Style => ({ size, face: "sans", colour: "ink" });
export const mutedStyle = (size: number): Style => ({ size, face: "sans", colour: "muted" });

/** Lines under each other. */
export function textBlock(pen: Pen, text: Inline, style: Style, width: number): Block {
  const lines = pen.lines(text, style, width);
  const step = style.size * LEADING;
  return {
    height: lines.length * step,
    dropped: 0,
    draw: (x, y) => lines.forEach((line, i) => pen.write(line, x, y + i * step + style.size * 0.95)),
  };
}

export const gap = (height: number): Block => ({ height, draw: () => undefined, dropped: 0 });

export function stack(blocks: readonly Block[]): Block {
  return {
    height: blocks.reduce((sum, b) => sum + b.height, 0),
    dropped: blocks.reduce((sum, b) => sum + b.dropped, 0),
    draw: (x, y) => {
      let at = y;
      for (const b of blocks) {
        b.draw(x, at);
        at += b.height;
      }
    },
  };
}

/** A heading over a line in ink, a word of its own at the right. */
export function heading(pen: Pen, words: string, aside: Inline, size: number, width: number): Block {
  const head = pen.line(words, { size: size + 0.5, face: "monoBold", colour: "ink" });
  const right = pen.line(aside, { size: size - 0.5, face: "sans", colour: "muted" });
  return {
    height: size * 1.9,
    dropped: 0,
    draw: (x, y) => {
      pen.write(head, x, y + size);
      pen.write(right, x + width - right.width, y + size);
      pen.rule(x, x + width, y + size * 1.42, 0.7, "ink");
    },
  };
}

/** Rows of blocks with a hairline under each; beyond `most` they are counted, not shown. */
export function rows(pen: Pen, all: readonly Block[], most: number, size: number, width: number, what: string): Block {
  const shown = all.length > most ? all.slice(0, Math.max(0, most - 1)) : all;
  const left = all.length - shown.length;
  const blocks = shown.map((b): Block => ({
    height: b.height + size * 0.42,
    dropped: b.dropped,
    draw: (x, y) => {
      b.draw(x, y + size * 0.12);
      pen.rule(x, x + width, y + b.height + size * 0.3, 0.35);
    },
  }));
  if (left > 0)
    blocks.push(textBlock(pen, `… and ${left} more ${what} in the plan`, { ...textStyle(size), face: "bold" }, width));
  return { ...stack(blocks), dropped: left };
}

export interface Column {
  /** share of the width */
  share: number;
  align?: "right";
}

/** Cells beside each other, the highest says the height. */
export function cells(
  pen: Pen,
  columns: readonly Column[],
  texts: readonly Inline[],
  style: Style,
  width: number,
): Block {
  const gutter = style.size * 0.9;
  const room = width - gutter * (columns.length - 1);
  const widths = columns.map(({ share }) => share * room);
  const laid: Line[][] = texts.map((text, i) => pen.lines(text, style, widths[i] ?? 0));
  const step = style.size * LEADING;
  return {
    height: Math.max(...laid.map((lines) => lines.length)) * step,
    dropped: 0,
    draw: (x, y) => {
      let left = x;
      laid.forEach((lines, i) => {
        const wide = widths[i] ?? 0;
        lines.forEach((line, k) => {
          const shift = columns[i]?.align === "right" ? wide - line.width : 0;
          pen.write(line, left + shift, y + k * step + style.size * 0.95);
        });
        left += wide + gutter;
      });
    },
  };
}
