import { v7 as uuidv7 } from "uuid";
import { describe, expect, it } from "vitest";
import { entrySchema } from "../../../shared/schemas/entry.ts";
import { errorsByField } from "../../../shared/schemas/errors-by-field.ts";
import { FieldErrors } from "../../ui/use-submit.ts";
import { emptyForm, newBikeEntry, type NewBikeForm } from "./new-bike-entry.ts";

const AT = "2026-03-01T09:00:00.000Z";
const entryOf = (form: Partial<NewBikeForm>) =>
  newBikeEntry({ ...emptyForm, name: "Heather", ...form }, uuidv7(), AT);

function errorsOf(form: Partial<NewBikeForm>): Record<string, string> {
  try {
    entryOf(form);
  } catch (error) {
    if (error instanceof FieldErrors) return error.errors;
  }
  return {};
}

describe("newBikeEntry", () => {
  it("needs no more than a name", () => {
    const entry = entryOf({});
    expect(entrySchema.safeParse({ ...entry, id: uuidv7(), v: 1 }).error).toBeUndefined();
    expect(entry).toMatchObject({ kind: "bike", hours: null, body: { name: "Heather" } });
    expect(errorsOf({ name: "  " })).toHaveProperty(["body.name"]);
  });

  it("leaves the interval open while the usual one is not changed", () => {
    expect(entryOf({ screen: "yes" }).body).toMatchObject({ intervalHours: null, hasScreen: true });
    expect(entryOf({ interval: "25" }).body).toMatchObject({ intervalHours: 25, hasScreen: null });
  });

  it("reads hours as the meter shows them", () => {
    expect(entryOf({ hours: "12,5" }).hours).toBe(12.5);
    expect(entryOf({ meterFormat: "hh:mm", hours: "12:30" }).hours).toBe(12.5);
    expect(entryOf({ meterFormat: "hh:mm", hours: ":" }).hours).toBeNull();
  });

  it("takes a usual sequence whole and an own one by its numbers", () => {
    expect(entryOf({ sequence: "two-rate" }).body).toMatchObject({
      sequence: { seconds: 30, rhythm: "alternating", nominalMl: 1 },
    });
    expect(entryOf({ sequence: "own", ownSeconds: "45", ownMl: "" }).body).toMatchObject({
      sequence: { seconds: 45, rhythm: "steady", nominalMl: null },
    });
    expect(errorsOf({ sequence: "own" })).toHaveProperty(["body.sequence.seconds"]);
  });

  it("says by field which number it cannot read", () => {
    expect(Object.keys(errorsOf({ year: "94ish", interval: "2o" }))).toEqual([
      "body.year",
      "body.intervalHours",
    ]);
    const entry = { ...entryOf({ hours: "many" }), id: uuidv7(), v: 1 };
    expect(errorsByField(entrySchema.safeParse(entry).error!)).toHaveProperty("hours");
  });
});
