import { expect, test } from "vitest";
import { deviation } from "../../../shared/trials/deviation";

const band = { pH: 0.15, Eh: 0.03 };

test("a reading within one control band of its planned point is where it was wanted, its edge counted in", () => {
  const found = deviation({ pH: 4.95, Eh: 0.69 }, { pH: 4.8, Eh: 0.66 }, band);
  expect(found.pH).toBeCloseTo(0.15, 12);
  expect(found.Eh).toBeCloseTo(0.03, 12);
  expect(found.bands).toBeCloseTo(1, 9);
  expect(found.off).toBe(false);
});

test("either of pH and potential can take it off", () => {
  expect(deviation({ pH: 4.6, Eh: 0.66 }, { pH: 4.8, Eh: 0.66 }, band)).toMatchObject({ Eh: 0, off: true });
  const low = deviation({ pH: 4.8, Eh: 0.6 }, { pH: 4.8, Eh: 0.66 }, band);
  expect(low.bands).toBeCloseTo(2, 9);
  expect(low.off).toBe(true);
});

test("the uncertainty of the electrode is not held against the trial", () => {
  expect(deviation({ pH: 4.8, Eh: 0.625, EhUncertainty: 0.01 }, { pH: 4.8, Eh: 0.66 }, band).off).toBe(false);
  expect(deviation({ pH: 4.8, Eh: 0.625 }, { pH: 4.8, Eh: 0.66 }, band).off).toBe(true);
});

test("what was not planned is not judged", () => {
  expect(deviation({ pH: 2, Eh: -0.6 }, { pH: null, Eh: null }, band)).toEqual({
    pH: null,
    Eh: null,
    bands: null,
    off: false,
  });
  expect(deviation({ pH: 4.5, Eh: -0.6 }, { pH: 4.5, Eh: null }, band)).toMatchObject({ bands: 0, off: false });
});
