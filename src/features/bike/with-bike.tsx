import type { ReactNode } from "react";
import { useParams } from "react-router-dom";
import type { BikeWithLog } from "../../offline/index.ts";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { useFetchedBike } from "./use-fetched-bike.ts";

const backToShed = { to: patterns.shed, label: "Shed" };

/**
 * Reads the bike that the address names from this phone; what is already there shows at once. One
 * that is not here may be shared with the club: the server is asked for it.
 */
export function WithBike({ children }: { children: (bike: BikeWithLog) => ReactNode }) {
  const { bikeId = "" } = useParams();
  const { bike, error, awaited } = useFetchedBike(bikeId);
  if (bike) return children(bike);
  if (error)
    return (
      <Page title="This bike cannot be shown" back={backToShed}>
        <Notice tone="error" title={error.message} />
      </Page>
    );
  if (bike === undefined) return <main className="flex-1" aria-busy />;
  if (awaited)
    return (
      <Page key="awaited" title="This bike is on its way" back={backToShed}>
        <p role="status">
          It is not on this phone yet. Its log comes from the server as soon as there is a network.
        </p>
      </Page>
    );
  return (
    <Page key="none" title="This bike is not here" back={backToShed}>
      <p>
        Neither this phone nor the server has a bike at this address for you. It may have been
        deleted, or is no longer shared with you.
      </p>
    </Page>
  );
}
