import { describe, expect, it } from "vitest";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { lifetimeHours } from "./lifetime-hours.ts";

const read = (book: { entries: Parameters<typeof lifetimeHours>[0] }) =>
  lifetimeHours(book.entries);

describe("readings", () => {
  it("counts the last one", () => {
    expect(read(logbook().hours(12).hours(15.5))).toMatchObject({ now: 15.5, doubtful: [] });
  });

  it("says null where there is none", () => {
    expect(read(logbook().note("New bike"))).toMatchObject({
      now: null,
      readAtMs: null,
      perWeek: null,
    });
  });

  it("keeps 320 typed for 32.0 aside until something confirms it", () => {
    const book = logbook().hours(12).hours(32).hours(320, {}, "2026-03-22T09:00:00Z");
    expect(read(book)).toMatchObject({
      now: 32,
      doubtful: [{ entryId: book.lastId, atHours: 320, why: "faster-than-clock" }],
    });
    expect(read(book.hours(33))).toMatchObject({ now: 33 });
  });

  it("counts it once the rider confirms it", () => {
    const book = logbook().hours(32).hours(320, {}, "2026-03-02T09:00:00Z");
    book.hours(320, { confirms: book.lastId });
    expect(read(book)).toMatchObject({ now: 320, doubtful: [] });
  });

  it("keeps a reading below an earlier one aside until a later one agrees with it", () => {
    const book = logbook().hours(120).hours(12.5);
    expect(read(book)).toMatchObject({ now: 120, doubtful: [{ why: "below-earlier" }] });
    expect(read(book.hours(13))).toMatchObject({ now: 13, doubtful: [] });
  });

  it("allows as many hours as passed, and the tenths that a meter hides", () => {
    const book = logbook().hours(10, {}, "2026-03-01T08:00:00Z");
    expect(read(book.hours(12.2, {}, "2026-03-01T10:00:00Z")).doubtful).toEqual([]);
    expect(read(book.hours(14.5, {}, "2026-03-01T12:00:00Z")).doubtful).toHaveLength(1);
  });

  it("does not doubt a meter because of an estimate", () => {
    const book = logbook().hours(60, { estimated: true }).hours(55.2);
    expect(read(book)).toMatchObject({ now: 55.2, doubtful: [] });
  });

  it("doubts an estimate below what the meter showed", () => {
    const book = logbook().hours(55).hours(50, { estimated: true });
    expect(read(book)).toMatchObject({ now: 55, doubtful: [{ why: "below-earlier" }] });
  });
});

describe("a meter change", () => {
  // Worked by hand: 118.4 on the old meter, the new one starts at 0.2, so the offset is 118.2.
  it("lets lifetime hours go on", () => {
    const book = logbook().hours(110).meter(118.4, 0.2).hours(5.2);
    const hours = read(book);
    expect(hours.now).toBeCloseTo(123.4, 9);
    expect(hours.displayOffset).toBeCloseTo(118.2, 9);
    expect(hours.atHours.get(book.lastId)).toBeCloseTo(123.4, 9);
  });

  it("takes the last counted reading where the old meter could not be read", () => {
    expect(read(logbook().hours(110).meter(null, 0).hours(3))).toMatchObject({
      now: 113,
      displayOffset: 110,
    });
  });

  it("changes nothing where there was no reading before", () => {
    expect(read(logbook().meter(null, 500).hours(10))).toMatchObject({ now: 10, displayOffset: 0 });
    expect(read(logbook().meter(null, 500).hours(510))).toMatchObject({ now: 510 });
  });

  it("never gives hours below zero, whatever the new meter shows", () => {
    // 10 on the old meter, 500 typed for 5.0 on the new one: the offset is −490.
    const book = logbook().hours(10).meter(10, 500).check(12, [3]);
    expect(read(book)).toMatchObject({ now: 10, doubtful: [{ atHours: 0 }] });
    expect(read(book).atHours.get(book.lastId)).toBe(0);
    expect(read(book.hours(14)).now).toBe(0);
  });

  it("adds up over two changes", () => {
    const book = logbook().hours(100).meter(100, 0).hours(50).meter(50, 10).hours(15);
    expect(read(book)).toMatchObject({ now: 155, displayOffset: 140 });
  });
});

describe("hours a week", () => {
  it("divides what was ridden in the 8 weeks before the last reading", () => {
    const book = logbook()
      .hours(0, {}, "2025-06-01T12:00:00Z")
      .hours(100, {}, "2026-03-01T12:00:00Z")
      .hours(112, {}, "2026-03-29T12:00:00Z");
    expect(read(book).perWeek).toBeCloseTo(3, 9);
  });

  it("is not known from readings less than a week apart", () => {
    const book = logbook()
      .hours(10, {}, "2026-03-01T12:00:00Z")
      .hours(14, {}, "2026-03-06T12:00:00Z");
    expect(read(book).perWeek).toBeNull();
  });
});
