import { clearShelf, keepOnShelf, readShelf } from "./draftShelf";
import { ApiFailure, staleAnswer } from "./failure";
import { merge, putAt, same, type Conflict } from "./merge";

/** A field that cannot be saved as it stands. */
export interface Problem {
  path: string;
  message: string;
}

export type DraftStatus =
  | "saved" // as on the server
  | "unsaved"
  | "saving"
  | "waiting" // no connection: sent again by itself
  | "refused"
  | "conflict"; // somebody else changed the same fields: to be decided

export interface DraftState<Values> {
  values: Values;
  status: DraftStatus;
  /** keys of the parts that differ from what the server has */
  changed: readonly (keyof Values & string)[];
  /** what the last save was refused for, here or by the server; kept until the field changes */
  problems: readonly Problem[];
  error: unknown;
  conflicts: readonly Conflict[];
  /** somebody else's changes were taken in beside one's own */
  joined: boolean;
  canUndo: boolean;
  canRedo: boolean;
  /** false where this browser keeps nothing between visits */
  kept: boolean;
  /** when the server took it last, ms since 1970 */
  savedAt: number | null;
}

export interface DraftOptions<Values extends object, Row> {
  /** name on the shelf: "trial.abc" */
  shelf: string;
  row: Row;
  valuesOf: (row: Row) => Values;
  versionOf: (row: Row) => number;
  /** why the changed parts cannot be sent; empty when they can */
  check: (changed: Partial<Values>) => Problem[];
  send: (changed: Partial<Values>, version: number, reason: string) => Promise<Row>;
}

const STEPS = 200;
/** Keystrokes in one field within this long are one step of undo. */
const JOIN = 1500; // ms

/** The values of one record in the hands of one person: undo, a copy in the browser until the server has them, changed parts sent,
 *  a save that came too late put together with what stands there by now. */
export class RecordDraft<Values extends object, Row> {
  private base: Values;
  private version: number;
  private past: Values[] = [];
  private future: Values[] = [];
  private last: { about: string; at: number } | null = null;
  private sending = false;
  private state: DraftState<Values>;
  private readonly listeners = new Set<() => void>();

  constructor(private readonly options: DraftOptions<Values, Row>) {
    const { row, valuesOf, versionOf, shelf } = options;
    this.base = valuesOf(row);
    this.version = versionOf(row);
    this.state = {
      values: this.base,
      status: "saved",
      changed: [],
      problems: [],
      error: null,
      conflicts: [],
      joined: false,
      canUndo: false,
      canRedo: false,
      kept: true,
      savedAt: null,
    };
    const kept = readShelf<Values>(shelf);
    if (kept)
      this.takeUp(kept.version, { ...this.base, ...kept.base }, { ...this.base, ...kept.values }, kept.conflicts);
  }

  readonly get = (): DraftState<Values> => this.state;
  readonly subscribe = (tell: () => void): (() => void) => {
    this.listeners.add(tell);
    return () => void this.listeners.delete(tell);
  };

  /** A draft found on the shelf: put on top of what the server has now. */
  private takeUp(version: number, base: Values, values: Values, open: Conflict[]): void {
    const theirs = this.base;
    const { merged, conflicts } =
      version === this.version ? { merged: values, conflicts: open } : merge(base, values, theirs);
    this.past = [theirs];
    this.update({
      values: merged,
      conflicts: [...conflicts],
      joined: version !== this.version,
      status: conflicts.length > 0 ? "conflict" : "unsaved",
    });
  }

  private update(part: Partial<DraftState<Values>>): void {
    const next = { ...this.state, ...part };
    const changed = (Object.keys(next.values) as (keyof Values & string)[]).filter(
      (key) => !same(next.values[key], this.base[key]),
    );
    const settled = next.status !== "saving" && next.status !== "conflict";
    if (changed.length === 0 && settled) next.status = "saved";
    else if (next.status === "saved") next.status = "unsaved";
    const { shelf } = this.options;
    let kept = next.kept;
    if (changed.length === 0 && next.conflicts.length === 0) clearShelf(shelf);
    else
      kept = keepOnShelf(shelf, {
        version: this.version,
        base: this.base,
        values: next.values,
        conflicts: [...next.conflicts],
      });
    this.state = { ...next, kept, changed, canUndo: this.past.length > 0, canRedo: this.future.length > 0 };
    this.listeners.forEach((tell) => tell());
  }

