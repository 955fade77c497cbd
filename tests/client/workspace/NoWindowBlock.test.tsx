import { act, fireEvent, render, screen } from "@testing-library/react";
import { MemoryRouter } from "react-router-dom";
import { expect, test, vi } from "vitest";
import type { Advice, Opening } from "../../../shared/advice/openings";
import { NoWindowBlock } from "../../../src/features/workspace/answers/NoWindowBlock";
import type { Awaited } from "../../../src/features/workspace/model/useAsked";

const iron: Opening = { change: "activity", of: "Fe", from: 1e-9, to: 2e-8, searched: "8 decades" };
const heat: Opening = { change: "temperature", from: 60, to: null, searched: "0 to 250 C" };
const advice: Advice = {
  conflicts: [],
  gaps: [{ members: ["Zn", "Fe"], across: "members", nearest: "Zn", gap: { pH: 0.46, Eh: null } }],
  openings: [heat, iron],
};
const props = {
  solution: {
    conflicts: [
      [
        { metal: "Zn", requirement: "dissolved" as const },
        { metal: "Fe", requirement: "solid" as const },
      ],
    ],
  },
  inputs: {
    metals: [
      {
        element: "Fe",
        role: "gangue" as const,
        requirement: "solid" as const,
        entry: "gPerL" as const,
        value: 1e-9,
        gammaFrom: "one" as const,
        gamma: null,
      },
    ],
  },
  metalName: (e: string) => ({ Zn: "zinc", Fe: "iron" })[e] ?? e,
};

const renderLinked = (block: React.ReactElement) => render(<MemoryRouter>{block}</MemoryRouter>);

test("says which requirements clash, by how much, and offers what helps first", () => {
  const onApply = vi.fn();
  renderLinked(<NoWindowBlock {...props} advice={{ state: "there", value: advice }} onApply={onApply} />);
  const section = screen.getByRole("region", { name: "No window" });
  expect(section.textContent).toContain("zinc dissolved and iron solid cannot hold together.");
  expect(section.textContent).toMatch(/0\.46.pH apart at one Eh\. No pH meets both\./);
  expect(section.textContent).toContain("20 times more");
  expect(section.textContent).toContain("none opens a window; looked over 0 to 250 C");
  expect(section.textContent).toContain("Tenor of iron");
  expect(section.textContent?.indexOf("iron solid")).toBeLessThan(section.textContent?.indexOf("Temperature") ?? 0);
  fireEvent.click(screen.getByRole("button", { name: /Set 0\.0200.µg\/L/ }));
  expect(onApply).toHaveBeenCalledWith(iron);
});

test("says how far beyond the water lines or the map a single demand would hold, and which of three stands nearest", () => {
  const say = (members: string[], gap: Partial<Advice["gaps"][number]>): string => {
    const conflicts = [members.map((metal) => ({ metal, requirement: "solid" as const }))];
    const value: Advice = {
      conflicts,
      gaps: [{ members, across: "members", nearest: null, gap: { pH: null, Eh: 0.25 }, ...gap }],
      openings: [],
    };
    const { container, unmount } = renderLinked(
      <NoWindowBlock {...props} solution={{ conflicts }} advice={{ state: "there", value }} />,
    );
    const { textContent } = container;
    unmount();
    return textContent.replace(/\s+/g, " ");
  };
  expect(say(["Zn"], { across: "water" })).toContain("It would be beyond the water lines, 250 mV away at one pH. No Eh meets both."); // prettier-ignore
  expect(say(["Zn"], { across: "frame", gap: { pH: 0.56, Eh: null } })).toContain("It would be beyond this map, 0.56 pH away at one Eh. No pH meets both."); // prettier-ignore
  expect(say(["Zn"], { across: "frame and water", gap: null })).toContain("Nor is it anywhere within the widest map.");
  expect(say(["Zn", "Fe", "Ni"], { nearest: "Fe" })).toContain("it is the 3 together that leave no ground. Where the others hold, iron is not solid: the nearest ground where it is lies 250 mV away at one pH."); // prettier-ignore
});

test("names a hazard kept out among what clashes, tells where its limit would have to stand, and offers no button for it", () => {
  const hazard: Opening = { change: "hazardPH", of: "HCN", from: 10.5, to: 9.8123, searched: "down to pH 7" };
  const conflicts = [[{ metal: "Zn", requirement: "dissolved" as const }, { gas: "HCN" as const, pHAtLeast: 10.5 }]]; // prettier-ignore
  const value = { ...advice, gaps: [{ members: ["Zn", "HCN"], across: "members" as const, nearest: "Zn", gap: { pH: 0.7, Eh: null } }], openings: [hazard] }; // prettier-ignore
  renderLinked(
    <NoWindowBlock {...props} solution={{ conflicts }} advice={{ state: "there", value }} onApply={vi.fn()} />,
  );
  const text = screen.getByRole("region", { name: "No window" }).textContent;
  expect(text).toContain("zinc dissolved and pH at or above 10.5 against HCN cannot hold together.");
  expect(text.replace(/\s/g, " ")).toContain(
    "From where zinc is dissolved, the nearest ground clear of HCN lies 0.70 pH away at one Eh.",
  );
  expect(text).toContain("from pH 10.50 to pH 9.81. Told so that you know what stands in the way");
  expect(text).toContain("No single number opens a window");
  expect(screen.queryByRole("button", { name: /Set/ })).toBeNull();
});

test("says that it looks, after a second how far it is, can be stopped, and that it failed", () => {
  vi.useFakeTimers();
  const stop = vi.fn();
  const again = vi.fn();
  const progress = { share: 0.25, steps: { done: 30, total: 120 } };
  const { rerender } = renderLinked(<NoWindowBlock {...props} advice={{ state: "waiting", ...progress, stop }} />);
  expect(screen.getByRole("status").textContent).toContain("Looking for the smallest change");
  expect(screen.queryByRole("progressbar")).toBeNull();
  act(() => void vi.advanceTimersByTime(1100));
  vi.useRealTimers();
  expect(screen.getByRole("progressbar").getAttribute("aria-valuenow")).toBe("25");
  expect(screen.getByText("step 30 of 120 at most")).toBeTruthy();
  fireEvent.click(screen.getByRole("button", { name: /^Stop/ }));
  expect(stop).toHaveBeenCalled();
  const shown = (advice: Awaited<Advice>) => (
    <MemoryRouter>
      <NoWindowBlock {...props} advice={advice} />
    </MemoryRouter>
  );
  rerender(shown({ state: "stopped", again }));
  fireEvent.click(screen.getByRole("button", { name: "start again" }));
  expect(again).toHaveBeenCalled();
  rerender(shown({ state: "failed", message: "no worker" }));
  expect(screen.getByRole("alert").textContent).toContain("no worker");
});

test("offers no action where the plan is only looked at", () => {
  renderLinked(<NoWindowBlock {...props} advice={{ state: "there", value: advice }} />);
  expect(screen.queryByRole("button")).toBeNull();
});
