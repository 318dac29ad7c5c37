import { once } from "node:events";
import { mkdtempSync, readdirSync, readFileSync, rmSync } from "node:fs";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import { onTestFinished } from "vitest";
import { createApp } from "../../server/app.ts";
import { readConfig, type Config } from "../../server/config.ts";
import { backupsDir } from "../../server/db/back-up-database.ts";
import { migrateDatabase } from "../../server/db/migrate-database.ts";
import { databaseFile, openDatabase } from "../../server/db/open-database.ts";
import { createLog } from "../../server/log.ts";

/** A folder that is gone after the test. */
export function temporaryDir(): string {
  const dir = mkdtempSync(path.join(tmpdir(), "sumpless-"));
  onTestFinished(() => rmSync(dir, { recursive: true, force: true }));
  return dir;
}

/** Cheap passwords; otherwise the config of an empty environment. */
const testConfig = (overrides: Partial<Config>): Config => ({
  ...readConfig({ DATA_DIR: overrides.dataDir ?? temporaryDir() }),
  hashCost: { memoryCost: 64, timeCost: 1, parallelism: 1 },
  ...overrides,
});

/** The mails written to the data folder, oldest first. */
const readMails = (dataDir: string) => {
  const folder = path.join(dataDir, "mail");
  const names = readdirSync(folder).filter((name) => name.endsWith(".eml"));
  return names.sort().map((name) => readFileSync(path.join(folder, name), "utf8"));
};

/** The real server over a real database, on a port of its own, until the test is finished. */
export async function startTestServer(overrides: Partial<Config> = {}, log = createLog("silent")) {
  const config = testConfig(overrides);
  const { dataDir, publicOrigin: origin } = config;
  const database = openDatabase(databaseFile(dataDir));
  await migrateDatabase(database, backupsDir(dataDir));
  const { app, services, store, mailer } = createApp(config, database, log);
  const server = app.listen(0, "127.0.0.1");
  await once(server, "listening");
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;

  async function stop(): Promise<void> {
    if (!server.listening) return;
    server.close();
    server.closeAllConnections();
    await mailer.sendDue();
    database.$client.close();
  }
  onTestFinished(stop);

  return {
    app,
    url,
    origin,
    dataDir,
    database,
    services,
    store,
    mailer,
    mails: () => readMails(dataDir),
    stop,
  };
}

export type TestServer = Awaited<ReturnType<typeof startTestServer>>;
