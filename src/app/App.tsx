import { QueryClientProvider, type QueryClient } from "@tanstack/react-query";
import { useEffect, useState } from "react";
import { RouterProvider } from "react-router-dom";
import { usePreferences } from "../lib/preferences";
import { createQueryClient } from "../lib/queries";
import { applyTheme } from "../lib/theme";
import { router } from "./router";

export function App() {
  const [client] = useState<QueryClient>(createQueryClient);
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
