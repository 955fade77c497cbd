/** The light palette: the screen and the printed sheet draw from the same. */
export const lightPalette = {
  paper: "#f5f8f4",
  sheet: "#ffffff",
  ink: "#13231f",
  muted: "#5a6b64",
  rule: "#c6d1ca",
  verdigris: "#14735f",
  tint: "#d3ede3",
  copper: "#a84b15",
  water: "#3a6a9a",
  signal: "#bf1e2e",
} as const;
