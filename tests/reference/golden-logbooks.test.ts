import { describe, expect, it } from "vitest";
import { summariseLogbook } from "../../shared/logbook/summarise-logbook.ts";
import { summarySchema } from "../../shared/schemas/summary.ts";
import { goldenLogbooks, goldenPerRunMl } from "../helpers/golden-logbooks.ts";

describe("a logbook worked by hand", () => {
  it.each(goldenLogbooks)("$title", ({ entries, expected, pLow }) => {
    const summary = summariseLogbook({ ownerId: "owner", entries });
    expect(summary).toMatchObject(expected);
    expect(summarySchema.parse(summary)).toEqual(summary);
    if (pLow !== undefined) expect(Math.abs(summary.pLow! - pLow)).toBeLessThan(0.001);
  });

  it("gives volumes at 15 °C", () => {
    const [first] = goldenLogbooks;
    const summary = summariseLogbook({ ownerId: "owner", entries: first!.entries });
    expect(summary.checks[0]?.perRunMl).toBeCloseTo(goldenPerRunMl, 4);
    expect(summary.series[0]?.baseline?.uMl).toBeCloseTo(Math.sqrt(0.010423) * 0.99639, 4);
  });
});
