import { existsSync, readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { z } from "zod";

const letterSchema = z.object({
  to: z.string(),
  message: z.object({ subject: z.string(), text: z.string(), html: z.string() }),
});

export type KeptLetter = z.infer<typeof letterSchema> & { name: string };

/** The letters that went to a folder because no mail server is set up, the newest first. */
export function readKeptLetters(folder: string): KeptLetter[] {
  if (!existsSync(folder)) return [];
  const files = readdirSync(folder).filter((file) => file.endsWith(".json"));
  return files
    .sort()
    .reverse()
    .map((file) => ({
      name: path.basename(file, ".json"),
      ...letterSchema.parse(JSON.parse(readFileSync(path.join(folder, file), "utf8"))),
    }));
}
