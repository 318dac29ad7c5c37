import compression from "compression";
import express, { type Express } from "express";
import { createPasswords } from "./auth/password.ts";
import { createSessions } from "./auth/session.ts";
import type { Config } from "./config.ts";
import type { Database } from "./db/open-database.ts";
import { createStore } from "./db/store.ts";
import type { Logger } from "./log.ts";
import { createMailer } from "./mail/mailer.ts";
import { notFound } from "./problems.ts";
import { createApi } from "./routes/api.ts";
import { createDevMailRoutes } from "./routes/dev-mail-routes.ts";
import { handleProblem } from "./routes/handle-problem.ts";
import { logRequests } from "./routes/log-requests.ts";
import { createRateLimits } from "./routes/rate-limits.ts";
import { securityHeaders } from "./routes/security-headers.ts";
import { serveClient } from "./routes/serve-client.ts";
import { addressFor } from "./services/address-for.ts";
import { createServices } from "./services/services.ts";

/** Puts the server's parts together over a migrated database. */
export function createApp(config: Config, database: Database, log: Logger) {
  const { publicOrigin } = config;
  const store = createStore(database, config.dataDir);
  const sessions = createSessions(database, publicOrigin);
  const passwords = createPasswords(config.hashCost);
  const mailer = createMailer(store, config, log, (mail) => addressFor(store, mail));
  const services = createServices({ store, passwords, sessions, mailer, publicOrigin });

  const app: Express = express();
  app.set("trust proxy", config.trustedProxies);
  app.set("query parser", "simple");
  app.disable("etag");
  app.disable("x-powered-by");
  app.use(logRequests(log), securityHeaders(publicOrigin), compression());
  app.use("/api", createApi({ services, sessions, limits: createRateLimits(), publicOrigin }));
  if (config.showMail) app.use(createDevMailRoutes(config));
  app.use(serveClient(config.clientDir));
  app.use(() => {
    throw notFound();
  });
  app.use(handleProblem);
  return { app, services, store, mailer };
}
