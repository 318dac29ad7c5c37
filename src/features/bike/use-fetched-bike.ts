import { useEffect, useState } from "react";
import { fetchBikes, useBike, useBikes } from "../../offline/index.ts";

/**
 * A bike as this phone has it; one that it does not have is asked for. Undefined until the phone,
 * and for a bike of others the server, has answered; *awaited* where the server could not be asked.
 */
export function useFetchedBike(bikeId: string) {
  const { data: bike, error } = useBike(bikeId);
  const awaited = useBikes().data?.some((one) => one.bikeId === bikeId && one.awaited) ?? false;
  const [askedFor, setAskedFor] = useState<string | null>(null);
  const asked = askedFor === bikeId;
  useEffect(() => {
    if (bike !== null || asked) return;
    void fetchBikes([bikeId])
      .catch(() => undefined)
      .then(() => setAskedFor(bikeId));
  }, [bike, asked, bikeId]);
  const unknown = bike === null && !awaited && !asked;
  return { bike: unknown ? undefined : bike, error, awaited };
}
