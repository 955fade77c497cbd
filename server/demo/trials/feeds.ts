import type { z } from "zod";
import type { feedCreate } from "../../../shared/schemas/feed";
import type { DemoOre } from "./leachModel";

export type DemoFeed = z.input<typeof feedCreate> & { id: string };

const percent = (text: string) => ({ text, unit: "%" });

/** What the materials are, for the bench of the demo: invented, of the usual size, and of no plant. */
export const ores = {
  calcine3: {
    target: "Zn",
    targetHead: 0.572,
    ironHead: 0.088,
    carbonate: 0,
    easy: 0.9,
    refractory: 0.1,
    refractoryBelow: 1.9,
    rate: 2.6,
    rateAt: 60,
    activation: 30_000,
    lostAbove: 5.85,
    ironMost: 0.34,
    ironBelow: 2.95,
    ferrous: 0.05,
    acidPerTarget: 1.5,
    massPerTarget: 1.2,
  },
  calcine4: {
    target: "Zn",
    targetHead: 0.548,
    ironHead: 0.107,
    carbonate: 0,
    easy: 0.855,
    refractory: 0.145,
    refractoryBelow: 1.9,
    rate: 1.9,
    rateAt: 60,
    activation: 30_000,
    lostAbove: 5.8,
    ironMost: 0.36,
    ironBelow: 3.05,
    ferrous: 0.07,
    acidPerTarget: 1.5,
    massPerTarget: 1.2,
  },
  heap4: {
    target: "Cu",
    targetHead: 0.0092,
    ironHead: 0.031,
    carbonate: 0.012,
    easy: 0.83,
    refractory: 0.09,
    refractoryBelow: 1.6,
    rate: 0.14,
    rateAt: 25,
    activation: 25_000,
    lostAbove: 4.2,
    ironMost: 0.085,
    ironBelow: 2.15,
    ferrous: 0.01,
    acidPerTarget: 1.543,
    massPerTarget: 1.25,
  },
} satisfies Record<string, DemoOre>;

const head = (element: string, text: string, laboratory: string, method: string, isHead = true) => ({
  element,
  value: percent(text),
  laboratory,
  method,
  head: isHead,
});
const site = "Tarn Hollow assay room (invented)";
const outside = "Outside laboratory (invented)";

export const demoFeeds: DemoFeed[] = [
  {
    id: "demo-feed-calcine-3",
    projectId: "demo-calcine",
    name: "Calcine, September blend (invented)",
    description: "Fluid-bed calcine, composite of ten shifts, stored dry. Invented for the demonstration.",
    heads: [
      head("Zn", "57.2", site, "EDTA titration"),
      head("Zn", "57.9", outside, "ICP after fusion", false),
      head("Fe", "8.80", site, "AAS, four acids"),
      head("Cu", "0.61", site, "AAS, four acids"),
      head("Cd", "0.24", site, "AAS, four acids"),
    ],
    minerals: [
      { mineral: "ZnO(s)", element: "Zn", share: percent("90") },
      { mineral: "ZnFe2O4(s)", element: "Zn", share: percent("10") },
      { mineral: "ZnFe2O4(s)", element: "Fe", share: percent("88") },
    ],
    p80: { text: "74", unit: "um" },
    solidDensity: { text: "5.3", unit: "t/m3" },
    moisture: percent("0.0"),
  },
  {
    id: "demo-feed-calcine-4",
    projectId: "demo-calcine",
    name: "Calcine, October blend (invented)",
    description: "More iron in the concentrate, so more ferrite. Invented for the demonstration.",
    heads: [
      head("Zn", "54.8", site, "EDTA titration"),
      head("Fe", "10.7", site, "AAS, four acids"),
      head("Cu", "0.55", site, "AAS, four acids"),
      head("Cd", "0.21", site, "AAS, four acids"),
    ],
    minerals: [
      { mineral: "ZnO(s)", element: "Zn", share: percent("85.5") },
      { mineral: "ZnFe2O4(s)", element: "Zn", share: percent("14.5") },
    ],
    p80: { text: "81", unit: "um" },
    solidDensity: { text: "5.2", unit: "t/m3" },
    moisture: percent("0.0"),
  },
  {
    id: "demo-feed-overflow",
    projectId: "demo-calcine",
    name: "Neutral overflow, day composites (invented)",
    description: "Liquor to be purified; no solids, so no head assay. Invented for the demonstration.",
  },
  {
    id: "demo-feed-heap-4",
    projectId: "demo-heap",
    name: "Oxide ore, lift 4 composite (invented)",
    description: "Minus 2 mm, split from column charge. Invented for the demonstration.",
    heads: [head("Cu", "0.92", site, "AAS, three acids"), head("Fe", "3,10", site, "AAS, three acids")],
    minerals: [
      { mineral: "CuO(s)", element: "Cu", share: percent("34") },
      { mineral: "malachite", element: "Cu", share: percent("49") },
      { mineral: "chrysocolla and copper wad", element: "Cu", share: percent("17") },
    ],
    carbonate: percent("1.2"),
    moisture: percent("3.8"),
    p80: { text: "1.4", unit: "mm" },
    solidDensity: { text: "2.7", unit: "t/m3" },
  },
];
