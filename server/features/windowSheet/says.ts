import { presetCaution } from "../../../shared/hazards/presetCautions";
import { askedOf } from "../../../shared/hazards/excluded";
import { keptWords } from "../../../shared/hazards/words";
import type { PlanMetal } from "../../../shared/schemas/plan";
import { demandName } from "../../../shared/solution";
import type { LimitSentence } from "../../../shared/windows/limitWords";
import { marginWords, windowName } from "../../../shared/windows/limitWords";
import { componentWord } from "../../../shared/words/componentWord";
import { celsius, fixed, withUnit } from "../../../shared/words/numbers";
import {
  amountWord,
  lixiviantName,
  requirementWord,
  solidsBasisWord,
  warningWord,
  waterBoundWord,
} from "../../../shared/words/planWords";
import { piecesOf, type Inline, type Piece } from "./pen";
import type { SheetWork } from "./work";
import { formula, joined, prose, quantity, reaction, speciesName } from "./words";

const bold = (text: string): Inline => ({ text, face: "bold" });
const volts = (E: number, digits = 2): string => withUnit(fixed(E, digits), "V");
const millivolts = (E: number): string => withUnit(fixed(E * 1000, 0), "mV");
const signedMinus = (x: number, digits: number) => fixed(x, digits);

const gammaWord = { one: " taken as 1", davies: " by Davies", typed: " typed" } as const;

/** A metal of the plan: what it must be and what its number means.
 *  @param brief  leaves the name and the words to the number away, so that it stands on one line */
export function metalSays(metal: PlanMetal, { solution, naming }: SheetWork, brief = false): Inline {
  const solved = solution.metals.find((m) => m.metal === metal.element);
  const asks = metal.requirement === "free" ? "watched" : requirementWord[metal.requirement];
  const [activity, gamma] = [solved?.activity ?? metal.value, fixed(solved?.gamma ?? 1, 2)];
  if (brief) {
    const tenor: Inline = metal.entry === "activity" ? "" : [quantity(metal.value, "g/L"), ` γ\u00a0${gamma}: `];
    const word = metal.role === "watched" ? "" : `, ${amountWord(metal)}`;
    return [bold(metal.element), " ", bold(asks), `${word} `, inSans([tenor, quantity(activity)])];
  }
  const tenor: Inline =
    metal.entry === "activity"
      ? ""
      : [quantity(metal.value, "g/L", 3), `, γ\u00a0${gamma}${gammaWord[metal.gammaFrom]}: `];
  const name = ` ${naming.metalName(metal.element)}, ${metal.role === "watched" ? "" : `${metal.role}, `}`;
  return [bold(metal.element), name, bold(asks), `; ${amountWord(metal)} `, tenor, quantity(activity), " activity"];
}

const inSans = (inline: Inline): Inline => piecesOf(inline).map((piece): Piece => ({ ...piece, face: "sans" }));

/** The band of pH as it was typed: in pH, or as free acid. */
function bandSays({ controlBand: { pH, Eh }, freeAcidBand: acid }: SheetWork["revision"]["inputs"]): string {
  const typed = acid ? ` (free acid ±${withUnit(fixed(acid.gPerL, 1), "g/L")} at pH ${fixed(acid.atPH, 2)})` : "";
  return `pH ±${fixed(pH, 2)}${typed}, Eh ±${volts(Eh, 3)}`;
}

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
    if (set.length === 1 && only) return ["Nowhere on this map is ", each, "."];
    const gap = gaps.find((g) => g.members.join() === set.map(demandName).join())?.gap;
    const apart = [
      (gap?.pH ?? null) === null ? null : `${fixed(gap?.pH ?? 0, 2)} pH at one Eh`,
      (gap?.Eh ?? null) === null ? null : `${volts(gap?.Eh ?? 0)} at one pH`,
    ].filter((part) => part !== null);
    return [
      joined(each.slice(0, -1)),
      " and ",
      each.at(-1) ?? "",
      " cannot hold together",
      apart.length > 0 ? `: their grounds stand ${apart.join(", and ")} apart.` : ".",
    ];
  });
}

