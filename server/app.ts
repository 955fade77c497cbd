import compression from "compression";
import express, { type Express } from "express";
import { pinoHttp } from "pino-http";
import type { Deps } from "./deps";
import { authRoutes } from "./features/auth/routes";
import { campaignRoutes } from "./features/campaigns/routes";
import { chemistryRoutes } from "./features/chemistry/routes";
import { commentRoutes } from "./features/comments/routes";
import { feedRoutes } from "./features/feeds/routes";
import { healthRoutes } from "./features/health/routes";
import { mailboxRoutes } from "./features/mailbox/routes";
import { invitationRoutes } from "./features/members/invitationRoutes";
import { memberRoutes } from "./features/members/routes";
import { planRoutes } from "./features/plans/routes";
import { projectRoutes } from "./features/projects/routes";
import { solverRoutes } from "./features/solver/routes";
import { speciesEditRoutes } from "./features/speciesEdits/routes";
import { trialRoutes } from "./features/trials/routes";
import { windowSheetRoutes } from "./features/windowSheet/routes";
import { clientFiles, noSuchFile } from "./http/clientFiles";
import { errorHandler, unknownRoute } from "./http/errorHandler";
import { mountRoutes, type Route } from "./http/route";
import { sameOrigin } from "./http/sameOrigin";
import { securityHeaders } from "./http/security";

const features = [
  healthRoutes,
  authRoutes,
  memberRoutes,
  invitationRoutes,
  mailboxRoutes,
  chemistryRoutes,
  speciesEditRoutes,
  solverRoutes,
  projectRoutes,
  planRoutes,
  windowSheetRoutes,
  commentRoutes,
  feedRoutes,
  campaignRoutes,
  trialRoutes,
];

/** Every route of the API with its roles. */
export const routesOf = (deps: Deps): Route[] => features.flatMap((routes): Route[] => routes(deps));

/** The application is a function of what it stands on; nothing here listens.
 *  @param clientFolder  the built pages, served beside the API */
export function createApp(deps: Deps, clientFolder: string): Express {
  const { config, log, sessions } = deps;
  const app = express();
  app.disable("x-powered-by").set("trust proxy", config.trustProxy);
  app.use(securityHeaders(config.appUrl.startsWith("https:")));
  app.use("/api", requestLog(log), compression(), sameOrigin(config.appUrl), express.json({ limit: "1mb" }));
  app.use("/api", sessions.middleware);
  app.use(mountRoutes(routesOf(deps)));
  app.use("/api", unknownRoute);
  app.use(clientFiles(clientFolder), noSuchFile);
  return app.use(errorHandler(log));
}

/** Requests that went well are news to nobody: they show at LOG_LEVEL=debug. */
const requestLog = (logger: Deps["log"]) =>
  pinoHttp({
    logger,
    redact: ["req.headers.cookie", 'res.headers["set-cookie"]'],
    customLogLevel: (_req, res, error) => {
      if (error || res.statusCode >= 500) return "error";
      return res.statusCode >= 400 ? "info" : "debug";
    },
  });
