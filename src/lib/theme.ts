import { useSyncExternalStore } from "react";
import { lightPalette } from "../../shared/drawing/palette";

export type Theme = "system" | "light" | "dark";
export type ResolvedTheme = "light" | "dark";

/** The tokens of src/styles/tokens.css as plain colours, for Plotly, which cannot read CSS variables. */
export interface ThemeColours {
  paper: string;
  sheet: string;
  ink: string;
  muted: string;
  rule: string;
  verdigris: string;
  tint: string;
  copper: string;
  water: string;
  signal: string;
  /** low to high, monotone in lightness */
  result: readonly [string, string, string, string, string];
}

const result = ["#f0e4c8", "#e0b873", "#c98a4b", "#8f5b4a", "#4b2e4b"] as const;

export const themeColours: Record<ResolvedTheme, ThemeColours> = {
  light: { ...lightPalette, result },
  dark: {
    paper: "#0f1a17",
    sheet: "#14231f",
    ink: "#e6efea",
    muted: "#9bafa6",
    rule: "#33463f",
    verdigris: "#58c4a3",
    tint: "#143b31",
    copper: "#ee9a5f",
    water: "#84b4e0",
    signal: "#ff8086",
    result,
  },
};

/** Paper for the printed page: the light palette without tints. */
export const printColours: ThemeColours = {
  ...themeColours.light,
  paper: "#ffffff",
  ink: "#000000",
  muted: "#444444",
  rule: "#999999",
  verdigris: "#000000",
  tint: "#ffffff",
  copper: "#000000",
  water: "#444444",
  signal: "#000000",
};

const darkQuery = () => window.matchMedia("(prefers-color-scheme: dark)");

export const resolveTheme = (theme: Theme): ResolvedTheme =>
  theme === "system" ? (darkQuery().matches ? "dark" : "light") : theme;

const current = (): ResolvedTheme => (document.documentElement.dataset.theme === "dark" ? "dark" : "light");

/** Writes the theme on <html>; while it is "system", follows the system. Returns a function that stops following. */
export function applyTheme(theme: Theme): () => void {
  const write = () => {
    document.documentElement.dataset.theme = resolveTheme(theme);
  };
  write();
  if (theme !== "system") return () => undefined;
  const query = darkQuery();
  query.addEventListener("change", write);
  return () => query.removeEventListener("change", write);
}

function subscribe(onChange: () => void) {
  const observer = new MutationObserver(onChange);
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ["data-theme"] });
  return () => observer.disconnect();
}

/** "light" or "dark", as it stands on <html> now. */
export const useResolvedTheme = (): ResolvedTheme => useSyncExternalStore(subscribe, current);

/** The colours of the theme in force; a stable object per theme, so it may stand in dependency lists. */
export const useThemeColours = (): ThemeColours => themeColours[useResolvedTheme()];
