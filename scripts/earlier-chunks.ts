import {
  copyFileSync,
  cpSync,
  existsSync,
  mkdirSync,
  readdirSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from "node:fs";
import path from "node:path";
import { z } from "zod";

/** Builds whose chunks stay served, the newest included: an app open since then still finds its own. */
const KEPT_BUILDS = 3;

const buildsSchema = z.array(z.array(z.string()));

function readBuilds(file: string): string[][] {
  return existsSync(file) ? buildsSchema.parse(JSON.parse(readFileSync(file, "utf8"))) : [];
}

/**
 * Keeps the chunks of earlier builds beside the new ones. They are set aside before the client is
 * built, since its folder is emptied, and brought back after, so that no phone precaches them.
 * `builds.json` remembers the chunks of each build, newest first.
 */
export function earlierChunks(distDir: string) {
  const assetsDir = path.join(distDir, "client/assets");
  const asideDir = path.join(distDir, "earlier-chunks");
  const buildsFile = path.join(distDir, "builds.json");

  function setAside(): void {
    if (existsSync(assetsDir)) cpSync(assetsDir, asideDir, { recursive: true });
  }

  function bringBack(): void {
    const current = readdirSync(assetsDir);
    const builds = [current, ...readBuilds(buildsFile)].slice(0, KEPT_BUILDS);
    mkdirSync(asideDir, { recursive: true });
    const aside = new Set(readdirSync(asideDir));
    for (const name of builds.flat())
      if (aside.has(name) && !current.includes(name))
        copyFileSync(path.join(asideDir, name), path.join(assetsDir, name));
    writeFileSync(buildsFile, JSON.stringify(builds));
    rmSync(asideDir, { recursive: true });
  }

  return { setAside, bringBack };
}
