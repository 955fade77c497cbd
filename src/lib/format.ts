/** Numbers as they stand on the page: true minus, thin space before a unit, fixed digits so that columns align. */
export const MINUS = "\u2212";
export const THIN_SPACE = "\u2009";
export const NARROW_NO_BREAK = "\u202f";

const trueMinus = (text: string) => text.replace("-", MINUS);
const withoutNegativeZero = (text: string) => (/^-0(\.0*)?$/.test(text) ? text.slice(1) : text);

/** `fixed(-0.204, 2)` → "−0.20" */
export const fixed = (x: number, digits: number): string => trueMinus(withoutNegativeZero(x.toFixed(digits)));

/** With a sign on both sides of zero: "+0.12", "−0.12". */
export const signed = (x: number, digits: number): string => {
  const text = fixed(x, digits);
  return text.startsWith(MINUS) || Number(x.toFixed(digits)) === 0 ? text : `+${text}`;
};

const plainRange = (x: number) => x === 0 || (Math.abs(x) >= 0.01 && Math.abs(x) < 1e4);

/** As an input shows it, in characters that can be typed again: 0.50, 12.5, 8.0e-2, 1.0e-5. */
export const inputText = (x: number, figures = 2): string => {
  if (Math.abs(x) >= 0.1 && Math.abs(x) < 1e4) return significantPlain(x, figures);
  return x === 0 ? "0" : x.toExponential(figures - 1).replace("e+", "e");
};

/** Activities and tenors as inputs show them: at least `figures` figures, and all the user typed up to six. */
export const inputTextExact = (x: number, figures = 2): string => {
  const typed = Number(x.toPrecision(6)).toExponential().replace(/e.*/, "").replace(/[-.]/g, "").length;
  return inputText(x, Math.max(figures, typed));
};

function significantPlain(x: number, figures: number): string {
  const magnitude = Math.floor(Math.log10(Math.abs(x)));
  return x.toFixed(Math.max(0, figures - 1 - magnitude));
}

export interface ScientificParts {
  sign: string;
  mantissa: string;
  /** null where the number stands plain */
  exponent: string | null;
}

/** Mantissa and exponent for typesetting in prose (see components/Quantity). */
export function scientificParts(x: number, figures = 2): ScientificParts {
  if (plainRange(x)) {
    return {
      sign: x < 0 ? MINUS : "",
      mantissa: x === 0 ? "0" : significantPlain(Math.abs(x), figures),
      exponent: null,
    };
  }
  const [mantissa = "", exponent = "0"] = Math.abs(x)
    .toExponential(figures - 1)
    .split("e");
  return { sign: x < 0 ? MINUS : "", mantissa, exponent: trueMinus(exponent.replace("+", "")) };
}

/** Plain text with significant figures: "0.50", "1.0e−5". */
export const significant = (x: number, figures = 2): string => {
  const { sign, mantissa, exponent } = scientificParts(x, figures);
  return `${sign}${mantissa}${exponent === null ? "" : `e${exponent}`}`;
};

export const withUnit = (text: string, unit?: string): string => (unit ? `${text}${THIN_SPACE}${unit}` : text);

/** "88.4 %" in running text, where it must not break: the space is narrow and holds. */
export const percent = (x: number, digits: number): string => `${fixed(x, digits)}${NARROW_NO_BREAK}%`;

export const celsius = (t: number, digits = 0): string => withUnit(fixed(t, digits), "°C");

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
  const say = (x: number) => withUnit(trueMinus(String(x)), unit);
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
