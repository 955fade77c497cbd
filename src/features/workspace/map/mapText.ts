import type { Problem } from "../../../../shared/schemas/problem";
import { type CrosscutPart, crosscut, speciesAt } from "../../../../shared/setpoint/crosscut";
import type { Point, Solution, State } from "../../../../shared/solution";
import { speciesParts } from "../../../../shared/species/parts";
import { limitSentences, marginWords, type Naming, windowName } from "../../../../shared/windows/limitWords";
import { celsius, fixed } from "../../../lib/format";
import { requirementWord } from "../../../lib/planWords";
import type { PotentialScale } from "../../../lib/potential";
import type { MapMetal } from "../../../map/view";
import { bandWords, mVWords, pHWords } from "../model/distances";
import type { Sight } from "../model/useSight";

export interface MapText {
  heading: string;
  sentences: string[];
}

interface Asked {
  solution: Solution;
  metals: readonly MapMetal[];
  scale: Pick<PotentialScale, "format" | "label">;
  band: Problem["controlBand"];
  naming: Naming;
  /** index of the window in hand */
  chosen: number;
  through: Point;
  sight: Sight;
}

const phaseWord = { aq: "dissolved", s: "solid", l: "liquid", g: "gas" } as const;

/** A species read aloud: "Fe(OH)3 solid, ferrihydrite". */
function said(id: string): string {
  const { formula, phase, form } = speciesParts(id);
  const words = [formula, phaseWord[phase as keyof typeof phaseWord]].filter(Boolean).join(" ");
  return form ? `${words}, ${form}` : words;
}

const list = (parts: readonly string[]): string =>
  parts.length < 2 ? parts.join("") : `${parts.slice(0, -1).join(", ")} and ${parts.at(-1)}`;

const upper = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** Species of warnings on trust, once each. */
function beyondText({ warnings, temperatureC }: Solution): string[] {
  const ids = new Set(warnings.flatMap((w) => (w.code === "TEMPERATURE_TRUST" && w.species ? [w.species] : [])));
  if (ids.size === 0) return [];
  return [
    `Beyond its trusted temperatures at ${celsius(temperatureC, 1)}, on or about a limit: ${list([...ids].map(said))}.`,
  ];
}

/** The window map in words: what a reader who does not see it would ask. Windows, set point, limits, what every metal is there, and
 *  both crosscuts. */
