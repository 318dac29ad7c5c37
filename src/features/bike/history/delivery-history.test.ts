import { describe, expect, it } from "vitest";
import { logbook } from "../../../../tests/helpers/logbook-in-words.ts";
import { deliveryHistory } from "./delivery-history.ts";

const history = (book: { entries: Parameters<typeof deliveryHistory>[1] }) =>
  deliveryHistory("owner", book.entries);
const moss = () => logbook().bike({ name: "Moss" });

describe("deliveryHistory", () => {
  it("gives each check as a fraction of its baseline, the baseline by its own reading alone", () => {
    const { points } = history(moss().check(12, [3]).check(32, [2.5]));
    // 2.5/3 and its uncertainty as docs/measurement.md works them: 0.833 ± 0.0430.
    expect(points.map(({ ratio }) => ratio)).toEqual([1, expect.closeTo(0.8333, 4)]);
    expect(points[1]?.uRatio).toBeCloseTo(0.043, 3);
    // u(3.0 mL) = √0.010423 = 0.1021 mL, of 3 mL.
    expect(points[0]?.uRatio).toBeCloseTo(0.034, 3);
    expect(points.map(({ verdict }) => verdict)).toEqual(["settling", "low"]);
  });

  it("measures a struck check without judging it", () => {
    const book = moss().check(12, [3]).check(32, [1.2]);
    const { points, lastSession } = history(book.strike(book.lastId));
    expect(points).toMatchObject([{ verdict: "settling" }, { verdict: null, atHours: 32 }]);
    expect(points[1]?.ratio).toBeCloseTo(0.4, 4);
    expect(lastSession?.perRunMl).toBeCloseTo(3 * 0.99639, 4);
  });

  it("puts a struck check of an earlier meter at its lifetime hours", () => {
    const book = moss().check(100, [3]).meter(110.5, 0).check(5, [2.9]);
    const { points } = history(book.strike(book.lastId));
    expect(points.map(({ atHours }) => atHours)).toEqual([100, 115.5]);
  });

  it("names what began each series and holds it to its own baseline", () => {
    const { series, points } = history(
      moss().check(10, [3]).work(30, ["pump-renewed"], true).check(31, [3.6]),
    );
    expect(series).toMatchObject([
      { cause: "First check", atHours: 10, holdsToEarlier: false },
      { cause: "Pump renewed", atHours: 30, holdsToEarlier: false },
    ]);
    expect(points.map(({ ratio, series }) => [series, ratio])).toEqual([
      [0, 1],
      [1, 1],
    ]);
  });

  it("holds a series that hides a fault to the baseline before it", () => {
    const { series, points, lastSession } = history(
      moss().check(10, [3]).work(30, ["screen-cleaned"], true).check(30, [2.5]),
    );
    expect(series[1]).toMatchObject({ cause: "Screen or filter cleaned", holdsToEarlier: true });
    expect(points[1]?.ratio).toBeCloseTo(0.8333, 4);
    expect(lastSession?.baseline?.perRunMl).toBeCloseTo(3 * 0.99639, 4);
  });

  it("marks checks whose hours are doubted", () => {
    const { points } = history(moss().check(12, [3]).check(320, [2.95]));
    expect(points.map(({ hoursCount }) => hoursCount)).toEqual([true, false]);
  });

  it("has no last session where the present series has no check yet", () => {
    const { lastSession } = history(moss().check(10, [3]).work(30, ["pump-renewed"], true));
    expect(lastSession).toBeNull();
  });
});
