import { describe, expect, it } from "vitest";
import { deviceName } from "./device-name.ts";

const likeGecko = "AppleWebKit/537.36 (KHTML, like Gecko)";

describe("a device's name", () => {
  it.each([
    [
      `Mozilla/5.0 (Linux; Android 14; X1) ${likeGecko} Chrome/124.0.0.0 Mobile Safari/537.36`,
      "Chrome on Android",
    ],
    [
      "Mozilla/5.0 (Windows NT 10.0; Win64; x64; rv:125.0) Gecko/20100101 Firefox/125.0",
      "Firefox on Windows",
    ],
    ["curl/8.1", "Unknown browser"],
    ["<script>alert(1)</script>", "Unknown browser"],
    ["", "Unknown browser"],
    [undefined, "Unknown browser"],
  ])("of %j is %j", (userAgent, name) => {
    expect(deviceName(userAgent)).toBe(name);
  });

  it("tells no version, model or build", () => {
    const userAgent = `Mozilla/5.0 (Linux; Android 14; X1) ${likeGecko} Chrome/124.0.0.0 Mobile Safari/537.36`;
    expect(deviceName(userAgent)).not.toMatch(/\d/);
  });
});
