import { dictionary } from "@zxcvbn-ts/language-common";
import { describe, expect, it } from "vitest";
import { MIN_PASSWORD_LENGTH } from "../../shared/schemas/auth.ts";
import { isEasilyGuessed } from "./guessable-password.ts";

const ann = ["Ann Marlow", "ann.marlow@club.example"];

describe("a password that is easily guessed", () => {
  it.each([
    "1234567890",
    "password123",
    "qwertyuiop",
    "aaaaaaaaaaaaaaaa",
    "passwordpassword",
    "P@ssw0rd12",
    "sumpless123",
    "annmarlow1",
    "ann.marlow@club.example",
    "1".repeat(128),
  ])("is %s", async (password) => {
    expect(await isEasilyGuessed(password, ann)).toBe(true);
  });

  it.each([
    "two strokes and a pump",
    "heather over the ridge",
    "k7#Vw2!pQz",
    "мотор стучит тихо",
    "🛠🏍⛽🌧🌲🪛🔩🧰🛢🧤",
    "k7#Vw2!pQz".repeat(12),
  ])("is not %s", async (password) => {
    expect(await isEasilyGuessed(password, ann)).toBe(false);
  });

  it("is each of the 3,000 most common ones, written twice where they are too short", async () => {
    const listed = dictionary["passwords-common"];
    const words = listed.map((word) => (word.length < MIN_PASSWORD_LENGTH ? word + word : word));
    const common = [...new Set(words)].filter((word) => word.length >= MIN_PASSWORD_LENGTH);
    const judged = common.slice(0, 3_000);
    expect(judged).toHaveLength(3_000);
    const passed: string[] = [];
    for (const word of judged) if (!(await isEasilyGuessed(word, []))) passed.push(word);
    expect(passed).toEqual([]);
  }, 60_000);
});
