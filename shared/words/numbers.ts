/** Numbers as they stand on the page: true minus, thin space before a unit, fixed digits so that columns align. */
export const MINUS = "\u2212";
export const THIN_SPACE = "\u2009";
export const NARROW_NO_BREAK = "\u202f";

/** A hyphen in front becomes a minus sign. */
export const trueMinus = (text: string) => text.replace("-", MINUS);
const withoutNegativeZero = (text: string) => (/^-0(\.0*)?$/.test(text) ? text.slice(1) : text);

/** `fixed(-0.204, 2)` → "−0.20" */
export const fixed = (x: number, digits: number): string => trueMinus(withoutNegativeZero(x.toFixed(digits)));

/** With a sign on both sides of zero: "+0.12", "−0.12". */
export const signed = (x: number, digits: number): string => {
  const text = fixed(x, digits);
  return text.startsWith(MINUS) || Number(x.toFixed(digits)) === 0 ? text : `+${text}`;
};

const plainRange = (x: number) => x === 0 || (Math.abs(x) >= 0.01 && Math.abs(x) < 1e4);

/** Significant figures without an exponent, whatever the size. */
export function significantPlain(x: number, figures: number): string {
  const magnitude = Math.floor(Math.log10(Math.abs(x)));
  return x.toFixed(Math.max(0, figures - 1 - magnitude));
}

/** A number taken apart for typesetting. */
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

/** A number with its unit behind a thin space. */
export const withUnit = (text: string, unit?: string): string => (unit ? `${text}${THIN_SPACE}${unit}` : text);

/** "88.4 %" in running text, where it must not break: the space is narrow and holds. */
export const percent = (x: number, digits: number): string => `${fixed(x, digits)}${NARROW_NO_BREAK}%`;

/** "60 °C" */
export const celsius = (t: number, digits = 0): string => withUnit(fixed(t, digits), "°C");
