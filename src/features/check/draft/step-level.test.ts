import { expect, test } from "vitest";
import { stepLevel } from "./step-level.ts";

test.each([
  [2.9, 0.1, 1, 3],
  [2.93, 0.1, 1, 3],
  [2.93, 0.1, -1, 2.9],
  [0.3, 0.1, -1, 0.2],
  [2.9, 0.25, 1, 3],
  [3, 0.25, -1, 2.75],
  [0, 0.1, -1, 0],
] as const)("steps from %d by %d towards %d to %d", (level, step, direction, next) => {
  expect(stepLevel(level, step, direction)).toBe(next);
});
