import { describe, expect, it } from "vitest";
import { summariseLogbook } from "../../../../shared/logbook/summarise-logbook.ts";
import { logbook } from "../../../../tests/helpers/logbook-in-words.ts";
import { deliveryHistory } from "../history/delivery-history.ts";
import { chartModel } from "./chart-model.ts";

function model({ entries }: Pick<ReturnType<typeof logbook>, "entries">) {
  const { trend } = summariseLogbook({ ownerId: "owner", entries });
  return chartModel(deliveryHistory("owner", entries), trend);
}
const moss = () => logbook().bike({ name: "Moss" });

/** Six runs each leave little doubt of the decline. */
const declining = () =>
  [3, 2.9, 2.8, 2.7].reduce(
    (book, ml, i) => book.check(10 + 20 * i, Array<number>(6).fill(ml)),
    moss(),
  );

describe("chartModel", () => {
  it("draws every check with a place, and both limits", () => {
    const { points, watchLimit, actLimit, undrawn, ratios } = model(
      moss().check(12, [3]).check(32, [2.5]),
    );
    expect(points.map(({ atHours }) => atHours)).toEqual([12, 32]);
    expect([watchLimit, actLimit]).toEqual([0.92, 0.85]);
    expect(undrawn).toBe(0);
    expect(ratios[0]).toBeLessThan(0.8333 - 2 * 0.043);
  });

  it("leaves out a check whose hours are doubted, and counts it", () => {
    const { points, undrawn, hours } = model(moss().check(12, [3]).check(320, [2.95]));
    expect(points).toHaveLength(1);
    expect(undrawn).toBe(1);
    expect(hours[1]).toBeLessThan(30);
  });

  it("never lets a struck check stretch the scales", () => {
    const book = moss().check(12, [3]).check(22, [0.2]);
    const { points, ratios } = model(book.strike(book.lastId).check(32, [2.95]));
    expect(points.map(({ verdict }) => verdict)).toEqual(["settling", null, "holding"]);
    expect(ratios[0]).toBeGreaterThan(0.7);
  });

  it("marks where each later series began, and why", () => {
    const { breaks } = model(
      moss().check(10, [3]).work(30, ["pump-renewed", "oil-changed"], true).check(31, [3.2]),
    );
    expect(breaks).toEqual([{ atHours: 30, cause: "Pump renewed, oil changed" }]);
  });

  it("draws the trend of a declining pump to where it meets the limit", () => {
    const { trend, hours, actLimit } = model(declining());
    // A straight line of 0.1 mL in 20 h, 3.3 % of the baseline, meets 85 % after 90 h.
    expect(trend?.from.atHours).toBe(10);
    expect(trend?.from.ratio).toBeCloseTo(1, 2);
    expect(trend?.to.atHours).toBeCloseTo(100, 0);
    expect(trend?.to.ratio).toBeCloseTo(actLimit, 2);
    expect(trend?.range?.low).toBeLessThan(100);
    expect(hours[1]).toBeGreaterThan(100);
  });

  it("draws no trend that cannot be told from scatter", () => {
    expect(model(moss().check(10, [3]).check(30, [2.98]).check(50, [3])).trend).toBeNull();
  });

  it("has room for a first check", () => {
    const { hours } = model(moss().check(12, [3]));
    expect(hours[0]).toBeLessThan(12);
    expect(hours[1] - hours[0]).toBeGreaterThanOrEqual(10);
  });
});
