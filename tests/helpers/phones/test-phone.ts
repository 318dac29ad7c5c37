import "fake-indexeddb/auto";
import { connectTo } from "../../../src/offline/logbook/connection.ts";
import type { Phone } from "../../../src/offline/logbook/phone.ts";
import type { Account } from "../../../src/offline/types.ts";

export const rider: Account = {
  id: "0193a000-0000-7000-8000-00000000aaaa",
  name: "Ada",
  email: "ada@club.example",
};

let phones = 0;

/** A phone with an empty store of its own (needs fake-indexeddb) and a clock that can be set. */
export function testPhone(account: Account = rider, name = `phone-${(phones += 1)}`) {
  const databaseName = `${name}-${account.id}`;
  const clock = { now: new Date("2026-03-01T08:00:00Z") };
  const phone: Phone = {
    account,
    databaseName,
    open: () => connectTo(databaseName),
    now: () => clock.now,
  };
  return { ...phone, clock };
}
