import path from "node:path";
import { z } from "zod";
import { usualHashCost, type HashCost } from "./auth/password.ts";
import { projectRoot } from "./project-root.ts";

const originSchema = z
  .url({ protocol: /^https?$/, error: "must be a web address such as https://logbook.example" })
  .regex(/^[^/]+\/\/[^/?#]+\/?$/, "must be an origin alone: no path, no query")
  .transform((text) => new URL(text).origin);

/** An empty variable counts as one that is not set. */
const environmentSchema = z.object({
  PORT: z.coerce
    .number("must be a port number")
    .int("must be a port number")
    .min(0, "must be a port number")
    .max(65_535, "must be a port number")
    .default(3000),
  DATA_DIR: z.string().default("./data"),
  PUBLIC_ORIGIN: originSchema.optional(),
  TRUST_PROXY: z.coerce
    .number("must be the number of proxies in front of the server")
    .int("must be the number of proxies in front of the server")
    .min(0, "must be the number of proxies in front of the server")
    .default(0),
  SMTP_URL: z
    .url({ protocol: /^smtps?$/, error: "must be a mail server such as smtp://mail.example:587" })
    .optional(),
  MAIL_FROM: z.string().default("Sumpless <sumpless@localhost>"),
  LOG_LEVEL: z
    .enum(
      ["trace", "debug", "info", "warn", "error", "fatal", "silent"],
      "must be one of trace, debug, info, warn, error, fatal, silent",
    )
    .default("info"),
});

export interface Config {
  port: number;
  dataDir: string;
  /** The one web address this server is reached at: it decides cookies, HSTS and allowed Origins. */
  publicOrigin: string;
  /** How many proxies in front of the server may be believed about the caller's address. */
  trustedProxies: number;
  /** Null: messages are written to `mail/` in the data folder. */
  smtpUrl: string | null;
  mailFrom: string;
  /** On a developer's own machine: messages that go to files are shown at `/dev/mail`. */
  showMail: boolean;
  logLevel: string;
  /** The built client. */
  clientDir: string;
  hashCost: HashCost;
}

export class ConfigError extends Error {
  override name = "ConfigError";
}

/** Reads the environment; a wrong one is refused whole, every wrong variable named. */
export function readConfig(environment: NodeJS.ProcessEnv): Config {
  const given = Object.entries(environment).filter(([, value]) => value !== "");
  const parsed = environmentSchema.safeParse(Object.fromEntries(given));
  if (!parsed.success) {
    const wrong = parsed.error.issues.map((issue) => `  ${issue.path.join(".")} ${issue.message}`);
    throw new ConfigError(`The environment is not usable:\n${wrong.join("\n")}`);
  }
  const env = parsed.data;
  const publicOrigin = env.PUBLIC_ORIGIN ?? `http://localhost:${env.PORT}`;
  const smtpUrl = env.SMTP_URL ?? null;
  return {
    port: env.PORT,
    dataDir: path.resolve(env.DATA_DIR),
    publicOrigin,
    trustedProxies: env.TRUST_PROXY,
    smtpUrl,
    mailFrom: env.MAIL_FROM,
    showMail: smtpUrl === null && /^http:\/\/localhost(:|$)/.test(publicOrigin),
    logLevel: env.LOG_LEVEL,
    clientDir: path.join(projectRoot, "dist/client"),
    hashCost: usualHashCost,
  };
}
