import { useQuery, useQueryClient } from "@tanstack/react-query";
import { useCallback } from "react";
import { preferences as schema, type Preferences } from "../../shared/schemas/member";
import { api } from "./api";
import { keys } from "./queries";
import { useSessionQuery } from "./session";

export type FullPreferences = Required<Preferences>;

export const defaultPreferences: FullPreferences = {
  theme: "system",
  plainMap: false,
  potentialUnit: "V",
  potentialScale: "SHE",
  electrodeTemperatureC: null,
  layers: {},
};

const shelf = "gangueway.preferences";

/** What this browser saw last, so that the first paint has the right theme before the server answers. */
export function mirroredPreferences(): Preferences {
  try {
    const parsed = schema.safeParse(JSON.parse(localStorage.getItem(shelf) ?? "{}"));
    return parsed.success ? parsed.data : {};
  } catch {
    return {}; // storage may be closed to us; the defaults do
  }
}

function mirror(preferences: Preferences) {
  try {
    localStorage.setItem(shelf, JSON.stringify(preferences));
  } catch {
    // a private window: the server still remembers
  }
}

/** One write at a time, the newest last: a slider of switches must not let an older answer win. */
let writing: Promise<unknown> = Promise.resolve();

/** The member's preferences over the defaults, and a way to change some of them: at once here, then on the server. */
export function usePreferences(): [FullPreferences, (change: Partial<Preferences>) => void] {
  const client = useQueryClient();
  const signedIn = Boolean(useSessionQuery().data?.user);
  const { data } = useQuery({
    queryKey: keys.preferences,
    queryFn: async ({ signal }) => {
      const kept = await api.get<Preferences>("/me/preferences", { signal });
      mirror(kept);
      return kept;
    },
    enabled: signedIn,
    staleTime: Infinity,
    placeholderData: mirroredPreferences,
  });
  const change = useCallback(
    (part: Partial<Preferences>) => {
      const next = { ...(client.getQueryData<Preferences>(keys.preferences) ?? mirroredPreferences()), ...part };
      mirror(next);
      client.setQueryData(keys.preferences, next);
      if (!signedIn) return;
      // Lost writes are harmless: the mirror keeps the wish and the next change sends everything.
      writing = writing.then(() => api.put<Preferences>("/me/preferences", next)).catch(() => undefined);
    },
    [client, signedIn],
  );
  return [{ ...defaultPreferences, ...(data ?? mirroredPreferences()) }, change];
}
