import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { documents, resolved } from "../../../src/features/method/documents";
import { anchorsOf, slug } from "../../../src/lib/anchors";
import { sourcePath, sources, type Source } from "../../../src/lib/sources";

const read = (document: string) => readFileSync(`docs/${document}.md`, "utf8");
const all = readdirSync("docs", { recursive: true, encoding: "utf8" })
  .filter((path) => path.endsWith(".md"))
  .map((path) => path.slice(0, -3).replaceAll("\\", "/"));
const ids = (document: string) => new Set(anchorsOf(read(document)).map((a) => a.id));

test("anchors are those of a code host: words joined by hyphens, a second one of a name counted", () => {
  expect(slug("6. Set point")).toBe("6-set-point");
  expect(slug("`freeAcid`, and Eh")).toBe("freeacid-and-eh");
  const text = "# A\n\n## Worked example\n**Bold start.** And on.\n```\n# no heading\n```\n## Worked example\n";
  expect(anchorsOf(text).map(({ id, level, line }) => [id, level, line])).toEqual([
    ["a", 1, 1],
    ["worked-example", 2, 3],
    ["bold-start", 4, 4],
    ["worked-example-1", 2, 8],
  ]);
});

test("every document of the product can be opened in the application", () =>
  expect([...documents.keys()].sort()).toEqual([...all].sort()));

describe("what a line of the plan screen rests on is there", () => {
  test.each(Object.keys(sources) as Source[])("%s", (source) => {
    const [document, anchor] = sources[source];
    expect(ids(document)).toContain(anchor);
    expect(sourcePath(source)).toMatch(/^\/method(\/\w+)?#/);
  });
});

describe("links between documents", () => {
  test.each(all)("%s: each leads to a document, and to a part of it that is there", (document) => {
    for (const [, href = ""] of read(document).matchAll(/\]\(([^)\s]+)\)/g)) {
      if (/^[a-z]+:|\.(png|svg)$/.test(href)) continue;
      const to = resolved(document, href);
      if (to === null) {
        // Files beside the documents, such as the README or a table, have no place in the application.
        expect(readdirSync(join("docs", document, "..", href, ".."))).toContain(href.split("/").at(-1));
        continue;
      }
      const [path = "", anchor] = to.split("#");
      const target = path === "/method" ? "method" : path.slice("/method/".length);
      expect(all, href).toContain(target);
      if (anchor !== undefined) expect([...ids(target)], href).toContain(anchor);
    }
  });
  test("another origin, or a place that is none, is no link", () => {
    expect(resolved("method", "https://example.org/x.md")).toBeNull();
    expect(resolved("method", "nowhere.md")).toBeNull();
    expect(resolved("decisions/0008-set-point-where-eh-is-mixed", "../data.md#grades")).toBe("/method/data#grades");
    expect(resolved("data", "#grades")).toBe("/method/data#grades");
  });
});
