import type { ReactNode } from "react";
import { Link } from "react-router-dom";
import { bikeTag } from "../../../shared/logbook/bike-tag.ts";
import type { BikeWithLog } from "../../offline/index.ts";
import { bikeDetailsPath, sharePath } from "../../ui/paths.ts";
import { SavedNotice } from "./saved-notice.tsx";

/** What bike it is, whose, and for its owner the ways to its details and to who may see it. */
export function Identity({ bike }: { bike: BikeWithLog }) {
  const { bikeId, access, details } = bike.record;
  const { make, model, year, retired } = details;
  const owner = access === "owner" ? null : ownerName(bike);
  const words = [owner && `Belongs to ${owner}`, make, model, year, retired && "Retired"];
  return (
    <div className="-mt-3 flex flex-wrap items-center gap-x-5">
      <p className="basis-full text-soft">
        {[...words.filter(Boolean), "Tag "].join(" · ")}
        <strong className="tracking-wider text-ink">{bikeTag(bikeId)}</strong>
      </p>
      {access === "owner" && (
        <>
          <Way to={bikeDetailsPath(bikeId)}>Details and settings</Way>
          <Way to={sharePath(bikeId)}>Share with a club</Way>
        </>
      )}
      <SavedNotice />
    </div>
  );
}

/** By the owner's own entries; the first of them registered the bike. */
const ownerName = ({ record, log }: BikeWithLog) =>
  log.find(({ entry }) => entry.author?.id === record.ownerId)?.entry.author?.name;

function Way({ to, children }: { to: string; children: ReactNode }) {
  return (
    <Link to={to} className="flex min-h-target items-center font-bold text-oil">
      {children}
    </Link>
  );
}
