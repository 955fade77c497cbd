import { existsSync } from "node:fs";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";

function findRoot(folder: string): string {
  if (existsSync(join(folder, "package.json"))) return folder;
  const parent = dirname(folder);
  if (parent === folder) throw new Error("no package.json above the server");
  return findRoot(parent);
}

/** The project's folder, the same from server/*.ts and from the bundle in dist/. */
export const projectRoot = findRoot(dirname(fileURLToPath(import.meta.url)));
