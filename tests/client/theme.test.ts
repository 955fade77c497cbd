import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { printColours, themeColours, type ThemeColours } from "../../src/lib/theme";

const css = readFileSync("src/styles/tokens.css", "utf8");
const names = ["paper", "sheet", "ink", "muted", "rule", "verdigris", "tint", "copper", "water", "signal"] as const;

function tokensOf(block: string): Record<string, string> {
  return Object.fromEntries([...block.matchAll(/--color-([a-z0-9-]+): (#[0-9a-f]{6});/g)].map(([, k, v]) => [k!, v!]));
}
const [theme = "", afterTheme = ""] = css.split(':root[data-theme="dark"] {');
const light = tokensOf(theme);
const dark = tokensOf(afterTheme.split("}")[0] ?? "");
const print = tokensOf(css.split("@media print")[1] ?? "");

test.each([
  ["light", light, themeColours.light],
  ["dark", dark, themeColours.dark],
  ["print", print, printColours],
] as const)("the %s colours for Plotly are those of the style sheet", (_name, tokens, colours) => {
  for (const name of names) expect(colours[name], name).toBe(tokens[name]);
});

test("the result scale is one, and falls in lightness", () => {
  expect(themeColours.light.result).toEqual([1, 2, 3, 4, 5].map((i) => light[`result-${i}`]));
  const lightness = themeColours.light.result.map(luminance);
  expect([...lightness].sort((a, b) => b - a)).toEqual(lightness);
});

/** WCAG 2.2, relative luminance and contrast ratio. */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5]
    .map((i) => parseInt(hex.slice(i, i + 2), 16) / 255)
    .map((c) => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4));
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}
const contrast = (a: string, b: string) => {
  const [hi = 0, lo = 0] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (hi + 0.05) / (lo + 0.05);
};

test.each(["light", "dark"] as const)("text of the %s theme keeps 4.5 : 1 on paper and sheet", (name) => {
  const c: ThemeColours = themeColours[name];
  for (const text of ["ink", "muted", "verdigris", "copper", "water", "signal"] as const)
    for (const ground of ["paper", "sheet"] as const)
      expect(contrast(c[text], c[ground]), `${text} on ${ground}`).toBeGreaterThanOrEqual(4.5);
  for (const text of ["ink", "muted", "verdigris", "copper", "water", "signal"] as const)
    expect(contrast(c[text], c.tint), `${text} on tint`).toBeGreaterThanOrEqual(4.5);
  expect(contrast(c.paper, c.verdigris), "primary button").toBeGreaterThanOrEqual(4.5);
});
