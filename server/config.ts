import { resolve } from "node:path";
import { z } from "../shared/schemas/z";
import { projectRoot } from "./root";

const flag = z.enum(["0", "1"]).transform((value) => value === "1");

const origin = z
  .url({ protocol: /^https?$/, error: "must be an http or https address" })
  .transform((address) => new URL(address).origin);

const environment = z.object({
  /** 0 takes any free port */
  PORT: z.coerce.number().int().min(0).max(65535).default(5180),
  HOST: z.string().default("127.0.0.1"),
  DATABASE_PATH: z.string().default("data/gangueway.db"),
  SEED_DEMO: flag.default(true),
  /** the address members type; https makes cookies Secure */
  APP_URL: origin.optional(),
  /** how many proxies stand in front and set X-Forwarded-For */
  TRUST_PROXY: z.coerce.number().int().min(0).max(10).default(0),
  LOG_LEVEL: z.enum(["silent", "fatal", "error", "warn", "info", "debug", "trace"]).default("info"),
  SESSION_DAYS: z.coerce.number().int().min(1).max(365).default(30),
  /** failed sign-ins from one address in a quarter of an hour */
  SIGN_IN_ATTEMPTS: z.coerce.number().int().min(1).max(1000).default(10),
  INVITATION_DAYS: z.coerce.number().int().min(1).max(60).default(7),
  /** without it letters stay in the mailbox page and nothing goes to the network */
  SMTP_URL: z.url({ protocol: /^smtps?$/, error: "must be an smtp or smtps address" }).optional(),
  MAIL_FROM: z.string().min(3).max(200).default("Gangueway <gangueway@localhost>"),
});

export interface Config {
  port: number;
  host: string;
  databasePath: string;
  seedDemo: boolean;
  /** origin only: scheme, host and port */
  appUrl: string;
  trustProxy: number;
  logLevel: z.infer<typeof environment>["LOG_LEVEL"];
  sessionDays: number;
  signInAttempts: number;
  invitationDays: number;
  smtpUrl: string | null;
  mailFrom: string;
}

/** Every setting that is wrong, in one message. */
export class ConfigError extends Error {}

/** A password inside an address is nobody's business on the console. */
const withoutSecret = (value: string) => value.replace(/:[^:@/]+@/, ":...@");

/** The settings from the environment; an empty variable counts as absent.
 *  @throws ConfigError that names every variable that is wrong, its value and its bound */
export function readConfig(env: Record<string, string | undefined>): Config {
  const given = Object.fromEntries(Object.entries(env).filter(([, value]) => value !== undefined && value !== ""));
  const parsed = environment.safeParse(given);
  if (!parsed.success) {
    const lines = parsed.error.issues.map(({ path, message }) => {
      const name = String(path[0]);
      return `  ${name}=${withoutSecret(given[name] ?? "")}: ${message}`;
    });
    throw new ConfigError(`These settings are wrong (see .env.example):\n${lines.join("\n")}`);
  }
  const settings = parsed.data;
  return {
    port: settings.PORT,
    host: settings.HOST,
    databasePath: resolve(projectRoot, settings.DATABASE_PATH),
    seedDemo: settings.SEED_DEMO,
    appUrl: settings.APP_URL ?? `http://localhost:${settings.PORT}`,
    trustProxy: settings.TRUST_PROXY,
    logLevel: settings.LOG_LEVEL,
    sessionDays: settings.SESSION_DAYS,
    signInAttempts: settings.SIGN_IN_ATTEMPTS,
    invitationDays: settings.INVITATION_DAYS,
    smtpUrl: settings.SMTP_URL ?? null,
    mailFrom: settings.MAIL_FROM,
  };
}
