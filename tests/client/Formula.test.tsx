import { render } from "@testing-library/react";
import { expect, test } from "vitest";
import { Formula, SpeciesName } from "../../src/components/Formula";
import { FormulaText } from "../../src/components/FormulaText";
import { Quantity } from "../../src/components/Quantity";

const html = (element: React.ReactElement) => render(element).container.firstElementChild?.innerHTML;

test("sets subscripts and the charge with true elements", () => {
  expect(html(<Formula formula="Cu(NH3)4^2+" />)).toBe("Cu(NH<sub>3</sub>)<sub>4</sub><sup>2+</sup>");
  expect(html(<Formula formula="SO4^2-" />)).toBe("SO<sub>4</sub><sup>2\u2212</sup>");
  expect(html(<Formula formula="CuSO4.5H2O" />)).toBe("CuSO<sub>4</sub>·5H<sub>2</sub>O");
});

test("a solid is named by its formula and its form", () => {
  const { container } = render(<SpeciesName id="FeOOH(s,goethite)" />);
  expect(container.textContent).toBe("FeOOH goethite");
});

test("finds the formulas in a sentence and leaves words, codes and numbers alone", () => {
  const { container } = render(
    <p>
      <FormulaText text="log beta4 of Cu(NH3)4^2+(aq) + 2 OH^-, from BF01 at pH 7; see H2O." />
    </p>,
  );
  expect([...container.querySelectorAll("sub")].map((e) => e.textContent)).toEqual(["3", "4", "2"]);
  expect([...container.querySelectorAll("sup")].map((e) => e.textContent)).toEqual(["2+", "\u2212"]);
  expect(container.textContent).toBe("log beta4 of Cu(NH3)42+(aq) + 2 OH\u2212, from BF01 at pH 7; see H2O.");
});

test("a small number in prose has a power of ten", () => {
  expect(html(<Quantity value={1e-5} unit="g/L" />)).toBe("1.0×10<sup>\u22125</sup>\u2009g/L");
  expect(html(<Quantity value={0.5} />)).toBe("0.50");
});
