import { describe, expect, it } from "vitest";
import { summariseLogbook } from "../../shared/logbook/summarise-logbook.ts";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { columnOfSummary } from "./column-of-summary.ts";

const columnOf = ({ entries }: Pick<ReturnType<typeof logbook>, "entries">) =>
  columnOfSummary(summariseLogbook({ ownerId: "owner", entries }), 0.15);
const moss = () => logbook().bike({ name: "Moss" });

describe("columnOfSummary", () => {
  it("draws an empty column where nothing was measured", () =>
    expect(columnOf(moss())).toMatchObject({ readingMl: null }));

  it("draws the first check as its own baseline", () => {
    const { readingMl, baselineMl, limitMl } = columnOf(moss().check(12, [3]));
    expect(readingMl).toBe(baselineMl);
    expect(limitMl).toBeCloseTo(0.85 * baselineMl!, 12);
  });

  it("draws the session that was judged, with the uncertainty of the comparison", () => {
    const { readingMl, uMl, baselineMl } = columnOf(moss().check(12, [3]).check(32, [2.5]));
    // 2.5/3 ± 0.0430, as docs/measurement.md works it.
    expect(readingMl! / baselineMl!).toBeCloseTo(2.5 / 3, 6);
    expect(uMl! / baselineMl!).toBeCloseTo(0.043, 3);
  });

  it("shows nothing of an earlier pump once a new series began", () => {
    const renewed = moss().check(12, [3]).work(20, ["pump-renewed"], true);
    expect(columnOf(renewed)).toMatchObject({ readingMl: null });
  });
});
