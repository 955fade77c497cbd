import bold from "@fontsource/jetbrains-mono/files/jetbrains-mono-latin-700-normal.woff2?url";
import regular from "@fontsource/jetbrains-mono/files/jetbrains-mono-latin-400-normal.woff2?url";
import { createElement, type ReactElement } from "react";
import { flushSync } from "react-dom";
import { createRoot } from "react-dom/client";
import { sheetBoxes, type Sheet } from "./boxes";
import type { MapContent } from "./content";
import { mapLayout, mapTraces } from "./figure";
import { placedNames } from "./names/placedNames";
import { picture } from "./Plot";
import type { Figure } from "./plotTypes";
import { Overlay } from "./svg/Overlay";
import { Shapes } from "./svg/Shapes";
import { drawnMetals, type MapView, MONO } from "./view";

const WIDTH = 1000;
const HEIGHT = 860;
const LINE = 16;
const HEAD = 30;

/** A picture in the making: the axes with the caption, and what stands under and over them. */
export interface Picture {
  figure: Figure;
  content: MapContent;
  sheet: Sheet;
  view: MapView;
}

/** The map at one size for every screen, as it is seen: part in sight, hidden metals, trials. With what it rests on in the caption,
 *  since a picture travels without its plan. */
export function captionedPicture(
  content: MapContent,
  view: MapView,
  title: string,
  caption: readonly string[],
): Picture {
  const { crosscuts, reach } = view.layers;
  const sheet = sheetBoxes(WIDTH, HEIGHT, {
    metals: drawnMetals(view).length,
    reagents: content.reaches.length,
    crosscuts: crosscuts && content.through !== null,
    reach,
    freeAcid: content.freeAcid !== null,
    pinned: content.pinned !== null,
  });
  const layout = mapLayout(sheet, view);
  const foot = LINE * caption.length + 18;
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
  const figure = {
    data: [],
    layout: {
      ...layout,
      height: HEIGHT + HEAD + foot,
      margin: { ...layout.margin, t: layout.margin.t + HEAD, b: layout.margin.b + foot },
      annotations: [
        { ...words(`<b>${title}</b>`, 1, 15, view.colours.ink), yshift: HEAD + 16 },
        ...caption.map((line, i) => ({
          ...words(line, 0, 11, view.colours.muted),
          yshift: -layout.margin.b - 8 - i * LINE,
        })),
      ],
    },
  };
  return { figure, content, sheet, view };
}

/** One of the map's drawings as SVG text, moved below the title. */
function svgText(drawing: ReactElement): string {
  const holder = document.createElement("div");
  const root = createRoot(holder);
  flushSync(() => root.render(drawing));
  const svg = holder.querySelector("svg");
  svg?.setAttribute("y", String(HEAD));
  const text = svg ? new XMLSerializer().serializeToString(svg) : "";
  root.unmount();
  return text;
}

const underSvg = ({ content, sheet, view }: Picture): string =>
  svgText(createElement(Shapes, { traces: mapTraces(content, view), sheet, visible: view.visible, view }));

function overSvg({ content, sheet, view }: Picture): string {
  const trials =
    view.layers.trials && content.trials ? { ...content.trials, colours: view.colours, brushed: null } : null;
  const names = placedNames(content, sheet, view);
  return svgText(createElement(Overlay, { content, sheet, view, names, trials, picture: true }));
}

const asDataUrl = async (url: string): Promise<string> => {
  const bytes = new Uint8Array(await (await fetch(url)).arrayBuffer());
  return `data:font/woff2;base64,${btoa(Array.from(bytes, (b) => String.fromCharCode(b)).join(""))}`;
};

/** The picture as SVG text that stands alone: its fonts written into it. */
async function standaloneSvg(wanted: Picture): Promise<string> {
  const url = await picture(wanted.figure);
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
  const { width, height } = wanted.figure.layout;
  const paper = `<rect width="${width}" height="${height}" fill="${wanted.view.colours.paper}"/>`;
  return svg
    .replace(/(<svg[^>]*>)/, (tag) => `${tag}<style>${faces.join("")}</style>${paper}${underSvg(wanted)}`)
    .replace(/<\/svg>\s*$/, () => `${overSvg(wanted)}</svg>`);
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
export async function mapPicture(wanted: Picture, format: "png" | "svg"): Promise<Blob> {
  const svg = await standaloneSvg(wanted);
  if (format === "svg") return new Blob([svg], { type: "image/svg+xml" });
  return rasterised(svg, wanted.figure.layout.width, wanted.figure.layout.height);
}
