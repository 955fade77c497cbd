import { planInputs, type PlanInputs } from "../../../../shared/schemas/plan";

/** Settings that are not saved, as text of an address: their difference from a revision, "3~temperatureC:85;metals.Fe.value:1e-6".
 *  A path names a field; metals and totals are named by element and component; a part that came, went or moved is written whole. */

type Json = null | boolean | number | string | Json[] | { [key: string]: Json | undefined };

/** Lists whose items have a name, and the field that holds it. */
const named: Readonly<Record<string, string>> = { metals: "element", ligands: "component", others: "component" };

const isObject = (x: Json | undefined): x is Record<string, Json | undefined> =>
  typeof x === "object" && x !== null && !Array.isArray(x);
const same = (a: Json | undefined, b: Json | undefined) => JSON.stringify(a) === JSON.stringify(b);
const namesOf = (items: readonly Json[], field: string): string[] =>
  items.map((item) => {
    const name = isObject(item) ? item[field] : undefined;
    return typeof name === "string" ? name : "";
  });

function changes(
  before: Json | undefined,
  after: Json | undefined,
  path: readonly string[],
  out: [string, Json][],
): void {
  if (same(before, after)) return;
  const field = path.length === 1 ? named[path[0] ?? ""] : undefined;
  if (field && Array.isArray(before) && Array.isArray(after)) {
    const names = namesOf(before, field);
    if (same(names, namesOf(after, field)) && new Set(names).size === names.length) {
      after.forEach((item, i) => changes(before[i], item, [...path, names[i] ?? ""], out));
      return;
    }
  }
  if (isObject(before) && isObject(after)) {
    for (const key of new Set([...Object.keys(before), ...Object.keys(after)]))
      changes(before[key], after[key], [...path, key], out);
    return;
  }
  out.push([path.join("."), after ?? null]);
}

/** Fields that may be absent: null takes them away. */
const optional = new Set(["circuit", "ranges", "heldSetPoint"]);

const bare = /^[A-Za-z][\w() ^+-]*$/;
const words = new Set(["true", "false", "null"]);
const valueText = (value: Json): string =>
  (typeof value === "string" && bare.test(value) && !words.has(value) ? value : JSON.stringify(value)).replace(
    /[%;]/g,
    encodeURIComponent,
  );
function valueOf(text: string): Json {
  const plain = decodeURIComponent(text);
  return bare.test(plain) && !words.has(plain) ? plain : (JSON.parse(plain) as Json);
}

/** @param base  number and inputs of the revision they start from     @param inputs  the settings     @returns  text for an address */
export function encodeSettings(base: { number: number; inputs: PlanInputs }, inputs: PlanInputs): string {
  const out: [string, Json][] = [];
  changes(base.inputs, JSON.parse(JSON.stringify(inputs)) as Json, [], out);
  return `${base.number}~${out.map(([path, value]) => `${path}:${valueText(value)}`).join(";")}`;
}

/** The revision a text of settings starts from; null where it names none. */
export function baseOf(text: string): number | null {
  const number = /^(\d{1,6})~/.exec(text)?.[1];
  return number === undefined ? null : Number(number);
}

/** @param base  inputs of the revision the text names     @param text  as `encodeSettings` writes it
 *  @returns  the settings, or in words why they cannot be read */
export function decodeSettings(base: PlanInputs, text: string): { inputs: PlanInputs } | { wrong: string } {
  const next = structuredClone(base) as unknown as Record<string, Json | undefined>;
  const body = text.slice(text.indexOf("~") + 1);
  try {
    for (const part of body === "" ? [] : body.split(";")) {
      const colon = part.indexOf(":");
      if (colon < 1) return { wrong: `“${part}” is no setting` };
      const path = part.slice(0, colon).split(".");
      if (!Object.hasOwn(planInputs.shape, path[0] ?? "") || !put(next, path, valueOf(part.slice(colon + 1))))
        return { wrong: `this plan has no ${path.join(" ")}` };
    }
  } catch {
    return { wrong: "it is cut short or was changed on its way" };
  }
  const parsed = planInputs.safeParse(next);
  if (parsed.success) return { inputs: parsed.data };
  const [issue] = parsed.error.issues;
  return { wrong: `${issue?.path.join(" ") ?? "a setting"}: ${issue?.message ?? "not understood"}` };
}

function put(into: Record<string, Json | undefined>, path: readonly string[], value: Json): boolean {
  let at: Json | undefined = into;
  for (const [depth, key] of path.slice(0, -1).entries()) {
    if (Array.isArray(at)) {
      const items: Json[] = at;
      const field = named[path[depth - 1] ?? ""];
      at = field === undefined ? undefined : items.find((item) => isObject(item) && item[field] === key);
    } else {
      at = isObject(at) && Object.hasOwn(at, key) ? at[key] : undefined;
    }
  }
  const last = path.at(-1) ?? "";
  if (!isObject(at) || ["__proto__", "constructor", "prototype"].includes(last)) return false;
  if (value === null && (optional.has(last) || path.length > 1) && !isNullable(path)) delete at[last];
  else at[last] = value;
  return true;
}

/** Fields whose null is a value of theirs. */
const isNullable = (path: readonly string[]): boolean =>
  (path[0] === "metals" && path.at(-1) === "gamma") || path[0] === "ionicStrength";
