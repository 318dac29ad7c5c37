import { describe, expect, it } from "vitest";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import type { BikePatch } from "../schemas/entry.ts";
import { bikeDetails } from "./bike-details.ts";

const limits = (...patches: BikePatch[]) => {
  const book = logbook();
  for (const patch of patches) book.bike(patch);
  const { watchDrop, actDrop } = bikeDetails(book.entries);
  return { watchDrop, actDrop };
};

describe("a bike's limits", () => {
  it("are the usual ones where it has none, or no longer", () => {
    expect(limits({ name: "Moss" })).toEqual({ watchDrop: 0.08, actDrop: 0.15 });
    expect(limits({ watchDrop: 0.05, actDrop: 0.1 }, { watchDrop: null, actDrop: null })).toEqual({
      watchDrop: 0.08,
      actDrop: 0.15,
    });
  });

  it("may be tighter, each by itself", () => {
    expect(limits({ watchDrop: 0.05 })).toEqual({ watchDrop: 0.05, actDrop: 0.15 });
    expect(limits({ actDrop: 0.1 })).toEqual({ watchDrop: 0.08, actDrop: 0.1 });
  });

  it("stop no later than usual", () => {
    expect(limits({ actDrop: 0.3 })).toEqual({ watchDrop: 0.08, actDrop: 0.15 });
  });

  it("watch no further than they stop", () => {
    expect(limits({ actDrop: 0.05 })).toEqual({ watchDrop: 0.05, actDrop: 0.05 });
    expect(limits({ watchDrop: 0.07, actDrop: 0.05 })).toEqual({ watchDrop: 0.05, actDrop: 0.05 });
  });
});
