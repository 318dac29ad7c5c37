/**
 * A program of the server, to be killed at a chosen moment: `HOLD_AT` names it, and there the
 * process says HELD and stands still. Run as `node --import tsx held-program.ts PROGRAM.ts`.
 */
import SQLite from "better-sqlite3";
import { writeSync } from "node:fs";
import path from "node:path";
import { pathToFileURL } from "node:url";

const holdAt = process.env.HOLD_AT;

function hold(moment: string): void {
  if (moment !== holdAt) return;
  writeSync(1, "HELD\n");
  Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0);
}

type Transaction = ReturnType<SQLite.Database["transaction"]>;
const behaviours = ["default", "deferred", "immediate", "exclusive"] as const;
const prototype = SQLite.prototype;

/* eslint-disable @typescript-eslint/unbound-method -- called on the connection below */
const { transaction, backup, pragma } = prototype;
/* eslint-enable @typescript-eslint/unbound-method */

prototype.transaction = function (this: SQLite.Database, work: (...args: never[]) => unknown) {
  const own = transaction.call(this, (...args: unknown[]) => {
    const result = work(...(args as never[]));
    hold("before-commit");
    return result;
  });
  const held = behaviours.map((behaviour) => [
    behaviour,
    (...args: unknown[]) => {
      const result = own[behaviour](...args);
      if (!this.inTransaction) hold("after-commit");
      return result;
    },
  ]);
  const variants = Object.fromEntries(held) as Transaction;
  return Object.assign((...args: unknown[]) => variants.default(...args), variants);
} as SQLite.Database["transaction"];

prototype.backup = function (this: SQLite.Database, file: string) {
  const progress = () => {
    hold("backup");
    return 1;
  };
  return backup.call(this, file, { progress });
};

// With every commit a checkpoint, a kill under load lands in one often.
prototype.pragma = function (this: SQLite.Database, source, options) {
  if (holdAt === "checkpoint" && source.startsWith("journal_mode"))
    pragma.call(this, "wal_autocheckpoint=1");
  return pragma.call(this, source, options);
};

// The program sees its own arguments, as if it had been run by itself.
process.argv.splice(1, 1);
await import(pathToFileURL(path.resolve(process.argv[1]!)).href);
