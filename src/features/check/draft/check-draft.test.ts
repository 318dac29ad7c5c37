import { expect, test } from "vitest";
import {
  abandoned,
  beginCheck,
  changeRun,
  chooseSpoilers,
  countedNumber,
  isClosedOut,
  mayAddRun,
  meanReadMl,
  nextRun,
  proposeStart,
  startRun,
  startTextOf,
  voidRun,
} from "./check-draft.ts";
import { checkDraftSchema, closeOutItems } from "./check-draft-schema.ts";

const NOW = "2026-03-01T09:00:00.000Z";
const five = { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 };
const begun = beginCheck({
  at: NOW,
  hoursText: "12.0",
  estimatedHours: false,
  syringe: five,
  hoseMaybeOff: false,
});
const withEnds = (...ends: string[]) =>
  ends.reduce((draft, endText, index) => changeRun(draft, index + 1, { endText }), begun);

test("begins with no run, and nothing to warn of", () => {
  expect(begun).toMatchObject({ runs: [], closeOut: [], hoseMaybeOff: false });
  expect(nextRun(begun)).toBe(1);
});

test("survives being stored and read back", () => {
  const draft = voidRun(startRun(withEnds("1.0"), 2, NOW), 2, "doubled");
  expect(checkDraftSchema.parse(JSON.parse(JSON.stringify(draft)))).toEqual(draft);
});

test("warns of the hose from the first run on, and still when the check is given up", () => {
  const draft = startRun(begun, 1, NOW);
  expect(draft.hoseMaybeOff).toBe(true);
  expect(abandoned(draft)).toEqual({ hoseMaybeOff: true });
  expect(checkDraftSchema.safeParse(abandoned(draft)).success).toBe(false);
  expect(abandoned(begun)).toBeNull();
});

test("proposes the 0 mark for the first run, and the last end for those after", () => {
  const draft = withEnds("1,0", "2.0");
  expect(startTextOf(begun, 1, 1)).toBe("0");
  expect(startTextOf(draft, 2, 1)).toBe("1,0");
  expect(proposeStart(draft, 3, 1)).toBe("2.0");
});

test("proposes no start where the next run would not fit the barrel", () => {
  expect(proposeStart(withEnds("2.9"), 2, 2.9)).toBe("");
  expect(proposeStart(withEnds("2.9"), 2, 1.85)).toBe("2.9");
});

test("goes on from the last end as it is put right, once the run is begun", () => {
  const draft = startRun(withEnds("2.9"), 2, NOW);
  expect(startTextOf(changeRun(draft, 1, { endText: "3.0" }), 2, 3)).toBe("3.0");
});

test("keeps a start that was typed", () => {
  const draft = changeRun(withEnds("2.9"), 2, { startText: "0.2" });
  expect(startTextOf(changeRun(draft, 1, { endText: "3.0" }), 2, 3)).toBe("0.2");
});

test("starts where a run that did not start would have, and asks anew after other void runs", () => {
  expect(startTextOf(voidRun(withEnds("1.0"), 2, "not-started"), 3, 1)).toBe("1.0");
  expect(startTextOf(voidRun(withEnds("1.0"), 2, "interrupted"), 3, 1)).toBe("");
});

test("counts neither void runs nor unread ones", () => {
  const draft = startRun(voidRun(withEnds("1.0"), 2, "interrupted"), 3, NOW);
  expect(countedNumber(draft, 3)).toBe(2);
  expect(nextRun(draft)).toBe(3);
  expect(meanReadMl(draft)).toBe(1);
});

test("takes a void run back", () => {
  const draft = voidRun(voidRun(withEnds("1.0"), 1, "doubled"), 1, null);
  expect(draft.runs[0]).toMatchObject({ voided: null, endText: "1.0" });
});

test("adds runs up to what a check holds", () => {
  expect(mayAddRun(withEnds(...Array.from({ length: 29 }, () => "1")))).toBe(true);
  expect(mayAddRun(withEnds(...Array.from({ length: 30 }, () => "1")))).toBe(false);
});

test("keeps the spoilers of one step when another step's are ticked", () => {
  const first = chooseSpoilers(begun, ["bubbles", "cold-oil"], ["bubbles"]);
  const both = chooseSpoilers(first, ["hose-in-oil"], ["hose-in-oil"]);
  expect(both.spoilers).toEqual(["bubbles", "hose-in-oil"]);
  expect(chooseSpoilers(both, ["bubbles", "cold-oil"], []).spoilers).toEqual(["hose-in-oil"]);
});

test("is closed out when all is ticked", () => {
  expect(isClosedOut(closeOutItems)).toBe(true);
  expect(isClosedOut(closeOutItems.slice(1))).toBe(false);
});
