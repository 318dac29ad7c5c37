/** `npm run build`: the server's bundle into dist/server, the client into dist/client. */
import { build as bundle } from "esbuild";
import { existsSync, rmSync } from "node:fs";
import path from "node:path";
import { build as buildClient } from "vite";
import { earlierChunks } from "./earlier-chunks.ts";

const root = path.resolve(import.meta.dirname, "..");
process.chdir(root);

const programs = ["index", "rebuild", "backup", "restore", "admin", "demo"]
  .map((name) => `server/${name}.ts`)
  .filter((file) => existsSync(file));

async function buildServer(): Promise<void> {
  rmSync("dist/server", { recursive: true, force: true });
  await bundle({
    entryPoints: programs,
    outdir: "dist/server",
    bundle: true,
    splitting: true,
    platform: "node",
    format: "esm",
    target: "node20",
    packages: "external",
    logLevel: "warning",
  });
}

const { setAside, bringBack } = earlierChunks("dist");
await buildServer();
setAside();
await buildClient({ logLevel: "warn" });
bringBack();
