import { createServer, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { join } from "node:path";
import type { Logger } from "pino";
import { solve } from "../shared/solve";
import { createApp } from "./app";
import { readTables } from "./chemistry/readTables";
import type { Config } from "./config";
import { migrateDatabase } from "./db/migrate";
import { openDatabase } from "./db/open";
import { createSessions } from "./features/auth/sessions";
import { createMailer } from "./features/mailbox/mailer";
import { createChemistry } from "./features/chemistry/library";
import { keepVersion, keptVersion } from "./features/chemistry/service";
import { findByEmail } from "./features/members/service";
import { refreshOutdatedFigures, workOffDueLater } from "./features/trials/refresh";
import { workingsOf } from "./features/trials/workedOut";
import { demoAccounts } from "./demo/accounts";
import { seedDemoAtStart } from "./demo/seed";
import { projectRoot } from "./root";

export interface Running {
  url: string;
  /** the demo's accounts still open this server */
  demo: boolean;
  /** takes no more requests, lets those under way end, closes the database */
  stop: () => Promise<void>;
}

/** Opens, migrates and fills the database, then serves API and pages on one port. */
export async function startServer(config: Config, log: Logger): Promise<Running> {
  const open = openDatabase(config.databasePath);
  const { db, raw } = open;
  const { ran, backup } = migrateDatabase(open);
  if (ran > 0) log.info({ ran, backup }, "database migrated");

  const clock = () => new Date();
  const { tables, version } = readTables();
  if (keepVersion(db, tables, clock())) log.info({ version }, "chemistry library written to the database");
  const current = keptVersion(db, version);

  const https = config.appUrl.startsWith("https:");
  const sessions = createSessions(db, { https, days: config.sessionDays });
  const mailer = createMailer(db, { smtpUrl: config.smtpUrl, from: config.mailFrom, clock });
  const chemistry = createChemistry(db, current, clock());
  for (const { edit, why } of chemistry.unfit) log.warn({ species: edit.speciesId, why }, "library edit left out");
  const seeded = config.seedDemo ? await seedDemoAtStart(db, chemistry) : 0;
  if (seeded !== 0) log.info({ rows: seeded }, "demo data written");
  const refreshed = refreshOutdatedFigures(db, workingsOf(chemistry));
  workOffDueLater(db, workingsOf(chemistry));
  if (refreshed > 0) log.info({ trials: refreshed }, "figures worked out anew");
  const app = createApp(
    { db, config, clock, log, sessions, mailer, chemistry, solve },
    join(projectRoot, "dist/client"),
  );

  const server = await listen(createServer(app), config);
  const { port } = server.address() as AddressInfo;
  const demo = demoAccounts.some(({ email }) => findByEmail(db, email));
  const stop = async () => {
    await close(server);
    raw.close();
  };
  return { url: `http://${config.host === "0.0.0.0" ? "localhost" : config.host}:${port}`, demo, stop };
}

function listen(server: Server, { port, host }: Config): Promise<Server> {
  return new Promise((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, host, () => resolve(server));
  });
}

function close(server: Server): Promise<void> {
  return new Promise((resolve) => {
    server.close(() => resolve());
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), 3000).unref();
  });
}
