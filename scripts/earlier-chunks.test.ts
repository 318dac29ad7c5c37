import { mkdirSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { expect, it, onTestFinished } from "vitest";
import { earlierChunks } from "./earlier-chunks.ts";

/** A build as Vite makes it: the client's folder emptied, new chunks in it. */
function buildOf(distDir: string) {
  const { setAside, bringBack } = earlierChunks(distDir);
  const assetsDir = path.join(distDir, "client/assets");
  return (...chunks: string[]) => {
    setAside();
    rmSync(path.join(distDir, "client"), { recursive: true, force: true });
    mkdirSync(assetsDir, { recursive: true });
    for (const chunk of chunks) writeFileSync(path.join(assetsDir, chunk), chunk);
    bringBack();
    return readdirSync(assetsDir).sort();
  };
}

it("keeps the chunks of the last three builds, and drops those before", () => {
  const distDir = mkdtempSync(path.join(tmpdir(), "sumpless-"));
  onTestFinished(() => rmSync(distDir, { recursive: true }));
  const build = buildOf(distDir);
  expect(build("a1.js", "same.js")).toEqual(["a1.js", "same.js"]);
  expect(build("a2.js", "same.js")).toEqual(["a1.js", "a2.js", "same.js"]);
  expect(build("a3.js", "same.js")).toEqual(["a1.js", "a2.js", "a3.js", "same.js"]);
  expect(build("a4.js", "same.js")).toEqual(["a2.js", "a3.js", "a4.js", "same.js"]);
  expect(readdirSync(distDir).sort()).toEqual(["builds.json", "client"]);
});
