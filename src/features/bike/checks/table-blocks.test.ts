import { describe, expect, it } from "vitest";
import { logbook } from "../../../../tests/helpers/logbook-in-words.ts";
import { deliveryHistory } from "../history/delivery-history.ts";
import { tableBlocks } from "./table-blocks.ts";

const { entries } = logbook()
  .bike({ name: "Moss" })
  .check(10, [3])
  .check(30, [2.95])
  .work(40, ["pump-renewed"], true)
  .check(41, [3.2])
  .check(60, [3.1])
  .work(70, ["controller-updated"], true);
const history = deliveryHistory("owner", entries);
const shown = (most: number) =>
  tableBlocks(history, most).map(({ series, points }) => [
    series.cause,
    ...points.map(({ atHours }) => atHours),
  ]);

describe("tableBlocks", () => {
  it("puts the newest check first, under what began its series", () => {
    expect(shown(Infinity)).toEqual([
      ["Controller updated"],
      ["Pump renewed", 60, 41],
      ["First check", 30, 10],
    ]);
  });

  it("keeps the newest where there is no room for all", () => {
    expect(shown(3)).toEqual([
      ["Controller updated"],
      ["Pump renewed", 60, 41],
      ["First check", 30],
    ]);
    expect(shown(1)).toEqual([["Controller updated"], ["Pump renewed", 60]]);
  });
});
