import type { BikePatch, CheckBody, EntryBody, EntryKind } from "../../shared/schemas/entry.ts";

/** An entry told by how many days ago it happened. */
export type Told = {
  [K in EntryKind]: {
    daysAgo: number;
    kind: K;
    hours: number | null;
    body: EntryBody<K>;
    /** Says that this entry is struck, and why. */
    struck?: string;
    /** Written by the club's mechanic on a member's bike. */
    byMechanic?: true;
  };
}[EntryKind];

export interface DemoBike {
  patch: BikePatch & { name: string };
  /** Bikes are shared with the club, but for these. */
  unshared?: true;
  log: Told[];
}

export interface DemoRider {
  name: string;
  email: string;
  role: "rider" | "organiser" | "mechanic";
  bikes: DemoBike[];
}

export const DEMO_CLUB = "Heron Moor Trail Riders";
export const DEMO_PASSWORD = "two-strokes-only";

const fine = { id: "demo-fine", label: "Fine, 2.5 mL", capacityMl: 2.5, graduationMl: 0.1 };
const wide = { id: "demo-wide", label: "Wide, 5 mL", capacityMl: 5, graduationMl: 0.2 };
const large = { id: "demo-large", label: "Large, 10 mL", capacityMl: 10, graduationMl: 0.5 };

const twoRate = { seconds: 30, rhythm: "alternating", nominalMl: null } as const;
const shortSingle = { seconds: 30, rhythm: "steady", nominalMl: null } as const;
const longSingle = { seconds: 60, rhythm: "steady", nominalMl: null } as const;

const hours = (daysAgo: number, reading: number, body: EntryBody<"hours"> = {}): Told => ({
  daysAgo,
  kind: "hours",
  hours: reading,
  body,
});

/** A check whose runs each start on an empty barrel. */
function check(
  daysAgo: number,
  reading: number,
  syringe: CheckBody["syringe"],
  endMl: number[],
  more: Partial<CheckBody> & { struck?: string } = {},
): Told {
  const { struck, ...body } = more;
  const runs = endMl.map((end) => ({ startMl: 0, endMl: end }));
  return {
    daysAgo,
    kind: "check",
    hours: reading,
    body: { syringe, runs, closedOut: true, ...body },
    ...(struck ? { struck } : {}),
  };
}

const work = (daysAgo: number, reading: number, body: EntryBody<"work">): Told => ({
  daysAgo,
  kind: "work",
  hours: reading,
  body,
});

const note = (daysAgo: number, text: string): Told => ({
  daysAgo,
  kind: "note",
  hours: null,
  body: { text },
});

