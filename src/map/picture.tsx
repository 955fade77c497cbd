import bold from "@fontsource/jetbrains-mono/files/jetbrains-mono-latin-700-normal.woff2?url";
import regular from "@fontsource/jetbrains-mono/files/jetbrains-mono-latin-400-normal.woff2?url";
import { flushSync } from "react-dom";
import { createRoot } from "react-dom/client";
import { sheetBoxes, type Sheet } from "./boxes";
import type { MapContent } from "./content";
import { mapTraces } from "./figure";
import { placedNames } from "./names/placedNames";
import { plainText } from "./speciesText";
import { Overlay } from "./svg/Overlay";
import { Shapes } from "./svg/Shapes";
import { SvgText } from "./svg/SvgText";
import { drawnMetals, type MapView } from "./view";

const WIDTH = 1000;
const HEIGHT = 860;
const LINE = 16;
const HEAD = 30;

/** A picture in the making: the map with a title above and a caption below. */
export interface Picture {
  content: MapContent;
  sheet: Sheet;
  view: MapView;
  title: string;
  caption: readonly string[];
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
  return { content, sheet, view, title, caption };
}

const heightOf = ({ caption }: Picture): number => HEIGHT + HEAD + LINE * caption.length + 18;

function Drawing({ wanted, style }: { wanted: Picture; style: string }) {
  const { content, sheet, view, title, caption } = wanted;
  const { colours } = view;
  const height = heightOf(wanted);
  const trials = view.layers.trials && content.trials ? { ...content.trials, colours, brushed: null } : null;
  return (
    <svg xmlns="http://www.w3.org/2000/svg" width={WIDTH} height={height} viewBox={`0 0 ${WIDTH} ${height}`}>
      <style>{style}</style>
      <rect width={WIDTH} height={height} fill={colours.paper} />
      <SvgText
        lines={[{ parts: plainText(title), size: 15, bold: true }]}
        x={14}
        y={26}
        anchor="start"
        colour={colours.ink}
      />
      <g transform={`translate(0 ${HEAD})`}>
        <Shapes traces={mapTraces(content, view)} sheet={sheet} visible={view.visible} view={view} />
        <Overlay
          content={content}
          sheet={sheet}
          view={view}
          names={placedNames(content, sheet, view)}
          trials={trials}
          picture
        />
      </g>
      {caption.map((line, i) => (
        <SvgText
          key={line}
          lines={[{ parts: plainText(line), size: 11 }]}
          x={14}
          y={HEIGHT + HEAD + 14 + i * LINE}
          anchor="start"
          colour={colours.muted}
        />
      ))}
    </svg>
  );
}

const asDataUrl = async (url: string): Promise<string> => {
  const bytes = new Uint8Array(await (await fetch(url)).arrayBuffer());
  return `data:font/woff2;base64,${btoa(Array.from(bytes, (b) => String.fromCharCode(b)).join(""))}`;
};

/** The picture as SVG text that stands alone: its fonts written into it. */
async function standaloneSvg(wanted: Picture): Promise<string> {
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
  const holder = document.createElement("div");
  const root = createRoot(holder);
  flushSync(() => root.render(<Drawing wanted={wanted} style={faces.join("")} />));
  const svg = holder.querySelector("svg");
  const text = svg ? new XMLSerializer().serializeToString(svg) : "";
  root.unmount();
  return text;
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
  return rasterised(svg, WIDTH, heightOf(wanted));
}
