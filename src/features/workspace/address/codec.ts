import { z } from "../../../../shared/schemas/z";
import { hazardGases } from "../../../../shared/hazards/pressures";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Frame } from "../../../../shared/schemas/problem";
import type { Point } from "../../../../shared/solution";
import { settingBounds, settingOf, type Varied } from "../../../../shared/whatif/vary";
import { usualScale } from "../../../lib/scaleChoice";
import { defaultLayers, layerNames } from "../../../map/view";
import { bareView, type FilmWish, type PlanView } from "./view";

/** What stands in an address for each layer and gas. */
const switches: Readonly<Record<string, string>> = {
  boundaries: "boundaries",
  labels: "names",
  water: "water",
  setPoint: "setpoint",
  crosscuts: "crosscuts",
  reach: "reach",
  equilibriumLines: "equilibria",
  otherBasis: "otherbasis",
  hazard: "hazards",
  practice: "practice",
  trials: "trials",
  ...Object.fromEntries(hazardGases.map((gas) => [`gas ${gas}`, gas])),
};
const switchOf = new Map(Object.entries(switches).map(([name, word]) => [word, name]));
const colours = { recoveryPct: "recovery", gangueDissolvedPct: "gangue", selectivityPct: "selectivity" } as const;

const number = z
  .string()
  .regex(/^-?\d+(\.\d+)?(e[+-]?\d+)?$/i, "is not a number")
  .transform(Number);
const parts = (separator: string) => z.string().transform((text) => text.split(separator));
const list = z
  .string()
  .min(1)
  .transform((text) => text.split(","));
const range = (low: number, high: number) =>
  parts("..")
    .pipe(z.tuple([number, number]))
    .refine(([lo, hi]) => lo < hi && lo >= low && hi <= high, { message: `does not rise within ${low} to ${high}` });
const point = parts(",").pipe(z.tuple([number, number]));
const known = list.refine((words) => words.every((w) => switchOf.has(w)), { message: "names no layer" });
const varied = z
  .string()
  .regex(/^(temperature|(amount|total)-\w+)$/, "names no setting")
  .transform((text): Varied => {
    const [kind = "", of = ""] = text.split("-");
    return kind === "temperature" ? { kind } : { kind: kind as "amount" | "total", of };
  });

/** The keys of a plan's address, each as text. Every key may be absent: then it stands as for a new member. */
const addressSchema = z.object({
  view: z.literal("1"),
  pH: range(-10, 30),
  Eh: range(-10, 10),
  focus: z.string().min(1),
  hide: list,
  pair: parts(",").pipe(z.tuple([z.string(), z.string()], { error: "names two metals" })),
  window: z.string().regex(/^[A-Z]$/, "is no window’s letter"),
  pin: point,
  plain: z.enum(["0", "1"]),
  on: known,
  off: known,
  reach: z.string().transform((text) => (text === "none" ? [] : text.split(","))),
  scale: parts(",").pipe(z.tuple([z.enum(["V", "mV"]), z.string().min(1), z.union([z.literal("liquor"), number])])),
  side: z.literal("trials"),
  trials: z.literal("project"),
  colour: z.enum(["recovery", "gangue", "selectivity"]),
  without: list,
  brush: parts(",").pipe(z.tuple([range(-10, 30), range(-10, 10)])),
  comments: z.literal("1"),
  text: z.literal("1"),
  vary: varied,
  over: parts("..").pipe(z.tuple([number, number])),
  frames: number.refine((n) => [5, 6, 7, 8, 9].includes(n), { message: "is not 5 to 9" }),
});
type Address = Partial<z.infer<typeof addressSchema>>;
const addressKeys = Object.keys(addressSchema.shape) as (keyof Address)[];

/** Short, and exact to what a screen can show. */
const text = (x: number, digits = 4): string => String(Number(x.toFixed(digits)));
const figures = (x: number): string => String(Number(x.toPrecision(6)));
const spanText = ([lo, hi]: readonly [number, number], write = text): string => `${write(lo)}..${write(hi)}`;
const pointText = (at: Point): string => `${text(at[0])},${text(at[1], 5)}`;

/** An address's query for a view. `view=1` says that the address states all of it: what is not named stands as for a new member,
 *  whoever opens it.
 *  @param view  with layers, plain and scale as they are in force     @returns  pairs in a fixed order, defaults left away */
