import { expect } from "vitest";
import type { LogEntry } from "../../shared/schemas/entry.ts";
import { logbook, syringe5 } from "./logbook-in-words.ts";

/**
 * Logbooks whose summaries were worked by hand from docs/measurement.md, so that a fault which phone
 * and server share cannot hide. One run each in a 5 mL barrel with 0.2 mL marks unless said
 * otherwise; such a check of V mL has
 *   u² = 0.2²/6 (marks) + (0.02·V)² (repeatability) + (0.0041663·V)² (oil taken as 20 °C ± 10),
 * which is 0.010423 for 3.0 mL, 0.009275 for 2.5 mL and 0.010177 for 2.9 mL, before everything is
 * brought to 15 °C by the factor 0.99639.
 */
export interface GoldenLogbook {
  title: string;
  entries: LogEntry[];
  expected: object;
  pLow?: number;
}

const TO_15C = 0.99639;
const thirtySteady = { seconds: 30, rhythm: "steady", nominalMl: null } as const;
const syringe10 = { id: "ten", label: "10 mL", capacityMl: 10, graduationMl: 0.5 };

const moss = () => logbook().bike({ name: "Moss" });

function struckCheck() {
  const book = moss().check(12, [3]).check(32, [1.2]);
  return book.strike(book.lastId, "Read from the wrong end").entries;
}

const four = (ml: number) => [ml, ml, ml, ml];
const near = (value: number) => expect.closeTo(value, 6) as number;
const newSyringe5 = { ...syringe5, id: "five-new" };

/**
 * Sessions of four runs, a fill a run, each with u² = 0.04/24 + (0.02·V)²/4 + (0.0041663·V)²:
 * 0.05199, 0.05159, 0.05120 and 0.05081 mL at 15 °C for 3.00, 2.94, 2.88 and 2.82. At 10, 30, 50 and
 * 70 h their line falls by 0.003·0.99639 mL an hour, u = 0.0514/√(30² + 10² + 10² + 30²) about. It
 * meets 0.85·3.00 = 2.55 at 10 + 0.45/0.003 = 160 h. The last digits and the roots of Fieller's
 * equation are numpy's, by inverting the normal equations.
 */
const decline = (book: ReturnType<typeof logbook>) =>
  book.check(10, four(3)).check(30, four(2.94)).check(50, four(2.88)).check(70, four(2.82));
const declineTrend = {
  perHour: near(-0.002989164),
  uPerHour: near(0.001149268),
  reachesLimitAtHours: near(160),
  range: { low: near(112.342842), high: near(367.153037) },
};

