import { existsSync, mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import pino from "pino";
import { chromium, type Browser, type BrowserContext } from "playwright-core";
import { createApp } from "../../../server/app";
import { readTables } from "../../../server/chemistry/readTables";
import { readConfig } from "../../../server/config";
import { migrateDatabase } from "../../../server/db/migrate";
import { openDatabase, type OpenDatabase } from "../../../server/db/open";
import { seedDemo } from "../../../server/demo/seed";
import { createSessions } from "../../../server/features/auth/sessions";
import { createChemistry, type Chemistry } from "../../../server/features/chemistry/library";
import { keepVersion } from "../../../server/features/chemistry/service";
import { createMailer } from "../../../server/features/mailbox/mailer";
import { findChromium } from "../../../server/tools/chromium.mjs";
import { solve } from "../../../shared/solve";

export interface BenchApp {
  open: OpenDatabase;
  chemistry: Chemistry;
  baseURL: string;
  browser: Browser;
  /** a fresh context, nothing in its cache, signed in as the demo's metallurgist */
  signedIn: () => Promise<BrowserContext>;
  end: () => Promise<void>;
}

export const benchMember = "demo-metallurgist";

/** The built client and this source's server on a free port with the demo and whatever `fill` adds, and Chromium beside it.
 *  `CLIENT_FOLDER=…` for a client built elsewhere. */
export async function startBenchApp(fill: (app: Pick<BenchApp, "open" | "chemistry">) => void): Promise<BenchApp> {
  const clientFolder = resolve(process.env.CLIENT_FOLDER ?? "dist/client");
  if (!existsSync(join(clientFolder, "index.html"))) throw new Error("The client is not built: npm run build.");
  const executablePath = findChromium();
  if (executablePath === undefined) throw new Error("No Chromium: see the README.");

  const folder = mkdtempSync(join(tmpdir(), "gangueway-bench-"));
  const open = openDatabase(join(folder, "bench.db"));
  migrateDatabase(open);
  open.raw.pragma("synchronous = OFF"); // filling is not what is measured
  const { db } = open;
  const { tables } = readTables();
  const clock = () => new Date();
  keepVersion(db, tables, clock());
  const chemistry = createChemistry(db, tables, clock());
  await seedDemo(db, chemistry);
  fill({ open, chemistry });

  const config = readConfig({ LOG_LEVEL: "silent" });
  const sessions = createSessions(db, { https: false, days: 1 });
  const mailer = createMailer(db, { smtpUrl: null, from: config.mailFrom, clock });
  const log = pino({ level: "silent" });
  const server = createServer(createApp({ db, config, clock, log, sessions, mailer, chemistry, solve }, clientFolder));
  await new Promise<void>((listening) => server.listen(0, "127.0.0.1", listening));
  const baseURL = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const browser = await chromium.launch({ executablePath, args: ["--disable-gpu", "--disable-background-networking"] });
  return {
    open,
    chemistry,
    baseURL,
    browser,
    signedIn: async () => {
      const [name = "", value = ""] = ((await sessions.start(benchMember)).split(";")[0] ?? "").split("=");
      const context = await browser.newContext({ baseURL, viewport: { width: 1280, height: 800 } });
      await context.addCookies([{ name, value, url: baseURL }]);
      // the runner of these scripts wraps functions that are handed to the page
      await context.addInitScript("globalThis.__name ??= (f) => f");
      return context;
    },
    end: async () => {
      await browser.close();
      server.close();
      server.closeAllConnections();
      open.raw.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
