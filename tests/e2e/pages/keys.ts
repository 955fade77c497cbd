import { expect } from "vitest";
import type { Page } from "playwright-core";

interface Stop {
  name: string;
  /** an outline or a shadow that the rest of the page has not, on something that is on the screen */
  shown: boolean;
}

/** A hand on the keyboard and none on the mouse; notes every place the focus comes to. */
export class Keys {
  constructor(private readonly page: Page) {}

  /** Begins to note where the focus goes; after every load of the page. */
  async watch(): Promise<void> {
    await this.page.evaluate(() => {
      const stops: Stop[] = [];
      const seen = new WeakSet<Element>();
      const nameOf = (e: Element): string => {
        const labels = e instanceof HTMLInputElement || e instanceof HTMLTextAreaElement ? [...(e.labels ?? [])] : [];
        const words = e.getAttribute("aria-label") ?? (labels.map((l) => l.textContent).join(" ") || e.textContent);
        return (words || e.getAttribute("title") || e.tagName).replace(/\s+/g, " ").trim().slice(0, 160);
      };
      document.addEventListener("focusin", ({ target }) => {
        if (!(target instanceof Element) || target.id === "screen") return;
        // A group hands the focus on to the one of its lines that has it.
        if (target.matches("[role=menu], [role=group], [role=radiogroup], [role=tablist], [role=listbox]")) return;
        seen.add(target);
        const { outlineStyle, outlineWidth, boxShadow } = getComputedStyle(target);
        const { width, height } = target.getBoundingClientRect();
        const marked = (outlineStyle !== "none" && parseFloat(outlineWidth) > 0) || boxShadow !== "none";
        stops.push({ name: nameOf(target), shown: marked && width > 0 && height > 0 });
      });
      Object.assign(window, {
        focusStops: stops,
        /** what can be worked and was not come to; of a group that arrow keys walk, one stands for all */
        notReached: () => {
          const all = document.querySelectorAll(
            "a[href], button:not(:disabled), input:not(:disabled), select:not(:disabled), textarea, summary, [tabindex]",
          );
          const groups = "[role=radiogroup], [role=tablist], [role=grid], [role=group]:has(> [role=radio])";
          return [...all]
            .filter((e) => e.checkVisibility({ visibilityProperty: true }) && !seen.has(e))
            .filter((e) => !e.closest("[aria-hidden=true], [inert]") && !e.closest(groups))
            .filter(
              (e) => !(e instanceof HTMLElement && e.tabIndex < 0 && !e.matches("a, button, input, select, summary")),
            )
            .map(nameOf);
        },
      });
    });
  }

  async stops(): Promise<Stop[]> {
    return this.page.evaluate(() => (window as unknown as { focusStops: Stop[] }).focusStops);
  }

  notReached(): Promise<string[]> {
    return this.page.evaluate(() => (window as unknown as { notReached: () => string[] }).notReached());
  }

  /** Presses Tab until the focus stands on something of that name. */
  async tabTo(name: RegExp, { back = false, most = 160 } = {}): Promise<void> {
    const passed: string[] = [];
    for (let i = 0; i < most; i++) {
      await this.page.keyboard.press(back ? "Shift+Tab" : "Tab");
      const stop = await this.page.evaluate(
        () => (window as unknown as { focusStops: Stop[] }).focusStops.at(-1)?.name ?? "",
      );
      if (name.test(stop)) return;
      passed.push(stop);
    }
    throw new Error(`${most} times Tab did not lead to ${name}, but to: ${passed.join(" | ")}`);
  }

  async press(...keys: string[]): Promise<void> {
    for (const key of keys) await this.page.keyboard.press(key);
  }

  /** Every place so far showed that it had the focus. */
  async expectAllShown(): Promise<void> {
    const hidden = (await this.stops()).filter(({ shown }) => !shown).map(({ name }) => name);
    expect([...new Set(hidden)], "places whose focus does not show").toEqual([]);
  }
}
