import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Download } from "playwright-core";
import { onTestFinished } from "vitest";

/** Where a download lies while the test runs: a browser that several test files share hands out no path of its own. */
export async function savedPath(download: Download): Promise<string> {
  const folder = await mkdtemp(join(tmpdir(), "gangueway-download-"));
  onTestFinished(() => rm(folder, { recursive: true, force: true }));
  const path = join(folder, download.suggestedFilename());
  await download.saveAs(path);
  return path;
}
