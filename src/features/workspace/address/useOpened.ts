import { useQueryClient } from "@tanstack/react-query";
import { useEffect, useState } from "react";
import { useLocation } from "react-router-dom";
import type { PlanInputs, PlanRow, RevisionRow } from "../../../../shared/schemas/plan";
import { bareView, type PlanView } from "./view";

/** What the address brought when the plan was opened. */
export interface Opened {
  view: PlanView;
  /** what could not be taken, in words */
  ignored: readonly string[];
  /** settings of somebody else's that were not saved: a proposal */
  settings: PlanInputs | null;
}

/** State of a navigation whose settings were asked for already: they go into the draft at once. */
export const TAKE_SETTINGS = { takeSettings: true };
export const takesSettings = (state: unknown): boolean =>
  typeof state === "object" && state !== null && "takeSettings" in state;

const bare: Opened = { view: bareView, ignored: [], settings: null };

/** Reads the address a plan is opened by, once for each plan and revision; null while that takes a moment.
 *  @param of  names plan and revision     @param plan, frozen  undefined until they are read */
export function useOpened(
  of: string,
  plan: PlanRow | undefined,
  frozen: RevisionRow | null | undefined,
): Opened | null {
  const { search } = useLocation();
  const client = useQueryClient();
  const [opened, setOpened] = useState<{ of: string; what: Opened } | null>(null);
  const done = opened?.of === of;
  useEffect(() => {
    if (done || !plan || frozen === undefined) return;
    const query = new URLSearchParams(search);
    let here = true;
    const take = (what: Opened) => here && setOpened({ of, what });
    if ([...query.keys()].every((key) => key === "revision")) take(bare);
    else
      void import("./readAddress")
        .then(({ readAddress }) => readAddress(query, plan, frozen, client))
        .then(take, () =>
          take({ ...bare, ignored: ["all of it (what reads it could not be fetched; reload the page to try again)"] }),
        );
    return () => {
      here = false;
    };
  }, [done, of, plan, frozen, search, client]);
  return done ? opened.what : null;
}
