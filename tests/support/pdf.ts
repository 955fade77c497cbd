import { inflateSync } from "node:zlib";

/** A piece of text as it stands on the page; points from the upper left corner, y of the base line. */
export interface PdfText {
  text: string;
  x: number;
  y: number;
  size: number;
  width: number;
  /** drawn as an outline only: a halo */
  halo: boolean;
  /** runs up the page; x and y are then its own */
  turned: boolean;
}

interface PdfFont {
  letters: Map<number, string>;
  widths: Map<number, number>;
}

/** Objects of a file without object streams, by number: dictionary and, inflated, the stream. */
function objectsOf(bytes: Buffer): Map<number, { head: string; stream: string }> {
  const raw = bytes.toString("latin1");
  const objects = new Map<number, { head: string; stream: string }>();
  for (const match of raw.matchAll(/(?:^|\n)(\d+) 0 obj\n/g)) {
    const start = match.index + match[0].length;
    const end = raw.indexOf("\nendobj", start);
    const body = raw.slice(start, end);
    const at = body.indexOf("stream\n");
    const head = at < 0 ? body : body.slice(0, at);
    const length = Number(/\/Length (\d+)/.exec(head)?.[1] ?? 0);
    const data = at < 0 ? "" : body.slice(at + 7, at + 7 + length);
    const stream = head.includes("/FlateDecode") ? inflateSync(Buffer.from(data, "latin1")).toString("latin1") : data;
    objects.set(Number(match[1]), { head, stream });
  }
  return objects;
}

const utf16 = (hex: string): string => Buffer.from(hex, "hex").swap16().toString("utf16le");

function fontOf(objects: ReturnType<typeof objectsOf>, number: number): PdfFont {
  const head = objects.get(number)?.head ?? "";
  const ref = (key: string, of: string) => Number(new RegExp(`/${key} \\[?(\\d+) 0 R`).exec(of)?.[1]);
  const letters = new Map<number, string>();
  const map = objects.get(ref("ToUnicode", head))?.stream ?? "";
  for (const [, first = "", , list = ""] of map.matchAll(/<([0-9a-f]+)> <([0-9a-f]+)> \[([^\]]*)\]/gi))
    [...list.matchAll(/<([0-9a-f]*)>/gi)].forEach(([, hex = ""], i) =>
      letters.set(parseInt(first, 16) + i, utf16(hex)),
    );
  const widths = new Map<number, number>();
  const descendant = objects.get(ref("DescendantFonts", head))?.head ?? "";
  for (const [, first = "", list = ""] of descendant.slice(descendant.indexOf("/W [")).matchAll(/(\d+) \[([^\]]*)\]/g))
    list
      .trim()
      .split(/\s+/)
      .forEach((w, i) => widths.set(Number(first) + i, Number(w)));
  return { letters, widths };
}

export interface ReadPdf {
  pages: number;
  texts: PdfText[];
  /** in the order of drawing, pieces on one base line side by side */
  words: string;
  info: string;
  /** closed paths, points from the upper left corner */
  paths: [number, number][][];
  /** how often the pen was held inside an outline, holes left out */
  clips: number;
  images: number;
}

/** Closed paths of a page, in the coordinates of its content. */
function pathsOf(stream: string): [number, number][][] {
  const paths: [number, number][][] = [];
  let open: [number, number][] = [];
  for (const line of stream.split("\n")) {
    const [, x = "", y = "", verb = ""] = /^(-?[\d.]+) (-?[\d.]+) ([ml])$/.exec(line) ?? [];
    if (verb === "m") open = [];
    if (verb !== "") open.push([Number(x), Number(y)]);
    if (line === "h") paths.push(open);
  }
  return paths;
}

/** Reads what PDFKit writes: pages, text by its ToUnicode maps, places and widths. */
export function readPdf(bytes: Buffer): ReadPdf {
  const objects = objectsOf(bytes);
  const heads = [...objects.values()].map(({ head }) => head);
  const pages = heads.filter((h) => /\/Type \/Page\b(?!s)/.test(h));
  const fonts = new Map<string, PdfFont>();
  for (const head of heads)
    for (const [, name = "", number = ""] of head.matchAll(/\/(F\d+) (\d+) 0 R/g))
      if (!fonts.has(name)) fonts.set(name, fontOf(objects, Number(number)));
  const contents = Number(/\/Contents (\d+) 0 R/.exec(pages[0] ?? "")?.[1]);
  const { stream = "" } = objects.get(contents) ?? {};
  const texts: PdfText[] = [];
  const turns = [false];
  for (const [token, block] of stream.matchAll(/^BT\n([\s\S]*?)ET$|^q$|^Q$|^[-\d.]+ [-\d.]+ .* cm$/gm)) {
    if (token === "q") turns.push(turns.at(-1) ?? false);
    else if (token === "Q") turns.pop();
    else if (block === undefined) turns[turns.length - 1] ||= Number(token.split(" ")[1]) !== 0;
    if (block === undefined) continue;
    const place = /1 0 0 1 (-?[\d.]+) (-?[\d.]+) Tm/.exec(block);
    const font = /\/(F\d+) ([\d.]+) Tf/.exec(block);
    if (!place || !font) continue;
    const own = fonts.get(font[1] ?? "");
    const size = Number(font[2]);
    let [text, width] = ["", 0];
    for (const [, list = ""] of block.matchAll(/\[([^\]]*)\] TJ/g))
      for (const [, hex = "", kern = ""] of list.matchAll(/<([0-9a-f]*)>|(-?[\d.]+)/g)) {
        if (kern !== "") width -= (Number(kern) / 1000) * size;
        for (const [code = ""] of hex.matchAll(/[0-9a-f]{4}/g)) {
          text += own?.letters.get(parseInt(code, 16)) ?? "\ufffd";
          width += ((own?.widths.get(parseInt(code, 16)) ?? 0) / 1000) * size;
        }
      }
    const halo = /\b1 Tr/.test(block);
    texts.push({
      text,
      x: Number(place[1]),
      y: 841.89 - Number(place[2]),
      size,
      width,
      halo,
      turned: turns.at(-1) ?? false,
    });
  }
  return {
    pages: pages.length,
    texts,
    words: wordsOf(texts.filter((t) => !t.halo)),
    info: infoOf(objects),
    paths: pathsOf(stream),
    clips: stream.match(/^W\* n$/gm)?.length ?? 0,
    images: heads.filter((h) => h.includes("/Subtype /Image")).length,
  };
}

/** Title, author and moment, as the file names itself. */
function infoOf(objects: ReturnType<typeof objectsOf>): string {
  const head = [...objects.values()].find((o) => o.head.includes("/CreationDate"))?.head ?? "";
  return head.replace(/(\d+) 0 R/g, (_, n: string) => objects.get(Number(n))?.head ?? "");
}

/** Text put together again: a space where the pen moved on, none where it touched. */
function wordsOf(texts: readonly PdfText[]): string {
  let words = "";
  let last: PdfText | null = null;
  for (const t of texts) {
    const near = last !== null && Math.abs(t.y - last.y) < 6 && Math.abs(t.x - (last.x + last.width)) < 0.6;
    words += near ? t.text : ` ${t.text}`;
    last = t;
  }
  return words.replace(/[ \u2009\u00a0]+/g, " ").trim();
}