const trendLogbooks: GoldenLogbook[] = [
  {
    title: "checks a declining pump halfway to where it may be low at the earliest",
    // 70 + (112.343 − 70)/2 = 91.171, before the interval's 110. r 0.94, u 0.0236: Φ(−3.8).
    entries: decline(logbook().bike({ name: "Moss", hasScreen: true })).entries,
    expected: {
      verdict: "holding",
      action: "ride",
      trend: declineTrend,
      due: {
        atHours: near(91.171421),
        inHours: near(21.171421),
        reason:
          "Delivery is declining: checked again 21.2 h after the last check, halfway to where it may be low.",
      },
      flags: [],
    },
    pLow: 0.0001,
  },
  {
    title: "keeps to the interval where that ends sooner",
    entries: decline(moss()).entries,
    expected: {
      trend: declineTrend,
      due: { atHours: 90, reason: "Delivery is holding: 20 h after the last check." },
    },
  },
  {
    title: "measures a renewed pump's decline by its own baseline",
    entries: decline(moss().check(5, four(3.4)).work(9, ["pump-renewed"], true)).entries,
    expected: { trend: declineTrend },
  },
  {
    title: "measures the decline by the earlier baseline where a new one could not replace it",
    // 2.74/3 = 0.913 is dropping, so 3.00 stays: 2.55 is met at 30 + (2.74 − 2.55)/0.004 = 77.5 h.
    entries: moss()
      .check(10, four(3))
      .work(30, ["screen-cleaned"], true)
      .check(30, four(2.74))
      .check(50, four(2.66))
      .check(70, four(2.58)).entries,
    expected: {
      trend: {
        perHour: near(-0.003985552),
        uPerHour: near(0.001760486),
        reachesLimitAtHours: near(77.5),
        range: { low: near(62.621834), high: near(153.302946) },
      },
    },
  },
  {
    title: "does not call a fall declining that its uncertainty explains",
    // One run each: slope −0.000996, u 0.002266.
    entries: moss().check(10, [3]).check(30, [2.98]).check(50, [2.96]).check(70, [2.94]).entries,
    expected: {
      trend: {
        perHour: near(-0.000996388),
        uPerHour: near(0.002266458),
        reachesLimitAtHours: null,
        range: null,
      },
      due: { atHours: 90 },
    },
  },
  {
    title: "widens a trend's uncertainties by the scatter about it",
    // χ²/ν = 4.3639: u(slope) = 0.00081908·√4.3639, and the covariance 4.3639 times as large.
    entries: moss()
      .check(10, four(3.2))
      .check(30, four(2.95))
      .check(50, four(3.05))
      .check(70, four(2.75))
      .check(90, four(2.8)).entries,
    expected: {
      trend: {
        perHour: near(-0.004954757),
        uPerHour: near(0.001711055),
        reachesLimitAtHours: near(95.885818),
        range: { low: near(74.898028), high: near(159.623723) },
      },
      flags: ["trend-scatter"],
    },
  },
  {
    title: "sees no trend in two sessions",
    entries: moss().check(10, four(3)).check(30, four(2.8)).entries,
    expected: { trend: null },
  },
  {
    title: "sees no trend within 10 h",
    entries: moss().check(10, four(3)).check(14, four(2.8)).check(19.9, four(2.6)).entries,
    expected: { trend: null },
  },
  {
    title: "sees one over 10 h",
    // Slope −0.04·0.99639; 2.55 is met at 10 + 0.45/0.04 = 21.25 h.
    entries: moss().check(10, four(3)).check(15, four(2.8)).check(20, four(2.6)).entries,
    expected: { trend: { perHour: near(-0.039855523), reachesLimitAtHours: near(21.25) } },
  },
  {
    title: "counts both scales in the trend where there are two syringes",
    // ISO 7886-1: 4 % of V, so 0.0693·0.99639 mL at 3.00. The same decline, no longer surely one.
    entries: moss()
      .check(10, four(3))
      .check(30, four(2.94))
      .check(50, four(2.88), { syringe: newSyringe5 })
      .check(70, four(2.82), { syringe: newSyringe5 }).entries,
    expected: {
      trend: {
        perHour: near(-0.002989164),
        uPerHour: near(0.001887337),
        reachesLimitAtHours: null,
        range: null,
      },
      due: { atHours: 90 },
    },
    // r 0.94 as before, its u with both scales 0.0387: Φ(−2.325).
    pLow: 0.01,
  },
  {
    title: "leaves a session at doubted hours out of the trend",
    // The line of the first three; 700 was typed for 70.0.
    entries: moss()
      .check(10, four(3))
      .check(30, four(2.94))
      .check(50, four(2.88))
      .check(700, four(2.82)).entries,
    expected: {
      trend: {
        perHour: near(-0.002989164),
        uPerHour: near(0.00182412),
        reachesLimitAtHours: null,
      },
      due: { atHours: 70 },
    },
  },
];

