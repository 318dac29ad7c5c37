/** `npm run demo`: fills an invented club once, then serves it and prints the sign-ins. */
import { subHours } from "date-fns";
import { existsSync } from "node:fs";
import path from "node:path";
import { v7 as uuid } from "uuid";
import type { Entry } from "../shared/schemas/entry.ts";
import { readConfig } from "./config.ts";
import { databaseFile } from "./db/open-database.ts";
import {
  DEMO_CLUB,
  DEMO_PASSWORD,
  demoRiders,
  type DemoBike,
  type Told,
} from "./demo/invented-club.ts";
import { createLog } from "./log.ts";
import { projectRoot } from "./project-root.ts";
import { startServer } from "./start-server.ts";

const now = new Date();
const daysAgo = (days: number) => subHours(now, days * 24).toISOString();

/** A bike's entries, each strike right after what it strikes. */
function entriesOf({ patch, log }: DemoBike): Entry[] {
  const bikeId = uuid();
  const entryOf = (told: Told) =>
    ({ id: uuid(), bikeId, at: daysAgo(told.daysAgo), v: 1, ...withoutTelling(told) }) as Entry;
  const oldest = Math.max(...log.map((told) => told.daysAgo));
  const entries = [entryOf({ daysAgo: oldest + 1, kind: "bike", hours: null, body: patch })];
  for (const told of log) {
    const entry = entryOf(told);
    entries.push(entry);
    if (told.struck) {
      const body = { entryId: entry.id, reason: told.struck };
      entries.push(entryOf({ daysAgo: told.daysAgo - 0.1, kind: "strike", hours: null, body }));
    }
  }
  return entries;
}

const withoutTelling = ({ kind, hours, body }: Told) => ({ kind, hours, body });

const config = readConfig({ ...process.env, DATA_DIR: process.env.DATA_DIR ?? "./data/demo" });
const isNew = !existsSync(databaseFile(config.dataDir));
const { services, port, stop } = await startServer(config, createLog("warn"));
if (isNew) {
  for (const { name, email, bikes } of demoRiders) {
    const { id } = await services.accounts.signUp({ name, email, password: DEMO_PASSWORD });
    const { results } = services.sync(id, { known: {}, entries: bikes.flatMap(entriesOf) });
    const refused = results.filter((result) => result.status !== "stored");
    if (refused.length > 0) throw new Error(`The demo was refused: ${JSON.stringify(refused)}`);
  }
}
const width = Math.max(...demoRiders.map(({ email }) => email.length));
console.log(`
${DEMO_CLUB}, an invented club, is at http://localhost:${port}
Data: ${path.relative(projectRoot, config.dataDir) || config.dataDir} (delete it to start anew)

Sign in as any of these; the password of all is  ${DEMO_PASSWORD}
${demoRiders.map(({ name, email, bikes }) => `  ${email.padEnd(width)}  ${name}: ${bikes.map(({ patch }) => patch.name).join(", ")}`).join("\n")}
`);
for (const signal of ["SIGTERM", "SIGINT"] as const) process.once(signal, () => void stop());
