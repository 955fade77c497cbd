import { typedFigures } from "../../shared/words/tenor";
import { significantPlain, trueMinus, withUnit } from "../../shared/words/numbers";

export {
  celsius,
  fixed,
  MINUS,
  percent,
  scientificParts,
  significant,
  signed,
  THIN_SPACE,
  withUnit,
} from "../../shared/words/numbers";

/** As an input shows it, in characters that can be typed again: 0.50, 12.5, 8.0e-2, 1.0e-5. */
export const inputText = (x: number, figures = 2): string => {
  if (Math.abs(x) >= 0.1 && Math.abs(x) < 1e4) return significantPlain(x, figures);
  return x === 0 ? "0" : x.toExponential(figures - 1).replace("e+", "e");
};

/** Activities and tenors as inputs show them: at least `figures` figures, and all the user typed up to six. */
export const inputTextExact = (x: number, figures = 2): string => {
  return inputText(x, typedFigures(x, figures));
};

export type Parsed = { ok: true; value: number } | { ok: false; message: string };

/** What a person types: decimal comma or point, true minus, 1e-5, 8×10^-2. Thousands separators are refused, since
 *  1,000 may mean one or one thousand. */
export function parseNumber(text: string): Parsed {
  const bare = text
    .trim()
    .replace(/[\u2009\u202f\u00a0 ]/g, "")
    .replace(/[\u2212\u2013]/g, "-");
  if (bare === "") return { ok: false, message: "a number is needed here" };
  if ((bare.match(/[.,]/g) ?? []).length > 1) {
    return {
      ok: false,
      message: `“${text.trim()}” has more than one decimal sign; write it without thousands separators`,
    };
  }
  const plain = bare
    .replace(",", ".")
    .replace(/[×x*·]?10\^/i, "e")
    .replace(/^e/i, "1e")
    .replace(/^-e/i, "-1e");
  if (!/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d{1,3})?$/i.test(plain)) {
    return { ok: false, message: `“${text.trim()}” is not a number; write it like 0.05, 0,05 or 5e-2` };
  }
  return { ok: true, value: Number(plain) };
}

export interface Bounds {
  min?: number | undefined;
  max?: number | undefined;
  /** the lower bound itself is not allowed */
  above?: number | undefined;
}

/** Why a value is out of its bounds, naming value and bound; null when it is inside. */
export function outOfBounds(value: number, { min, max, above }: Bounds, unit?: string): string | null {
  const say = (x: number) => withUnit(trueMinus(String(Number(x.toPrecision(12)))), unit);
  if (above !== undefined && value <= above) return `${say(value)} is too low: it must be above ${say(above)}`;
  if (min !== undefined && value < min) return `${say(value)} is too low: the least is ${say(min)}`;
  if (max !== undefined && value > max) return `${say(value)} is too high: the most is ${say(max)}`;
  return null;
}

const day = new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "short", year: "numeric" });
const clock = new Intl.DateTimeFormat("en-GB", { hour: "2-digit", minute: "2-digit" });

/** "09:42" today, "yesterday 09:42", else "3 Dec 2026". The full time belongs in a title attribute. */
export function savedAt(iso: string, now: Date = new Date()): string {
  const at = new Date(iso);
  const days = Math.round((startOfDay(now) - startOfDay(at)) / 86_400_000);
  if (days === 0) return clock.format(at);
  if (days === 1) return `yesterday ${clock.format(at)}`;
  return day.format(at);
}
/** "09:42" */
export const clockTime = (at: number | Date): string => clock.format(at);
export const fullTime = (iso: string): string => `${day.format(new Date(iso))}, ${clock.format(new Date(iso))}`;

const startOfDay = (d: Date) => new Date(d.getFullYear(), d.getMonth(), d.getDate()).getTime();

/** "1 revision", "2 revisions" */
export const counted = (n: number, one: string, many = `${one}s`): string => `${n} ${n === 1 ? one : many}`;

/** "the window" -> "The window" */
export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
