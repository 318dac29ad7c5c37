import { lazy } from "react";
import { Link } from "react-router-dom";
import { PlusIcon } from "../../ui/icons.tsx";
import { useBikes, useOpenChecks } from "../../offline/index.ts";
import { ButtonLink } from "../../ui/button-link.tsx";
import { Fold } from "../../ui/fold.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { bikePath, patterns } from "../../ui/paths.ts";
import { BikeCard } from "./bike-card.tsx";
import { shedBikes, type ShedBike } from "./shed-bikes.ts";

const EmptyShed = lazy(() => import("./empty-shed.tsx"));

/** The rider's own bikes, read from this phone: no network has a part in it. */
export function ShedPage() {
  const { data: bikes, error } = useBikes();
  const openChecks = useOpenChecks();
  const own = bikes && shedBikes(bikes, openChecks);
  const riding = own?.filter((bike) => !bike.details.retired) ?? [];
  const retired = own?.filter((bike) => bike.details.retired) ?? [];
  if (own?.length === 0) return <EmptyShed />;
  return (
    <Page title="Shed" wide>
      {error && <Notice tone="error" title={error.message} />}
      <ul className="grid items-start gap-4 grid-cols-[repeat(auto-fill,minmax(min(20rem,100%),1fr))]">
        {riding.map((bike) => (
          <li key={bike.bikeId}>
            <BikeCard bike={bike} />
          </li>
        ))}
      </ul>
      {own && (
        <ButtonLink to={patterns.newBike} className="sm:self-start">
          <PlusIcon />
          Add a bike
        </ButtonLink>
      )}
      {retired.length > 0 && <RetiredBikes bikes={retired} />}
    </Page>
  );
}

function RetiredBikes({ bikes }: { bikes: ShedBike[] }) {
  return (
    <Fold title={`Retired (${bikes.length})`}>
      <ul>
        {bikes.map((bike) => (
          <li key={bike.bikeId}>
            <Link
              to={bikePath(bike.bikeId)}
              className="inline-flex min-h-target items-center font-bold text-oil underline"
            >
              {bike.details.name}
            </Link>
          </li>
        ))}
      </ul>
    </Fold>
  );
}
