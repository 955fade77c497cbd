import { numberIn } from "../../../../shared/entry/measure";
import type { Entry } from "../../../../shared/entry/readEntry";
import { withUnit } from "../../../lib/format";

/** Whole minutes since the start; null before it, or without one. */
export function minutesSince(startedAt: string | null, now: Date): number | null {
  if (startedAt === null) return null;
  const minutes = Math.floor((now.getTime() - Date.parse(startedAt)) / 60_000);
  return Number.isFinite(minutes) && minutes >= 0 ? minutes : null;
}

/** "2 h 12 min", "48 min", "3 d 4 h" */
export function elapsed(minutes: number): string {
  const whole = Math.round(minutes);
  if (whole < 60) return `${whole} min`;
  if (whole < 2 * 24 * 60) return `${Math.floor(whole / 60)} h ${String(whole % 60).padStart(2, "0")} min`;
  return `${Math.floor(whole / 1440)} d ${Math.floor((whole % 1440) / 60)} h`;
}

/** The time a reading is kept at: what was typed, in minutes; else now, in the unit the record has used so far.
 *  @param minutes  since the start; null before it */
export function timeEntry(typed: string, minutes: number | null, unit: string | undefined): Entry {
  if (typed.trim() !== "") return { text: typed, unit: "min" };
  if (minutes === null) return { text: "", unit: unit ?? "min" };
  if (unit === "h") return { text: (minutes / 60).toFixed(2), unit };
  if (unit === "d") return { text: (minutes / 1440).toFixed(3), unit };
  return { text: String(minutes), unit: "min" };
}

/** A tenth over is the bench's own slack; a trial beyond it was forgotten or goes another way than it was laid out. */
const SLACK = 0.1;

/** How far a running trial is past the end it was laid out for: "21 d 16 h past its planned 6.0 h".
 *  @param planned  duration as typed     @param minutes  since the start
 *  @returns  null while it runs as planned     @source  the slack: common practice, no source */
export function overdue(planned: Entry, minutes: number | null): string | null {
  const wanted = minutesOf(planned);
  if (wanted === null || minutes === null || minutes <= wanted * (1 + SLACK)) return null;
  return `${elapsed(minutes - wanted)} past its planned ${withUnit(planned.text.trim(), planned.unit)}`;
}

/** A typed time as minutes; null where it is blank or no number. */
export function minutesOf(at: Entry): number | null {
  const hours = numberIn(at, "time");
  return hours === null ? null : hours * 60;
}
