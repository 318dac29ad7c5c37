import { expect, test } from "vitest";
import { runStatistics, uncertaintyMl, withOneMoreRun } from "./one-more-run.ts";

const syringe = { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 };
const body = {
  syringe,
  closedOut: false,
  runs: [
    { startMl: 0, endMl: 1 },
    { startMl: 1, endMl: 2.2 },
    { startMl: 2.2, endMl: 2.2, void: true },
  ],
};

test("says the mean of the counted runs, and how far they lie apart", () => {
  const statistics = runStatistics(body);
  expect(statistics?.count).toBe(2);
  expect(statistics?.meanMl).toBeCloseTo(1.1);
  expect(statistics?.spreadMl).toBeCloseTo(0.2);
  expect(runStatistics({ ...body, runs: [] })).toBeNull();
});

test("puts one more run on top of the last where there is room, else in an emptied barrel", () => {
  const onTop = { ...body, runs: [{ startMl: 0, endMl: 1 }] };
  expect(withOneMoreRun(onTop).runs.at(-1)).toEqual({ startMl: 1, endMl: 2 });
  const full = { ...body, runs: [{ startMl: 0, endMl: 3 }] };
  expect(withOneMoreRun(full).runs.at(-1)).toEqual({ startMl: 0, endMl: 3 });
});

test("narrows the uncertainty with one more run", () => {
  const now = uncertaintyMl(body, null) ?? NaN;
  expect(uncertaintyMl(withOneMoreRun(body), null)).toBeLessThan(now);
});
