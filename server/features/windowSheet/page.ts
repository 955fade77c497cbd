import { lightPalette } from "../../../shared/drawing/palette";
import { besideMap } from "./besideMap";
import { ALL, belowMap, type Caps } from "./belowMap";
import { gap, mutedStyle, SIZES, SMALLEST, stack, textBlock, textStyle, type Block } from "./blocks";
import { drawMap } from "./map";
import { Pen, type Inline } from "./pen";
import type { SheetWork } from "./work";
import { moment } from "./words";

const PAGE = { width: 595.28, height: 841.89 };
const MARGIN = 32;
const WIDTH = PAGE.width - 2 * MARGIN;
const MAP_SHARE = 0.655;
const LEAST_MAP = 276;
const MAP_HEIGHTS = [430, 402, 374, 346, 312];

function headOf(pen: Pen, { plan, revision }: SheetWork): Block {
  const tag = pen.line(`WINDOW SHEET  revision ${revision.number}`, { size: 9, face: "monoBold", colour: "ink" });
  const title = textBlock(
    pen,
    { text: plan.name, face: "bold" },
    { ...textStyle(15), face: "bold" },
    WIDTH - tag.width - 20,
  );
  const newer =
    plan.revisionCount > revision.number ? ` Not the newest: the plan has ${plan.revisionCount} revisions.` : "";
  const under = textBlock(
    pen,
    [
      `${plan.siteName} / ${plan.projectName}. Saved ${moment(revision.createdAt)} by ${revision.author}. `,
      revision.note,
      { text: newer, face: "bold" },
    ],
    mutedStyle(8),
    WIDTH,
  );
  const invented = plan.invented
    ? stack([gap(3), boxed(pen, "INVENTED DEMO DATA: there is no such plant. Not for operation.")])
    : gap(0);
  const body = stack([title, under, invented, gap(4)]);
  return { ...body, draw: (x, y) => (body.draw(x, y), pen.write(tag, x + WIDTH - tag.width, y + 13)) };
}

function boxed(pen: Pen, words: string): Block {
  const line = pen.line(words, { size: 8.5, face: "bold", colour: "ink" });
  return {
    height: 14,
    dropped: 0,
    draw: (x, y) => {
      pen.doc
        .rect(x, y, line.width + 12, 13.5)
        .lineWidth(1)
        .strokeColor(lightPalette.ink)
        .undash()
        .stroke();
      pen.write(line, x + 6, y + 9.8);
    },
  };
}

function footOf(pen: Pen, { plan, revision }: SheetWork): Block {
  const small = mutedStyle(6.4);
  const said: Inline = [
    {
      text: "Thermodynamics says what can happen, not how fast. Potentials in V vs SHE at the liquor's temperature unless said otherwise; activities without unit.",
      face: "bold",
      colour: "ink",
    },
  ];
  const which = `${plan.name}, revision ${revision.number}; chemistry data ${revision.dataVersion}; drawn by Gangueway from the solver's polygons.`;
  const body = stack([textBlock(pen, said, small, WIDTH), textBlock(pen, which, small, WIDTH)]);
  return {
    ...body,
    height: body.height + 5,
    draw: (x, y) => {
      pen.rule(x, x + WIDTH, y, 0.7, "ink");
      body.draw(x, y + 4);
    },
  };
}

/** The largest type that fits whole, the map given up a little first; at the smallest type rows go, and the page says how many.
 *  @param room  for map and what stands below it     @param least  height of the map that its neighbour needs */
function fitted(pen: Pen, work: SheetWork, room: number, least: number): { mapHeight: number; below: Block } {
  const heights = [...MAP_HEIGHTS.filter((h) => h > least), least];
  for (const size of SIZES) {
    const below = belowMap(pen, work, size, WIDTH, ALL);
    const mapHeight = heights.find((h) => below.height <= room - h);
    if (mapHeight !== undefined) return { mapHeight, below };
  }
  const caps: Caps = { ...ALL, limits: work.sentences.length + 1, inputs: 14, reactions: 5, reach: 5 };
  let below = belowMap(pen, work, SMALLEST, WIDTH, caps);
  while (below.height > room - least) {
    if (caps.reach > 3) caps.reach = Math.min(caps.reach, work.reach.length + 1) - 1;
    else if (caps.reactions > 3) caps.reactions--;
    else if (caps.warnings > 3) caps.warnings = Math.min(caps.warnings, work.solution.warnings.length + 1) - 1;
    else if (caps.limits > 7) caps.limits--;
    else if (caps.exposure) caps.exposure = false;
    else if (caps.inputs > 7) caps.inputs--;
    else if (caps.grades) caps.grades = false;
    else if (caps.limits > 4) caps.limits--;
    else if (caps.reach > 1) caps.reach--;
    else if (caps.reactions > 1) caps.reactions--;
    else if (caps.warnings > 1) caps.warnings--;
    else if (caps.inputs > 4) caps.inputs--;
    else break;
    below = belowMap(pen, work, SMALLEST, WIDTH, caps);
  }
  return { mapHeight: least, below };
}

/** One A4 page.
 *  @returns  the PDF; the same bytes for the same work */
export function windowSheet(work: SheetWork): Promise<Buffer> {
  const { plan, revision } = work;
  const pen = new Pen(
    {
      Title: `${plan.name}, window sheet, revision ${revision.number}`,
      Author: revision.author,
      Subject: `Chemistry data ${revision.dataVersion}`,
    },
    new Date(revision.createdAt),
  );
  const head = headOf(pen, work);
  const foot = footOf(pen, work);
  const top = MARGIN - 4 + head.height;
  const bottom = PAGE.height - MARGIN + 8 - foot.height;
  const mapWidth = WIDTH * MAP_SHARE;
  const beside = WIDTH - mapWidth - 12;
  const least = Math.max(LEAST_MAP, besideMap(pen, work, beside, 0).height + 6);
  const { mapHeight, below } = fitted(pen, work, bottom - top - 14, least);
  head.draw(MARGIN, MARGIN - 4);
  pen.rule(MARGIN, MARGIN + WIDTH, top - 1, 0.7, "ink");
  drawMap(pen, work, { x0: MARGIN - 6, y0: top + 3, x1: MARGIN + mapWidth, y1: top + mapHeight });
  besideMap(pen, work, beside, mapHeight - 4).draw(MARGIN + mapWidth + 12, top + 4);
  below.draw(MARGIN, top + mapHeight + 8);
  foot.draw(MARGIN, bottom);
  return pen.finished();
}
