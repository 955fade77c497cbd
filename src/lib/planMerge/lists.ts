import { askedOf } from "../../../shared/hazards/excluded";
import { keptWords } from "../../../shared/hazards/words";
import type { OverallChoice, PlanInputs, PlanMetal, PlanTotal } from "../../../shared/schemas/plan";
import type { ExcludedHazard } from "../../../shared/schemas/problem";
import { significant } from "../format";
import { circuitText, heldText, metalText, totalText } from "../planChanges";
import type { Kind } from "./kind";

/** Text of its own for an entry of a list that is either on it or not. */
export const listed = (field: "feedMinerals" | "dosed", name: string): Kind<true> => ({
  name,
  of: (i) => i[field].map((id) => [id, true]),
  put: (i, entries) => ({ ...i, [field]: entries.map(([id]) => id) }),
  what: (id) => `${name}: ${id}`,
  text: () => "on the list",
  absent: "not on the list",
});

export const totals = (field: "ligands" | "others", name: string): Kind<PlanTotal> => ({
  name,
  of: (i) => i[field].map((c) => [c.component, c]),
  put: (i, entries) => ({ ...i, [field]: entries.map(([, c]) => c) }),
  what: (component) => `${component}, total`,
  text: totalText,
});

export const metals: Kind<PlanMetal> = {
  name: "Metals",
  of: (i) => i.metals.map((m) => [m.element, m]),
  put: (i, entries) => ({ ...i, metals: entries.map(([, m]) => m) }),
  what: (element) => element,
  text: metalText,
  order: "Order of metals",
  fits: ({ length }) => length > 0 && length <= 16,
};

interface Standing {
  reason?: string;
  putBack?: true;
}
/** Left out and put back are two answers to one question about a species. */
export const standing: Kind<Standing> = {
  name: "Species",
  of: (i) => {
    const all = new Map<string, Standing>(i.leftOut.map(({ species, reason }) => [species, { reason }]));
    for (const id of i.putBack) all.set(id, { ...all.get(id), putBack: true });
    return [...all];
  },
  put: (i, entries) => ({
    ...i,
    leftOut: entries.flatMap(([species, { reason }]) => (reason === undefined ? [] : [{ species, reason }])),
    putBack: entries.flatMap(([species, { putBack }]) => (putBack ? [species] : [])),
  }),
  what: (species) => species,
  text: ({ reason, putBack }) =>
    [...(reason === undefined ? [] : [`left out: ${reason}`]), ...(putBack ? ["put back"] : [])].join(", "),
  absent: "as the solids basis has it",
};

export const hazards: Kind<ExcludedHazard> = {
  name: "Kept out of windows",
  of: (i) => (i.excludedHazards ?? []).map((h) => [h.gas, h]),
  put: ({ excludedHazards: _old, ...i }, entries) =>
    entries.length > 0 ? { ...i, excludedHazards: entries.map(([, h]) => h) } : i,
  what: (gas) => `Kept out of windows: ${gas}`,
  text: (h) => keptWords(askedOf(h)),
  absent: "not kept out",
};

type Range = [number, number];
/** "" is the temperature, an element its activity. */
export const ranges: Kind<Range> = {
  name: "Hold over",
  of: ({ ranges: { temperatureC, activities = {} } = {} }) => [
    ...(temperatureC ? [["", temperatureC] as const] : []),
    ...Object.entries(activities),
  ],
  put: ({ ranges: _old, ...i }, entries) => {
    const temperature = entries.find(([key]) => key === "")?.[1];
    const activities = entries.filter(([key]) => key !== "");
    const next = {
      ...(temperature ? { temperatureC: temperature } : {}),
      ...(activities.length > 0 ? { activities: Object.fromEntries(activities) } : {}),
    };
    return entries.length > 0 ? { ...i, ranges: next } : i;
  },
  what: (element) => (element === "" ? "Hold over temperature, °C" : `Hold over activity of ${element}`),
  text: ([lo, hi]) => `${significant(lo)} to ${significant(hi)}`,
  absent: "nothing",
};

/** No species id holds a blank, so start and component part again. */
const REDOX = "electrons";
/** "start component" is a product chosen, "start electrons" what closes its electrons. */
export const overall: Kind<string> = {
  name: "Overall reactions",
  of: (i) =>
    Object.entries(i.overall ?? {}).flatMap(([start, { products = {}, redox }]) => [
      ...Object.entries(products).map(([component, id]) => [`${start} ${component}`, id] as const),
      ...(redox === undefined ? [] : [[`${start} ${REDOX}`, redox] as const]),
    ]),
  put: ({ overall: _old, ...i }, entries) => {
    const all: Record<string, OverallChoice> = {};
    for (const [key, value] of entries) {
      const { start, of } = partsOf(key);
      const old = all[start] ?? {};
      all[start] = of === REDOX ? { ...old, redox: value } : { ...old, products: { ...old.products, [of]: value } };
    }
    return entries.length > 0 ? { ...i, overall: all } : i;
  },
  what: (key) => {
    const { start, of } = partsOf(key);
    return `Overall reaction of ${start}, ${of === REDOX ? of : `product of ${of}`}`;
  },
  text: (value) => (value === "open" ? "left open" : value),
  absent: "by rule",
};
function partsOf(key: string): { start: string; of: string } {
  const at = key.lastIndexOf(" ");
  return { start: key.slice(0, at), of: key.slice(at + 1) };
}

export const held: Kind<NonNullable<PlanInputs["heldSetPoint"]>> = {
  name: "Set point",
  of: ({ heldSetPoint }) => (heldSetPoint ? [["", heldSetPoint]] : []),
  put: ({ heldSetPoint: _old, ...i }, entries) => entries.reduce((sum, [, at]) => ({ ...sum, heldSetPoint: at }), i),
  what: () => "Set point",
  text: heldText,
  absent: heldText(undefined),
};

export const circuit: Kind<NonNullable<PlanInputs["circuit"]>> = {
  name: "Around the leach",
  of: ({ circuit }) => (circuit ? [["", circuit]] : []),
  put: ({ circuit: _old, ...i }, entries) => entries.reduce((sum, [, circuit]) => ({ ...sum, circuit }), i),
  what: () => "Around the leach",
  text: circuitText,
  absent: circuitText({}),
};
