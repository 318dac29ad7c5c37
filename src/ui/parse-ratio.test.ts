import { expect, test } from "vitest";
import { parseRatio } from "./parse-ratio.ts";

test.each([
  ["80:1", 80],
  ["1:80", 80],
  ["80", 80],
  ["32,5 : 1", 32.5],
])("reads %j as a fuel:oil ratio", (text, ratio) => {
  expect(parseRatio(text)).toBe(ratio);
});

test.each(["", "80:", ":1", "0:1", "80:1:2", "-80:1", "rich"])("reads no ratio in %j", (text) => {
  expect(parseRatio(text)).toBeNull();
});
