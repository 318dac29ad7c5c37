import { describe, expect, it } from "vitest";
import type { LogEntry } from "../../../../shared/schemas/entry.ts";
import { logbook } from "../../../../tests/helpers/logbook-in-words.ts";
import { entryFacts } from "./entry-facts.ts";

type Book = ReturnType<typeof logbook>;
const factsOf = (write: (book: Book) => Book, format: "decimal" | "hh:mm" = "decimal") =>
  entryFacts(write(logbook()).entries.at(-1)!, format).map((fact) =>
    fact.replaceAll("\u00a0", " "),
  );

describe("entryFacts", () => {
  it("says what a patch changes, null being the usual or not known", () => {
    const sequence = { seconds: 30, rhythm: "steady", nominalMl: null } as const;
    expect(factsOf((book) => book.bike({ name: "Moss", sequence, actDrop: 0.125 }))).toEqual([
      "Name: Moss",
      "Sequence: 30 s, one fast rate",
      "Delivery low from: 12.5 % under the baseline",
    ]);
    expect(
      factsOf((book) => book.bike({ intervalHours: null, hasScreen: null, sequence: null })),
    ).toEqual(["Interval: the usual", "Screen: not known", "Sequence: not known"]);
    expect(factsOf((book) => book.bike({ retired: false }))).toEqual(["Brought back"]);
  });

  it("lists a check's runs, void ones too, and what spoiled it", () => {
    const facts = factsOf((book) =>
      book.check(12, [], {
        runs: [
          { startMl: 0.2, endMl: 3.2, seconds: 30 },
          { startMl: 0, endMl: 1, void: true },
          { deliveredMl: 2.9 },
        ],
        oilTempC: 21,
        spoilers: ["bubbles", "cold-oil"],
        closedOut: false,
      }),
    );
    expect(facts).toEqual([
      "Run 1: 0.20 to 3.20 mL, 30 s",
      "Run 2: 0.00 to 1.00 mL, void",
      "Run 3: 2.90 mL",
      "5 mL, 0.2 mL marks",
      "Oil at 21 °C",
      "Bubbles in the line, cold oil",
      "Not closed out",
    ]);
  });

  it("tells work that starts a new baseline", () => {
    expect(factsOf((book) => book.work(12, ["pump-renewed"], true))).toEqual([
      "Pump renewed",
      "Starts a new baseline",
    ]);
  });

  it("tells a meter change as the meters show it", () => {
    expect(factsOf((book) => book.meter(110.5, 0), "hh:mm")).toEqual([
      "The old meter showed 110:30 h",
      "The new one starts at 0:00 h",
    ]);
    expect(factsOf((book) => book.meter(null, 3))[0]).toBe("The old meter could not be read");
  });

  it("tells what was topped up", () => {
    const topup = { kind: "topup", body: { oilMl: 450, oilFull: true, fuelL: 8.5 } } as LogEntry;
    expect(entryFacts(topup, "decimal")).toEqual(["Oil 450\u00a0mL, filled up", "Fuel 8.5\u00a0L"]);
    const full = { kind: "topup", body: { oilFull: true, fuelFull: true } } as LogEntry;
    expect(entryFacts(full, "decimal")).toEqual(["Oil filled up", "Fuel filled up"]);
  });
});
