import { expect, test } from "vitest";
import { widestChord } from "../../../shared/setpoint/widestChord";
import { cutUp, loop } from "../../support/border";

// Where a slanted window of even width has corners at many levels the stretch ended at the next level, so that the point
// depended on how many species shut its walls.
test.each([1, 3, 7])("a slanted band with walls in %i parts has its widest chord in the middle", (n) => {
  const band = cutUp(loop([[0, 0], [4, 0], [10, 12], [6, 12]]), n); // prettier-ignore
  expect(widestChord(band)).toMatchObject({
    u: expect.closeTo(5, 6) as number,
    v: expect.closeTo(6, 6) as number,
    margin: expect.closeTo(2, 6) as number,
  });
});
