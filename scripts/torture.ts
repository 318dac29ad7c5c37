/**
 * `npm run torture [-- name …]`: the tests that try to break a promise, at full length. The same
 * files run small and seeded in `npm test`.
 */
import { spawnSync } from "node:child_process";

const tortures: Record<string, { file: string; env: Record<string, string> }> = {
  model: { file: "tests/api/phone-model.test.ts", env: { MODEL_RUNS: "10000" } },
  kills: { file: "tests/api/killed-server.test.ts", env: { KILLS: "200" } },
  fuzz: { file: "tests/api/fuzz.test.ts", env: { REQUESTS: "50000" } },
  faults: { file: "tests/api/phone-faulty-network.test.ts", env: { EXCHANGES: "1000" } },
};

const asked = process.argv.slice(2);
const names = asked.length > 0 ? asked : Object.keys(tortures);
const unknown = names.filter((name) => !(name in tortures));
if (unknown.length > 0) {
  console.error(`There is no torture ${unknown.join(", ")}: ${Object.keys(tortures).join(", ")}.`);
  process.exit(2);
}
const failed = names.filter((name) => {
  const { file, env } = tortures[name]!;
  console.log(
    `\n▸ ${name}: ${Object.entries(env)
      .map((pair) => pair.join("="))
      .join(" ")}`,
  );
  const args = ["node_modules/vitest/vitest.mjs", "run", "--project", "node", file];
  const run = spawnSync(process.execPath, args, {
    stdio: "inherit",
    env: { ...process.env, ...env },
  });
  return run.status !== 0;
});
console.log(failed.length > 0 ? `\nBroken: ${failed.join(", ")}` : "\nEvery promise was kept.");
process.exitCode = failed.length > 0 ? 1 : 0;
