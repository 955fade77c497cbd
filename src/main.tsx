import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { App } from "./app/App";
import { headStart } from "./app/headStart";
import { fetchScreen } from "./app/router";
import { mirroredPreferences } from "./lib/preferences";
import { createQueryClient } from "./lib/queries";
import { applyTheme } from "./lib/theme";
import "./styles/index.css";

// Before the first paint: a dark room stays dark.
applyTheme(mirroredPreferences().theme ?? "system")();

const client = createQueryClient();
fetchScreen(location.pathname);
headStart(client, location);

const root = document.getElementById("root");
if (!root) throw new Error("index.html has no #root");
createRoot(root).render(
  <StrictMode>
    <App client={client} />
  </StrictMode>,
);
