/** `npm run demo`: fills an invented club once, then serves it and prints the sign-ins. */
import { existsSync } from "node:fs";
import path from "node:path";
import { readConfig } from "./config.ts";
import { databaseFile } from "./db/open-database.ts";
import { fillClub } from "./demo/fill-club.ts";
import { DEMO_CLUB, DEMO_PASSWORD, demoRiders, type DemoRider } from "./demo/invented-club.ts";
import { createLog } from "./log.ts";
import { projectRoot } from "./project-root.ts";
import { startServer } from "./start-server.ts";

const config = readConfig({ ...process.env, DATA_DIR: process.env.DATA_DIR ?? "./data/demo" });
const isNew = !existsSync(databaseFile(config.dataDir));
const { services, store, port, stop } = await startServer(config, createLog("warn"));
if (isNew) await fillClub({ services, store });

const address = `http://localhost:${port}`;
const width = Math.max(...demoRiders.map(({ email }) => email.length));
const roles = {
  rider: "",
  organiser: ", the club's organiser, who sees no bikes of others",
  mechanic: ", the club's mechanic, who sees the bikes that are shared",
};
const signIn = ({ name, email, role, bikes }: DemoRider) =>
  `  ${email.padEnd(width)}  ${name}${roles[role]}\n${" ".repeat(width + 4)}${bikes
    .map(({ patch, unshared }) => patch.name + (unshared ? " (not shared)" : ""))
    .join(", ")}`;

console.log(`
${DEMO_CLUB}, an invented club, is at ${address}
Data: ${path.relative(projectRoot, config.dataDir) || config.dataDir} (delete it to start anew)
${config.showMail ? `Its mail is shown at ${address}/dev/mail` : ""}
Sign in as any of these; the password of all is  ${DEMO_PASSWORD}
${demoRiders.map(signIn).join("\n")}
`);
for (const signal of ["SIGTERM", "SIGINT"] as const) process.once(signal, () => void stop());
