/** The light palette: the screen and the printed sheet draw from the same. */
export const lightPalette = {
  paper: "#f5f8f4",
  sheet: "#ffffff",
  ink: "#13231f",
  muted: "#5a6b64",
  rule: "#c6d1ca",
  verdigris: "#14735f",
  tint: "#d3ede3",
  copper: "#ad4e17",
  water: "#3e6e9e",
  signal: "#bf1e2e",
} as const;
