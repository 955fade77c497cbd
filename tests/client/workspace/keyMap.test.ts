import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { keyMap } from "../../../src/features/workspace/header/keyMap";
import { glossary } from "../../../src/lib/glossary";
import { glossaryTitles } from "../../../src/lib/glossaryTitles";

const shown = (keyMap.find(({ place }) => place === "Anywhere on the plan")?.keys ?? [])
  .map(([key]) => key)
  .join(" | ");

test("every key the plan's screen listens to stands in the list of keys, and every letter of the list is listened to", () => {
  const source = readFileSync("src/features/workspace/model/useWorkspaceKeys.ts", "utf8");
  const listened = [...source.matchAll(/\{ key: "([^"]+)"(, ctrl: true)?/g)].map(([, key = "", ctrl]) =>
    ctrl === undefined ? key : `Ctrl ${key.toUpperCase()}`,
  );
  expect(listened.length).toBeGreaterThan(6);
  for (const key of listened) expect(shown.split(" | ").flatMap((k) => k.split(" or ")).map((k) => k.replace("Shift ", ""))).toContain(key); // prettier-ignore
  for (const letter of shown.match(/(?<=^| )[a-z?](?= |$)/g) ?? []) expect(listened).toContain(letter);
  // the two that are listened to as a list
  expect(source).toMatch(/\["0", "escape"\]/);
  expect(source).toMatch(/slice\(0, 9\)/);
});

test("every word of the glossary is said in full sentences", () => {
  expect(Object.keys(glossary).sort()).toEqual(Object.keys(glossaryTitles).sort());
  for (const paragraphs of Object.values(glossary)) {
    expect(paragraphs.length).toBeGreaterThan(0);
    for (const text of paragraphs) expect(text).toMatch(/^[A-Z].{20,}[.]$/);
  }
});
