import { describe, expect, it } from "vitest";
import { marks, numberStepMl, usualScale } from "./column-scale.ts";

describe("usualScale", () => {
  it("takes the smallest usual barrel that leaves room above the oil", () => {
    expect(usualScale(0.85, 1)).toEqual({ maxMl: 2.5, graduationMl: 0.1 });
    expect(usualScale(2.5, 3)).toEqual({ maxMl: 5, graduationMl: 0.2 });
    expect(usualScale(5.5)).toEqual({ maxMl: 10, graduationMl: 0.5 });
  });

  it("draws a barrel even where nothing or very much was measured", () => {
    expect(usualScale(null)).toEqual({ maxMl: 1, graduationMl: 0.05 });
    expect(usualScale(400).maxMl).toBeGreaterThan(400);
  });
});

describe("numberStepMl", () => {
  it.each([
    [{ maxMl: 1, graduationMl: 0.01 }, 0.2],
    [{ maxMl: 2.5, graduationMl: 0.1 }, 0.5],
    [{ maxMl: 5, graduationMl: 0.2 }, 1],
    [{ maxMl: 10, graduationMl: 0.5 }, 2],
    [{ maxMl: 20, graduationMl: 1 }, 5],
  ])("numbers the round marks of %j", (scale, step) => expect(numberStepMl(scale)).toBe(step));

  it("numbers every fifth mark where none is round", () =>
    expect(numberStepMl({ maxMl: 3, graduationMl: 0.3 })).toBeCloseTo(1.5));
});

describe("marks", () => {
  it("draws every graduation from zero to the top", () => {
    const drawn = marks({ maxMl: 5, graduationMl: 0.2 }, 101);
    expect(drawn).toHaveLength(26);
    expect(drawn.filter(({ numbered }) => numbered).map(({ ml }) => ml)).toEqual([
      0, 1, 2, 3, 4, 5,
    ]);
  });

  it("keeps to the numbered ones where all would run together", () => {
    const drawn = marks({ maxMl: 1, graduationMl: 0.01 }, 26);
    expect(drawn.map(({ ml }) => ml)).toEqual([0, 0.2, 0.4, 0.6, 0.8, 1]);
  });
});
