import type { z } from "zod";
import type { campaignCreate } from "../../../shared/schemas/campaign";

export type DemoCampaign = z.input<typeof campaignCreate> & { id: string };

export const demoCampaigns: DemoCampaign[] = [
  {
    id: "demo-campaign-nl-1",
    projectId: "demo-calcine",
    code: "NL-1",
    title: "Neutral leach: how high in pH (invented)",
    question: "Where between pH 3 and 6 does zinc still come and iron stay out, and does the oxidant matter?",
    planId: "demo-neutral-leach",
    planRevision: 3,
    notes: "Base case pH 4.8 repeated at start, middle and end. All data invented.",
    stages: [{ code: "NL", name: "neutral leach", target: "Zn", gangue: "Fe" }],
  },
  {
    id: "demo-campaign-nl-2",
    projectId: "demo-calcine",
    code: "NL-2",
    title: "Neutral and weak acid leach of the October blend (invented)",
    question: "What does the extra ferrite cost, and does a weak acid step win it back without the iron?",
    planId: "demo-neutral-leach",
    planRevision: 3,
    notes: "Same bench, other feed: compare stage by stage. All data invented.",
    stages: [
      { code: "NL", name: "neutral leach", target: "Zn", gangue: "Fe" },
      { code: "WA", name: "weak acid leach", target: "Zn", gangue: "Fe" },
    ],
  },
  {
    id: "demo-campaign-zd-1",
    projectId: "demo-calcine",
    code: "ZD-1",
    title: "Zinc dust: how much and how long (invented)",
    question: "Least dust that takes cadmium under 1 mg/L, and when it starts to come back.",
    planId: "demo-zinc-dust",
    planRevision: 2,
    notes:
      "Platinum in a dust slurry shows a mixed potential: trend only. Ventilated; arsenic below detection. All data invented.",
    stages: [
      { code: "CU", name: "copper stage", target: "Cu", gangue: null },
      { code: "CD", name: "cadmium stage", target: "Cd", gangue: null },
    ],
  },
  {
    id: "demo-campaign-ox-1",
    projectId: "demo-heap",
    code: "OX-1",
    title: "Oxide ore: acid against iron and gangue (invented)",
    question: "How much acid is worth adding on the last lift?",
    planId: "demo-oxide-heap",
    planRevision: 1,
    notes: "Bottle rolls, vented, 25 C. All data invented.",
    stages: [{ code: "OX", name: "oxide leach", target: "Cu", gangue: "Fe" }],
  },
];