const ruleLogbooks: GoldenLogbook[] = [
  {
    title: "points out oil over 10 °C warmer or colder than at the baseline",
    entries: moss()
      .check(10, [3], { oilTempC: 20 })
      .check(30, [3], { oilTempC: 30 })
      .check(50, [3], { oilTempC: 30.5 })
      .check(70, [3], { oilTempC: 10 })
      .check(90, [3], { oilTempC: 9.5 }).entries,
    expected: {
      checks: [
        { flags: [] },
        { flags: [] },
        { flags: ["temperature-differs"] },
        { flags: [] },
        { flags: ["temperature-differs"] },
      ],
    },
  },
  {
    title: "counts both scales where a syringe was replaced by its like",
    // 4 % of V on each side, /√3: u = 0.9·√(0.0357² + 0.0231² + 0.0340² + 0.0231²) = 0.0537.
    // Without the session's own 0.0357 still 0.0425, and (0.9 − 0.85)/0.0425 < 1.645: never settled.
    entries: moss().check(10, [3]).check(30, [2.7], { syringe: newSyringe5 }).entries,
    expected: {
      verdict: "dropping",
      action: "repeat",
      flags: ["baseline-cannot-settle", "syringe-differs"],
    },
    pLow: 0.1758,
  },
  {
    title: "never takes two unknown syringes for one",
    // 5 % of V on each side, /√3: u = 0.0580.
    entries: moss().check(10, [3], { syringe: null }).check(30, [2.7], { syringe: null }).entries,
    expected: {
      verdict: "dropping",
      flags: ["syringe-unknown", "baseline-cannot-settle", "syringe-differs"],
    },
    pLow: 0.1944,
  },
  {
    title: "says that something spoiled a reading, where something did",
    entries: moss()
      .check(10, [3], { spoilers: ["bubbles"] })
      .check(30, [3], { spoilers: [] }).entries,
    expected: { checks: [{ flags: ["spoiled"] }, { flags: [] }] },
  },
  {
    title: "says that the last check could not be counted, and keeps to the one before",
    entries: moss()
      .check(10, [2.9])
      .check(29, [], { runs: [{ startMl: 0, endMl: 1, void: true }] }).entries,
    expected: {
      verdict: "settling",
      checks: [{}],
      flags: ["check-not-counted"],
      due: { atHours: 30, inHours: 1 },
    },
  },
  {
    title: "says it of the last check only",
    entries: moss()
      .check(10, [3])
      .check(29, [], { runs: [{ startMl: 0, endMl: 1, void: true }] })
      .check(30, [2.95]).entries,
    expected: { verdict: "holding", checks: [{}, {}], flags: [] },
  },
  {
    title: "counts on from a check up to an hour above the hours now",
    entries: moss().check(32, [3]).hours(30.9).hours(31).entries,
    expected: { hours: { now: 31 }, due: { atHours: 52, inHours: 21 }, flags: [] },
  },
  {
    title: "is due now where the meter shows over an hour less than at the check",
    // The second reading agrees with the first, so both count.
    entries: moss().check(32, [3]).hours(30.8).hours(30.9).entries,
    expected: {
      hours: { now: 30.9 },
      due: { atHours: 30.9, inHours: 0 },
      flags: ["hours-below-session"],
    },
  },
  {
    title: "watches no further than a bike's own stop limit",
    // 2.9/3 = 0.9667, u 0.0470: Φ((0.95 − 0.9667)/0.0470) = 0.3616 for both; for 0.92 it were 0.16.
    entries: logbook().bike({ name: "Moss", actDrop: 0.05 }).check(10, [3]).check(30, [2.9])
      .entries,
    expected: {
      verdict: "holding",
      action: "repeat",
      checks: [{}, { pDropping: expect.closeTo(0.36156, 4) as number }],
    },
    pLow: 0.3616,
  },
  {
    title: "lets a new series begin with whatever an updated controller gives",
    entries: moss()
      .check(10, [3])
      .work(30, ["controller-updated"], true)
      .check(30, [2.5])
      .check(50, [2.5]).entries,
    expected: {
      verdict: "holding",
      action: "ride",
      due: { atHours: 70 },
      series: [{ startedBy: "first-check" }, { startedBy: "work" }],
      checks: [{}, { verdict: "settling", action: "ride", flags: [] }, { ratio: 1 }],
    },
  },
];

/** A low check at 32 h, made again five minutes later. */
const repeatedAt = (hours: number) =>
  moss()
    .check(12, [3])
    .check(32, [2.4], {}, "2026-04-01T09:00:00.000Z")
    .check(hours, [2.95], {}, "2026-04-01T09:05:00.000Z").entries;

