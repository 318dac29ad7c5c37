import { describe, expect, it } from "vitest";
import type { ChartPoint } from "./chart-model.ts";
import { pointSentence } from "./point-sentence.ts";
import { trendSentence } from "./trend-sentence.ts";

const plain = (text: string) => text.replaceAll("\u00a0", " ");
const point: ChartPoint = {
  entryId: "a",
  at: "2026-05-25T10:00:00.000Z",
  atHours: 52.5,
  hoursCount: true,
  series: 0,
  perRunMl: 2.5,
  uMl: 0.06,
  ratio: 0.83,
  uRatio: 0.043,
  verdict: "low",
  flags: [],
};

describe("pointSentence", () => {
  it("says what a point shows", () => {
    expect(plain(pointSentence(point, "decimal"))).toBe(
      "52.5 h, 25 May 2026: 83 % ± 9 % of the baseline, 2.50 ± 0.12 mL a run. Delivery low.",
    );
  });

  it("shows the hours as the meter does, and says that a struck check does not count", () => {
    const struck = pointSentence({ ...point, verdict: null }, "hh:mm");
    expect(plain(struck)).toMatch(/^52:30 h, .* Struck, not counted\.$/);
  });
});

describe("trendSentence", () => {
  const trend = {
    perHour: -0.007,
    uPerHour: 0.001,
    reachesLimitAtHours: 155.1,
    range: { low: 134.7, high: 226.3 },
  };

  it("says how fast it falls, and when it may meet the limit", () => {
    expect(plain(trendSentence(trend, "decimal"))).toBe(
      "Delivery falls by 0.07 mL a run in 10 h: the trend meets the limit at about 155.1 h, between 134.7 h and 226.3 h.",
    );
  });

  it("claims nothing that cannot be told", () => {
    expect(trendSentence({ ...trend, reachesLimitAtHours: null, range: null }, "decimal")).toMatch(
      /^No decline/,
    );
    expect(trendSentence(null, "decimal")).toMatch(/^Three checks/);
  });
});
