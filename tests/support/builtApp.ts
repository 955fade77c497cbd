import { spawn, type ChildProcess } from "node:child_process";
import { once } from "node:events";
import { existsSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { chromium } from "playwright-core";
import type { TestProject } from "vitest/node";
import { projectRoot } from "../../server/root";
import { findHeadless } from "../../server/tools/chromium.mjs";

declare module "vitest" {
  interface ProvidedContext {
    /** where the built application listens: one of its own for each worker, so that files beside each other share no data */
    baseUrls: string[];
    /** where the one browser of all tests is reached */
    chromium: string;
  }
}

const bundle = join(projectRoot, "dist/server.mjs");

/** Without these the browser looks for its maker's servers. */
const quiet = [
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

/** The address in what the server prints, once it listens. */
function addressOf(server: ChildProcess): Promise<string> {
  let said = "";
  return new Promise((resolve, reject) => {
    const hear = (text: Buffer) => {
      said += text.toString();
      const url = /listens on (\S+)/.exec(said)?.[1];
      if (url !== undefined) resolve(url);
    };
    server.stdout?.on("data", hear);
    server.stderr?.on("data", hear);
    server.once("exit", (code) => reject(new Error(`the server ended with ${code} before it listened:\n${said}`)));
  });
}

/** The built application on a free port, with a fresh database and the demo. */
function application(folder: string, name: string) {
  const settings = { ENV_FILE: "", DATABASE_PATH: join(folder, `${name}.db`), PORT: "0", LOG_LEVEL: "error" };
  const env = { PATH: process.env.PATH, ...settings };
  const server = spawn(process.execPath, [bundle], { cwd: projectRoot, env, stdio: ["ignore", "pipe", "pipe"] });
  const stop = async () => {
    const ended = once(server, "exit");
    server.kill("SIGTERM");
    await ended;
  };
  return { address: addressOf(server), stop };
}

/** Starts one application a worker, and the browser that all of them share. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  if (!existsSync(bundle)) throw new Error("The application is not built: npm run build.");
  const executablePath = findHeadless();
  if (executablePath === undefined)
    throw new Error(
      "No Chromium: install one (Debian: apt-get install chromium-headless-shell) or name it in CHROMIUM_PATH.",
    );
  const folder = mkdtempSync(join(tmpdir(), "gangueway-e2e-"));
  const workers = Math.max(1, Number(project.config.maxWorkers));
  const applications = Array.from({ length: workers }, (_, i) => application(folder, `e2e-${i + 1}`));
  const browser = await chromium.launchServer({ executablePath, args: quiet });
  project.provide("baseUrls", await Promise.all(applications.map(({ address }) => address)));
  project.provide("chromium", browser.wsEndpoint());
  return async () => {
    await browser.close();
    await Promise.all(applications.map(({ stop }) => stop()));
    rmSync(folder, { recursive: true, force: true });
  };
}
