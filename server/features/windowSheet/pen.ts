import { createRequire } from "node:module";
import PDFDocument from "pdfkit";
import { lightPalette } from "../../../shared/drawing/palette";

export type Face = "sans" | "bold" | "mono" | "monoBold";
export type Colour = keyof typeof lightPalette;

/** A piece of a line: what it reads, and how it is set apart from its neighbours. */
export interface Piece {
  text: string;
  rise?: "sub" | "sup";
  face?: Face;
  colour?: Colour;
}
export type Inline = string | Piece | readonly Inline[];

export interface Style {
  size: number;
  face: Face;
  colour: Colour;
}

/** A run of letters in one face at one height. */
interface Run {
  text: string;
  face: Face;
  size: number;
  colour: Colour;
  /** above the base line */
  up: number;
  width: number;
}
/** Words set side by side, with its whole width. */
export interface Line {
  runs: Run[];
  width: number;
}

const { resolve } = createRequire(import.meta.url);
const files: Readonly<Record<Face, string>> = {
  sans: "atkinson-hyperlegible-next/400Regular/AtkinsonHyperlegibleNext_400Regular.ttf",
  bold: "atkinson-hyperlegible-next/700Bold/AtkinsonHyperlegibleNext_700Bold.ttf",
  mono: "jetbrains-mono/400Regular/JetBrainsMono_400Regular.ttf",
  monoBold: "jetbrains-mono/700Bold/JetBrainsMono_700Bold.ttf",
};
const other: Readonly<Record<Face, Face>> = { sans: "mono", bold: "monoBold", mono: "sans", monoBold: "bold" };

// The ligatures of JetBrains Mono trip the writer, and chemistry wants none.
const plain = { calt: false, liga: false, clig: false } as unknown as PDFKit.Mixins.OpenTypeFeatures[];

/** Characters that neither face has, in characters that one has. */
const spelt: Readonly<Record<string, string>> = {
  "\u202f": "\u2009",
  "\u00b5": "\u03bc",
  "\u21cc": "=",
  "\u2103": "°C",
  "\u207b": "\u2212",
};

const SMALL = 0.72;
const UP = { sub: -0.16, sup: 0.36 } as const;

/** The document and the hand that writes on it: faces, measures, lines of typeset words. Sizes in points, y downwards. */
export class Pen {
  readonly doc: PDFKit.PDFDocument;
  private readonly bytes: Buffer[] = [];
  private readonly done: Promise<void>;
  private readonly known = new Map<string, boolean>();
  private readonly widths = new Map<string, number>();

  /** @param info  as the file names itself; a file of one moment and content is always the same bytes
   *  @param at  stands as the moment of creation, and makes the file's id */
  constructor(info: { Title: string; Author: string; Subject: string }, at: Date) {
    const dated = { ...info, Creator: "Gangueway", Producer: "Gangueway", CreationDate: at, ModDate: at };
    this.doc = new PDFDocument({
      size: "A4",
      margin: 0,
      info: dated,
      lang: "en-GB",
      displayTitle: true,
      font: "",
      pdfVersion: "1.7",
    });
    for (const face of Object.keys(files) as Face[])
      this.doc.registerFont(face, resolve(`@expo-google-fonts/${files[face]}`));
    this.done = new Promise((end, fail) => {
      this.doc.on("data", (chunk: Buffer) => this.bytes.push(chunk));
      this.doc.once("end", end);
      this.doc.once("error", fail);
    });
  }

  async finished(): Promise<Buffer> {
    this.doc.end();
    await this.done;
    return Buffer.concat(this.bytes);
  }

  private has(face: Face, letter: string): boolean {
    const key = face + letter;
    let has = this.known.get(key);
    if (has === undefined) {
      this.doc.font(face);
      const { font } = (this.doc as unknown as { _font: { font: { hasGlyphForCodePoint: (c: number) => boolean } } })
        ._font;
      this.known.set(key, (has = font.hasGlyphForCodePoint(letter.codePointAt(0) ?? 0)));
    }
    return has;
  }

  private widthOf(text: string, face: Face, size: number): number {
    const key = `${face} ${text}`;
    let width = this.widths.get(key);
    if (width === undefined) {
      width = this.doc.font(face).fontSize(1000).widthOfString(text, { features: plain });
      this.widths.set(key, width);
    }
    return (width * size) / 1000;
  }

