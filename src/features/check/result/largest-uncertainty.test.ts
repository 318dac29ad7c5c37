import { expect, test } from "vitest";
import { largestUncertainty } from "./largest-uncertainty.ts";

const five = { graduationMl: 0.2 };

test.each([
  [{ readingMl: 0.08, repeatabilityMl: 0.06, temperatureMl: 0.01 }, "your syringe’s 0.2 mL marks"],
  [
    { readingMl: 0.03, repeatabilityMl: 0.06, temperatureMl: 0.01 },
    "how one run differs from the next",
  ],
  [
    { readingMl: 0.01, repeatabilityMl: 0.01, temperatureMl: 0.02 },
    "the oil’s temperature, which was not noted",
  ],
])("names what makes a delivery uncertain most", (components, words) => {
  expect(largestUncertainty(components, five, false)).toBe(words);
});

test("says that the marks are assumed where the syringe is not known", () => {
  const marks = { readingMl: 0.08, repeatabilityMl: 0.06, temperatureMl: 0.01 };
  expect(largestUncertainty(marks, null, true)).toBe(
    "the syringe, which is not known: marks of 0.2 mL are assumed",
  );
});
