import type { Logger } from "pino";
import type { Outcome } from "../shared/outcome";
import type { Solution } from "../shared/solution";
import type { ChemicalData } from "../shared/species/chemicalData";
import type { Config } from "./config";
import type { Db } from "./db/open";
import type { Chemistry } from "./features/chemistry/library";
import type { Sessions } from "./features/auth/sessions";
import type { Mailer } from "./features/mailbox/mailer";

/** Everything the routes stand on. */
export interface Deps {
  db: Db;
  config: Config;
  clock: () => Date;
  log: Logger;
  sessions: Sessions;
  mailer: Mailer;
  chemistry: Chemistry;
  solve: (problem: unknown, data: ChemicalData) => Outcome<Solution>;
}
