/** The anchor a code host gives a heading: lower case, words joined by hyphens, other signs gone. */
export const slug = (text: string): string =>
  text
    .toLowerCase()
    .replace(/[`*_]/g, "")
    .replace(/[^\p{L}\p{N}\s-]/gu, "")
    .trim()
    .replace(/\s+/g, "-");

export interface Anchor {
  id: string;
  text: string;
  /** 1 to 3 for headings, 4 for a paragraph with a bold beginning */
  level: number;
  /** counted from 1 */
  line: number;
}

/** Where one can jump to in a document: its headings, and paragraphs that begin in bold. Two of one name are told apart as code hosts do. */
export function anchorsOf(markdown: string): Anchor[] {
  const seen = new Map<string, number>();
  let fenced = false;
  return markdown.split("\n").flatMap((source, i): Anchor[] => {
    if (source.startsWith("```")) fenced = !fenced;
    const [, marks, heading, bold] = /^(?:(#{1,3}) (.+)|\*\*(.+?)\.?\*\*.*)$/.exec(source) ?? [];
    const text = (heading ?? bold ?? "").trim();
    if (fenced || text === "") return [];
    const wanted = slug(text);
    const times = seen.get(wanted) ?? 0;
    seen.set(wanted, times + 1);
    return [{ id: times === 0 ? wanted : `${wanted}-${times}`, text, level: marks?.length ?? 4, line: i + 1 }];
  });
}
