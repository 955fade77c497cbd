import regular from "@fontsource/jetbrains-mono/files/jetbrains-mono-latin-400-normal.woff2?url";
import bold from "@fontsource/jetbrains-mono/files/jetbrains-mono-latin-700-normal.woff2?url";
import { sheetBoxes } from "./boxes";
import type { MapContent } from "./content";
import { mapFigure } from "./figure";
import { picture } from "./Plot";
import type { Figure } from "./plotTypes";
import { haloStyle } from "./texts";
import { type MapView, MONO } from "./view";

const WIDTH = 1000;
const HEIGHT = 860;
const LINE = 16;

/** The map at one size for every screen, with what it rests on in the caption: a picture travels without its plan. */
export function captionedFigure(
  content: MapContent,
  view: Omit<MapView, "visible">,
  title: string,
  caption: readonly string[],
): Figure {
  const { crosscuts, reach } = view.layers;
  const sheet = sheetBoxes(WIDTH, HEIGHT, {
    metals: view.metals.length,
    reagents: content.reaches.length,
    crosscuts: crosscuts && content.through !== null,
    reach,
    freeAcid: content.freeAcid !== null,
  });
  const { data, layout } = mapFigure(content, sheet, { ...view, visible: view.frame, traceTrials: true });
  const [head, foot] = [30, LINE * caption.length + 18];
  const words = (text: string, y: number, size: number, color: string) => ({
    text,
    x: 0,
    y,
    xref: "paper",
    yref: "paper",
    xanchor: "left" as const,
    yanchor: "top" as const,
    xshift: -layout.margin.l + 14,
    showarrow: false as const,
    align: "left" as const,
    font: { family: MONO, size, color },
  });
  return {
    data,
    layout: {
      ...layout,
      height: HEIGHT + head + foot,
      margin: { ...layout.margin, t: layout.margin.t + head, b: layout.margin.b + foot },
      paper_bgcolor: view.colours.paper,
      annotations: [
        ...layout.annotations,
        { ...words(`<b>${title}</b>`, 1, 15, view.colours.ink), yshift: head + 12 },
        ...caption.map((line, i) => ({
          ...words(line, 0, 11, view.colours.muted),
          yshift: -layout.margin.b - 8 - i * LINE,
        })),
      ],
    },
  };
}

const asDataUrl = async (url: string): Promise<string> => {
  const bytes = new Uint8Array(await (await fetch(url)).arrayBuffer());
  return `data:font/woff2;base64,${btoa(Array.from(bytes, (b) => String.fromCharCode(b)).join(""))}`;
};

/** The figure as SVG text that stands alone: fonts and halos written into it. */
async function standaloneSvg(figure: Figure, view: Omit<MapView, "visible">): Promise<string> {
  const url = await picture(figure);
  const svg = decodeURIComponent(url.slice(url.indexOf(",") + 1));
  const faces = await Promise.all(
    (
      [
        [400, regular],
        [700, bold],
      ] as const
    ).map(
      async ([weight, file]) =>
        `@font-face{font-family:"JetBrains Mono";font-weight:${weight};src:url(${await asDataUrl(file)}) format("woff2")}`,
    ),
  );
  const style = faces.join("") + haloStyle(view.colours.sheet, view.colours.tint);
  return svg.replace(/(<svg[^>]*>)/, `$1<style>${style}</style>`);
}

async function rasterised(svg: string, width: number, height: number): Promise<Blob> {
  const image = new Image();
  image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(svg)}`;
  await image.decode();
  const canvas = Object.assign(document.createElement("canvas"), { width: 2 * width, height: 2 * height });
  canvas.getContext("2d")?.drawImage(image, 0, 0, canvas.width, canvas.height);
  return new Promise((done, fail) =>
    canvas.toBlob(
      (blob) => (blob ? done(blob) : fail(new Error("The browser could not make the picture."))),
      "image/png",
    ),
  );
}

/** A picture of the map as a file.
 *  @throws Error when the browser cannot draw it */
export async function mapPicture(figure: Figure, view: Omit<MapView, "visible">, format: "png" | "svg"): Promise<Blob> {
  const svg = await standaloneSvg(figure, view);
  if (format === "svg") return new Blob([svg], { type: "image/svg+xml" });
  return rasterised(svg, figure.layout.width, figure.layout.height);
}
