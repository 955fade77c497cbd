/** The product's own documents, each fetched when it is opened; keyed by its path below docs without the ending. */
const files = import.meta.glob<string>("../../../docs/**/*.md", { query: "?raw", import: "default" });
const prefix = "../../../docs/";

export const documents: ReadonlyMap<string, () => Promise<string>> = new Map(
  Object.entries(files).map(([path, load]) => [path.slice(prefix.length, -".md".length), load]),
);

/** Where a link inside a document leads in the application; null where the application has no such place.
 *  @param from  the document it stands in     @param href  as written: `data.md#grades`, `#11-free-acid`, `decisions/0008-x.md` */
export function resolved(from: string, href: string): string | null {
  if (/^[a-z]+:/i.test(href)) return null;
  const [path = "", anchor] = href.split("#");
  const hash = anchor === undefined ? "" : `#${anchor}`;
  if (path === "") return `/method${from === "method" ? "" : `/${from}`}${hash}`;
  const parts = from.split("/").slice(0, -1);
  for (const part of path.split("/")) {
    if (part === "..") parts.pop();
    else if (part !== ".") parts.push(part);
  }
  const document = parts.join("/").replace(/\.md$/, "");
  if (!path.endsWith(".md") || !documents.has(document)) return null;
  return `/method${document === "method" ? "" : `/${document}`}${hash}`;
}
