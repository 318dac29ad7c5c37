import { describe, expect, it } from "vitest";
import { bikeTag, readBikeTag } from "./bike-tag.ts";

describe("bikeTag", () => {
  // By hand: 1 is the alphabet's second character, 3; everything before it is the first, 2.
  it("counts in 23 unambiguous letters and digits", () => {
    expect(bikeTag("0190a000-0000-7000-8000-000000000001")).toBe("222223");
    expect(bikeTag("0190a000-0000-7000-8000-000000000017")).toBe("222232");
  });

  it("takes the random end of the id, not the time at its front", () => {
    expect(bikeTag("0190a000-0000-7000-8000-3fd91c07ab52")).toBe(
      bikeTag("01aaaaaa-aaaa-7aaa-9aaa-3fd91c07ab52"),
    );
  });

  it("tells a thousand bikes of a club apart, or nearly", () => {
    const ids = Array.from({ length: 1_000 }, (_, n) => {
      // A fixed scramble in place of chance: Knuth's multiplier, taken to 48 bits.
      const end = ((BigInt(n + 1) * 6364136223846793005n) >> 8n) & 0xffffffffffffn;
      return `0190a000-0000-7000-8000-${end.toString(16).padStart(12, "0")}`;
    });
    expect(new Set(ids.map(bikeTag)).size).toBeGreaterThanOrEqual(998);
    for (const id of ids) expect(bikeTag(id)).toMatch(/^[2-9CDFHJKMNPQRTVWXY]{6}$/);
  });

  it("is read as people type it", () => {
    expect(readBikeTag(" k7q-x4 m")).toBe("K7QX4M");
  });
});
