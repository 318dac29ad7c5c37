import { render, screen } from "@testing-library/react";
import { expect, test } from "vitest";
import { bikeDetails } from "../../../shared/logbook/bike-details.ts";
import { lineUpFacts } from "../../../shared/logbook/line-up-facts.ts";
import { summariseLogbook } from "../../../shared/logbook/summarise-logbook.ts";
import { logbook } from "../../../tests/helpers/logbook-in-words.ts";
import { HoursPart } from "./hours-part.tsx";

function showHours(hoursText: string) {
  const { entries } = logbook().bike({ name: "Moss" }).hours(2).hours(12);
  const book = { ownerId: "owner", entries };
  const summary = summariseLogbook(book);
  const record = {
    ...{ bikeId: summary.bikeId, access: "owner" as const, ownerId: "owner", awaited: false },
    ...{ details: bikeDetails(entries), summary, lineUp: lineUpFacts(book, summary) },
    ...{ advice: null, unsent: 0 },
  };
  const value = { at: "2026-04-09T09:00:00.000Z", hoursText, estimatedHours: false };
  render(<HoursPart record={record} value={value} onChange={() => undefined} errors={{}} />);
}

test("asks about hours far beyond what the bike does in that time", () => {
  showHours("320");
  expect(screen.getByText(/^308\sh more than on 21 Mar 2026\. Is that right\?$/)).toBeVisible();
});

test("asks nothing about ordinary hours", () => {
  showHours("32");
  expect(screen.queryByText(/Is that right/)).not.toBeInTheDocument();
});
