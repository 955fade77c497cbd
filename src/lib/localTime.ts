const two = (n: number) => String(n).padStart(2, "0");

/** An instant as a date-and-time field shows it, in the time of this browser; "" for none. */
export function localInput(iso: string | null): string {
  if (iso === null) return "";
  const at = new Date(iso);
  if (Number.isNaN(at.getTime())) return "";
  return `${at.getFullYear()}-${two(at.getMonth() + 1)}-${two(at.getDate())}T${two(at.getHours())}:${two(at.getMinutes())}`;
}

/** What such a field holds as an instant with its offset: "2026-12-01T09:42:00+01:00"; null for an empty one. */
export function fromLocalInput(text: string): string | null {
  if (text === "") return null;
  const at = new Date(text);
  return Number.isNaN(at.getTime()) ? null : offsetIso(at);
}

/** Now, or another instant, with the offset of this browser: a bench in another time zone is still the same instant. */
export function offsetIso(at: Date): string {
  const minutes = -at.getTimezoneOffset();
  const local = new Date(at.getTime() + minutes * 60_000).toISOString().slice(0, 19);
  const size = Math.abs(minutes);
  return `${local}${minutes < 0 ? "-" : "+"}${two(Math.floor(size / 60))}:${two(size % 60)}`;
}
