import { deleteDB } from "idb";
import { summarySchema } from "../../../shared/schemas/summary.ts";
import { syncResponseSchema } from "../../../shared/schemas/sync.ts";
import type { User } from "../../../shared/schemas/auth.ts";
import { apiRequest } from "../../../src/offline/api-client.ts";
import { openDatabase, type LogbookDatabase } from "../../../src/offline/logbook/database.ts";
import { keepEntry } from "../../../src/offline/logbook/keep-entry.ts";
import { readBike, readUnsent } from "../../../src/offline/logbook/read-bike.ts";
import { rebuildBikes } from "../../../src/offline/logbook/rebuild-bikes.ts";
import { runSyncSession } from "../../../src/offline/sync/sync-session.ts";
import type { NewEntry } from "../../../src/offline/types.ts";
import type { Served } from "../rider.ts";
import { testPhone } from "./test-phone.ts";

/** What lies between a phone and the server: it may lose, delay, double or change what passes. */
export type Network = typeof fetch;

export interface Wire {
  /** Asked at each call: after a restore, the server listens elsewhere. */
  server: () => Served;
  cookie: () => string;
  network?: Network;
  device?: string;
}

/** A browser's `fetch`, from a page of the server's own origin, with its session cookie. */
const browserFetch =
  ({ server, cookie, network = fetch }: Wire): typeof fetch =>
  (path, init) =>
    network(new URL(path as string, server().url), {
      ...init,
      headers: {
        ...(init?.headers as Record<string, string>),
        origin: server().origin,
        cookie: cookie(),
      },
    });

/** The phone's own store and sync over a real connection to a real server. */
export function wiredPhone({ id, name, email }: User, wire: Wire) {
  let connection: Promise<LogbookDatabase> | undefined;
  let visit = 1;
  const ignored = () => undefined;
  const account = testPhone({ id, name, email }, wire.device);
  const connect = () =>
    openDatabase(account.databaseName, { blocking: ignored, terminated: ignored });
  const phone = { ...account, open: () => (connection ??= connect()) };

  async function close(): Promise<void> {
    const closing = connection;
    [connection, visit] = [undefined, visit + 1];
    (await closing)?.close();
  }

  /** The page goes, whatever it waited for, and comes again as the app does when it is opened. */
  async function reload(): Promise<void> {
    await close();
    await rebuildBikes(phone);
  }

  async function sync(network = wire.network): Promise<void> {
    const started = visit;
    await runSyncSession({
      phone,
      send: (body) =>
        apiRequest("/api/sync", {
          method: "POST",
          body,
          schema: syncResponseSchema,
          fetch: browserFetch({ ...wire, ...(network && { network }) }),
        }),
      isCurrent: () => started === visit,
      onApplied: () => undefined,
    });
  }

  return {
    ...phone,
    sync,
    reload,
    /** The account's store is gone from the phone, as if it had never been there. */
    async discard() {
      await close();
      await deleteDB(phone.databaseName);
    },
    keep: (entry: NewEntry) => keepEntry(phone, entry, { signal: new AbortController().signal }),
    bike: (bikeId: string) => readBike(phone, bikeId),
    bikes: async () => (await phone.open()).getAll("bikes"),
    unsent: () => readUnsent(phone),
    /** The summary as the server computed it. */
    serverSummary: (bikeId: string) =>
      apiRequest(`/api/bikes/${bikeId}`, { schema: summarySchema, fetch: browserFetch(wire) }),
  };
}

export type WiredPhone = ReturnType<typeof wiredPhone>;
