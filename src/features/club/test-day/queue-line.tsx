import { Link } from "react-router-dom";
import { changeTestDay, type QueuedBike } from "../../../offline/test-day.ts";
import { CautionIcon, CloseIcon, PhoneIcon } from "../../../ui/icons.tsx";
import { testDayBikePath } from "../../../ui/paths.ts";
import { takeOut, type Readiness } from "./queue.ts";

const readinessWords: Record<Readiness, string> = {
  ready: "Ready",
  awaited: "Not on this phone yet",
  gone: "No longer shared",
};

interface Props {
  clubId: string;
  bike: QueuedBike;
  readiness: Readiness;
}

/** One who waits: to the station, or out of the queue. */
export function QueueLine({ clubId, bike, readiness }: Props) {
  const { bikeId, name, owner, tag } = bike;
  const Icon = readiness === "ready" ? PhoneIcon : CautionIcon;
  return (
    <li className="flex items-center">
      <Link
        to={testDayBikePath(clubId, bikeId)}
        className="flex min-h-target min-w-0 flex-1 flex-wrap items-center gap-x-4 py-2 leading-snug"
      >
        <span className="min-w-0 flex-[1_1_10rem] wrap-anywhere">
          <strong className="block text-lg">{name}</strong>
          <span className="text-soft">
            {owner} · {tag}
          </span>
        </span>
        <span
          className={`inline-flex items-center gap-1 ${readiness === "ready" ? "text-soft" : "text-dropping"}`}
        >
          <Icon className="size-4 shrink-0" />
          {readinessWords[readiness]}
        </span>
      </Link>
      <button
        type="button"
        aria-label={`Take ${name} out of the queue`}
        onClick={() => void changeTestDay(clubId, (now) => takeOut(now, bikeId))}
        className="flex min-h-target min-w-target shrink-0 items-center justify-center rounded-card"
      >
        <CloseIcon className="size-5" />
      </button>
    </li>
  );
}
