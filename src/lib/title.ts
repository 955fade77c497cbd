import { useEffect } from "react";

/** The page's name in the browser's tab. */
export function usePageTitle(title: string | undefined): void {
  useEffect(() => {
    document.title = title ? `${title} · Gangueway` : "Gangueway";
  }, [title]);
}
