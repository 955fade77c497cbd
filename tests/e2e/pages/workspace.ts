import type { Locator, Page } from "playwright-core";
import { shownNumber } from "./shownNumber";

export interface ShownLimit {
  /** "low pH iron dissolves" */
  what: string;
  /** along the axis of its side, in pH or on the scale shown */
  distance: number;
  reaction: string;
}

export interface Answers {
  pH: number;
  Eh: number;
  /** with its unit */
  EhText: string;
  limits: ShownLimit[];
}

export interface DrawnTrace {
  uid: string;
  name: string;
  fillcolor: string;
  hatched: boolean;
  x: (number | null)[];
  y: (number | null)[];
}

export interface PaintedName {
  id: string;
  box: { left: number; top: number; right: number; bottom: number; width: number; height: number };
  pH: number;
  Eh: number;
}

/** Plotly hangs its axes on the element it draws in. */
interface PlotlyElement extends HTMLElement {
  _fullLayout: Record<
    "xaxis" | "yaxis",
    { _offset: number; _length: number; d2p: (value: number) => number; p2d: (px: number) => number }
  >;
}

/** A plan on the table: left asks, middle shows, right answers. */
export class WorkspaceScreen {
  constructor(readonly page: Page) {}

  private readonly plot = () => this.page.locator(".js-plotly-plot");
  readonly readOut = () => this.page.getByTestId("read-out");
  readonly header = () => this.page.locator("main").getByRole("heading", { level: 1 }).locator("..");
  readonly cautions = () => this.page.getByRole("region", { name: "Cautions" });
  readonly asks = (name: string) => this.page.getByRole("region", { name, exact: true });
  readonly number = (label: string) => this.page.getByRole("spinbutton", { name: label, exact: true });
  readonly button = (name: string) => this.page.getByRole("button", { name, exact: true });

  async drawn(): Promise<void> {
    await this.page.locator("[data-testid=window-map][data-drawn] .draglayer").waitFor({ state: "attached" });
  }

  /** What the right side says of the window in hand. */
  async answers(): Promise<Answers> {
    const [pH = "", EhText = ""] = await this.page.getByTestId("set-point").locator("span").allInnerTexts();
    const items = this.page.getByRole("region", { name: /^What shuts window/ }).locator("ul > li");
    const texts = await items.evaluateAll((all) =>
      all.map((li) => {
        const [head, why] = li.children;
        return [head?.children[0], head?.children[1], why].map((e) => (e as HTMLElement | undefined)?.innerText ?? "");
      }),
    );
    const limits = texts.map(([what = "", distance = "", reaction = ""]) => ({
      what: what.replace(/\s+/g, " "),
      distance: shownNumber(distance),
      reaction: reaction.replace(/\s+/g, " "),
    }));
    return { pH: shownNumber(pH), Eh: shownNumber(EhText), EhText, limits };
  }

  /** The same once it rests: the last move of a hand is drawn a moment after it was made. */
  async restedAnswers(): Promise<Answers> {
    let read = await this.answers();
    for (let still = 0; still < 2;) {
      await this.page.waitForTimeout(130);
      const next = await this.answers();
      still = JSON.stringify(next) === JSON.stringify(read) ? still + 1 : 0;
      read = next;
    }
    return read;
  }

  traces(): Promise<DrawnTrace[]> {
    return this.plot().evaluate((element) => {
      const { xaxis, yaxis } = (element as PlotlyElement)._fullLayout;
      const traces = document.querySelectorAll<SVGGElement>("[data-testid=map-shapes] [data-trace]");
      return Array.from(traces, (trace) => {
        const path = trace.querySelector("path");
        const fill = path?.getAttribute("fill") ?? "none";
        const parts = (path?.getAttribute("d") ?? "").split("M").filter((part) => part !== "");
        const rings = parts.map((part) => part.split("L").map((pair) => pair.split(" ").map(Number)));
        const gapped = (axis: 0 | 1, from: (px: number) => number) =>
          rings.flatMap((ring, i) => [...(i > 0 ? [null] : []), ...ring.map((pair) => from(pair[axis] ?? NaN))]);
        return {
          uid: trace.dataset.trace ?? "",
          name: trace.dataset.title ?? "",
          fillcolor: fill === "none" || fill.startsWith("url") ? "" : fill,
          hatched: fill.startsWith("url"),
          x: gapped(0, (px) => xaxis.p2d(px - xaxis._offset)),
          y: gapped(1, (px) => yaxis.p2d(px - yaxis._offset)),
        };
      });
    });
  }

  async trace(uid: string): Promise<DrawnTrace | undefined> {
    return (await this.traces()).find((t) => t.uid === uid);
  }

  /** Colour of the map's ground. */
  async ground(): Promise<string> {
    return (await this.page.locator("[data-testid=map-shapes] [data-ground]").getAttribute("fill")) ?? "";
  }

  /** The second row under the pH axis: free acid, g/L, and the pH it stands at. */
  acidTicks(): Promise<(readonly [gPerL: number, pH: number])[]> {
    return this.plot().evaluate((element) => {
      const left = element.getBoundingClientRect().left;
      const { xaxis } = (element as PlotlyElement)._fullLayout;
      return [...document.querySelectorAll("[data-testid=map-overlay] [data-acid] text:not([data-name])")].map(
        (text) => {
          const box = text.getBoundingClientRect();
          return [Number(text.textContent), xaxis.p2d((box.left + box.right) / 2 - left - xaxis._offset)] as const;
        },
      );
    });
  }

