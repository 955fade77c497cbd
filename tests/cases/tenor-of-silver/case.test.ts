import { expect, test } from "vitest";
import { simpleIonCharge } from "../../../shared/plan/toProblem";
import { library } from "../../support/solver";

// Silver's gamma was that of Ag^2+, an ion no liquor holds: the divalent one was taken wherever the tables had one.
test("the simple ion is the one an aerated acid liquor holds", () => {
  const charges = ["Ag", "Cr", "Cu", "Fe", "Mn", "Co"].map((m) => [m, simpleIonCharge(library, m)]);
  expect(charges).toEqual([["Ag", 1], ["Cr", 3], ["Cu", 2], ["Fe", 2], ["Mn", 2], ["Co", 2]]); // prettier-ignore
});
