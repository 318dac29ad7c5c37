import { secondsToMilliseconds } from "date-fns";
import { once } from "node:events";
import type { AddressInfo } from "node:net";
import { setTimeout } from "node:timers/promises";
import { createApp } from "./app.ts";
import type { Config } from "./config.ts";
import { backupsDir } from "./db/back-up-database.ts";
import { migrateDatabase } from "./db/migrate-database.ts";
import { databaseFile, openDatabase } from "./db/open-database.ts";
import { startJobs } from "./jobs/start-jobs.ts";
import type { Logger } from "./log.ts";

/** How long requests and mails under way may take to finish once the server is asked to stop. */
const PATIENCE_MS = secondsToMilliseconds(10);

/** Opens the database, brings it up to date, and listens. */
export async function startServer(config: Config, log: Logger) {
  const database = openDatabase(databaseFile(config.dataDir));
  await migrateDatabase(database, backupsDir(config.dataDir));
  const { app, services, store, mailer } = createApp(config, database, log);
  services.completeSummaries();
  const server = app.listen(config.port);
  await once(server, "listening");
  const jobs = startJobs({ services, store, mailer, log });

  /** Takes no more requests, finishes those under way, and leaves one whole database file. */
  async function stop(): Promise<void> {
    if (!server.listening) return;
    const outOfPatience = setTimeout(PATIENCE_MS, undefined, { ref: false });
    void outOfPatience.then(() => server.closeAllConnections());
    const closed = once(server, "close");
    server.close();
    jobs.stop();
    await closed;
    await Promise.race([jobs.settled().then(() => mailer.sendDue()), outOfPatience]);
    database.$client.pragma("wal_checkpoint(TRUNCATE)");
    database.$client.close();
  }

  const { port } = server.address() as AddressInfo;
  return { port, services, store, stop };
}
