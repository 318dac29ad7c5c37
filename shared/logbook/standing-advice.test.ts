import { expect, it } from "vitest";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { standingAdvice } from "./standing-advice.ts";
import { standingEntries } from "./standing-entries.ts";

const standing = ({ entries }: ReturnType<typeof logbook>) =>
  standingAdvice(standingEntries("owner", entries).standing)?.body ?? null;

it("is none where nobody advised anything", () => {
  expect(standing(logbook().note("Chain oiled").check(12, [3]))).toBeNull();
});

it("a stop stands, whatever is measured or noted after it", () => {
  const book = logbook().check(12, [3]).note("Hose is soft", "stop").check(12.5, [3]).note("Oiled");
  expect(standing(book)).toEqual({ text: "Hose is soft", advice: "stop" });
});

it("a later note with advice lifts it", () => {
  for (const advice of ["ride", "repeat"] as const)
    expect(standing(logbook().note("Hose", "stop").note("Renewed", advice))).toMatchObject({
      advice,
    });
});

it("a struck note advises nothing", () => {
  const book = logbook().note("Hose is soft", "stop");
  expect(standing(book.strike(book.lastId))).toBeNull();
});
