import { existsSync } from "node:fs";
import path from "node:path";

/** The nearest folder above `from` that holds a package.json. */
function findProjectRoot(from: string): string {
  const above = path.dirname(from);
  if (existsSync(path.join(from, "package.json")) || above === from) return from;
  return findProjectRoot(above);
}

/** The same from `server/` and from the bundle in `dist/server/`, wherever the process was started. */
export const projectRoot = findProjectRoot(import.meta.dirname);