export function encodeView(view: PlanView): [string, string][] {
  const out: [string, string][] = [["view", "1"]];
  const add = (key: keyof Address, value: string | null | false) =>
    value !== null && value !== false && out.push([key, value]);
  const { visible, film, scale, brush } = view;
  if (visible) {
    add("pH", spanText(visible.pH));
    add("Eh", spanText(visible.Eh));
  }
  add("focus", view.focus);
  add("hide", view.hidden.length > 0 && view.hidden.join(","));
  add("pair", view.pair?.join(",") ?? null);
  add("window", view.window > 0 && String.fromCharCode(65 + (view.window % 26)));
  add("pin", view.pin && pointText(view.pin));
  add("plain", view.plain === true && "1");
  const switched = (wanted: boolean) =>
    Object.entries(view.layers ?? {})
      .filter(
        ([name, on]) => on === wanted && name in switches && on !== (defaultLayers as Record<string, boolean>)[name],
      )
      .map(([name]) => switches[name])
      .join(",");
  add("on", switched(true) || null);
  add("off", switched(false) || null);
  add("reach", view.reagents && (view.reagents.join(",") || "none"));
  if (scale && (scale.potentialUnit !== "V" || scale.potentialScale !== "SHE" || scale.electrodeTemperatureC !== null))
    add("scale", [scale.potentialUnit, scale.potentialScale, scale.electrodeTemperatureC ?? "liquor"].join(","));
  add("side", view.side === "trials" && "trials");
  add("trials", view.trialsOf === "project" && "project");
  add("colour", view.colouredBy !== "recoveryPct" && colours[view.colouredBy]);
  add("without", view.without.length > 0 && view.without.join(","));
  add("brush", brush && `${spanText(brush.pH)},${spanText(brush.Eh)}`);
  add("comments", view.comments && "1");
  add("text", view.asText && "1");
  if (film) {
    add("vary", film.vary.kind === "temperature" ? "temperature" : `${film.vary.kind}-${film.vary.of}`);
    add("over", spanText(film.range, figures));
    add("frames", film.frames !== 7 && String(film.frames));
  }
  return out;
}

/** A query in which the signs an address may hold stand as themselves, so that one can read it. */
export const queryText = (pairs: readonly (readonly [string, string])[]): string =>
  `?${new URLSearchParams(pairs.map(([k, v]) => [k, v])).toString()}`.replace(
    /%(2C|3A|3B|7E|28|29|40)/g,
    decodeURIComponent,
  );

export interface DecodedView {
  view: PlanView;
  /** what was not taken, in words, with what stood there */
  ignored: string[];
}

/** Reads a view out of an address. What is malformed, or speaks of what the plan has not, is left out and named; the rest holds.
 *  @param query  of the address     @param inputs  of the plan, for its metals and settings     @returns  the view and what was ignored;
 *  an address that states no view leaves layers, plain and scale to the member */
export function decodeView(query: URLSearchParams, inputs: PlanInputs): DecodedView {
  const ignored: string[] = [];
  const found: Record<string, unknown> = {};
  for (const key of addressKeys) {
    const value = query.get(key);
    if (value === null) continue;
    const parsed = addressSchema.shape[key].safeParse(value);
    if (parsed.success) found[key] = parsed.data;
    else ignored.push(`${key}=${value} (${parsed.error.issues[0]?.message ?? "not understood"})`);
  }
  const a = found as Address;
  const drop = (key: keyof Address, why: string) => {
    ignored.push(`${key}=${query.get(key) ?? ""} (${why})`);
    delete a[key];
  };
  const elements = new Set(inputs.metals.map((m) => m.element));
  for (const key of ["focus", "hide", "pair"] as const) {
    const strange = [a[key] ?? []].flat().filter((e) => !elements.has(e));
    if (strange.length > 0) drop(key, `the plan has no ${strange.join(", ")}`);
  }
  const stated = addressKeys.some((key) => query.has(key));
  const film = filmOf(a, inputs, drop);
  const layers = Object.fromEntries<boolean>(stated ? layerNames.map((name) => [name, defaultLayers[name]]) : []);
  for (const word of a.on ?? []) layers[switchOf.get(word) ?? word] = true;
  for (const word of a.off ?? []) layers[switchOf.get(word) ?? word] = false;
  if (stated && (a.pH === undefined) !== (a.Eh === undefined)) drop(a.pH ? "pH" : "Eh", "pH and Eh go together");
  const visible: Frame | null = a.pH && a.Eh ? { pH: a.pH, Eh: a.Eh } : null;
  const colouredBy = (Object.keys(colours) as (keyof typeof colours)[]).find((c) => colours[c] === a.colour);
  return {
    ignored,
    view: {
      visible,
      focus: a.focus ?? null,
      hidden: a.hide ?? [],
      pair: a.pair ?? null,
      layers: stated ? layers : null,
      plain: stated ? a.plain === "1" : null,
      window: a.window ? a.window.charCodeAt(0) - 65 : 0,
      pin: a.pin ?? null,
      reagents: a.reach ?? null,
      scale: a.scale
        ? {
            potentialUnit: a.scale[0],
            potentialScale: a.scale[1],
            electrodeTemperatureC: a.scale[2] === "liquor" ? null : a.scale[2],
          }
        : stated
          ? usualScale
          : null,
      side: a.side ?? bareView.side,
      trialsOf: a.trials ?? bareView.trialsOf,
      colouredBy: colouredBy ?? bareView.colouredBy,
      without: a.without ?? [],
      brush: a.brush ? { pH: a.brush[0], Eh: a.brush[1] } : null,
      comments: a.comments === "1",
      asText: a.text === "1",
      film,
    },
  };
}

function filmOf(a: Address, inputs: PlanInputs, drop: (key: keyof Address, why: string) => void): FilmWish | null {
  if (!a.vary) return null;
  if (settingOf(inputs, a.vary) === null) {
    drop("vary", "the plan has no such setting");
    return null;
  }
  const [low, high] = settingBounds(inputs, a.vary);
  if (!a.over || !(a.over[0] < a.over[1] && a.over[0] >= low && a.over[1] <= high)) {
    drop("over", `a range that rises within ${low} to ${high} is needed`);
    return null;
  }
  return { vary: a.vary, range: a.over, frames: a.frames ?? 7 };
}
