import { expect, test } from "vitest";
import { entrySchema } from "../../../../shared/schemas/entry.ts";
import { beginCheck, changeRun, startRun, voidRun } from "./check-draft.ts";
import { checkEntry } from "./check-entry.ts";
import { closeOutItems } from "./check-draft-schema.ts";

const NOW = "2026-03-01T09:00:00.000Z";
const bikeId = "0190a000-0000-7000-8000-000000000001";
const sequence = { seconds: 30, rhythm: "steady", nominalMl: 3 } as const;
const five = { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 };
const begun = beginCheck({
  at: NOW,
  hoursText: "12,5",
  estimatedHours: false,
  syringe: five,
  hoseMaybeOff: false,
});
const bike = { bikeId, sequence };
const asStored = (entry: unknown) =>
  entrySchema.parse({ ...(entry as object), id: "0190a000-0000-7000-9000-000000000001", v: 1 });

test("writes down levels, length and rhythm, and takes commas", () => {
  const draft = changeRun(startRun(begun, 1, NOW), 1, { endText: "2,9", rhythm: "steady" });
  const entry = checkEntry({ ...draft, oilTempText: "18,5" }, bike);
  expect(asStored(entry)).toMatchObject({
    kind: "check",
    at: NOW,
    hours: 12.5,
    body: {
      syringe: five,
      oilTempC: 18.5,
      closedOut: false,
      runs: [{ startMl: 0, endMl: 2.9, seconds: 30, rhythm: "steady" }],
    },
  });
});

test("goes on in one barrel from the end of the run before", () => {
  const draft = changeRun(changeRun(begun, 1, { endText: "1" }), 2, { endText: "2" });
  expect(checkEntry(draft, bike)?.body.runs).toEqual([
    { startMl: 0, endMl: 1 },
    { startMl: 1, endMl: 2 },
  ]);
});

test("keeps a void run with what was read of it, and says in the note why it is void", () => {
  const read = changeRun(begun, 1, { endText: "2.9" });
  const draft = voidRun(startRun(read, 2, NOW), 2, "not-started");
  const entry = asStored(checkEntry({ ...draft, note: " Cold day. " }, bike));
  expect(entry.body).toMatchObject({
    runs: [
      { startMl: 0, endMl: 2.9 },
      { startMl: 2.9, endMl: 2.9, void: true },
    ],
    note: "Cold day.\nRun 2 is void: it did not start.",
  });
});

test("leaves out a run that was begun and not read", () => {
  const draft = startRun(changeRun(begun, 1, { endText: "2.9" }), 2, NOW);
  expect(checkEntry(draft, bike)?.body.runs).toHaveLength(1);
});

test("is closed out when all five are ticked", () => {
  const read = changeRun(begun, 1, { endText: "2.9" });
  expect(checkEntry({ ...read, closeOut: [...closeOutItems] }, bike)?.body.closedOut).toBe(true);
  expect(checkEntry({ ...read, closeOut: ["no-leaks"] }, bike)?.body.closedOut).toBe(false);
});

test("is no entry without hours or without a run", () => {
  expect(checkEntry(begun, bike)).toBeNull();
  expect(checkEntry({ ...changeRun(begun, 1, { endText: "1" }), hoursText: "" }, bike)).toBeNull();
});
