import { describe, expect, it } from "vitest";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { lineUpFactsSchema, lineUpOrder } from "../schemas/club.ts";
import { bikeTag } from "./bike-tag.ts";
import { lineUpFacts } from "./line-up-facts.ts";
import { summariseLogbook } from "./summarise-logbook.ts";

const facts = ({ entries }: Pick<ReturnType<typeof logbook>, "entries">) => {
  const book = { ownerId: "owner", entries };
  return lineUpFactsSchema.parse(lineUpFacts(book, summariseLogbook(book)));
};
const moss = () => logbook().bike({ name: "Moss" });

// One run in a 5 mL barrel, of a baseline of 3.0 mL (tests/helpers/golden-logbooks.ts): 2.5 is low,
// 2.6 asks for a repeat; four runs of 2.7 are dropping and surely not low; 20 h between checks.
describe("a bike's place", () => {
  const bikes = {
    stop: moss().check(12, [3]).check(32, [2.5]),
    repeat: moss().check(12, [3]).check(32, [2.6]),
    overdue: moss().check(12, [3, 3, 3, 3]).hours(33),
    dropping: moss()
      .check(12, [3, 3, 3, 3, 3, 3, 3, 3])
      .check(32, [2.73, 2.73, 2.73, 2.73, 2.73, 2.73, 2.73, 2.73]),
    "due-soon": moss().check(12, [3, 3, 3, 3]).hours(27),
    settling: moss().check(12, [3]).hours(13),
    holding: moss().check(12, [3, 3, 3, 3]).check(32, [3, 3, 3, 3]).hours(33),
    retired: moss().check(12, [3]).check(32, [2.5]).bike({ retired: true }),
  };

  it.each(lineUpOrder.map((place) => ({ place })))("is $place", ({ place }) => {
    expect(facts(bikes[place]).place).toBe(place);
  });

  it("is settling where there is no check at all, though one is due", () => {
    expect(facts(moss().hours(5))).toMatchObject({
      place: "settling",
      verdict: "none",
      ratio: null,
    });
  });

  it("is stop for as long as a stop written by hand stands", () => {
    const book = moss().check(12, [3]).note("Hose is soft", "stop");
    expect(facts(book)).toMatchObject({ place: "stop", action: "ride", stopAdvised: true });
    expect(facts(book.note("Renewed", "ride"))).toMatchObject({
      place: "settling",
      stopAdvised: false,
    });
  });
});

describe("a bike's facts", () => {
  it("say what a mechanic looks for", () => {
    const book = moss()
      .bike({ actDrop: 0.12 })
      .work(10, ["pump-renewed"], true)
      .check(12, [3])
      .check(32, [2.9], { closedOut: false });
    const last = book.entries.at(-1)!;
    expect(facts(book)).toMatchObject({
      name: "Moss",
      tag: bikeTag(last.bikeId),
      hoursNow: 32,
      pumpHours: 22,
      lastCheckAt: last.at,
      limitsTightened: true,
      hoseMaybeOff: true,
      lowCheckStruck: false,
    });
    expect(facts(book).ratio).toBeCloseTo(2.9 / 3, 9);
  });

  it("say that a low check was struck", () => {
    const book = moss().check(12, [3]).check(32, [2.5]);
    expect(facts(book.strike(book.lastId))).toMatchObject({
      lowCheckStruck: true,
      place: "settling",
    });
  });

  it("give no ratio of the pump that was there before", () => {
    const book = moss().check(12, [3]).check(32, [2.5]).work(33, ["pump-renewed"], true);
    expect(facts(book)).toMatchObject({ verdict: "none", ratio: null });
  });

  // By hand: 3.0, 2.9 and 2.8 mL at 0, 10 and 20 h fall by 0.01 mL/h, a third of a percent of 3.0.
  it("give the trend as a fraction of the baseline", () => {
    const book = moss().check(10, [3]).check(20, [2.9]).check(30, [2.8]);
    expect(facts(book).trendPerHour).toBeCloseTo(-0.01 / 3, 3);
  });
});
