// @vitest-environment node
import { build, type Metafile } from "esbuild";
import path from "node:path";
import { expect, it } from "vitest";

/** A built file with all it imports at once, and not what it imports later. */
function loadedAtOnce({ outputs }: Metafile, file: string, seen = new Set<string>()): Set<string> {
  seen.add(file);
  for (const { path, kind } of outputs[file]!.imports)
    if (kind === "import-statement" && outputs[path] && !seen.has(path))
      loadedAtOnce({ inputs: {}, outputs }, path, seen);
  return seen;
}

it("reads the Shed's bikes without the schemas, the judging or the sync", async () => {
  const { metafile } = await build({
    entryPoints: [path.join(import.meta.dirname, "index.ts")],
    bundle: true,
    splitting: true,
    format: "esm",
    write: false,
    outdir: "out",
    metafile: true,
    logLevel: "silent",
    external: ["react", "react-dom"],
  });
  const files = [...loadedAtOnce(metafile, "out/index.js")];
  const sources = files.flatMap((file) => Object.keys(metafile.outputs[file]!.inputs));
  expect(sources).toContain("src/offline/logbook-queries.ts");
  expect(sources.filter((source) => /\/zod\/|^shared\/|offline\/sync\//.test(source))).toEqual([]);
});
