import { chromium } from "@playwright/test";
import { spawnSync } from "node:child_process";
import { existsSync } from "node:fs";

const usualPlaces = () => [
  process.env.CHROMIUM_PATH,
  "/usr/bin/chromium",
  "/usr/bin/chromium-browser",
  "/usr/bin/google-chrome",
  chromium.executablePath(),
];

const present = () => usualPlaces().find((path) => path && existsSync(path));

const run = (command: string, args: string[]) =>
  spawnSync(command, args, { stdio: "inherit" }).status === 0;

/**
 * The path of a Chromium: one that is there, else one installed by apt (as root), else Playwright's
 * own download. Throws a sentence saying how to get one where none of that works.
 */
export function findChromium(): string {
  const isRoot = process.getuid?.() === 0;
  const install = () =>
    (isRoot &&
      run("apt-get", ["update", "-qq"]) &&
      run("apt-get", ["install", "-y", "-qq", "chromium"])) ||
    run(process.execPath, ["node_modules/@playwright/test/cli.js", "install", "chromium"]);
  const found = present() ?? (install() ? present() : undefined);
  if (found) return found;
  throw new Error(
    "The browser tests need Chromium and none could be installed. Install one (Debian: apt-get " +
      "install chromium) or name one in CHROMIUM_PATH.",
  );
}
