import { appendFileSync, existsSync, readFileSync } from "node:fs";
import path from "node:path";
import { z } from "zod";

const givenRolesSchema = z.strictObject({
  ...{ clubId: z.string(), userId: z.string() },
  ...{ organiser: z.boolean(), mechanic: z.boolean() },
});
export type GivenRoles = z.infer<typeof givenRolesSchema>;

const erasureSchema = z.strictObject({
  erasedAt: z.string(),
  accountId: z.string().optional(),
  bikeIds: z.array(z.string()),
  entryIds: z.array(z.string()),
  /** What was taken back rather than erased; it may have been given again since. */
  clubIds: z.array(z.string()).optional(),
  members: z.array(z.strictObject({ clubId: z.string(), userId: z.string() })).optional(),
  invites: z.array(z.strictObject({ clubId: z.string(), inviteId: z.string() })).optional(),
  /** As they are from then on, given ones too: the last line about a member holds. */
  roles: z.array(givenRolesSchema).optional(),
  shares: z.array(z.strictObject({ clubId: z.string(), bikeId: z.string() })).optional(),
});
export type Erasure = z.infer<typeof erasureSchema>;

/** Null for a line cut short by a full disk: its erasure was never confirmed to anyone. */
function parseLine(line: string): Erasure | null {
  try {
    return erasureSchema.parse(JSON.parse(line));
  } catch {
    return null;
  }
}

/**
 * What was erased or taken back, one line each, in a file that backups do not hold and a restore does
 * not touch: an older backup must not bring back what someone asked to have erased, nor share again
 * what is shared no more, nor give back a role that was taken.
 */
export function createErasureRecord(dataDir: string) {
  const file = path.join(dataDir, "erased.jsonl");
  return {
    /** Returns once the line is on the disk; begins a line of its own, whatever was cut short before. */
    append: (erasure: Erasure) =>
      appendFileSync(file, `\n${JSON.stringify(erasure)}\n`, { mode: 0o600, flush: true }),
    readAll(): Erasure[] {
      if (!existsSync(file)) return [];
      const lines = readFileSync(file, "utf8").split("\n").filter(Boolean);
      return lines.map(parseLine).filter((erasure) => erasure !== null);
    },
  };
}
