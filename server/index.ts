import { existsSync, statSync } from "node:fs";
import { join } from "node:path";
import pino from "pino";
import { ConfigError, readConfig } from "./config";
import { demoAccounts, demoPassword } from "./demo/accounts";
import { projectRoot } from "./root";
import { startServer, type Running } from "./start";

const say = (text: string) => process.stdout.write(`${text}\n`);

function announce({ url, demo }: Running): void {
  say(`\nGangueway listens on ${url}`);
  if (demo) {
    say(`Demo accounts (invented site, password ${demoPassword}):`);
    for (const { email, role } of demoAccounts) say(`  ${email.padEnd(34)} ${role}`);
  }
  say("");
}

/** The sentence for what stops a start; null for what only a stack explains. */
function inWords(error: unknown): string | null {
  if (error instanceof ConfigError) return error.message;
  const { code, port, address } = error as { code?: string; port?: number; address?: string };
  if (code === "EADDRINUSE") return `Port ${port} on ${address} is taken: stop what listens there, or set PORT.`;
  if (code === "EACCES" && port !== undefined)
    return `Port ${port} may not be opened by this user: set PORT above 1023.`;
  if (code === "ERR_DLOPEN_FAILED")
    return "better-sqlite3 was built for another Node: delete node_modules and start again.";
  return null;
}

async function main(): Promise<void> {
  const envFile = join(projectRoot, process.env.ENV_FILE ?? ".env");
  if (existsSync(envFile) && statSync(envFile).isFile()) process.loadEnvFile(envFile);
  const config = readConfig(process.env);
  const running = await startServer(config, pino({ level: config.logLevel }));
  announce(running);
  // npm passes on a signal that the terminal has sent already: the second one must not cut the first one short.
  let stopping: Promise<void> | undefined;
  const stop = () => void (stopping ??= running.stop().then(() => process.exit(0)));
  process.on("SIGTERM", stop).on("SIGINT", stop);
}

main().catch((error: unknown) => {
  process.stderr.write(`${inWords(error) ?? (error instanceof Error ? error.stack : String(error))}\n`);
  process.exit(1);
});
