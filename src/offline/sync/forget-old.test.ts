import { expect, it } from "vitest";
import { createReadCache } from "../query-cache.ts";
import { forgetOld } from "./forget-old.ts";

const DAY_MS = 86_400_000;

it("drops each answer two weeks after it was given, however lately another came", async () => {
  const { client, persistOptions } = createReadCache("ada");
  await persistOptions.persister.restoreClient();
  const answer = async (name: string, persist: boolean, daysAgo: number) => {
    const queryFn = () => name;
    await client.fetchQuery({ queryKey: [name], queryFn, meta: { persist } });
    client.setQueryData([name], name, { updatedAt: Date.now() - daysAgo * DAY_MS });
  };
  await answer("clubs", true, 15);
  await answer("line-up", true, 13);
  await answer("logbook", false, 15);
  await forgetOld("someone else");
  expect(client.getQueryData(["clubs"])).toBe("clubs");
  await forgetOld("ada");
  expect(client.getQueryData(["clubs"])).toBeUndefined();
  expect(client.getQueryData(["line-up"])).toBe("line-up");
  expect(client.getQueryData(["logbook"])).toBe("logbook");
});
