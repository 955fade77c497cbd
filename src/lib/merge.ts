/** A field that two people changed to different things. */
export interface Conflict {
  path: string;
  base: unknown;
  yours: unknown;
  theirs: unknown;
}

type Fields = Record<string, unknown>;

const isFields = (value: unknown): value is Fields =>
  typeof value === "object" && value !== null && !Array.isArray(value);
/** A typed number is one thing: its text under another unit would be another number. */
const isEntry = (value: unknown) =>
  isFields(value) && Object.keys(value).length === 2 && "text" in value && "unit" in value;

/** Plain JSON values, compared through. */
export function same(a: unknown, b: unknown): boolean {
  if (a === b) return true;
  if (Array.isArray(a) && Array.isArray(b)) return a.length === b.length && a.every((x, i) => same(x, b[i]));
  if (!isFields(a) || !isFields(b)) return false;
  const keys = Object.keys(a);
  return keys.length === Object.keys(b).length && keys.every((key) => key in b && same(a[key], b[key]));
}

const below = (path: string, key: string | number) => (path === "" ? String(key) : `${path}.${key}`);

/** Two changed copies of one value put together: what only one of the two changed is taken; rows added at the end of a list by
 *  both are all kept, theirs first; what both changed differently is a conflict, and stands as yours until somebody decides. */
export function merge<T>(base: T, yours: T, theirs: T): { merged: T; conflicts: Conflict[] } {
  const conflicts: Conflict[] = [];
  const join = (b: unknown, y: unknown, t: unknown, path: string): unknown => {
    if (same(y, t) || same(b, t)) return y;
    if (same(b, y)) return t;
    if (Array.isArray(b) && Array.isArray(y) && Array.isArray(t)) {
      if (y.length >= b.length && t.length >= b.length) {
        const kept = b.map((x: unknown, i) => join(x, y[i], t[i], below(path, i)));
        const added = t.slice(b.length) as unknown[];
        const own = (y.slice(b.length) as unknown[]).filter((x) => !added.some((a) => same(a, x)));
        return [...kept, ...added, ...own];
      }
    } else if (isFields(b) && isFields(y) && isFields(t) && !isEntry(b)) {
      const keys = new Set([...Object.keys(b), ...Object.keys(t), ...Object.keys(y)]);
      return Object.fromEntries([...keys].map((key) => [key, join(b[key], y[key], t[key], below(path, key))]));
    }
    conflicts.push({ path, base: b, yours: y, theirs: t });
    return y;
  };
  return { merged: join(base, yours, theirs, "") as T, conflicts };
}

/** The value with one field changed; `path` as in a conflict. */
export function putAt<T>(value: T, path: string, field: unknown): T {
  const put = (at: unknown, keys: readonly string[]): unknown => {
    const [key, ...rest] = keys;
    if (key === undefined) return field;
    if (Array.isArray(at)) return at.map((x: unknown, i) => (String(i) === key ? put(x, rest) : x));
    return isFields(at) ? { ...at, [key]: put(at[key], rest) } : at;
  };
  return put(value, path === "" ? [] : path.split(".")) as T;
}
