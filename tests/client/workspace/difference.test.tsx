import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen, within } from "@testing-library/react";
import { useState } from "react";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import type { PlanInputs, PlanRow, RevisionRow } from "../../../shared/schemas/plan";
import DifferenceDialog from "../../../src/features/workspace/header/DifferenceDialog";
import { NewerRevision } from "../../../src/features/workspace/header/NewerRevision";
import { readDraft } from "../../../src/features/workspace/model/draftShelf";
import { setMetal, setTotal } from "../../../src/features/workspace/model/edit";
import { useDraft, type DraftInHand } from "../../../src/features/workspace/model/useDraft";
import { sheetInputs, sheetPlan, sheetRevision } from "../../support/sheetFixture";

const third = sheetRevision("v1");
const theirs: PlanInputs = { ...setMetal(1, { value: 1e-5 })(sheetInputs), temperatureC: 60 };
const fourth: RevisionRow = { ...third, number: 4, author: "Night shift", note: "Iron eased.", inputs: theirs };
const planAt = (latest: RevisionRow): PlanRow => ({
  ...sheetPlan,
  id: "third-tank",
  projectId: "p",
  description: "",
  archived: false,
  version: latest.number,
  createdAt: latest.createdAt,
  updatedAt: latest.createdAt,
  commentCount: 0,
  latest,
  dataOutdated: false,
  changedSpecies: [],
});

let draft: DraftInHand;
function Table({ latest }: { latest: RevisionRow }) {
  draft = useDraft("third-tank", latest);
  const [open, setOpen] = useState(false);
  return (
    <>
      {draft.basedOn < latest.number && (
        <NewerRevision
          latest={latest}
          basedOn={draft.basedOn}
          changed={draft.changed}
          onDifference={() => setOpen(true)}
        />
      )}
      <button type="button" onClick={() => draft.edit((p) => ({ ...p, temperatureC: 71 }))}>
        warmer
      </button>
      <button type="button" onClick={() => draft.edit(setTotal("ligands", "S", 0.9))}>
        more acid
      </button>
      <button type="button" onClick={draft.undo}>
        undo
      </button>
      <button type="button" onClick={draft.redo}>
        redo
      </button>
      {open && <DifferenceDialog plan={planAt(latest)} draft={draft} open onOpenChange={setOpen} saving={false} />}
    </>
  );
}
const client = () => new QueryClient({ defaultOptions: { queries: { retry: false } } });
const table = (latest: RevisionRow, c: QueryClient) => (
  <QueryClientProvider client={c}>
    <Table latest={latest} />
  </QueryClientProvider>
);
const press = (name: string) => fireEvent.click(screen.getByRole("button", { name }));

beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

/** Warmer and with more acid here, from revision 3, while the night shift saved revision 4. */
function overtaken() {
  const c = client();
  const shown = render(table(third, c));
  press("warmer");
  press("more acid");
  expect(screen.queryByRole("status")).toBeNull();
  shown.rerender(table(fourth, c));
  return shown;
}

test("a newer revision is told with author and note; what both changed is decided, the rest taken, as one step of undo with its base", () => {
  overtaken();
  const mine = draft.inputs;
  expect(screen.getByRole("status").textContent).toMatch(/Revision 4 was saved .* by Night shift: “Iron eased.”/);
  press("Show the difference");
  const both = screen.getByRole("region", { name: "Changed by both" });
  expect(within(both).getByRole("row", { name: /^Temperature 57\.5.*71\.0.*60\.0/ })).toBeTruthy();
  const rest = screen.getByRole("region", { name: "Taken as they are" });
  expect(within(rest).getByRole("row", { name: /^Fe .*Night shift$/ })).toBeTruthy();
  expect(within(rest).getByRole("row", { name: /^S, total .*you$/ })).toBeTruthy();
  expect(screen.getByRole<HTMLButtonElement>("button", { name: "1 to decide" }).disabled).toBe(true);

  press("All theirs");
  fireEvent.click(within(both).getByRole("radio", { name: "mine" }));
  press("Put together");
  const merged = { ...setTotal("ligands", "S", 0.9)(theirs), temperatureC: 71 };
  expect(draft.inputs).toEqual(merged);
  expect([draft.basedOn, draft.changed]).toEqual([4, true]);
  expect(screen.queryByRole("status")).toBeNull();

  press("undo");
  expect(draft.inputs).toBe(mine);
  expect(draft.basedOn).toBe(3);
  expect(screen.getByRole("status")).toBeTruthy();
  press("redo");
  expect(draft.inputs).toEqual(merged);
  expect(draft.basedOn).toBe(4);
});

test("Cancel changes nothing, and after a reload the revision the draft is from is read again", async () => {
  const { unmount } = overtaken();
  const mine = draft.inputs;
  press("Show the difference");
  press("Cancel");
  expect(draft.inputs).toBe(mine);
  expect(draft.basedOn).toBe(3);
  unmount();
  expect(readDraft("third-tank")).toMatchObject({ basedOn: 3, inputs: mine });

  const fetch = vi.fn((url: string) => {
    expect(url).toBe("/api/plans/third-tank/revisions/3");
    return Promise.resolve(Response.json(third));
  });
  vi.stubGlobal("fetch", fetch);
  render(table(fourth, client()));
  expect(draft.inputs).toEqual(mine);
  expect([draft.basedOn, draft.changed]).toEqual([3, true]);
  press("Show the difference");
  const both = await screen.findByRole("region", { name: "Changed by both" });
  expect(within(both).getAllByRole("row")).toHaveLength(2);
  press("All mine");
  press("Put together");
  expect(draft.inputs.temperatureC).toBe(71);
  expect(draft.inputs.metals).toEqual(theirs.metals);
  expect(fetch).toHaveBeenCalledTimes(1);
});

test("a base that cannot be read is told, with the draft untouched", async () => {
  const { unmount } = overtaken();
  const mine = draft.inputs;
  unmount();
  vi.stubGlobal("fetch", () => Promise.resolve(Response.json({}, { status: 404 })));
  render(table(fourth, client()));
  press("Show the difference");
  await screen.findByText(/Revision 3, from which your changes are, could not be read/);
  expect(screen.queryByRole("button", { name: /Put together/ })).toBeNull();
  expect(draft.inputs).toEqual(mine);
});

test("with no change of one's own the new revision is shown and gone to", () => {
  const c = client();
  const shown = render(table(third, c));
  shown.rerender(table(fourth, c));
  expect(draft.inputs).toBe(third.inputs);
  expect(screen.getByRole("status").textContent).toContain("Here still stands revision 3.");
  press("Show the difference");
  press("Go to revision 4");
  expect(draft.inputs).toEqual(theirs);
  expect([draft.basedOn, draft.changed]).toEqual([4, false]);
});

test("going back to the latest revision goes to its base; an older one taken stays on the draft's", () => {
  overtaken();
  act(() => draft.take({ number: 1, inputs: { ...sheetInputs, temperatureC: 20 } }));
  expect([draft.basedOn, draft.inputs.temperatureC]).toEqual([3, 20]);
  act(() => draft.take(fourth));
  expect([draft.basedOn, draft.changed]).toEqual([4, false]);
  press("undo");
  expect([draft.basedOn, draft.inputs.temperatureC]).toEqual([3, 20]);
});
