import { expect, it } from "vitest";
import { isFoundBy } from "./line-up-views.ts";

const moss = { name: "Moss", owner: "Wren Hollow", tag: "7KMX4P" };

it.each([
  ["", true],
  ["mos", true],
  ["hollow", true],
  [" 7km x4p ", true],
  ["7KM-", true],
  ["x4p", false],
  ["fern", false],
])("finds a bike by its name, its owner or the front of its tag: %j", (typed, found) => {
  expect(isFoundBy(moss, typed)).toBe(found);
});
