import { spawn } from "node:child_process";
import { once } from "node:events";
import { readdirSync } from "node:fs";
import { createInterface } from "node:readline";
import { expect, it, onTestFinished } from "vitest";
import { assertIntegrity } from "../../server/db/back-up-database.ts";
import { databaseFile } from "../../server/db/open-database.ts";
import { newId, smallLog } from "../helpers/make-entry.ts";
import { signInRider, signUpRider } from "../helpers/rider.ts";
import { temporaryDir } from "../helpers/start-test-server.ts";

/** `server/index.ts` in a process of its own, as `npm start` runs it. */
async function startProcess(dataDir: string) {
  const env = { ...process.env, PORT: "0", DATA_DIR: dataDir, LOG_LEVEL: "info" };
  const server = spawn(process.execPath, ["--import", "tsx", "server/index.ts"], { env });
  onTestFinished(() => void server.kill("SIGKILL"));
  for await (const line of createInterface(server.stdout)) {
    const { msg, port } = JSON.parse(line) as { msg: string; port?: number };
    if (msg !== "listening") continue;
    server.stdout.resume();
    return { server, url: `http://127.0.0.1:${port}`, origin: "http://localhost:0" };
  }
  throw new Error("The server never listened.");
}

it.each(["SIGTERM", "SIGINT"] as const)(
  "a server told to stop by %s leaves one whole file, and starts again where it was",
  async (signal) => {
    const dataDir = temporaryDir();
    const first = await startProcess(dataDir);
    const rider = await signUpRider(first);
    const bikeId = newId();
    await rider.sync(smallLog(bikeId));
    const summary = await rider.summary(bikeId);

    const exit = once(first.server, "exit");
    first.server.kill(signal);
    expect(await exit).toEqual([0, null]);
    expect(readdirSync(dataDir).sort()).toEqual(["mail", "sumpless.sqlite"]);
    assertIntegrity(databaseFile(dataDir));

    const second = await startProcess(dataDir);
    const again = await signInRider(second, rider.user.email);
    expect(await again.summary(bikeId)).toEqual(summary);
  },
  30_000,
);

it("a server with a wrong environment says so and does not start", async () => {
  const env = { ...process.env, PORT: "http", TRUST_PROXY: "all", DATA_DIR: temporaryDir() };
  const server = spawn(process.execPath, ["--import", "tsx", "server/index.ts"], { env });
  let said = "";
  server.stderr.on("data", (chunk: Buffer) => (said += chunk.toString()));
  expect(await once(server, "close")).toEqual([1, null]);
  expect(said).toContain("PORT must be");
  expect(said).toContain("TRUST_PROXY must be");
  expect(said).not.toContain("at ");
}, 30_000);