  /** Which metals' ground is hatched. */
  async shutGround(): Promise<string[]> {
    return (await this.traces()).filter((t) => t.hatched && t.uid.startsWith("shut-")).map((t) => t.uid);
  }

  /** "Fe Fe(OH)3(s) ferrihydrite" for each metal of the read-out, typesetting taken off. */
  speciesRead(): Promise<string[]> {
    const metals = this.readOut().locator(":scope > span:last-child > span");
    return metals.evaluateAll((all) =>
      all.map((metal) => {
        const words = [...metal.children].filter((e) => e.tagName !== "svg").map((e) => e.textContent.trim());
        return words.join(" ");
      }),
    );
  }

  /** Names on the map as they are painted, once they rest: their boxes on the page, and what their middles point at. */
  async names(): Promise<PaintedName[]> {
    const read = () =>
      this.plot().evaluate((element): PaintedName[] => {
        const { left, top } = element.getBoundingClientRect();
        const { xaxis, yaxis } = (element as PlotlyElement)._fullLayout;
        return [...document.querySelectorAll<SVGTextElement>("[data-testid=map-names] text[data-name]")].map((text) => {
          // Without the halo, which may lie under another's.
          const { x, y, width, height } = text.getBBox();
          const to = text.getScreenCTM()!;
          const box = {
            left: x + to.e,
            top: y + to.f,
            right: x + width + to.e,
            bottom: y + height + to.f,
            width,
            height,
          };
          return {
            id: text.dataset.name ?? "",
            box,
            pH: xaxis.p2d((box.left + box.right) / 2 - left - xaxis._offset),
            Eh: yaxis.p2d((box.top + box.bottom) / 2 - top - yaxis._offset),
          };
        });
      });
    let names = await read();
    for (let still = 0; still < 2;) {
      await this.page.waitForTimeout(130);
      const next = await read();
      still = JSON.stringify(next) === JSON.stringify(names) ? still + 1 : 0;
      names = next;
    }
    return names;
  }

  /** Where the map lies on the page. */
  mapBox(): Promise<Pick<DOMRect, "left" | "top" | "right" | "bottom">> {
    return this.plot().evaluate((element) => {
      const { left, top } = element.getBoundingClientRect();
      const { xaxis, yaxis } = (element as PlotlyElement)._fullLayout;
      const [x, y] = [left + xaxis._offset, top + yaxis._offset];
      return { left: x, top: y, right: x + xaxis._length, bottom: y + yaxis._length };
    });
  }

  /** Pixels a unit of pH and of Eh takes. */
  pixelsPer(): Promise<{ pH: number; Eh: number }> {
    return this.plot().evaluate((element) => {
      const { xaxis, yaxis } = (element as PlotlyElement)._fullLayout;
      return { pH: xaxis.d2p(1) - xaxis.d2p(0), Eh: yaxis.d2p(0) - yaxis.d2p(1) };
    });
  }

  axisWords(): Promise<string[]> {
    return this.page.locator("[data-testid=map-overlay] [data-name^=axis]").allTextContents();
  }

  /** Where a point of the map stands on the page; Eh on the scale shown. */
  pixelOf(pH: number, Eh: number): Promise<readonly [x: number, y: number]> {
    return this.plot().evaluate(
      (element, [pH, Eh]) => {
        const box = element.getBoundingClientRect();
        const { xaxis, yaxis } = (element as PlotlyElement)._fullLayout;
        return [box.left + xaxis._offset + xaxis.d2p(pH), box.top + yaxis._offset + yaxis.d2p(Eh)] as const;
      },
      [pH, Eh] as const,
    );
  }

  /** Moves the mouse to a point of the map. */
  async pointAt(pH: number, Eh: number): Promise<void> {
    await this.page.mouse.move(...(await this.pixelOf(pH, Eh)));
  }

  /** Drags a slider's thumb by some pixels; what `whileHeld` reads, it reads before the hand lets go. */
  async drag<Seen>(label: string, dx: number, whileHeld: () => Promise<Seen>): Promise<Seen> {
    const thumb = this.page.getByRole("slider", { name: `${label}, slider`, exact: true });
    await thumb.scrollIntoViewIfNeeded();
    const box = await thumb.boundingBox();
    if (!box) throw new Error(`The slider of ${label} is not on the screen.`);
    const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
    await this.page.mouse.move(x, y);
    await this.page.mouse.down();
    await this.page.mouse.move(x + dx, y, { steps: 4 });
    const seen = await whileHeld();
    await this.page.mouse.up();
    return seen;
  }

  /** Opens a metal's line, where role, requirement and amount are set. */
  async openMetal(element: string): Promise<Locator> {
    await this.asks("Metals")
      .getByRole("button", { name: new RegExp(`^${element}\\b`) })
      .click();
    return this.page.getByRole("group", { name: `Metal ${element}` });
  }

  async chooseBasis(basis: "feed" | "fresh" | "aged"): Promise<void> {
    await this.page.getByRole("radio", { name: basis, exact: true }).click();
  }

  async type(label: string, text: string): Promise<void> {
    await this.number(label).fill(text);
    await this.number(label).press("Enter");
  }

  /** A command behind the word More. */
  async command(name: string): Promise<void> {
    await this.button("More commands").click();
    await this.page.getByRole("menuitem", { name }).click();
  }

  async saveRevision(note: string): Promise<void> {
    await this.button("Save revision").click();
    const dialog = this.page.getByRole("dialog");
    await dialog.getByLabel("Note").fill(note);
    await dialog.getByRole("button", { name: "Save revision" }).click();
    await dialog.waitFor({ state: "detached" });
  }
}
