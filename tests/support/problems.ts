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
  const chosen = random.shuffled(metals).slice(0, random.whole(1, 5));
  const couple = random.chance(0.5); // rich in iron, so that a couple sets Eh in many windows
  const frame: Problem["frame"] =
    couple && random.chance(0.5)
      ? { pH: [random.between(-1, 0), random.between(0.5, 3)], Eh: [random.between(0.4, 0.7), random.between(0.8, 1)] }
      : anyFrame(random);
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
    ...(random.chance(0.3) && !chosen.includes("K")
      ? { others: [{ component: "K", activity: random.decade(-3, 0) }] }
      : {}),
    ...reductionOf(preset),
    ...(basis ? { solidsBasis: basis } : {}),
    leftOut,
    frame,
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

function anyFrame(random: Random): Problem["frame"] {
  const low = random.between(-2, 8);
  const bottom = random.between(-1.8, 0.4);
  return { pH: [low, low + random.between(0.5, 14)], Eh: [bottom, bottom + random.between(0.2, 3)] };
}

/** A question whose liquor is rich in both states of iron, so that a couple sets Eh in most of its windows. */
export function coupleProblem(random: Random): Problem {
  const any = randomProblem(random);
  const other = random.pick(metals.filter((m) => m !== "Fe"));
  return {
    ...any,
    metals: [
      { element: "Fe", requirement: random.pick(["free", "dissolved"] as const), activity: random.decade(-0.5, 0.5) },
      {
        element: other,
        requirement: random.pick(["free", "dissolved", "solid"] as const),
        activity: random.decade(-6, -1),
      },
    ],
    ligands: random.chance(0.5) ? [] : [{ component: "S", activity: random.decade(-3, -1) }],
    others: [],
    sulfateReduction: false,
    leftOut: presetChoice("sulfate").leftOut,
    frame: {
      pH: [random.between(-1, 0), random.between(0.5, 2.5)],
      Eh: [random.between(0.5, 0.7), random.between(0.8, 0.95)],
    },
    water: { bound: "both" },
  };
}
