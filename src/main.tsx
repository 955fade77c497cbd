import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { App } from "./app/App";
import { mirroredPreferences } from "./lib/preferences";
import { applyTheme } from "./lib/theme";
import "./styles/index.css";

// Before the first paint: a dark room stays dark.
applyTheme(mirroredPreferences().theme ?? "system")();

const root = document.getElementById("root");
if (!root) throw new Error("index.html has no #root");
createRoot(root).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
