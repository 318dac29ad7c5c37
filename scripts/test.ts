/**
 * `npm test`: types, lint, format, unit, reference and API tests, the build, and browser tests
 * against what was built. All of it runs, whatever fails; the last line counts.
 */
import { spawn } from "node:child_process";
import { once } from "node:events";
import { mkdtempSync, readFileSync, rmSync, statfsSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { z } from "zod";
import { findChromium } from "./find-chromium.ts";

interface Count {
  passed: number;
  failed: number;
}

const MEMORY = "/dev/shm";
const ROOM = 2 ** 31;

/** In memory, where there is room: thousands of small databases would each wait for the disk. */
function roomForTests(): string {
  try {
    const { bavail, bsize } = statfsSync(MEMORY);
    if (bavail * bsize > ROOM) return mkdtempSync(path.join(MEMORY, "sumpless-test-"));
  } catch {
    // No such place on this machine.
  }
  return mkdtempSync(path.join(tmpdir(), "sumpless-test-"));
}

const room = roomForTests();

/** Runs a package's own program with this Node: no npx, which leaves its child alive when killed. */
async function run(file: string, args: string[], env: NodeJS.ProcessEnv = {}): Promise<boolean> {
  console.log(`\n▸ ${file.split("/").slice(0, -1).join("/")} ${args.join(" ")}`);
  const program = spawn(process.execPath, [path.join("node_modules", file), ...args], {
    stdio: "inherit",
    env: { ...process.env, TMPDIR: room, ...env },
  });
  const [status] = (await once(program, "exit")) as [number | null];
  return status === 0;
}

const check = (passed: boolean): Count => ({ passed: Number(passed), failed: Number(!passed) });

/** What a runner's report counts; a run that failed without a failed test counts as one. */
function counted(passedAll: boolean, report: string, schema: z.ZodType<Count>): Count {
  try {
    const count = schema.parse(JSON.parse(readFileSync(report, "utf8")));
    return { ...count, failed: Math.max(count.failed, passedAll ? 0 : 1) };
  } catch {
    return { passed: 0, failed: 1 };
  }
}

const vitestReport = z
  .object({ numPassedTests: z.number(), numFailedTests: z.number() })
  .transform((report) => ({ passed: report.numPassedTests, failed: report.numFailedTests }));

/** Playwright counts a test that passed on a second try as flaky: here that is a failure. */
const playwrightReport = z
  .object({
    stats: z.object({ expected: z.number(), unexpected: z.number(), flaky: z.number() }),
  })
  .transform(({ stats }) => ({ passed: stats.expected, failed: stats.unexpected + stats.flaky }));

async function unitTests(): Promise<Count> {
  const report = path.join(room, "vitest.json");
  const reporters = ["--reporter=default", "--reporter=json", `--outputFile.json=${report}`];
  return counted(await run("vitest/vitest.mjs", ["run", ...reporters]), report, vitestReport);
}

async function browserTests(): Promise<Count> {
  const report = path.join(room, "playwright.json");
  const env = { CHROMIUM_PATH: findChromium(), PLAYWRIGHT_JSON_OUTPUT_FILE: report };
  return counted(await run("@playwright/test/cli.js", ["test"], env), report, playwrightReport);
}

const staticChecks = await Promise.all([
  run("typescript/bin/tsc", ["-b"]),
  run("eslint/bin/eslint.js", ["."]),
  run("prettier/bin/prettier.cjs", ["--check", "--log-level", "warn", "."]),
]);
const unit = await unitTests();
const built = await run("tsx/dist/cli.mjs", ["scripts/build.ts"]);
const counts = [
  ...[...staticChecks, built].map(check),
  unit,
  ...(built ? [await browserTests()] : []),
];
rmSync(room, { recursive: true, force: true });
const sum = (of: keyof Count) => counts.reduce((total, count) => total + count[of], 0);
process.exitCode = sum("failed") === 0 ? 0 : 1;
console.log(`\n${sum("passed")} passed, ${sum("failed")} failed`);
