import { describe, expect, it } from "vitest";
import { entrySchema } from "./entry.ts";

const topup = (body: object) =>
  entrySchema.safeParse({
    id: "0190a000-0000-7000-9000-000000000001",
    bikeId: "0190a000-0000-7000-8000-000000000001",
    v: 1,
    at: "2026-03-01T09:00:00.000Z",
    kind: "topup",
    hours: null,
    body,
  });

describe("a top-up", () => {
  it.each([{ oilMl: 450 }, { oilFull: true }, { fuelL: 8.5 }, { fuelFull: true }])(
    "is taken with %o alone",
    (body) => {
      expect(topup(body).data?.body).toEqual(body);
    },
  );

  it.each([{}, { oilMl: undefined, oilFull: undefined }])("says something: %o does not", (body) => {
    expect(topup(body).error?.issues).toMatchObject([
      { path: ["body", "oilMl"], message: "Say how much oil or fuel went in." },
    ]);
  });
});
