import { expect, it } from "vitest";
import { usualDeliveryMl } from "./usual-delivery-ml.ts";

it("is what the usual sequences deliver (the documented example)", () => {
  expect(usualDeliveryMl({ seconds: 30, rhythm: "steady", nominalMl: null })).toBe(3);
  expect(usualDeliveryMl({ seconds: 30, rhythm: "alternating", nominalMl: null })).toBe(1);
  expect(usualDeliveryMl({ seconds: 60, rhythm: "steady", nominalMl: null })).toBe(5.5);
});

it("is the bike's own figure where it has one", () => {
  expect(usualDeliveryMl({ seconds: 30, rhythm: "steady", nominalMl: 2.8 })).toBe(2.8);
  expect(usualDeliveryMl({ seconds: 45, rhythm: "steady", nominalMl: 4 })).toBe(4);
});

it("is not known of another sequence, or of none", () => {
  expect(usualDeliveryMl({ seconds: 45, rhythm: "steady", nominalMl: null })).toBeNull();
  expect(usualDeliveryMl(null)).toBeNull();
});
