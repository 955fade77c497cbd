/** Where an excerpt of JSON is not found in an answer: the paths that differ. Objects may have more keys and lists of objects more entries
 *  than the excerpt shows, in its order; lists of numbers and texts must agree whole. Numbers agree to the digits printed. */
export function differences(answer: unknown, excerpt: unknown, path = ""): string[] {
  if (typeof excerpt === "number") {
    const decimals = String(excerpt).split(".")[1]?.length ?? 0;
    const near = typeof answer === "number" && Math.abs(answer - excerpt) <= 0.5000001 * 10 ** -decimals;
    return near ? [] : [`${path}: ${JSON.stringify(answer)}, printed ${excerpt}`];
  }
  if (Array.isArray(excerpt)) return listDifferences(answer, excerpt, path);
  if (typeof excerpt === "object" && excerpt !== null) {
    if (typeof answer !== "object" || answer === null) return [`${path}: ${JSON.stringify(answer)}`];
    return Object.entries(excerpt).flatMap(([key, value]) =>
      differences((answer as Record<string, unknown>)[key], value, `${path}.${key}`),
    );
  }
  return answer === excerpt ? [] : [`${path}: ${JSON.stringify(answer)}, printed ${JSON.stringify(excerpt)}`];
}

function listDifferences(answer: unknown, excerpt: readonly unknown[], path: string): string[] {
  if (!Array.isArray(answer)) return [`${path}: ${JSON.stringify(answer)}`];
  const whole = excerpt.length === 0 || excerpt.every((e) => typeof e !== "object" || e === null);
  if (whole && answer.length !== excerpt.length)
    return [`${path}: ${answer.length} entries, printed ${excerpt.length}`];
  let at = 0;
  return excerpt.flatMap((entry, i) => {
    const found = whole ? i : answer.findIndex((a, k) => k >= at && differences(a, entry).length === 0);
    if (whole) return differences(answer[i], entry, `${path}.${i}`);
    if (found < 0) return [`${path}.${i}: nothing like ${JSON.stringify(entry)} from entry ${at} on`];
    at = found + 1;
    return [];
  });
}
