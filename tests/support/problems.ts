import type { Problem } from "../../shared/schemas/problem";
import { requirements, solidsBases } from "../../shared/schemas/problem";
import type { Random } from "./random";
import { presetChoice, presetsOfData, reductionOf } from "./presets";
import { metalsOfLibrary } from "./oracleSpecies";
import { library } from "./solver";

const metals = metalsOfLibrary(library).filter((m) => m !== "Ti"); // the library holds no species of titanium alone

/** A question nobody would type: any metals, requirements, lixiviant, temperature, frame and water bounds. */
export function randomProblem(random: Random): Problem {
  const preset = random.pick(presetsOfData);
  const { ligands, leftOut } = presetChoice(preset);
  const basis = random.pick([undefined, ...solidsBases]);
  const low = random.between(-2, 8);
  const bottom = random.between(-1.8, 0.4);
  const chosen = random.shuffled(metals).slice(0, random.whole(1, 5));
  const couple = random.chance(0.5); // rich in iron, so that a couple sets Eh in many windows
  return {
    temperatureC: random.chance(0.3) ? 25 : random.between(0, random.chance(0.8) ? 150 : 250),
    metals: [
      ...chosen
        .filter((m) => !couple || m !== "Fe")
        .map((element) => ({ element, requirement: random.pick(requirements), activity: random.decade(-8, 0) })),
      ...(couple
        ? [
            {
              element: "Fe",
              requirement: random.pick(["free", "dissolved"] as const),
              activity: random.decade(-1, 0.3),
            },
          ]
        : []),
    ],
    ligands: ligands.map((l) => ({ ...l, activity: l.activity * random.decade(-1, 0.5) })),
    ...(random.chance(0.3) ? { others: [{ component: "K", activity: random.decade(-3, 0) }] } : {}),
    ...reductionOf(preset),
    ...(basis ? { solidsBasis: basis } : {}),
    leftOut,
    frame: { pH: [low, low + random.between(0.5, 14)], Eh: [bottom, bottom + random.between(0.2, 3)] },
    ...(random.chance(0.7)
      ? {
          water: {
            bound: random.pick(["both", "upper", "lower", "none"] as const),
            ...(random.chance(0.3) ? { oxygenV: random.between(0, 0.6) } : {}),
            ...(random.chance(0.3) ? { hydrogenV: random.between(0, 0.8) } : {}),
          },
        }
      : {}),
    controlBand: { pH: random.between(0.05, 0.5), Eh: random.between(0.01, 0.1) },
  };
}

/** K is at times both a metal and a partner: drop the partner then. */
export function plausible(problem: Problem): Problem {
  const taken = new Set(problem.metals.map((m) => m.element));
  const others = problem.others?.filter((o) => !taken.has(o.component));
  return { ...problem, ...(others ? { others } : {}) };
}
