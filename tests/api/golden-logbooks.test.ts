import { expect, it } from "vitest";
import type { LogEntry } from "../../shared/schemas/entry.ts";
import { goldenLogbooks } from "../helpers/golden-logbooks.ts";
import { signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

const asPushed = ({ id, bikeId, kind, v, at, hours, body }: LogEntry) => ({
  ...{ id, bikeId, kind, v, at, hours, body },
});

it.each(goldenLogbooks)("the server answers: $title", async ({ entries, expected, pLow }) => {
  const rider = await signUpRider(await startTestServer());
  const { results } = await rider.sync(entries.map(asPushed));
  expect(results.map(({ status }) => status)).toEqual(entries.map(() => "stored"));
  const summary = await rider.summary(entries[0]!.bikeId);
  expect(summary).toMatchObject(expected);
  if (pLow !== undefined) expect(Math.abs(summary.pLow! - pLow)).toBeLessThan(0.001);
});
