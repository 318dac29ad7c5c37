import { existsSync, readFileSync } from "node:fs";
import { expect, it } from "vitest";

const document = readFileSync("docs/security.md", "utf8");
const rows = [...document.matchAll(/^\| (\d+\.\d+\.\d+) \| (.+?) \| (.+) \|$/gm)];

/** OWASP ASVS 5.0.0, level 1: how many items each chapter has. */
const itemsOfChapter = {
  1: 8,
  2: 4,
  3: 8,
  4: 2,
  5: 4,
  6: 13,
  7: 6,
  8: 4,
  9: 4,
  10: 5,
  11: 3,
  12: 3,
  13: 1,
  14: 2,
  15: 3,
};

it("the list of security.md has each of the 70 items of level 1 once", () => {
  const items = rows.map(([, item]) => item!);
  expect(new Set(items).size).toBe(items.length);
  const counted = Object.fromEntries(
    Object.keys(itemsOfChapter).map((chapter) => [
      chapter,
      items.filter((item) => item.startsWith(`${chapter}.`)).length,
    ]),
  );
  expect(counted).toEqual(Object.fromEntries(Object.entries(itemsOfChapter)));
  expect(items).toHaveLength(70);
});

it("the list says of every item whether it is met, and why not", () => {
  const said = rows.map(([, item, , here]) => [
    item,
    /^(Met|Not met|Not applicable|Not verified|As 12)\b/.test(here!),
  ]);
  expect(said.filter(([, says]) => !says)).toEqual([]);
});

it("every test that security.md names is there", () => {
  const named = [
    ...document.matchAll(/`((?:tests|server)\/[\w./-]+\.(?:test|spec)\.ts)`(?: \*([^*]+)\*)?/g),
  ];
  expect(named.length).toBeGreaterThan(40);
  for (const [, file, title] of named) {
    expect(existsSync(file!), file).toBe(true);
    if (title) expect(readFileSync(file!, "utf8"), `${file} ${title}`).toContain(title);
  }
});
