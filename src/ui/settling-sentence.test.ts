import { expect, test } from "vitest";
import { summariseLogbook } from "../../shared/logbook/summarise-logbook.ts";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { settlingSentence } from "./settling-sentence.ts";

const short = { seconds: 30, rhythm: "steady", nominalMl: 3 } as const;
const coarse10 = { id: "ten", label: "10 mL", capacityMl: 10, graduationMl: 0.5 };

function lastCheck({ entries }: ReturnType<typeof logbook>) {
  const check = summariseLogbook({ ownerId: "owner", entries }).checks.at(-1)!;
  expect(check.verdict).toBe("settling");
  return check;
}

test("tells a first check that holds from one of a pump that may be tired", () => {
  const book = () => logbook().bike({ name: "Bike", sequence: short });
  expect(settlingSentence(lastCheck(book().check(12, [3])))).toMatch(/^This first check is the/);
  expect(settlingSentence(lastCheck(book().check(12, [2])))).toMatch(/may already be tired/);
});

test("says that a new series' first check reads high, where it does", () => {
  const book = logbook().bike({ name: "Bike" }).check(12, [3]);
  const check = lastCheck(book.work(20, ["screen-cleaned"], true).check(21, [4.6]));
  expect(check).toMatchObject({ action: "repeat" });
  expect(settlingSentence(check)).toMatch(/reads far above the baseline before/);
});

test("says that a new series' first check may be below the baseline before", () => {
  const more = { syringe: coarse10 };
  const book = logbook().bike({ name: "Bike" }).check(12, [3], more);
  const check = lastCheck(book.work(20, ["screen-cleaned"], true).check(21, [2.9], more));
  expect(check).toMatchObject({ action: "repeat" });
  expect(settlingSentence(check)).toMatch(/may be below the limit of the baseline before/);
});
