import { Writable } from "node:stream";
import { createLog } from "../../server/log.ts";

/** A log kept in memory. */
export function keepLog(level: string) {
  const lines: string[] = [];
  const to = new Writable({
    write(chunk: Buffer, _encoding, done) {
      lines.push(chunk.toString());
      done();
    },
  });
  return { log: createLog(level, to), text: () => lines.join("") };
}
