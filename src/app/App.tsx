import { QueryClientProvider, type QueryClient } from "@tanstack/react-query";
import { useEffect } from "react";
import { usePreferences } from "../lib/preferences";
import { applyTheme } from "../lib/theme";
import { Router } from "./router";

export function App({ client }: { client: QueryClient }) {
  return (
    <QueryClientProvider client={client}>
      <ThemeKeeper />
      <Router />
    </QueryClientProvider>
  );
}

function ThemeKeeper() {
  const [{ theme }] = usePreferences();
  useEffect(() => applyTheme(theme), [theme]);
  return null;
}
