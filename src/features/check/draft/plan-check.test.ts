import { expect, test } from "vitest";
import { summariseLogbook } from "../../../../shared/logbook/summarise-logbook.ts";
import { logbook } from "../../../../tests/helpers/logbook-in-words.ts";
import { planCheck } from "./plan-check.ts";
import { planSentence } from "./plan-sentence.ts";

const twoRate = { seconds: 30, rhythm: "alternating", nominalMl: 1 } as const;
const short = { seconds: 30, rhythm: "steady", nominalMl: 3 } as const;
const syringe = (capacityMl: number, graduationMl: number) => ({ capacityMl, graduationMl });
const summary = ({ entries }: ReturnType<typeof logbook>) =>
  summariseLogbook({ ownerId: "owner", entries });
const newBike = summary(logbook().bike({ name: "Bike" }));
const bike = { actDrop: 0.15, atHours: 32 };

test("asks a first check for twice the runs: 1 mL in a 5 mL barrel takes 6", () => {
  const plan = planCheck(newBike, { ...bike, sequence: twoRate }, syringe(5, 0.2));
  expect(plan).toMatchObject({ runs: 6, fills: 2, makesBaseline: true, unfit: null });
  expect(planSentence(plan, syringe(5, 0.2))).toBe(
    "This check makes the baseline that later ones are held to: it gets twice the runs of a usual check. The barrel is emptied once in between.",
  );
});

test("asks a later check for what its baseline calls for", () => {
  const checked = summary(logbook().bike({ name: "Bike" }).check(12, [3, 3]));
  const plan = planCheck(checked, { ...bike, sequence: short }, syringe(5, 0.2));
  expect(plan.makesBaseline).toBe(false);
  expect(plan.runs).toBeGreaterThanOrEqual(1);
  expect(plan.expectedMl).toBeCloseTo(2.99, 2);
});

test("asks for the runs still missing where the last check is to be repeated in the same hour", () => {
  const doubtful = summary(
    logbook().bike({ name: "Bike" }).check(12, [3, 3, 3, 3]).check(32, [2.7]),
  );
  expect(doubtful.action).toBe("repeat");
  const needed = doubtful.checks.at(-1)?.runsToSettle;
  expect(needed).toBeGreaterThan(0);
  const plan = planCheck(doubtful, { ...bike, sequence: short }, syringe(5, 0.2));
  expect(plan).toMatchObject({ settlesLast: true, runs: needed });
  const later = planCheck(doubtful, { ...bike, sequence: short, atHours: 40 }, syringe(5, 0.2));
  expect(later.settlesLast).toBe(false);
});

test("says which barrel would do where this one is too small", () => {
  const plan = planCheck(newBike, { ...bike, sequence: short }, syringe(1, 0.05));
  expect(plan).toMatchObject({ runs: null, unfit: "barrel-too-small" });
  expect(planSentence(plan, syringe(1, 0.05))).toMatch(
    /^This 1 mL barrel is too small for a run of about 3\.00\smL\. A 5 mL syringe with 0.2 mL marks would do\.$/,
  );
});

test("says which barrel would do where these marks are too coarse", () => {
  const plan = planCheck(newBike, { ...bike, sequence: twoRate }, syringe(5, 1));
  expect(plan).toMatchObject({ runs: null, unfit: "marks-too-coarse" });
  expect(planSentence(plan, syringe(5, 1))).toMatch(/A 2.5 mL syringe with 0.1 mL marks would do/);
});

test("plans nothing until something is known of what the pump gives", () => {
  const plan = planCheck(newBike, { ...bike, sequence: null }, syringe(5, 0.2));
  expect(plan).toMatchObject({ expectedMl: null, runs: null, unfit: null });
});

test("takes what the first run gave where nothing else is known: twice the runs at a first check", () => {
  const own = { seconds: 45, rhythm: "steady", nominalMl: null } as const;
  const plan = planCheck(newBike, { ...bike, sequence: own, readMl: 1 }, syringe(5, 0.2));
  expect(plan).toMatchObject({ expectedMl: 1, runs: 6, fills: 2, makesBaseline: true });
  const nothing = planCheck(newBike, { ...bike, sequence: own, readMl: 0 }, syringe(5, 0.2));
  expect(nothing.runs).toBeNull();
});

test("holds to what is known of the pump, whatever the first run gave", () => {
  const plan = planCheck(newBike, { ...bike, sequence: short, readMl: 1 }, syringe(5, 0.2));
  expect(plan.expectedMl).toBe(3);
});
