import { useEffect, useSyncExternalStore } from "react";
import type { ProjectRow } from "../../shared/schemas/api";
import { useProjects } from "./plans";

/** Which project this browser looked at last; a convenience, so it stays here and not on the server. */
const shelf = "gangueway.project";
const listeners = new Set<() => void>();
let chosen: string | null = null;

function read(): string | null {
  if (chosen !== null) return chosen;
  try {
    return localStorage.getItem(shelf);
  } catch {
    return null;
  }
}

export function selectProject(id: string): void {
  chosen = id;
  try {
    localStorage.setItem(shelf, id);
  } catch {
    // remembered for this page only
  }
  listeners.forEach((tell) => tell());
}

const subscribe = (tell: () => void) => {
  listeners.add(tell);
  return () => void listeners.delete(tell);
};

/** The project whose plans are shown: the one chosen last, else the first. */
export function useProject(): { project: ProjectRow | undefined; projects: ProjectRow[] | undefined } {
  const id = useSyncExternalStore(subscribe, read);
  const { data: projects } = useProjects();
  return { projects, project: projects?.find((p) => p.id === id) ?? projects?.[0] };
}

/** A screen of one record: its project becomes the one in hand, so that the way back leads to its own lists.
 *  @param projectId  undefined until the record is read */
export function useProjectOf(projectId: string | undefined): void {
  useEffect(() => {
    if (projectId !== undefined) selectProject(projectId);
  }, [projectId]);
}
