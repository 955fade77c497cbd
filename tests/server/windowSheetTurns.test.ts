import { expect, test } from "vitest";
import { workInTurns, workOf } from "../../server/features/windowSheet/work";
import { lettingOthers } from "../../server/http/lettingOthers";
import type { PlanInputs } from "../../shared/schemas/plan";
import { sheetInputs, sheetPlan, sheetRevision } from "../support/sheetFixture";
import { library, tables } from "../support/testServer";

const ranged: PlanInputs = { ...sheetInputs, ranges: { temperatureC: [25, 95], activities: { Fe: [1e-6, 1e-4] } } };

test("over ranges each temperature is a turn of its own: what is due runs between them, and the answer is the same", async () => {
  const revision = sheetRevision(tables.version, ranged);
  let others = 0;
  let done = false;
  const other = () => {
    if (done) return;
    others++;
    setImmediate(other);
  };
  setImmediate(other);
  const work = await lettingOthers(workInTurns(sheetPlan, revision, library));
  done = true;
  const atOnce = workOf(sheetPlan, revision, library);
  if (!work.ok || !atOnce.ok) expect.fail("the plan is solved");
  const { robust } = work.value;
  expect(robust).toEqual(atOnce.value.robust);
  const solved = robust && "checked" in robust ? robust.checked.temperatures.length : 0;
  expect(solved).toBeGreaterThan(10);
  expect(others).toBeGreaterThanOrEqual(solved - 1);
});
