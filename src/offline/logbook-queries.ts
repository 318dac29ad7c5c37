import type { UseQueryResult } from "@tanstack/react-query";
import { useLogbookQuery } from "./logbook-query.ts";
import { BIKE_ROW_FORMAT, type LogbookDatabase } from "./logbook/database.ts";
import type { Phone } from "./logbook/phone.ts";
import type { BikeRecord, BikeWithLog, KeptEntry } from "./types.ts";

async function readBikes(database: LogbookDatabase, phone: Phone): Promise<BikeRecord[]> {
  const bikes = await database.getAll("bikes");
  if (bikes.every((bike) => bike.format === BIKE_ROW_FORMAT)) return bikes;
  const { rebuildBikes } = await import("./logbook/rebuild-bikes.ts");
  await rebuildBikes(phone);
  return database.getAll("bikes");
}

/** The bikes this account may see, oldest first, each with the summary stored with its log. */
export const useBikes = (): UseQueryResult<BikeRecord[]> => useLogbookQuery(["bikes"], readBikes);

/** A bike with its log; null where this phone has no such bike, or not yet. */
export const useBike = (bikeId: string): UseQueryResult<BikeWithLog | null> =>
  useLogbookQuery(["bike", bikeId], async (_, phone) => {
    const { readBike } = await import("./logbook/read-bike.ts");
    return readBike(phone, bikeId);
  });

/**
 * Entries the server does not have yet, of all bikes, the oldest first. Refused ones are among them
 * until they are struck or written anew.
 */
export const useUnsent = (): UseQueryResult<KeptEntry[]> =>
  useLogbookQuery(["unsent"], async (_, phone) => {
    const { readUnsent } = await import("./logbook/read-bike.ts");
    return readUnsent(phone);
  });
