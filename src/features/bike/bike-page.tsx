import { lazy, Suspense, useMemo, useState } from "react";
import { useOpenChecks, type BikeWithLog, type KeptEntry } from "../../offline/index.ts";
import { ButtonLink } from "../../ui/button-link.tsx";
import { Page } from "../../ui/page.tsx";
import { backToLineUp } from "../../ui/last-line-up.ts";
import { checkPath, patterns } from "../../ui/paths.ts";
import { isStop, StopAdvised } from "../../ui/stop-advised.tsx";
import { CheckTable } from "./checks/check-table.tsx";
import { countedEntries } from "./counted-entries.ts";
import { deliveryHistory } from "./history/delivery-history.ts";
import { Identity } from "./identity.tsx";
import { LogSection } from "./log/log-section.tsx";
import { StrikeSheet } from "./log/strike-sheet.tsx";
import { DoubtfulReadings } from "./now/doubtful-readings.tsx";
import { HoseMaybeOff } from "./now/hose-maybe-off.tsx";
import { WhatToDo } from "./now/what-to-do.tsx";

const DeliveryChart = lazy(() => import("./chart/delivery-chart.tsx"));

/** One bike: what to do now, how its delivery went, and everything written about it. */
export function BikePage({ bike }: { bike: BikeWithLog }) {
  const { record, log } = bike;
  const { bikeId, access, ownerId, details, summary, advice } = record;
  const history = useMemo(() => deliveryHistory(ownerId, countedEntries(log)), [ownerId, log]);
  const [striking, setStriking] = useState<KeptEntry | null>(null);
  const openCheck = useOpenChecks().find((check) => check.bikeId === bikeId);
  const hoseMaybeOff = summary.flags.includes("not-closed-out") || openCheck?.hoseMaybeOff === true;

  return (
    <Page
      title={details.name}
      back={access === "owner" ? { to: patterns.shed, label: "Shed" } : backToLineUp()}
      wide
      action={
        <ButtonLink look="primary" wide to={checkPath(bikeId)}>
          {openCheck ? "Go on with the delivery check" : "Start a delivery check"}
        </ButtonLink>
      }
    >
      <Identity bike={bike} />
      {isStop(advice) && <StopAdvised advice={advice} />}
      {hoseMaybeOff && <HoseMaybeOff bikeId={bikeId} />}
      <DoubtfulReadings bike={bike} onStrike={setStriking} />
      <WhatToDo record={record} history={history} mayRide={!hoseMaybeOff && !isStop(advice)} />
      <div className="mt-4 grid gap-8 min-[900px]:grid-cols-2">
        {history.points.length > 0 && (
          <section aria-labelledby="checks" className="flex min-w-0 flex-col gap-4">
            <h2 id="checks" className="text-2xl">
              Delivery checks
            </h2>
            <Suspense fallback={<div className="h-80" aria-busy />}>
              <DeliveryChart record={record} history={history} />
            </Suspense>
            <CheckTable history={history} meterFormat={details.meterFormat} />
          </section>
        )}
        <LogSection bike={bike} history={history} onStrike={setStriking} />
      </div>
      {striking && <StrikeSheet kept={striking} onClose={() => setStriking(null)} />}
    </Page>
  );
}
