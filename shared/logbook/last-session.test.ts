import { expect, it } from "vitest";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { lastSession } from "./last-session.ts";
import { summariseLogbook } from "./summarise-logbook.ts";

const lengths = ({ entries }: ReturnType<typeof logbook>) =>
  lastSession(summariseLogbook({ ownerId: "owner", entries })).length;

it("is empty where there is no check", () => {
  expect(lengths(logbook().hours(12))).toBe(0);
});

it("holds the checks within an hour of its first", () => {
  const book = logbook().check(10, [3]).check(30, [2.5]);
  expect(lengths(book)).toBe(1);
  expect(lengths(book.check(30.6, [2.6]).check(31, [2.7]))).toBe(3);
  expect(lengths(book.check(31.1, [2.8]))).toBe(1);
});

it("ends with its series", () => {
  const book = logbook().check(10, [3]).work(10, ["pump-renewed"], true).check(10.2, [3]);
  expect(lengths(book)).toBe(1);
});
