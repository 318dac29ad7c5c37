import { Link } from "react-router-dom";
import type { Club } from "../../../../shared/schemas/club.ts";
import { useBikes } from "../../../offline/index.ts";
import { OnwardIcon } from "../../../ui/icons.tsx";
import { sharePath } from "../../../ui/paths.ts";
import { useShares } from "../share/use-shares.ts";

/** The member's own bikes, each with whether this club sees it. */
export function OwnBikes({ club }: { club: Club }) {
  const own = useBikes().data?.filter(({ access }) => access === "owner");
  if (!own) return null;
  return (
    <section aria-labelledby="own-bikes" className="flex flex-col gap-2">
      <h2 id="own-bikes" className="text-2xl">
        Your bikes
      </h2>
      <p>
        {own.length > 0
          ? "The club’s mechanics see those that you share, and no others."
          : "None in your Shed yet. Once there is, you say here whether the club sees it."}
      </p>
      <ul className="divide-y divide-rule border-y border-rule empty:hidden">
        {own.map(({ bikeId, details }) => (
          <li key={bikeId}>
            <OwnBike bikeId={bikeId} name={details.name} clubId={club.id} />
          </li>
        ))}
      </ul>
    </section>
  );
}

function OwnBike({ bikeId, name, clubId }: { bikeId: string; name: string; clubId: string }) {
  const { data: shares } = useShares(bikeId);
  const shared = shares?.some(({ club }) => club.id === clubId);
  return (
    <Link to={sharePath(bikeId)} className="flex min-h-target items-center gap-3 py-1">
      <span className="min-w-0 flex-1 text-lg font-bold wrap-anywhere">{name}</span>
      <span className={shared ? "font-bold text-holding" : "text-soft"}>
        {shares && (shared ? "Shared" : "Not shared")}
      </span>
      <OnwardIcon className="shrink-0 text-oil" />
    </Link>
  );
}
