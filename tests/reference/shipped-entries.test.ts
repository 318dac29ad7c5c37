import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { expect, it } from "vitest";
import { z } from "zod";
import { summariseLogbook } from "../../shared/logbook/summarise-logbook.ts";
import { entryKinds, entrySchema } from "../../shared/schemas/entry.ts";

const folder = path.resolve(import.meta.dirname, "../corpus");
const releaseSchema = z.object({
  version: z.string(),
  ownerId: z.string(),
  entries: z.array(z.unknown()),
  means: z.looseObject({}),
});
const releases = readdirSync(folder)
  .filter((name) => name.endsWith(".json"))
  .map((name) => releaseSchema.parse(JSON.parse(readFileSync(path.join(folder, name), "utf8"))));

it.each(releases)("entries of version $version are read as they were written", (release) => {
  const entries = release.entries.map((entry) => entrySchema.parse(entry));
  expect(entries).toEqual(release.entries);
  expect(summariseLogbook({ ownerId: release.ownerId, entries })).toMatchObject(release.means);
});

it("the first version's corpus holds every kind of entry it knew", () => {
  const kinds = new Set(releases[0]!.entries.map((entry) => entrySchema.parse(entry).kind));
  expect([...kinds].sort()).toEqual([...entryKinds].sort());
});
