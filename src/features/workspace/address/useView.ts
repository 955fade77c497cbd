import { useCallback, useEffect, useLayoutEffect, useRef, useState } from "react";
import { useLocation, useNavigate } from "react-router-dom";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import { bringScale, usualScale, useScaleChoice } from "../../../lib/scaleChoice";
import { keptReagents } from "../model/useMapSettings";
import { defaultLayers } from "../../../map/view";
import { bareView, type PlanView } from "./view";

export type ChangeView = (part: Partial<PlanView>) => void;

/** A hand on the map rests this long, ms, before the address follows. */
const REST = 350;

/** An address that states no view leaves the reagents to this browser, as it leaves layers and scale to the member. */
const settled = (view: PlanView, planId: string): PlanView =>
  view.layers === null ? { ...view, reagents: keptReagents(planId) } : view;

/** How the plan is looked at: from the address it was opened by, then as the member changes it, and again from the address when they go
 *  back or forward. */
export function useView(start: PlanView, planId: string, inputs: PlanInputs) {
  const location = useLocation();
  const [view, setView] = useState(() => settled(start, planId));
  const change = useCallback<ChangeView>((part) => setView((old) => ({ ...old, ...part })), []);
  /** the next change of the address is our own */
  const own = useRef(false);
  const known = useRef(location.key);
  const now = useRef(inputs);
  useEffect(() => {
    now.current = inputs;
  }, [inputs]);
  useEffect(() => {
    if (location.key === known.current) return;
    known.current = location.key;
    if (own.current) {
      own.current = false;
      return;
    }
    void import("./codec").then(({ decodeView }) =>
      setView(settled(decodeView(new URLSearchParams(location.search), now.current).view, planId)),
    );
  }, [location, planId]);
  // "Back" may come before a busy page has shown the address it is back from: the location is then seen to change by nobody.
  useEffect(() => {
    const { pathname } = window.location;
    const back = () => {
      if (window.location.pathname !== pathname) return;
      own.current = false;
      const query = new URLSearchParams(window.location.search);
      void import("./codec").then(({ decodeView }) => setView(settled(decodeView(query, now.current).view, planId)));
    };
    window.addEventListener("popstate", back);
    return () => window.removeEventListener("popstate", back);
  }, [planId]);
  useLayoutEffect(() => {
    bringScale(view.scale);
    return () => bringScale(null);
  }, [view.scale]);
  return { view, change, own };
}

/** The text of a view that is nobody's in particular. */
const usual = JSON.stringify({ ...bareView, plain: false, layers: defaultLayers, scale: usualScale });

/** What an address may keep besides the view: which revision, which settings. */
const kept = ["revision", "settings"] as const;

/** Keeps the address what is seen: rewritten when the hand rests, without an entry of its own in the browser's history; opening or
 *  closing the filmstrip makes one, so that "back" leads back from it.
 *  @param seen  with layers, plain and reagents as they are in force */
export function useAddress(seen: PlanView, own: { current: boolean }, settings: boolean): void {
  const navigate = useNavigate();
  const location = useLocation();
  const [scale] = useScaleChoice();
  const text = JSON.stringify({ ...seen, scale });
  const film = useRef(seen.film === null);
  const here = useRef(location);
  useEffect(() => {
    here.current = location;
  }, [location]);
  useEffect(() => {
    let open = true;
    const opened = film.current !== (seen.film === null);
    const timer = setTimeout(
      () => {
        const before = new URLSearchParams(here.current.search);
        const stays = kept.flatMap((key): [string, string][] => {
          const value = before.get(key);
          return value === null || (key === "settings" && !settings) ? [] : [[key, value]];
        });
        const write = (search: string) => {
          // Whoever has followed a link is on the way out, though this screen stands until the next has come: their address is not ours.
          if (!open || window.location.pathname !== here.current.pathname) return;
          film.current = seen.film === null;
          // After "back" the address may say so before the location does: an entry of its own would undo the going back.
          if (search === here.current.search || search === window.location.search) return;
          own.current = true;
          void navigate({ search }, { replace: !opened, preventScrollReset: true });
        };
        // A plan just opened as any new member sees it: what writes addresses is not fetched for that.
        if (stays.length === 0 && text === usual) return write("?view=1");
        void import("./codec").then(
          ({ encodeView, queryText }) => write(queryText([...stays, ...encodeView(JSON.parse(text) as PlanView)])),
          () => undefined, // the server is out of reach: the address waits for the next change
        );
      },
      opened ? 0 : REST,
    );
    return () => {
      open = false;
      clearTimeout(timer);
    };
  }, [text, settings, seen.film, own, navigate]);
}
