import { describe, expect, it } from "vitest";
import { bikeDetails } from "../../../../shared/logbook/bike-details.ts";
import { logbook } from "../../../../tests/helpers/logbook-in-words.ts";
import { detailsFormOf, detailsPatch } from "./details-patch.ts";

const details = bikeDetails(
  logbook().bike({
    name: "Moss",
    year: 2019,
    intervalHours: 25,
    hasScreen: true,
    sequence: { seconds: 30, rhythm: "steady", nominalMl: 3 },
  }).entries,
);
const patch = (change: object) => detailsPatch(details, { ...detailsFormOf(details), ...change });

describe("detailsPatch", () => {
  it("is empty where nothing was changed", () => {
    expect(patch({})).toEqual({});
  });

  it("holds only what was changed", () => {
    expect(patch({ name: "Fern", year: "2020" })).toEqual({ name: "Fern", year: 2020 });
    expect(patch({ screen: "unknown", interval: "" })).toEqual({
      hasScreen: null,
      intervalHours: null,
    });
  });

  it("turns percent into fractions of the baseline, without rounding dust", () => {
    expect(patch({ watchPercent: "7", actPercent: "12,5" })).toEqual({
      watchDrop: 0.07,
      actDrop: 0.125,
    });
  });

  it("keeps a sequence of its own", () => {
    expect(patch({ sequence: "own", ownSeconds: "45", ownMl: "" })).toEqual({
      sequence: { seconds: 45, rhythm: "steady", nominalMl: null },
    });
    expect(patch({ sequence: "unknown" })).toEqual({ sequence: null });
  });

  it("names the field that is no number", () => {
    expect(() => patch({ year: "soon" })).toThrow(
      expect.objectContaining({ errors: { "body.year": "This is not a number." } }),
    );
    expect(patch({ actPercent: "" }).actDrop).toBeNaN();
  });
});
