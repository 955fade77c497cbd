import {
  nextTrials,
  standingAt,
  type NextTrials,
  type Site,
  type Standing,
} from "../../../../shared/nextTrials/nextTrials";
import { cautionsFor, hazardContext, type Caution } from "../../../../shared/hazards/rules";
import type { Reach } from "../../../../shared/reach/reach";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Limit, Point, Window } from "../../../../shared/solution";
import { sameTemperature } from "../../../../shared/trials/comparable";
import type { Naming } from "../../../../shared/windows/limitWords";
import { fixed } from "../../../lib/format";
import type { PlacedTrial } from "../../../lib/judgedTrials";
import type { NextAsked } from "../../../map/proposalStore";

/** What counts as tried: trials under conditions comparable with the plan's, where they were measured; and those planned but not yet
 *  read, where they are to stand. A rejected trial tried nothing. */
export function sitesOf(
  trials: readonly Pick<PlacedTrial, "code" | "status" | "figures" | "comparability" | "compared">[],
  { temperatureC }: Pick<PlanInputs, "temperatureC">,
): Site[] {
  return trials.flatMap(({ code: name, status, figures: { pH, Eh }, comparability, compared }): Site[] => {
    if (status === "rejected" || !comparability.comparable) return [];
    if (pH !== null && Eh !== null) return [{ pH, Eh, name, kind: "tried" }];
    const at = compared.plannedAt ?? null;
    if (at === null || (at.temperatureC !== null && !sameTemperature(at.temperatureC, temperatureC))) return [];
    return [{ pH: at.pH, Eh: at.Eh, name, kind: "planned" }];
  });
}

/** From the lowest to the highest potential that the chosen reagents are known to bring a slurry to, V vs SHE; null where none is on
 *  record for the liquor. */
export function reachSpan(reaches: readonly Pick<Reach, "practical">[]): readonly [number, number] | null {
  const spans = reaches.flatMap(({ practical }) => (practical === null ? [] : [practical]));
  if (spans.length === 0) return null;
  return [Math.min(...spans.map(([lo]) => lo)), Math.max(...spans.map(([, hi]) => hi ?? Infinity))];
}

/** Cautions that stand at a point and not at the window's set point, whose own are read beside it. */
export function cautionsBeyond(inputs: PlanInputs, at: Standing, setPoint: { pH: number; Eh: number }): Caution[] {
  const said = new Set(cautionsFor(hazardContext(inputs, setPoint)).map((c) => c.text));
  return cautionsFor(hazardContext(inputs, at)).filter((c) => !said.has(c.text));
}

export interface Proposal extends Standing {
  n: number;
  moved: boolean;
}

export interface Proposals extends Omit<NextTrials, "points"> {
  points: readonly Proposal[];
}

const siteAt = ([pH, Eh]: Point, name: string, kind: Site["kind"]): Site => ({ pH, Eh, name, kind });

/** The points asked for: those kept where they are, and as many more as are missing, away from them. */
export function proposalsOf(
  { count, kept, aside, withinReach }: NextAsked,
  window: Window,
  band: PlanInputs["controlBand"],
  tried: readonly Site[],
  reach: readonly [number, number] | null = null,
): Proposals {
  const taken = [...tried, ...aside.map((at) => siteAt(at, "", "set aside"))];
  const stay = (kept ?? []).slice(0, count);
  const staying = stay.map(({ at }, i) => siteAt(at, String(i + 1), "proposed"));
  const more = nextTrials(
    window,
    band,
    [...taken, ...staying],
    count - stay.length,
    (withinReach && reach) || undefined,
  );
  const points = [
    ...stay.map(({ at: [pH, Eh], moved }, i): Proposal => {
      const others = [...taken, ...staying.filter((_, k) => k !== i)];
      return { ...standingAt({ pH, Eh }, window, band, others), n: i + 1, moved };
    }),
    ...more.points.map((p, i): Proposal => {
      // the core numbers its own from 1
      const own = p.nearest?.kind === "proposed" && !staying.includes(p.nearest);
      const nearest =
        own && p.nearest ? { ...p.nearest, name: String(Number(p.nearest.name) + stay.length) } : p.nearest;
      return { ...p, nearest, n: stay.length + i + 1, moved: false };
    }),
  ];
  return { ...more, points };
}

/** The points as they stand, one of them moved: from then on they stay. */
export const moveTo = (asked: NextAsked, points: readonly Proposal[], n: number, at: Point): NextAsked => ({
  ...asked,
  kept: points.map((p) => (p.n === n ? { at, moved: true } : { at: [p.pH, p.Eh], moved: p.moved })),
});

/** One point fewer, and not proposed again; the others stay where they are. */
export const setAside = (asked: NextAsked, points: readonly Proposal[], n: number): NextAsked => {
  const gone = points.find((p) => p.n === n);
  if (!gone) return asked;
  return {
    ...asked,
    count: Math.max(1, asked.count - 1),
    kept: points.flatMap((p) => (p.n === n ? [] : [{ at: [p.pH, p.Eh], moved: p.moved }])),
    aside: [...asked.aside, [gone.pH, gone.Eh]],
  };
};

const limitName = (limit: Limit, { metalName }: Naming): string => {
  if (limit.kind === "metal") return `the ${metalName(limit.metal ?? "")} limit`;
  if (limit.kind === "water") return `the ${limit.side ?? "water"} line`;
  return limit.kind === "frame" ? "the edge of the frame" : "what is kept out as a hazard";
};

const siteName = ({ kind, name }: Site): string => {
  if (kind === "tried") return `the nearest trial, ${name}`;
  if (kind === "planned") return `the nearest trial, ${name}, not yet run`;
  return kind === "proposed" ? `proposal ${name}` : "a point set aside";
};

/** Why this point, in a sentence: "Largest gap: 3.1 control bands from the nearest trial, T-014; 1.4 inside the iron limit." */
export function reasonOf(
  p: Proposal,
  { along, naming, window, tried }: { along: NextTrials["along"]; naming: Naming; window: string; tried: number },
): string {
  const bands = along === "pH" ? "bands of pH" : "control bands";
  const gap = p.gap !== null && p.nearest ? `${fixed(p.gap, 1)} ${bands} from ${siteName(p.nearest)}` : null;
  const edge = !p.inWindow
    ? `outside window ${window}`
    : p.limit
      ? `${fixed(p.inside, 1)} ${gap === null ? `${bands} ` : ""}inside ${limitName(p.limit, naming)}`
      : null;
  const head = p.moved
    ? "Moved by hand"
    : gap === null
      ? "The set point, since nothing comparable was tried yet"
      : p.n === 1 && tried > 0
        ? "Largest gap"
        : "Next largest gap";
  const rest = [gap, edge].filter((part) => part !== null).join("; ");
  return `${head}${rest === "" ? "" : `${gap === null && !p.moved ? "; " : ": "}${rest}`}.`;
}
