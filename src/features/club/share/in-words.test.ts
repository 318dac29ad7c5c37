import { expect, it } from "vitest";
import { inWords } from "./in-words.ts";

it.each([
  [[], ""],
  [["Ann"], "Ann"],
  [["Ann", "Bob"], "Ann and Bob"],
  [["Ann", "Bob", "Cleo"], "Ann, Bob and Cleo"],
])("says names as a sentence does: %j", (names, words) => {
  expect(inWords(names)).toBe(words);
});