  /** Parts a text where the face changes because a letter is missing. */
  private byFace(text: string, face: Face): [string, Face][] {
    const parts: [string, Face][] = [];
    for (const raw of text) {
      for (const letter of this.has(face, raw) || this.has(other[face], raw) ? raw : (spelt[raw] ?? "?")) {
        const own = this.has(face, letter) ? face : other[face];
        const last = parts.at(-1);
        if (last && last[1] === own) last[0] += letter;
        else parts.push([letter, own]);
      }
    }
    return parts;
  }

  private runsOf({ text, rise, face, colour }: Piece, style: Style): Run[] {
    const size = rise ? style.size * SMALL : style.size;
    const up = rise ? style.size * UP[rise] : 0;
    return this.byFace(text, face ?? style.face).map(([part, own]) => ({
      text: part,
      face: own,
      size,
      colour: colour ?? style.colour,
      up,
      width: this.widthOf(part, own, size),
    }));
  }

  /** One line, however long. */
  line(inline: Inline, style: Style): Line {
    const runs = piecesOf(inline).flatMap((piece) => this.runsOf(piece, style));
    return { runs, width: runs.reduce((sum, r) => sum + r.width, 0) };
  }

  /** Lines no wider than `width`; broken at spaces, a word that is too long within itself. */
  lines(inline: Inline, style: Style, width: number): Line[] {
    const space = this.widthOf(" ", style.face, style.size);
    const out: Line[] = [];
    let open: Line = { runs: [], width: 0 };
    const close = () => {
      out.push(open);
      open = { runs: [], width: 0 };
    };
    const blank = (): Run => ({ text: " ", ...style, up: 0, width: space });
    for (const word of wordsOf(piecesOf(inline))) {
      const runs = word.flatMap((piece) => this.runsOf(piece, style));
      const wide = runs.reduce((sum, r) => sum + r.width, 0);
      if (open.runs.length > 0 && open.width + space + wide > width) close();
      if (open.runs.length > 0) {
        open.runs.push(blank());
        open.width += space;
      }
      for (const run of wide > width ? runs.flatMap((r) => this.letters(r)) : runs) {
        if (open.width + run.width > width && open.runs.length > 0 && wide > width) close();
        open.runs.push(run);
        open.width += run.width;
      }
    }
    if (open.runs.length > 0 || out.length === 0) close();
    return out;
  }

  private letters = (run: Run): Run[] =>
    Array.from(run.text, (text) => ({ ...run, text, width: this.widthOf(text, run.face, run.size) }));

  /** Writes a line with its base line at `y`; `halo` in the colour of the ground lifts it off hatching. */
  write(line: Line, x: number, y: number, halo?: string): void {
    for (const stroke of halo === undefined ? [false] : [true, false]) {
      let at = x;
      for (const { text, face, size, colour, up, width } of line.runs) {
        if (text !== " ") {
          this.doc.font(face).fontSize(size);
          if (stroke)
            this.doc
              .lineWidth(2.4)
              .lineJoin("round")
              .strokeColor(halo ?? "")
              .undash();
          else this.doc.fillColor(lightPalette[colour]);
          const options = { features: plain, lineBreak: false, baseline: "alphabetic" as const };
          this.doc.text(text, at, y - up, stroke ? { ...options, stroke: true, fill: false } : options);
        }
        at += width;
      }
    }
  }

  rule(x0: number, x1: number, y: number, weight = 0.5, colour: Colour = "rule"): void {
    this.doc.lineWidth(weight).strokeColor(lightPalette[colour]).undash().moveTo(x0, y).lineTo(x1, y).stroke();
  }
}

export function piecesOf(inline: Inline): Piece[] {
  if (typeof inline === "string") return [{ text: inline }];
  return "text" in inline ? [inline] : inline.flatMap(piecesOf);
}

/** Words as lists of pieces: pieces that touch without a space between stay together. */
function wordsOf(pieces: readonly Piece[]): Piece[][] {
  const words: Piece[][] = [];
  let joined = false;
  for (const piece of pieces) {
    const parts = piece.text.split(/[ \t\r\n]+/);
    parts.forEach((text, i) => {
      if (i > 0) joined = false;
      if (text === "") return;
      const last = words.at(-1);
      if (joined && last) last.push({ ...piece, text });
      else words.push([{ ...piece, text }]);
      joined = true;
    });
  }
  return words;
}