export function mapText({ solution, metals, scale, band, naming, chosen, through, sight }: Asked): MapText[] {
  const { windows, frame, temperatureC } = solution;
  const window = windows[chosen];
  const pH = (x: number) => `pH ${fixed(x, 2)}`;
  const between = ([lo, hi]: readonly [number, number]) => `${scale.format(lo)} to ${scale.format(hi)}`;
  const name = (metal: MapMetal) => naming.metalName(metal.element);

  const asked = metals.map((m) => `${name(m)} ${m.requirement === "free" ? "free" : requirementWord[m.requirement]}`);
  const opening = [
    `At ${celsius(temperatureC, 1)} with ${list(asked)}, over pH ${fixed(frame.pH[0], 1)} to ${fixed(frame.pH[1], 1)} and ${between(frame.Eh)}, potentials in ${scale.label}.`,
    windows.length === 0
      ? "No window is open: nowhere are all metals as required."
      : `${windows.length === 1 ? "One window is" : `${windows.length} windows are`} open.`,
    ...beyondText(solution),
    ...windows.map((w, i) => {
      const reach = `pH ${fixed(w.pH[0], 2)} to ${fixed(w.pH[1], 2)} and ${between(w.Eh)}`;
      const tight = w.controllable ? "" : ", narrower than the control bands";
      return `Window ${windowName(i)} reaches over ${reach}, margin ${fixed(w.setPoint.margin, 1)} ${marginWords(w.setPoint)}${tight}.`;
    }),
  ];

  const here = new Map(speciesAt(solution, ...through).map((s) => [s.metal, s]));
  const standing = metals.flatMap((m) => {
    const found = here.get(m.element);
    if (!found) return [];
    const verdict = m.requirement === "free" ? "" : found.fulfilled ? ", as required" : ", not as required";
    return [`${upper(name(m))} is ${said(found.species)}${verdict}.`];
  });
  const place = window
    ? `The set point of window ${windowName(chosen)} is ${pH(window.setPoint.pH)} and ${scale.format(window.setPoint.Eh)}, margin ${fixed(window.setPoint.margin, 1)} ${marginWords(window.setPoint)}.`
    : `In the middle of the frame, at ${pH(through[0])} and ${scale.format(through[1])}:`;

  const limits = window
    ? limitSentences(window, naming).map(({ side, what, axis, distance, bands, limit }) => {
        const way =
          distance === null
            ? `${fixed(bands, 1)} control bands away, within ${bandWords(bands, band)}`
            : `${axis === "pH" ? pHWords(distance) : mVWords(distance)} away`;
        return `${upper(side)}, ${way}: ${what}${limit.reaction ? `, ${limit.reaction}` : ""}.`;
      })
    : [];

  const run = (parts: readonly CrosscutPart[], value: (x: number) => string) =>
    parts
      .map((p, i) => (i + 1 < parts.length ? `${said(p.species)} to ${value(p.to)}` : said(p.species)))
      .join(", then ");
  const along = metals.flatMap((m) => {
    const cuts = crosscut(solution, m.element, "pH", through);
    return cuts.length > 1 ? [`${upper(name(m))} with rising pH: ${run(cuts, pH)}.`] : [];
  });
  const up = metals.flatMap((m) => {
    const cuts = crosscut(solution, m.element, "Eh", through);
    return cuts.length > 1 ? [`${upper(name(m))} with rising Eh: ${run(cuts, scale.format)}.`] : [];
  });

  const seen = [
    ...(sight.pair ? [`Two metals are drawn and compared: ${list(sight.pair.map(naming.metalName))}.`] : []),
    ...(!sight.pair && sight.hidden.length > 0
      ? [`Not drawn, but counted in the windows: ${list(sight.hidden.map(naming.metalName))}.`]
      : []),
    ...(sight.zoom
      ? [`In sight is pH ${fixed(sight.zoom.pH[0], 2)} to ${fixed(sight.zoom.pH[1], 2)} and ${between(sight.zoom.Eh)}.`]
      : []),
    ...(sight.pinned ? [pinnedText(solution, metals, naming, scale, through, sight.pinned)] : []),
  ];
  return [
    { heading: "Windows", sentences: opening },
    { heading: window ? "Set point" : "Middle of the frame", sentences: [place, ...standing] },
    ...(limits.length > 0 ? [{ heading: "Limits, nearest first", sentences: limits }] : []),
    ...(along.length + up.length > 0 ? [{ heading: "Crosscuts", sentences: [...along, ...up] }] : []),
    ...(seen.length > 0 ? [{ heading: "What is drawn", sentences: seen }] : []),
  ];
}

export interface Difference {
  metal: MapMetal;
  here: string;
  there: string;
  /** the metal is as required at one of the points only */
  turns: boolean;
  state: State;
}

/** Metals that are something else at another point. */
export function differences(solution: Solution, metals: readonly MapMetal[], here: Point, there: Point): Difference[] {
  const a = new Map(speciesAt(solution, ...here).map((s) => [s.metal, s]));
  const b = new Map(speciesAt(solution, ...there).map((s) => [s.metal, s]));
  return metals.flatMap((metal) => {
    const [p, q] = [a.get(metal.element), b.get(metal.element)];
    if (!p || !q || p.species === q.species) return [];
    return [{ metal, here: p.species, there: q.species, turns: p.fulfilled !== q.fulfilled, state: q.state }];
  });
}

function pinnedText(
  solution: Solution,
  metals: readonly MapMetal[],
  naming: Naming,
  scale: Pick<PotentialScale, "format">,
  through: Point,
  pinned: Point,
): string {
  const others = differences(solution, metals, through, pinned);
  const what =
    others.length === 0
      ? "every metal is what it is at the set point"
      : list(others.map((d) => `${naming.metalName(d.metal.element)} is ${said(d.there)}`));
  return `At the pinned point, pH ${fixed(pinned[0], 2)} and ${scale.format(pinned[1])}, ${what}.`;
}
