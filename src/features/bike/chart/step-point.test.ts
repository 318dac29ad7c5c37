import { describe, expect, it } from "vitest";
import { nearestPoint } from "./nearest-point.ts";
import { stepPoint } from "./step-point.ts";

describe("stepPoint", () => {
  it("goes one point at a time and stops at the ends", () => {
    expect(stepPoint("ArrowRight", 1, 4)).toBe(2);
    expect(stepPoint("ArrowUp", 3, 4)).toBe(3);
    expect(stepPoint("ArrowLeft", 1, 4)).toBe(0);
    expect(stepPoint("ArrowDown", 0, 4)).toBe(0);
  });

  it("jumps to the first and the last", () => {
    expect(stepPoint("Home", 2, 4)).toBe(0);
    expect(stepPoint("End", 2, 4)).toBe(3);
  });

  it("leaves every other key alone", () => {
    expect(stepPoint("Tab", 2, 4)).toBeNull();
    expect(stepPoint("a", 2, 4)).toBeNull();
  });
});

describe("nearestPoint", () => {
  const points = [{ atHours: 10 }, { atHours: 30 }, { atHours: 30 }, { atHours: 55 }];

  it("finds the point nearest to the hours, the last of several at the same hours", () => {
    expect(nearestPoint(points, -5)).toBe(0);
    expect(nearestPoint(points, 27)).toBe(2);
    expect(nearestPoint(points, 44)).toBe(3);
  });
});
