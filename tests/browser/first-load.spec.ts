import { readFileSync } from "node:fs";
import path from "node:path";
import { gzipSync } from "node:zlib";
import { expect, test } from "./fixtures.ts";

const client = "dist/client";
/** Gzipped, of all JavaScript that the first paint waits for. */
const MOST_BYTES = 110_000;

const read = (file: string) => readFileSync(path.join(client, file), "utf8");

/** Scripts that a page or a module names: `src="…"` and static imports, never `import(…)`. */
function namedIn(file: string): string[] {
  const text = read(file);
  const names = file.endsWith(".html")
    ? text.matchAll(/<(?:script|link)\b[^>]*\b(?:src|href)="\/([^"]+\.js)"/g)
    : text.matchAll(/(?:\bfrom|\bimport)\s*"\.\/([^"]+\.js)"/g);
  return [...names].map(([, name]) =>
    file.endsWith(".html") ? name! : path.posix.join(path.posix.dirname(file), name!),
  );
}

function firstLoad(): Set<string> {
  const found = new Set<string>();
  const waiting = namedIn("index.html");
  for (let file = waiting.pop(); file; file = waiting.pop()) {
    if (found.has(file)) continue;
    found.add(file);
    waiting.push(...namedIn(file));
  }
  return found;
}

test("The first load is at most 110 kB of gzipped JavaScript", () => {
  const files = [...firstLoad()];
  expect(files.some((file) => file.includes("libraries"))).toBe(true);
  const bytes = files.reduce((sum, file) => sum + gzipSync(read(file)).length, 0);
  expect(bytes, files.join(", ")).toBeLessThanOrEqual(MOST_BYTES);
});

test("Every script of the app is kept on the phone for when there is no network", () => {
  const precached = read("sw.js");
  // The chunks of this build; those of earlier ones are served, and not kept anew.
  const [built] = JSON.parse(readFileSync("dist/builds.json", "utf8")) as string[][];
  const scripts = built!.filter((name) => name.endsWith(".js"));
  expect(scripts.length).toBeGreaterThan(5);
  expect(scripts.filter((name) => !precached.includes(name))).toEqual([]);
});
