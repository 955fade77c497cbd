import "../setup";
import { fireEvent, render, screen } from "@testing-library/react";
import { MemoryRouter } from "react-router-dom";
import { expect, test, vi } from "vitest";
import type { Advice, Opening } from "../../../shared/advice/openings";
import { NoWindowBlock } from "../../../src/features/workspace/answers/NoWindowBlock";
import { potentialScale } from "../../../src/lib/potential";

const iron: Opening = { change: "activity", of: "Fe", from: 1e-9, to: 2e-8, searched: "8 decades" };
const heat: Opening = { change: "temperature", from: 60, to: null, searched: "0 to 250 C" };
const advice: Advice = {
  conflicts: [],
  gaps: [{ metals: ["Zn", "Fe"], gap: { pH: 0.46, Eh: null } }],
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
  scale: potentialScale("mV"),
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
  expect(section.textContent?.indexOf("iron solid")).toBeLessThan(section.textContent?.indexOf("Temperature") ?? 0);
  fireEvent.click(screen.getByRole("button", { name: /Set 2\.00e.8.g\/L/ }));
  expect(onApply).toHaveBeenCalledWith(iron);
});

test("says that it looks, and that it failed", () => {
  const { rerender } = renderLinked(<NoWindowBlock {...props} advice={{ state: "waiting" }} />);
  expect(screen.getByRole("status").textContent).toContain("Looking for the smallest change");
  rerender(
    <MemoryRouter>
      <NoWindowBlock {...props} advice={{ state: "failed", message: "no worker" }} />
    </MemoryRouter>,
  );
  expect(screen.getByRole("alert").textContent).toContain("no worker");
});

test("offers no action where the plan is only looked at", () => {
  renderLinked(<NoWindowBlock {...props} advice={{ state: "there", value: advice }} />);
  expect(screen.queryByRole("button")).toBeNull();
});
