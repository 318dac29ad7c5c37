import { expect, test } from "vitest";
import { changeRun } from "../draft/check-draft.ts";
import { addRun, beginQuick, quickDraftSchema, quickEntry, quickErrors } from "./quick-draft.ts";

const bike = { bikeId: "0190a000-0000-7000-8000-000000000001", sequence: null };
const five = { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 };
const begun = beginQuick({
  at: "2026-03-01T09:00:00.000Z",
  hoursText: "12.0",
  estimatedHours: false,
  syringe: five,
});
const withEnd = (draft: typeof begun, n: number, endText: string) => ({
  ...draft,
  ...changeRun(draft, n, { endText }),
});

test("needs one number besides the hours", () => {
  expect(quickErrors(begun)).toEqual({ "runs.0.end": "Set the level the oil stands at now." });
  expect(quickEntry(withEnd(begun, 1, "3,0"), bike)?.body.runs).toEqual([{ startMl: 0, endMl: 3 }]);
});

test("survives being stored and read back", () => {
  expect(quickDraftSchema.parse(JSON.parse(JSON.stringify(begun)))).toEqual(begun);
});

test("puts a run on top of the one before, or asks for its start anew", () => {
  const first = withEnd(begun, 1, "1.0");
  const onTop = withEnd(addRun(first, false), 2, "2.1");
  expect(quickEntry(onTop, bike)?.body.runs[1]).toEqual({ startMl: 1, endMl: 2.1 });
  const anew = withEnd(addRun(first, true), 2, "2.1");
  expect(quickErrors(anew)).toEqual({ "runs.1.start": "Type the level before the run, in mL." });
});

test("takes volumes alone, as an old note has them", () => {
  const note = { ...begun, known: "volumes" as const, syringe: null, volumes: ["2,8", "3"] };
  expect(quickEntry(note, bike)?.body).toMatchObject({
    syringe: null,
    runs: [{ deliveredMl: 2.8 }, { deliveredMl: 3 }],
  });
  expect(quickErrors({ ...note, volumes: ["x"] })).toEqual({
    "volumes.0": "Type what the run gave, in mL.",
  });
});

test.each([
  ["hoursText", "", "hours", "Type the engine hours as the meter shows them."],
  ["hoursText", "-3", "hours", "Engine hours cannot be negative."],
  ["oilTempText", "warm", "oilTemp", "Type the oil’s temperature in figures, or leave it empty."],
] as const)("says what is wrong with %s %j", (field, text, name, sentence) => {
  expect(quickErrors({ ...withEnd(begun, 1, "3"), [field]: text })).toEqual({ [name]: sentence });
});

test.each([
  ["1", "0.5", "The end level is below the start level."],
  ["0", "5.6", "This level is far beyond the 5 mL barrel."],
])("says what is wrong with a run from %s to %s", (startText, endText, sentence) => {
  const draft = { ...begun, ...changeRun(begun, 1, { startText, endText }) };
  expect(quickErrors(draft)).toEqual({ "runs.0.end": sentence });
  expect(quickEntry(draft, bike)).toBeNull();
});
