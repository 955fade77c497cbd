import { QueryClientProvider, type QueryClient } from "@tanstack/react-query";
import { useEffect } from "react";
import { RouterProvider } from "react-router-dom";
import { usePreferences } from "../lib/preferences";
import { applyTheme } from "../lib/theme";
import { router } from "./router";

export function App({ client }: { client: QueryClient }) {
  return (
    <QueryClientProvider client={client}>
      <ThemeKeeper />
      <RouterProvider router={router} />
    </QueryClientProvider>
  );
}

function ThemeKeeper() {
  const [{ theme }] = usePreferences();
  useEffect(() => applyTheme(theme), [theme]);
  return null;
}
