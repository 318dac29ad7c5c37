import { StoreUnavailableError } from "../errors.ts";
import { openDatabase, type LogbookDatabase } from "./database.ts";

const connections = new Map<string, Promise<LogbookDatabase>>();

const asTypedError = (cause: unknown) =>
  new StoreUnavailableError(
    (cause as Error | null)?.name === "VersionError" ? "store-newer" : "store-unavailable",
    { cause },
  );

async function open(name: string): Promise<LogbookDatabase> {
  const forget = () => connections.delete(name);
  try {
    return await openDatabase(name, {
      blocking(database) {
        forget();
        database.close();
      },
      terminated: forget,
    });
  } catch (error) {
    forget();
    throw asTypedError(error);
  }
}

/**
 * The page's one connection to a logbook. It closes when a newer version of the app asks for the
 * database, and opens again at the next call.
 */
export function connectTo(name: string): Promise<LogbookDatabase> {
  const connection = connections.get(name) ?? open(name);
  connections.set(name, connection);
  return connection;
}
