import { describe, expect, it } from "vitest";
import { bikeDetails } from "../../../../shared/logbook/bike-details.ts";
import { lineUpFacts } from "../../../../shared/logbook/line-up-facts.ts";
import { summariseLogbook } from "../../../../shared/logbook/summarise-logbook.ts";
import type { LogEntry } from "../../../../shared/schemas/entry.ts";
import { bikeEntry, checkEntry, newId } from "../../../../tests/helpers/make-entry.ts";
import type { BikeRecord } from "../../../offline/index.ts";
import { changeRun, startTextOf } from "../draft/check-draft.ts";
import { quickEntry } from "../quick/quick-draft.ts";
import { beginStation, withoutUntouched } from "./station-draft.ts";

const bikeId = newId();
const at = "2026-12-01T09:00:00.000Z";
const fine = { id: "fine", label: "Fine", capacityMl: 5, graduationMl: 0.2 };

function recordOf(...entries: object[]): BikeRecord {
  const logbook = { ownerId: "wren", entries: entries as LogEntry[] };
  const summary = summariseLogbook(logbook);
  return {
    ...{ bikeId, access: "mechanic", ownerId: "wren", awaited: false, unsent: 0, advice: null },
    details: bikeDetails(logbook.entries),
    summary,
    lineUp: lineUpFacts(logbook, summary),
  };
}

const known = recordOf(bikeEntry(bikeId), checkEntry(bikeId, 12, 3));

describe("beginStation", () => {
  it("lays out the runs that the station's syringe needs, emptied where one more does not fit", () => {
    const draft = beginStation(known, fine, at);
    expect(draft).toMatchObject({ hoursText: "12.0", syringe: fine });
    expect(draft.runs.length).toBeGreaterThan(1);
    // Two runs of 3 mL do not fit in 5 mL: each starts anew.
    expect(draft.runs.slice(1).map(({ startText }) => startText)).toEqual(
      draft.runs.slice(1).map(() => ""),
    );
  });

  it("goes on in one barrel where there is room", () => {
    const draft = beginStation(known, { ...fine, capacityMl: 20 }, at);
    const read = changeRun(draft, 1, { endText: "2.9" });
    expect(startTextOf({ ...draft, ...read }, 2, null)).toBe("2.9");
  });

  it("begins with one run where nothing is known of the pump", () => {
    expect(beginStation(recordOf(bikeEntry(bikeId)), fine, at).runs).toHaveLength(1);
  });
});

describe("withoutUntouched", () => {
  it("leaves out the runs that were not done, and keeps one to be filled in", () => {
    const draft = beginStation(known, fine, at);
    const read = { ...draft, ...changeRun(draft, 1, { endText: "2.9" }) };
    const bike = { bikeId, sequence: null };
    expect(withoutUntouched(draft).runs).toHaveLength(1);
    expect(quickEntry(withoutUntouched(draft), bike)).toBeNull();
    expect(quickEntry(withoutUntouched(read), bike)?.body.runs).toEqual([
      { startMl: 0, endMl: 2.9 },
    ]);
  });
});
