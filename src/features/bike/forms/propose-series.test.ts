import { describe, expect, it } from "vitest";
import { workItems } from "../../../../shared/schemas/entry.ts";
import { proposesSeries, seriesAdvice } from "./propose-series.ts";

describe("proposesSeries", () => {
  it("proposes a new baseline only where the delivery legitimately changes", () => {
    expect(workItems.filter((item) => proposesSeries([item]))).toEqual([
      "pump-renewed",
      "controller-updated",
    ]);
    expect(proposesSeries(["hose-renewed", "pump-renewed"])).toBe(true);
    expect(proposesSeries([])).toBe(false);
  });

  it("says why", () => {
    expect(seriesAdvice(["pump-renewed"])).toMatch(/becomes the new baseline/);
    expect(seriesAdvice(["screen-cleaned"])).toMatch(/the old baseline stays/);
  });
});
