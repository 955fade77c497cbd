import type { Conflict } from "./merge";

/** What a browser keeps of a record until the server has it: a closed page, a lost network or an expired sign-in loses nothing. */
export interface ShelvedDraft<Values> {
  /** the version the draft stands on */
  version: number;
  base: Values;
  values: Values;
  /** fields somebody else changed meanwhile and nobody has decided on */
  conflicts: Conflict[];
}

const prefix = "gangueway.record.";

const hasShape = (x: unknown): x is ShelvedDraft<object> =>
  typeof x === "object" &&
  x !== null &&
  "version" in x &&
  typeof x.version === "number" &&
  "base" in x &&
  typeof x.base === "object" &&
  "values" in x &&
  typeof x.values === "object" &&
  "conflicts" in x &&
  Array.isArray(x.conflicts);

/** @returns  null where nothing is kept, or what is kept cannot be read */
export function readShelf<Values>(name: string): ShelvedDraft<Values> | null {
  try {
    const found: unknown = JSON.parse(localStorage.getItem(prefix + name) ?? "null");
    return hasShape(found) ? (found as ShelvedDraft<Values>) : null;
  } catch {
    return null; // storage closed to us, or cut off half way
  }
}

/** @returns  false where the browser keeps nothing, so that the screen can say so */
export function keepOnShelf<Values>(name: string, draft: ShelvedDraft<Values>): boolean {
  try {
    localStorage.setItem(prefix + name, JSON.stringify(draft));
    return true;
  } catch {
    return false;
  }
}

export function clearShelf(name: string): void {
  try {
    localStorage.removeItem(prefix + name);
  } catch {
    // nothing was kept
  }
}

/** Names of the drafts this browser keeps that begin so: "trial." */
export function shelved(start: string): string[] {
  try {
    return Object.keys(localStorage)
      .filter((key) => key.startsWith(prefix + start))
      .map((key) => key.slice(prefix.length));
  } catch {
    return [];
  }
}