/** What the plan asks beside its metals: label and value. */
export function inputsSay({ revision: { inputs }, data }: SheetWork): [string, Inline][] {
  const total = (c: { component: string; activity: number }): Inline => [
    formula(c.component),
    ` ${componentWord(data, c.component)} `,
    quantity(c.activity, "", 3),
  ];
  const said: [string, Inline][] = [["Liquor", [celsius(inputs.temperatureC, 1), `, ${lixiviantName[inputs.preset]}`]]];
  if (inputs.ligands.length > 0) said.push(["Ligand totals", [joined(inputs.ligands.map(total)), " (activity)"]]);
  if (inputs.others.length > 0) said.push(["Other totals", [joined(inputs.others.map(total)), " (activity)"]]);
  if (inputs.ionicStrength !== null) said.push(["Ionic strength", quantity(inputs.ionicStrength, "mol/kg")]);
  said.push(["Solids", solidsBasisWord[inputs.solidsBasis]]);
  if (inputs.sulfateReduction) said.push(["Sulfate reduction", "on"]);
  if (inputs.feedMinerals.length > 0) said.push(["Feed minerals", joined(inputs.feedMinerals.map(speciesName))]);
  if (inputs.dosed.length > 0) said.push(["Dosed", inputs.dosed.join(", ")]);
  const { water } = inputs;
  said.push([
    "Bounded by",
    waterBoundWord[water.bound] +
      (water.oxygenV ? `, oxygen +${volts(water.oxygenV)}` : "") +
      (water.hydrogenV ? `, hydrogen ${signedMinus(-water.hydrogenV, 2)} V` : ""),
  ]);
  if (inputs.excludedHazards?.length)
    said.push(["Kept out of windows", joined(inputs.excludedHazards.map((h) => prose(keptWords(askedOf(h)))))]);
  said.push(["Control bands", bandSays(inputs)]);
  const { temperatureC: T, activities = {} } = inputs.ranges ?? {};
  const over: Inline[] = [
    ...(T ? [`${fixed(T[0], 1)} to ${celsius(T[1], 1)}`] : []),
    ...Object.entries(activities).map(([e, [lo, hi]]): Inline => [`${e} `, quantity(lo), " to ", quantity(hi)]),
  ];
  if (over.length > 0) said.push(["To hold over", joined(over)]);
  if (inputs.leftOut.length > 0)
    said.push(["Left out", joined(inputs.leftOut.map((l): Inline => [speciesName(l.species), `\u00a0(${l.reason})`]))]);
  if (inputs.putBack.length > 0) said.push(["Put back", joined(inputs.putBack.map(speciesName))]);
  return said;
}

const gradeMeans: Readonly<Record<string, string>> = {
  A: "seen in a published table",
  B: "handbook value, consistent within 1 kJ",
  C: "unchecked, or derived from a stability constant",
};

/** Species that rule a field, gathered by grade; those on a limit of the window stand first and bold. */
export function gradesSay({ species }: SheetWork): Inline[] {
  return [...new Set(species.map((s) => s.grade))].sort().map((grade): Inline => {
    const of = species.filter((s) => s.grade === grade);
    const names = of.map(({ id, limits }): Inline => (limits ? emboldened(speciesName(id)) : speciesName(id)));
    return [bold(grade), ` ${gradeMeans[grade] ?? ""}: `, joined(names)];
  });
}

const emboldened = (inline: Inline): Inline => piecesOf(inline).map((piece): Piece => ({ ...piece, face: "bold" }));

/** Species beyond their trusted temperature stand together: at 200 C they are many. */
export function warningsSay({ solution: { warnings, temperatureC } }: SheetWork): Inline[] {
  const hot = warnings.flatMap((w) => (w.code === "TEMPERATURE_TRUST" && w.species ? [w.species] : []));
  const gathered = hot.length > 3;
  const others = warnings.filter((w) => !(gathered && w.code === "TEMPERATURE_TRUST"));
  const said = others.map((w): Inline => [
    w.species ? emboldened(speciesName(w.species)) : bold(w.metal ?? "The plan"),
    `, ${warningWord[w.code]}: `,
    prose(w.text),
  ]);
  if (gathered)
    said.push([
      bold(`${hot.length} species`),
      `, beyond their trusted temperatures at ${celsius(temperatureC, 1)}: `,
      joined(hot.map(speciesName)),
    ]);
  return said;
}

/** Below the first no instrument finds anything; above the second the digits mean no pressure any more. */
const [NOTHING, BEYOND] = [1e-12, 100];
function pressureSays(bar: number | null): Inline {
  if (bar === null || bar < NOTHING) return "next to none";
  return bar > BEYOND ? "far above 1 bar" : quantity(bar, "bar");
}

/** A caution and the exposure values beside it. */
export interface CautionSays {
  text: Inline;
  limits: Inline | null;
}

/** Cautions of the set point, gases that reach the window, and last the liquor's usual one. */
export function cautionsSay({ cautions, drawnGases, revision, window, hazards }: SheetWork): CautionSays[] {
  const agents = new Set(cautions.flatMap((c) => c.agents));
  const said: CautionSays[] = cautions.map((c) => ({
    text: [
      joined(c.agents.map((a) => emboldened(formula(a)))),
      bold(". "),
      prose(c.text),
      c.confirm ? [" ", bold(`${c.confirm}:`), " ……………………"] : "",
    ],
    limits: c.limits === null ? null : prose(c.limits),
  }));
  for (const g of drawnGases) {
    const bar = g.atSetPoint;
    const reached = bar !== null && bar >= g.threshold.bar;
    const here: Inline = pressureSays(bar);
    said.push({
      text: [
        emboldened(formula(g.gas)),
        bold(
          reached
            ? `: at the set point it reaches ${g.threshold.words}`
            : `: part of the window reaches ${g.threshold.words}`,
        ),
        "; at the set point ",
        here,
        " in equilibrium. ",
        agents.has(g.gas) ? "" : prose(g.caution),
      ],
      limits: agents.has(g.gas) || !g.limits ? null : prose(g.limits),
    });
  }
  const saturationBar = hazards?.saturationBar ?? null;
  if (saturationBar !== null)
    said.push({
      text: `The vessel is closed: water alone stands at ${withUnit(fixed(saturationBar, 2), "bar")} here.`,
      limits: null,
    });
  if (!window) said.push({ text: "No set point: cautions that depend on one are not shown.", limits: null });
  said.push({ text: prose(presetCaution[revision.inputs.preset]), limits: null });
  return said;
}