// Alone, 2.95 mL is holding. Weights 1/0.009071 and 1/0.010299: mean 2.6576, ratio 0.8859,
// u = 0.8859·√(0.02613² + 0.03403²) = 0.0380, Φ(−0.943) = 0.173. χ² = 15.6 > 3.84: they disagree.
// Perfect runs would leave u = 0.8859·0.03403 and Φ(−1.19) = 0.117 > 0.05: that baseline settles nothing.
const repeatedAtOddHours = {
  verdict: "dropping",
  action: "repeat",
  checks: [{}, { verdict: "low", action: "stop" }, { verdict: "dropping", action: "repeat" }],
  due: { atHours: 32, inHours: 0 },
  flags: ["baseline-cannot-settle", "session-disagrees", "judged-with-earlier", "hours-doubtful"],
};

export const goldenLogbooks: GoldenLogbook[] = [
  {
    title: "counts what is left of the interval over a meter change",
    // Check at 100.0, old meter ends at 110.5, new one starts at 0.0 and shows 9.5: lifetime 120.
    entries: moss().check(100, [3]).meter(110.5, 0).hours(9.5).entries,
    expected: {
      hours: { now: 120, displayOffset: 110.5 },
      due: { atHours: 120, inHours: 0, overdue: false },
    },
  },
  {
    title: "is overdue an hour later",
    entries: moss().check(100, [3]).meter(110.5, 0).hours(10.5).entries,
    expected: { due: { atHours: 120, inHours: -1, overdue: true } },
  },
  {
    title: "has no verdict between the renewed pump and its first check",
    entries: moss().check(10, [3]).check(30, [2.5]).work(30, ["pump-renewed"], true).entries,
    expected: {
      verdict: "none",
      action: null,
      pLow: null,
      due: { atHours: 30, inHours: 0 },
      series: [{ startedBy: "first-check" }, { startedBy: "work", baseline: null }],
    },
  },
  {
    title: "holds a renewed pump to its own baseline",
    // 3.0/3.1 = 0.9677; u = 0.9677·√(0.0340² + 0.0333²) = 0.0461; Φ(−2.55) = 0.005.
    entries: moss()
      .check(10, [3])
      .check(30, [2.5])
      .work(30, ["pump-renewed"], true)
      .check(31, [3.1])
      .check(51, [3]).entries,
    expected: { verdict: "holding", action: "ride", due: { atHours: 71 } },
    pLow: 0.005,
  },
  {
    title: "finds a fault that a new series would hide",
    entries: moss().check(10, [3]).work(30, ["screen-cleaned"], true).check(30, [2.5]).entries,
    expected: {
      verdict: "low",
      action: "stop",
      due: { atHours: 30, inHours: 0 },
      checks: [{ verdict: "settling" }, { verdict: "low", series: 1 }],
    },
    pLow: 0.651,
  },
  {
    title: "goes on finding it at later checks, and after yet another new series",
    entries: moss()
      .check(10, [3])
      .work(30, ["screen-cleaned"], true)
      .check(30, [2.5])
      .check(50, [2.5])
      .work(51, ["other"], true)
      .check(51, [2.5]).entries,
    expected: { verdict: "low", action: "stop" },
    pLow: 0.651,
  },
  {
    title: "lets a new series begin after work where the delivery held",
    entries: moss().check(10, [3]).work(30, ["screen-cleaned"], true).check(30, [2.95]).entries,
    expected: { verdict: "settling", action: "ride", due: { atHours: 50 } },
  },
  {
    title: "pools the checks of one session",
    // Weights 1/0.009275 and 1/0.010177: mean 2.6907, ratio 0.8969, u 0.0383, Φ(−1.223) = 0.111.
    entries: moss().check(10, [3]).check(30, [2.5]).check(30.5, [2.9]).entries,
    expected: {
      verdict: "dropping",
      action: "repeat",
      checks: [{}, { verdict: "dropping" }, { verdict: "dropping" }],
      due: { atHours: 30.5 },
    },
    pLow: 0.111,
  },
  {
    title: "does not count a run of another sequence",
    entries: logbook()
      .bike({ name: "Moss", sequence: thirtySteady })
      .check(10, [], {
        runs: [
          { startMl: 0, endMl: 3, seconds: 30 },
          { startMl: 0, endMl: 4.9, seconds: 60 },
        ],
      }).entries,
    expected: { checks: [{ runsCounted: 1, flags: ["other-sequence"] }] },
  },
  {
    title: "starts a series when the sequence changes from one known to another",
    entries: logbook()
      .bike({ name: "Moss", sequence: thirtySteady })
      .check(10, [3])
      .bike({ sequence: { seconds: 30, rhythm: "alternating", nominalMl: null } })
      .check(30, [1]).entries,
    expected: {
      verdict: "settling",
      action: "ride",
      series: [{ startedBy: "first-check" }, { startedBy: "sequence" }],
    },
  },
  {
    title: "keeps the series when a sequence becomes known or only its usual delivery changes",
    entries: moss()
      .check(10, [3])
      .bike({ sequence: thirtySteady })
      .bike({ sequence: { ...thirtySteady, nominalMl: 3.1 } })
      .check(30, [2.95]).entries,
    expected: { verdict: "holding", series: [{}] },
  },
  {
    title: "asks for a repeat where the first check is far under the sequence's usual delivery",
    // A 60 s steady sequence usually delivers 5.5 mL; 4.0 is 27 % under.
    entries: logbook()
      .bike({ name: "Moss", sequence: { seconds: 60, rhythm: "steady", nominalMl: null } })
      .check(10, [4], { syringe: syringe10 }).entries,
    expected: {
      verdict: "settling",
      action: "repeat",
      flags: ["below-usual"],
      due: { atHours: 10 },
    },
  },
  {
    title: "lets later patches win field by field, whatever order they arrive in",
    entries: logbook()
      .bike({ name: "Moss", intervalHours: 40, hasScreen: true })
      .bike({ intervalHours: 25 })
      .bike({ name: "Fern", intervalHours: null })
      .check(12, [3])
      .entries.toReversed(),
    expected: { name: "Fern", due: { atHours: 52 } },
  },
  {
    title: "leaves the due hours alone for 320 typed for 32.0",
    entries: moss().check(12, [3]).hours(320).entries,
    expected: {
      hours: { now: 12, doubtful: [{ atHours: 320, why: "faster-than-clock" }] },
      due: { atHours: 32, inHours: 20 },
      flags: ["hours-doubtful"],
    },
  },
  {
    title: "leaves them alone for a check at 320 too, which is judged all the same",
    entries: moss().check(12, [3]).check(320, [2.95]).entries,
    expected: { verdict: "holding", due: { atHours: 32, inHours: 20 } },
  },
  {
    title: "does not ride on where a low check is repeated at an hour too far on",
    entries: repeatedAt(33.2),
    expected: repeatedAtOddHours,
    pLow: 0.173,
  },
  {
    title: "nor where it is repeated at an hour before",
    entries: repeatedAt(23),
    expected: repeatedAtOddHours,
    pLow: 0.173,
  },
  {
    title: "forgets a struck check",
    entries: struckCheck(),
    expected: { verdict: "settling", action: "ride", checks: [{}], due: { atHours: 32 } },
  },
  {
    title: "brings warm oil to 15 °C and points the difference out",
    // 0.98187/0.99639 = 0.9854 (API MPMS 11.1 factors at 40 and 20 °C).
    entries: moss().check(10, [3], { oilTempC: 20 }).check(30, [3], { oilTempC: 40 }).entries,
    expected: { verdict: "holding", flags: ["temperature-differs"] },
  },
  {
    title: "takes a paper note's volume and estimated hours",
    entries: moss().check(8, [], {
      syringe: null,
      runs: [{ deliveredMl: 3 }],
      estimatedHours: true,
    }).entries,
    expected: { checks: [{ flags: ["syringe-unknown", "estimated-hours"] }] },
  },
  {
    title: "repeats before riding where the runs read far too high",
    // 5.0/3.0 = 1.667: a doubled run.
    entries: moss().check(10, [3]).check(30, [5]).entries,
    expected: { verdict: "holding", action: "repeat", flags: ["reads-high"], due: { atHours: 30 } },
  },
  {
    title: "says stop where nothing is delivered, also at the very first check",
    entries: moss().check(10, [0]).entries,
    expected: { verdict: "low", action: "stop", pLow: 1, flags: ["no-delivery"] },
  },
  ...trendLogbooks,
  ...ruleLogbooks,
];

/** The first check of the first golden logbook, mL a run at 15 °C. */
export const goldenPerRunMl = 3 * TO_15C;