/** Every action and verdict, and what else a logbook may hold, in the bikes of one invented club. */
export const demoRiders: DemoRider[] = [
  {
    name: "Wren",
    email: "wren@heronmoor.example",
    role: "rider",
    bikes: [
      {
        patch: { name: "Bramble", year: 2021, hasScreen: true, sequence: twoRate },
        log: [
          check(150, 61.5, fine, [0.95, 0.95, 1.0, 0.95], { oilTempC: 18 }),
          hours(120, 74.2),
          check(88, 96.3, fine, [0.95, 0.95, 0.9, 0.95], { oilTempC: 21 }),
          { daysAgo: 60, kind: "topup", hours: 108.7, body: { oilMl: 420, oilFull: true } },
          hours(31, 118.4),
          check(12, 128.9, fine, [0.9, 0.95, 0.95, 0.95], { oilTempC: 16 }),
          hours(2, 133.1),
        ],
      },
      {
        patch: { name: "Old Tin", year: 2018, hasScreen: false, sequence: shortSingle },
        log: [
          check(140, 210.0, wide, [3.1, 3.1, 3.0, 3.1, 3.1, 3.0], { oilTempC: 17 }),
          check(95, 229.4, wide, [3.0, 3.0, 3.0], { oilTempC: 20 }),
          check(40, 247.0, wide, [2.8, 2.8, 2.8], { oilTempC: 19 }),
          note(39, "Down a little. Screenless tank, so looking again at half the interval."),
          hours(3, 251.2),
        ],
      },
      {
        patch: { name: "Sorrel", year: 2022, hasScreen: false, sequence: twoRate },
        log: [
          check(100, 33.0, fine, [1.0, 1.0, 0.95, 1.0]),
          hours(60, 44.0),
          check(9, 52.6, fine, [0.75, 0.75], { note: "Battery freshly charged." }),
          {
            daysAgo: 9,
            kind: "note",
            hours: 52.6,
            body: {
              text: "Not riding this one until the hose has been looked at.",
              advice: "stop",
            },
          },
        ],
      },
    ],
  },
  {
    name: "Tam",
    email: "tam@heronmoor.example",
    role: "rider",
    bikes: [
      {
        patch: { name: "Nettle", year: 2024, hasScreen: true, sequence: twoRate },
        log: [hours(30, 3.1), check(6, 11.8, fine, [1.0, 1.0, 1.05, 1.0], { oilTempC: 15 })],
      },
      {
        patch: { name: "Flint", year: 2019, hasScreen: false, sequence: longSingle },
        log: [
          check(160, 150.2, large, [5.5, 5.5]),
          check(90, 171.0, large, [5.5, 5.5]),
          hours(45, 185.5),
          hours(4, 196.3),
        ],
      },
      {
        patch: { name: "Gorse", year: 2020, hasScreen: false, sequence: shortSingle },
        log: [
          check(110, 88.0, wide, [3.0]),
          hours(70, 97.3),
          check(5, 107.5, wide, [2.7], { note: "One run only, it was getting dark." }),
          {
            daysAgo: 4,
            kind: "note",
            hours: null,
            body: {
              text: "One run settles nothing. Four runs with the fine syringe before the next ride, please.",
              advice: "repeat",
            },
            byMechanic: true,
          },
        ],
      },
    ],
  },
  {
    name: "Iris",
    email: "iris@heronmoor.example",
    role: "organiser",
    bikes: [
      {
        patch: { name: "Pebble", year: 2025, sequence: null },
        unshared: true,
        log: [hours(14, 0.4), hours(1, 4.6)],
      },
      {
        patch: { name: "Marl", year: 2017, hasScreen: true, sequence: shortSingle },
        log: [
          check(200, 402.1, wide, [3.2, 3.2, 3.2, 3.2], { oilTempC: 22 }),
          { daysAgo: 150, kind: "meter", hours: 421.6, body: { newReading: 0 } },
          hours(100, 8.9),
          check(70, 18.0, wide, [3.1, 3.2, 3.2], { oilTempC: 14 }),
          hours(8, 37.4),
        ],
      },
      {
        patch: {
          name: "Thistle",
          year: 2020,
          hasScreen: false,
          meterFormat: "hh:mm",
          sequence: twoRate,
        },
        log: [
          check(210, 120.0, fine, [1.05, 1.05, 1.0, 1.05]),
          check(150, 139.5, fine, [0.85, 0.8, 0.85]),
          work(143, 139.5, {
            items: ["screen-cleaned", "hose-renewed", "line-bled"],
            startsSeries: false,
            note: "Hose had gone soft at the bend.",
          }),
          check(142, 139.7, fine, [0.85, 0.85, 0.8]),
          work(120, 139.7, { items: ["pump-renewed", "line-bled"], startsSeries: true }),
          check(119, 139.9, fine, [1.0, 1.05, 1.0, 1.05], { oilTempC: 19 }),
          check(50, 158.2, fine, [1.0, 1.0, 1.05], { oilTempC: 12 }),
          hours(7, 167.9),
        ],
      },
    ],
  },
  {
    name: "Odo",
    email: "odo@heronmoor.example",
    role: "mechanic",
    bikes: [
      {
        patch: { name: "Rook", year: 2021, hasScreen: false, sequence: twoRate },
        log: [
          check(90, 70.0, fine, [1.0, 1.0, 1.0, 1.0]),
          check(10, 89.0, fine, [1.0, 0.6, 1.2, 0.8], { spoilers: ["bubbles"] }),
        ],
      },
      {
        patch: { name: "Sedge", year: 2023, hasScreen: true, sequence: shortSingle, actDrop: 0.12 },
        log: [
          check(120, 20.0, wide, [3.0, 3.0, 3.0, 3.0]),
          check(41, 49.3, wide, [2.2], { struck: "Interrupted: the lead slipped off halfway." }),
          check(40, 49.4, wide, [2.95, 3.0, 2.95]),
          hours(5, 60.2),
        ],
      },
      {
        patch: { name: "Clover", year: 2019, hasScreen: true, sequence: shortSingle },
        log: [
          check(180, 300.0, wide, [3.2, 3.2, 3.2, 3.2], { oilTempC: 18 }),
          check(130, 320.2, wide, [3.1, 3.1, 3.1], { oilTempC: 20 }),
          check(80, 340.1, wide, [3.05, 3.0, 3.0], { oilTempC: 19 }),
          check(20, 360.4, wide, [2.9, 2.95, 2.9], { oilTempC: 17, closedOut: false }),
          hours(3, 3636),
        ],
      },
      {
        patch: { name: "Moth", year: 1999, meter: "estimated", sequence: null, retired: true },
        unshared: true,
        log: [
          check(700, 80, null, [], {
            runs: [{ deliveredMl: 1.9 }],
            estimatedHours: true,
            note: "From the old paper book.",
          }),
          check(500, 110, null, [], { runs: [{ deliveredMl: 1.9 }], estimatedHours: true }),
        ],
      },
    ],
  },
];
