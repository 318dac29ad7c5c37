import type { Applying } from "./applying.ts";

/** Takes a bike off this phone. What was not sent stays: it may be the only copy. */
export async function dropBike(
  { change, bikes, touched }: Applying,
  bikeId: string,
): Promise<void> {
  const entries = change.objectStore("entries");
  for (const row of await entries.index("bike").getAll(bikeId))
    if (row.unsentSince === undefined) await entries.delete(row.entry.id);
  await change.objectStore("bikes").delete(bikeId);
  bikes.delete(bikeId);
  touched.delete(bikeId);
}
