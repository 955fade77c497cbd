import { mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import pino from "pino";
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
import { solve } from "../../../shared/solve";

export interface BenchServer {
  open: OpenDatabase;
  chemistry: Chemistry;
  baseURL: string;
  /** signs a member of the demo in: "name=value" */
  cookieOf: (member: string) => Promise<string>;
  end: () => void;
}

/** This source's server on a free port, with a database of its own that holds the demo and whatever `fill` adds.
 *  @param clientFolder  the built client; none where only the API is asked */
export async function startBenchServer(
  fill: (filled: Pick<BenchServer, "open" | "chemistry">) => void,
  clientFolder?: string,
): Promise<BenchServer> {
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
  const app = createApp({ db, config, clock, log, sessions, mailer, chemistry, solve }, clientFolder ?? folder);
  const server = createServer(app);
  await new Promise<void>((listening) => server.listen(0, "127.0.0.1", listening));
  return {
    open,
    chemistry,
    baseURL: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    cookieOf: async (member) => (await sessions.start(member)).split(";")[0] ?? "",
    end: () => {
      server.close();
      server.closeAllConnections();
      open.raw.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