  /** @param about  names the field: changes of one field in quick succession are one step of undo */
  readonly edit = (change: (values: Values) => Values, about = ""): void => {
    const before = this.state.values;
    const values = change(before);
    if (same(values, before)) return;
    const now = Date.now();
    const goesOn = about !== "" && this.last?.about === about && now - this.last.at < JOIN;
    if (!goesOn) this.past = [...this.past.slice(1 - STEPS), before];
    this.last = { about, at: now };
    this.future = [];
    this.update({ values, status: this.stillOpen(), ...this.reconsidered(values) });
  };

  /** The status of a draft that was changed: a save under way, one that waits and a conflict stay what they are. */
  private stillOpen(): DraftStatus {
    if (this.sending) return "saving";
    const { status } = this.state;
    return status === "conflict" || status === "waiting" ? status : "unsaved";
  }

  /** Refusals of fields that have changed since are no longer true. */
  private reconsidered(values: Values): Pick<DraftState<Values>, "problems" | "error"> {
    if (this.state.problems.length === 0) return { problems: [], error: null };
    return { problems: this.options.check(this.part(values)), error: null };
  }

  private part(values: Values): Partial<Values> {
    return Object.fromEntries(
      Object.entries(values).filter(([key, value]) => !same(value, this.base[key as keyof Values])),
    ) as Partial<Values>;
  }

  readonly undo = (): void => this.step(this.past, this.future);
  readonly redo = (): void => this.step(this.future, this.past);
  private step(from: Values[], to: Values[]): void {
    const values = from.pop();
    if (values === undefined) return;
    to.push(this.state.values);
    this.last = null;
    this.update({ values, status: this.stillOpen(), ...this.reconsidered(values) });
  }

  /** Back to what the server has; one can still undo it. */
  readonly discard = (): void => {
    this.past = [...this.past, this.state.values];
    this.future = [];
    this.last = null;
    this.update({ values: this.base, status: "saved", problems: [], error: null, conflicts: [], joined: false });
  };

  /** The row as it came from the server again: taken where nothing of one's own stands against it. */
  readonly seen = (row: Row): void => {
    const version = this.options.versionOf(row);
    if (version <= this.version || this.sending) return;
    const theirs = this.options.valuesOf(row);
    const { merged, conflicts } = merge(this.base, this.state.values, theirs);
    this.base = theirs;
    this.version = version;
    this.update({
      values: merged,
      conflicts,
      joined: this.state.changed.length > 0,
      status: conflicts.length > 0 ? "conflict" : this.stillOpen(),
    });
  };

  /** What to do with each field in dispute, by its path; those not named stay as they are: yours. */
  readonly resolve = (choices: Readonly<Record<string, "yours" | "theirs">>): void => {
    let { values } = this.state;
    for (const { path, theirs } of this.state.conflicts)
      if (choices[path] === "theirs") values = putAt(values, path, theirs);
    this.past = [...this.past, this.state.values];
    this.update({ values, conflicts: [], status: "unsaved" });
  };

  /** @returns  whether the server has everything now */
  readonly save = async (reason = ""): Promise<boolean> => {
    if (this.sending || this.state.status === "conflict") return false;
    for (let attempt = 0; attempt < 4; attempt += 1) {
      const sent = this.state.values;
      const part = this.part(sent);
      if (Object.keys(part).length === 0) return true;
      const problems = this.options.check(part);
      if (problems.length > 0) {
        this.update({ problems, status: "unsaved", error: null });
        return false;
      }
      this.sending = true;
      this.update({ status: "saving", problems: [], error: null });
      try {
        const row = await this.options.send(part, this.version, reason);
        this.sending = false;
        this.took(row, sent);
        return true;
      } catch (error) {
        this.sending = false;
        const stale = staleAnswer<Row>(error);
        if (stale) this.late(stale.current);
        else this.failed(error);
        if (!stale || this.state.conflicts.length > 0) return false;
      }
    }
    return false;
  };

  private took(row: Row, sent: Values): void {
    const theirs = this.options.valuesOf(row);
    const values = merge(sent, this.state.values, theirs).merged;
    this.base = theirs;
    this.version = this.options.versionOf(row);
    this.update({ values, status: "saved", error: null, savedAt: Date.now() });
  }

  private late(current: Row): void {
    const theirs = this.options.valuesOf(current);
    const { merged, conflicts } = merge(this.base, this.state.values, theirs);
    this.base = theirs;
    this.version = this.options.versionOf(current);
    this.update({ values: merged, conflicts, joined: true, status: conflicts.length > 0 ? "conflict" : "unsaved" });
  }

  private failed(error: unknown): void {
    const silent = error instanceof ApiFailure && error.status === 0;
    const named =
      error instanceof ApiFailure && error.path !== "" ? [{ path: error.path, message: error.message }] : [];
    this.update({ status: silent ? "waiting" : "refused", error, problems: silent ? [] : named });
  }
}
