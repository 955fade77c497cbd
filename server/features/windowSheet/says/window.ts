import { gapSentence, wayWords, type Way } from "../../../../shared/advice/gapWords";
import { demandName } from "../../../../shared/solution";
import { marginWords, windowName, type LimitSentence } from "../../../../shared/windows/limitWords";
import { keptWords } from "../../../../shared/hazards/words";
import { celsius, fixed, withUnit } from "../../../../shared/words/numbers";
import { requirementWord } from "../../../../shared/words/planWords";
import type { Inline } from "../pen";
import type { SheetWork } from "../work";
import { formula, joined, prose, reaction, speciesName } from "../words";
import { bandSays } from "./asked";
import { bold, millivolts, volts } from "./style";

/** The set point in large figures, and what it is worth. */
export function setPointSays(work: SheetWork): { figures: Inline[]; notes: Inline[] } {
  const { window, held, probe, solution, chosen, revision, acid } = work;
  if (!window) return { figures: [], notes: [] };
  const at = window.setPoint;
  const notes: Inline[] = [];
  if (probe)
    notes.push([
      bold(millivolts(at.Eh - probe.offset)),
      ` vs ${probe.label}, electrode at ${celsius(probe.temperatureC)}. `,
      probe.remark ?? "",
    ]);
  if (held) notes.push([bold("Placed by hand."), held.inside ? "" : [" It stands ", bold("outside the window"), "."]]);
  notes.push([
    "Margin ",
    bold(`${fixed(at.margin, 1)} ${marginWords(at)}`),
    `. A band is ${bandSays(revision.inputs)}: the box on the map.`,
  ]);
  if (!window.controllable) notes.push(bold("Narrower than the control bands: not a usable target with this loop."));
  if (at.cutByFrame) notes.push("Cut by the frame: the window may be wider than the map.");
  if (at.mixedPotential)
    notes.push([
      "No couple of this liquor holds both forms above about 10 mg/L: Eh is a mixed potential, a trend, and the margin counts pH alone.",
      at.EhRange ? ` At this pH ${fixed(at.EhRange[0], 2)} to ${volts(at.EhRange[1])} vs SHE is inside.` : "",
    ]);
  else if (at.couple)
    notes.push(["Eh is set by ", speciesName(at.couple[1]), " over ", speciesName(at.couple[0]), "."]);
  if (acid !== null)
    notes.push([
      "Free acid ",
      bold(
        acid.withinSulfate
          ? `about ${withUnit(fixed(acid.gPerL, acid.gPerL < 10 ? 1 : 0), "g/L")}`
          : "more than the sulfate balances",
      ),
      " as ",
      formula("H2SO4"),
      ": titrate it, a glass electrode is an index only here.",
    ]);
  notes.push([
    bold(`Window ${windowName(chosen)}`),
    `: pH ${fixed(window.pH[0], 2)} to ${fixed(window.pH[1], 2)}, Eh ${fixed(window.Eh[0], 2)} to ${volts(window.Eh[1])} vs SHE.`,
  ]);
  const others = solution.windows.flatMap((w, i) =>
    i === chosen
      ? []
      : [
          `${windowName(i)} at pH ${fixed(w.setPoint.pH, 2)}, ${volts(w.setPoint.Eh)} (margin ${fixed(w.setPoint.margin, 1)})`,
        ],
  );
  if (others.length > 0)
    notes.push(
      `Also open: ${others.slice(0, 3).join("; ")}${others.length > 3 ? `; and ${others.length - 3} more in the plan` : ""}.`,
    );
  return { figures: [`pH ${fixed(at.pH, 2)}`, volts(at.Eh)], notes };
}

/** side, what happens, reactions, distance along the axis of the side, in control bands */
export function limitSays({ side, what, limit, others, axis, distance, bands }: LimitSentence): Inline[] {
  const seen = new Set<string>();
  const reactions = [limit, ...others].flatMap((l): Inline[] => {
    if (!l.reactionTerms || seen.has(l.reaction ?? "")) return [];
    seen.add(l.reaction ?? "");
    return [reaction(l.reactionTerms)];
  });
  const more = reactions.length - 2;
  const way =
    distance === null ? "not straight ahead" : axis === "pH" ? `${fixed(distance, 2)} pH` : millivolts(distance);
  return [
    bold(side),
    limit.kind === "hazard" ? prose(what) : what,
    [joined(reactions.slice(0, 2), "; "), more > 0 ? `; and ${more} more in the plan` : ""],
    way,
    fixed(bands, 1),
  ];
}

/** Why there is no window, a sentence a set of requirements. */
export function conflictSays({ solution, naming, gaps }: SheetWork): Inline[] {
  if (solution.conflicts.length === 0)
    return ["The frame and the water lines leave no ground where all metals are as required."];
  return solution.conflicts.map((set): Inline => {
    const each = set.map((c): Inline =>
      c.gas === undefined
        ? [bold(naming.metalName(c.metal)), ` ${requirementWord[c.requirement]}`]
        : prose(keptWords(c)),
    );
    const [only] = set;
    const found = gaps.find((g) => g.members.join() === set.map(demandName).join());
    const gap = found?.gap ?? { pH: null, Eh: null };
    const along: (Way | null)[] = [
      gap.pH === null ? null : [`${fixed(gap.pH, 2)} pH`, "at one Eh"],
      gap.Eh === null ? null : [volts(gap.Eh), "at one pH"],
    ];
    const ways = along.filter((way) => way !== null);
    if (set.length === 1 && only) {
      const past = found && found.across !== "members" && ways.length > 0 ? beyondWord[found.across] : null;
      return [
        "Nowhere on this map is ",
        each,
        past === null ? "." : `: it would be ${past}, ${wayWords(ways, "away")}.`,
      ];
    }
    return [
      joined(each.slice(0, -1)),
      " and ",
      each.at(-1) ?? "",
      " cannot hold together.",
      found && ways.length > 0 ? [" ", prose(gapSentence(set, found.nearest, ways, naming.metalName))] : "",
    ];
  });
}

const beyondWord = {
  water: "beyond the water lines",
  frame: "beyond the frame",
  "frame and water": "beyond the frame and the water lines",
} as const;
