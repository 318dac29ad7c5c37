import type { ReactNode } from "react";
import { useParams } from "react-router-dom";
import { useBike, type BikeWithLog } from "../../offline/index.ts";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";

const backToShed = { to: patterns.shed, label: "Shed" };

/** Reads the bike that the address names from this phone; what is already there shows at once. */
export function WithBike({ children }: { children: (bike: BikeWithLog) => ReactNode }) {
  const { bikeId = "" } = useParams();
  const { data: bike, error } = useBike(bikeId);
  if (bike) return children(bike);
  if (error)
    return (
      <Page title="This bike cannot be shown" back={backToShed}>
        <Notice tone="error" title={error.message} />
      </Page>
    );
  if (bike === undefined) return <main className="flex-1" aria-busy />;
  return (
    <Page title="This bike is not here" back={backToShed}>
      <p>
        This phone has no bike at this address. It may have been deleted, or not have reached this
        phone yet: it comes with the next exchange with the server.
      </p>
    </Page>
  );
}
