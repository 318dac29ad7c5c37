import { Route, Routes } from "react-router-dom";
import { BikeDetailsPage } from "./details/bike-details-page.tsx";
import { LogEntryPage } from "./forms/log-entry-page.tsx";
import { BikePage } from "./bike-page.tsx";
import { NoPageHere } from "./no-page-here.tsx";
import { WithBike } from "./with-bike.tsx";

/** The screens of one bike, but for its delivery check. */
export default function BikeRoutes() {
  return (
    <WithBike>
      {(bike) => (
        <Routes>
          <Route index element={<BikePage bike={bike} />} />
          <Route path="log/:kind" element={<LogEntryPage bike={bike} />} />
          <Route path="details" element={<BikeDetailsPage bike={bike} />} />
          <Route path="*" element={<NoPageHere record={bike.record} />} />
        </Routes>
      )}
    </WithBike>
  );
}
