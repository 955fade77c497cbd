import { fireEvent, render, screen } from "@testing-library/react";
import { Fragment, useState } from "react";
import { MemoryRouter } from "react-router-dom";
import { expect, test } from "vitest";
import { toProblem } from "../../../shared/plan/toProblem";
import { reachesOf, standsAt } from "../../../shared/reach/reach";
import { reagents } from "../../../shared/reach/reagents";
import { ReachBlock } from "../../../src/features/workspace/answers/ReachBlock";
import { potentialScale } from "../../../src/lib/potential";
import { sheetInputs } from "../../support/sheetFixture";
import { library, solved } from "../../support/solver";

const [window] = solved(toProblem(sheetInputs, library)).windows;
const { pH } = window!.setPoint;
const liquor = { preset: "sulfate", temperatureC: sheetInputs.temperatureC } as const;
const scale = potentialScale("mV");

function rows(ids: readonly string[], inWindow: typeof window | null = window) {
  const reaches = reachesOf(library, ids, liquor.preset, liquor.temperatureC);
  render(
    <MemoryRouter>
      <ReachBlock reaches={reaches} window={inWindow ?? null} {...{ data: library, liquor, pH, scale }} choose={null} />
    </MemoryRouter>,
  );
  const items = screen.getByRole("region", { name: "Reach" }).querySelectorAll("li");
  return { reaches, texts: [...items].map((li) => li.textContent.replace(/[\u2009\u00a0]/g, " ")) };
}

test("practical range and verdict stand first, the equilibrium second and labelled, what it can do to people last", () => {
  const { reaches, texts } = rows(["air", "chlorate"]);
  const stands = scale.format(standsAt(reaches[0]!, pH)!).replace("\u2009", " ");
  const order = ["450 … 750 mV", "the set point", `equilibrium of O2/H2O, every activity one: ${stands}`];
  const places = [...order, "a slurry seldom shows it", "oxygen enrichment feeds fire; heat"].map((part) =>
    texts[0]!.indexOf(part),
  );
  expect(
    places.every((at) => at >= 0),
    texts[0],
  ).toBe(true);
  expect([...places].sort((a, b) => a - b)).toEqual(places);
  expect(texts[1]).toContain("ClO2 and Cl2 with strong acid; fire with organics");
});

test("every reagent of the table shows its hazard; one without a range says so and still shows its equilibrium as such", () => {
  const { texts } = rows(reagents.map((r) => r.id));
  reagents.forEach(({ hazard }, i) => expect(texts[i]).toContain(hazard));
  const zinc = texts[reagents.findIndex((r) => r.id === "zinc-dust")]!;
  expect(zinc).toMatch(
    /no practical range on record for this liquor.*equilibrium of Zn2\+\/Zn, every activity one: −7\d\d mV/,
  );
  expect(texts[reagents.findIndex((r) => r.id === "peroxomonosulfuric")]).toContain("(E0 of 25 °C)");
  expect(texts[reagents.findIndex((r) => r.id === "so2-oxygen")]).not.toContain("equilibrium");
});

test("without a window there is no verdict, and the rest stands", () => {
  const { texts } = rows(["air"], null);
  expect(texts[0]).toContain("450 … 750 mV");
  expect(texts[0]).toContain("equilibrium of O2/H2O");
  expect(texts[0]).not.toContain("set point");
});

test("reagents ticked quickly one after the other all count, though the lines follow late", () => {
  const chosen: (readonly string[])[] = [];
  function Screen() {
    const [ids, setIds] = useState<readonly string[]>([]);
    const reaches = reachesOf(library, ids, liquor.preset, liquor.temperatureC);
    chosen.push(ids);
    const tick = (id: string) => <button onClick={() => setIds([...ids, id])}>{id}</button>;
    const choose = ["air", "chlorate"].map((id) => <Fragment key={id}>{tick(id)}</Fragment>);
    return (
      <MemoryRouter>
        <ReachBlock {...{ reaches, window: window!, data: library, liquor, pH, scale, choose }} />
      </MemoryRouter>
    );
  }
  render(<Screen />);
  for (const id of ["air", "chlorate"]) fireEvent.click(screen.getByRole("button", { name: id }));
  expect(chosen.at(-1)).toEqual(["air", "chlorate"]);
});
