import { describe, expect, it } from "vitest";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { struckLowChecks } from "./struck-low-checks.ts";

type Book = ReturnType<typeof logbook>;
const found = ({ entries }: Book) => struckLowChecks({ ownerId: "owner", entries });

/** Adds a check and strikes it; answers its id. */
function strikeCheck(book: Book, hours: number, endMl: number): string {
  const id = book.check(hours, [endMl]).lastId;
  book.strike(id);
  return id;
}

// One run in a 5 mL barrel: 2.5 of 3.0 mL is low, 2.9 holds (tests/helpers/golden-logbooks.ts).
describe("a struck check", () => {
  it("is found where it would have been low", () => {
    const book = logbook().bike({ name: "Moss" }).check(12, [3]);
    const low = strikeCheck(book, 32, 2.5);
    expect(found(book)).toEqual([low]);
  });

  it("is not where it would have held, or where it stands", () => {
    const book = logbook().check(12, [3]).check(32, [2.5]);
    strikeCheck(book, 33, 2.9);
    expect(found(book)).toEqual([]);
  });

  it("is found whatever was measured after it, in the same session too", () => {
    const book = logbook().check(12, [3]);
    const low = strikeCheck(book, 32, 2.5);
    expect(found(book.check(32.2, [3, 3, 3]).check(52, [3]))).toEqual([low]);
  });

  it("is found beside other struck checks, which judge nothing", () => {
    const book = logbook();
    strikeCheck(book, 10, 1);
    book.check(12, [3]);
    const low = strikeCheck(book, 32, 2.5);
    expect(found(book)).toEqual([low]);
  });

  it("has nothing to be held to before the first baseline, or after the pump was renewed", () => {
    const book = logbook();
    strikeCheck(book, 10, 2.5);
    book.check(12, [3]).work(20, ["pump-renewed"], true);
    strikeCheck(book, 21, 2.5);
    expect(found(book)).toEqual([]);
  });

  it("is held to the baseline before where a new series did not renew the pump", () => {
    const book = logbook().check(12, [3]).work(20, ["screen-cleaned"], true);
    const low = strikeCheck(book, 21, 2.5);
    expect(found(book)).toEqual([low]);
  });

  it("that delivered nothing is low by itself", () => {
    const book = logbook();
    const low = strikeCheck(book, 10, 0);
    expect(found(book)).toEqual([low]);
  });

  it("that could not be counted is not", () => {
    const book = logbook().check(12, [3]);
    book.check(32, [1], { runs: [{ startMl: 0, endMl: 1, void: true }] });
    expect(found(book.strike(book.lastId))).toEqual([]);
  });
});

it("answers the same whatever order the entries come in", () => {
  const book = logbook().check(12, [3]);
  const low = strikeCheck(book, 32, 2.5);
  const { entries } = book.check(52, [3]);
  expect(struckLowChecks({ ownerId: "owner", entries: entries.toReversed() })).toEqual([low]);
});
