import { render, screen } from "@testing-library/react";
import { expect, test } from "vitest";
import { bikeDetails } from "../../../../shared/logbook/bike-details.ts";
import { summariseLogbook } from "../../../../shared/logbook/summarise-logbook.ts";
import type { LogEntryOf } from "../../../../shared/schemas/entry.ts";
import { logbook } from "../../../../tests/helpers/logbook-in-words.ts";
import { Judgement } from "./judgement.tsx";

test("says of a new series' first check that reads high that it does, not that it gave little", () => {
  const book = logbook().bike({ name: "Bike" }).check(12, [3]);
  const { entries } = book.work(20, ["screen-cleaned"], true).check(21, [4.6]);
  const check = summariseLogbook({ ownerId: "owner", entries }).checks.at(-1)!;
  const { body } = entries.at(-1) as LogEntryOf<"check">;
  render(
    <Judgement
      details={bikeDetails(entries)}
      check={check}
      flags={check.flags}
      body={body}
      hoseMaybeOff={false}
    />,
  );
  expect(screen.getByText("Repeat before riding")).toBeInTheDocument();
  expect(screen.getByText(/reads far above the baseline before/)).toBeInTheDocument();
  expect(screen.queryByText(/gave (so )?little/)).not.toBeInTheDocument();
});
