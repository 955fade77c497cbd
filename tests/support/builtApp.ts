import { spawn, type ChildProcess } from "node:child_process";
import { once } from "node:events";
import { existsSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { TestProject } from "vitest/node";
import { projectRoot } from "../../server/root";

declare module "vitest" {
  interface ProvidedContext {
    /** where the built application listens */
    baseUrl: string;
  }
}

const bundle = join(projectRoot, "dist/server.mjs");

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

/** Starts the built application on a free port, with a fresh database and the demo, for all browser tests. */
export default async function setup({ provide }: TestProject): Promise<() => Promise<void>> {
  if (!existsSync(bundle)) throw new Error("The application is not built: npm run build.");
  const folder = mkdtempSync(join(tmpdir(), "gangueway-e2e-"));
  const settings = { ENV_FILE: "", DATABASE_PATH: join(folder, "e2e.db"), PORT: "0", LOG_LEVEL: "error" };
  const env = { PATH: process.env.PATH, ...settings };
  const server = spawn(process.execPath, [bundle], { cwd: projectRoot, env, stdio: ["ignore", "pipe", "pipe"] });
  provide("baseUrl", await addressOf(server));
  return async () => {
    const ended = once(server, "exit");
    server.kill("SIGTERM");
    await ended;
    rmSync(folder, { recursive: true, force: true });
  };
}
