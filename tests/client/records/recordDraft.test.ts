import { beforeEach, describe, expect, test, vi } from "vitest";
import { ApiFailure, offline } from "../../../src/lib/failure";
import { readShelf } from "../../../src/lib/draftShelf";
import { RecordDraft, type DraftOptions } from "../../../src/lib/recordDraft";

interface Values {
  note: string;
  mass: string;
  readings: string[];
}
interface Row extends Values {
  id: string;
  version: number;
}
const row = (part: Partial<Row> = {}): Row => ({ id: "t1", version: 1, note: "", mass: "120", readings: [], ...part });
const valuesOf = ({ note, mass, readings }: Row): Values => ({ note, mass, readings });
const stale = (current: Row) =>
  new ApiFailure(412, "STALE", "If-Match", "late", {
    error: { code: "STALE", path: "", message: "" },
    current,
    difference: [],
  });

type Send = DraftOptions<Values, Row>["send"];
const draftOf = (send: Send, from = row(), check: DraftOptions<Values, Row>["check"] = () => []) =>
  new RecordDraft<Values, Row>({ shelf: "trial.t1", row: from, valuesOf, versionOf: (r) => r.version, check, send });
const set = (part: Partial<Values>) => (v: Values) => ({ ...v, ...part });
const never: Send = () => Promise.reject(new Error("not expected"));

beforeEach(() => localStorage.clear());

describe("a record in hand", () => {
  test("sends only what changed, with the version it stands on, and is clean afterwards", async () => {
    const send = vi.fn<Send>((part, version) => Promise.resolve(row({ ...part, version: version + 1 })));
    const draft = draftOf(send);
    draft.edit(set({ note: "washed twice" }));
    expect(draft.get().changed).toEqual(["note"]);
    expect(await draft.save("forgot")).toBe(true);
    expect(send).toHaveBeenCalledWith({ note: "washed twice" }, 1, "forgot");
    expect(draft.get()).toMatchObject({ status: "saved", changed: [] });
    expect(readShelf("trial.t1")).toBeNull();
  });

  test("keeps what is typed in the browser and takes it up again", () => {
    draftOf(never).edit(set({ mass: "121" }));
    const again = draftOf(never);
    expect(again.get()).toMatchObject({ status: "unsaved", values: { mass: "121" } });
    again.undo();
    expect(again.get()).toMatchObject({ status: "saved", values: { mass: "120" } });
  });

  test("joins what somebody else saved meanwhile and sends again", async () => {
    const send = vi
      .fn<Send>()
      .mockRejectedValueOnce(stale(row({ version: 5, mass: "119" })))
      .mockImplementation((part, version) => Promise.resolve(row({ mass: "119", ...part, version: version + 1 })));
    const draft = draftOf(send);
    draft.edit(set({ note: "mine" }));
    expect(await draft.save()).toBe(true);
    expect(send).toHaveBeenLastCalledWith({ note: "mine" }, 5, "");
    expect(draft.get()).toMatchObject({ status: "saved", joined: true, values: { note: "mine", mass: "119" } });
  });

  test("asks where both changed the same field, survives a reload, and saves what was chosen", async () => {
    const send = vi
      .fn<Send>()
      .mockRejectedValueOnce(stale(row({ version: 2, mass: "119" })))
      .mockImplementation((part, version) => Promise.resolve(row({ mass: "119", ...part, version: version + 1 })));
    const draft = draftOf(send);
    draft.edit(set({ mass: "121" }));
    expect(await draft.save()).toBe(false);
    expect(draft.get()).toMatchObject({
      status: "conflict",
      conflicts: [{ path: "mass", yours: "121", theirs: "119" }],
    });

    const reopened = draftOf(send, row({ version: 2, mass: "119" }));
    expect(reopened.get().status).toBe("conflict");
    expect(await reopened.save()).toBe(false);
    reopened.resolve({ mass: "yours" });
    expect(await reopened.save()).toBe(true);
    expect(send).toHaveBeenLastCalledWith({ mass: "121" }, 2, "");

    draft.resolve({ mass: "theirs" });
    expect(draft.get()).toMatchObject({ status: "saved", values: { mass: "119" } });
  });

  test("waits without a connection, and typing on does not stop the waiting", async () => {
    const draft = draftOf(() => Promise.reject(offline()));
    draft.edit(set({ note: "a" }));
    expect(await draft.save()).toBe(false);
    draft.edit(set({ note: "ab" }));
    expect(draft.get().status).toBe("waiting");
    expect(readShelf<Values>("trial.t1")?.values.note).toBe("ab");
  });

  test("a refusal names its field until the field changes, and nothing typed is lost", async () => {
    const check = ({ mass }: Partial<Values>) => (mass === "x" ? [{ path: "mass", message: "no number" }] : []);
    const draft = draftOf(never, row(), check);
    draft.edit(set({ mass: "x" }));
    expect(await draft.save()).toBe(false);
    expect(draft.get().problems).toEqual([{ path: "mass", message: "no number" }]);
    draft.edit(set({ mass: "12" }));
    expect(draft.get()).toMatchObject({ problems: [], values: { mass: "12" } });
  });

  test("what is typed while a save is under way stays, and is still to be saved", async () => {
    let answer: (value: Row) => void = () => undefined;
    const send = vi.fn<Send>(() => new Promise<Row>((resolve) => (answer = resolve)));
    const draft = draftOf(send);
    draft.edit(set({ note: "a" }));
    const saving = draft.save();
    draft.edit(set({ mass: "125" }));
    expect(await draft.save()).toBe(false);
    answer(row({ note: "a", version: 2 }));
    expect(await saving).toBe(true);
    expect(draft.get()).toMatchObject({ status: "unsaved", changed: ["mass"], values: { note: "a", mass: "125" } });
  });

  test("keystrokes in one field are one step of undo; another field is another", () => {
    const draft = draftOf(never);
    draft.edit(set({ note: "a" }), "note");
    draft.edit(set({ note: "ab" }), "note");
    draft.edit(set({ mass: "1" }), "mass");
    draft.undo();
    expect(draft.get().values).toMatchObject({ note: "ab", mass: "120" });
    draft.undo();
    expect(draft.get().values).toMatchObject({ note: "", mass: "120" });
    draft.redo();
    expect(draft.get().values.note).toBe("ab");
  });

  test("a newer row from the server is taken where nothing stands against it", () => {
    const draft = draftOf(never);
    draft.edit(set({ note: "mine" }));
    draft.seen(row({ version: 3, readings: ["0 h"] }));
    expect(draft.get()).toMatchObject({ values: { note: "mine", readings: ["0 h"] }, changed: ["note"], joined: true });
  });
});
