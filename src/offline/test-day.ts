/**
 * A club's test day on this phone: the bikes in the queue, and the syringe they are all measured
 * with. It stands among the drafts, under the club's id. Not part of the first load.
 */
import { useMemo } from "react";
import { z } from "zod";
import { syringeSchema } from "../../shared/schemas/entry.ts";
import { changeDraft, dropDraft, useDraft } from "./drafts.ts";
import type { Phone } from "./logbook/phone.ts";
import type { Draft } from "./types.ts";

const FORM = "test-day";

const queuedBikeSchema = z.object({
  bikeId: z.string(),
  name: z.string(),
  owner: z.string(),
  tag: z.string(),
  /** The check made here today; null while the bike waits. */
  entryId: z.string().nullable(),
});

const testDaySchema = z.object({
  syringe: syringeSchema.nullable(),
  bikes: z.array(queuedBikeSchema),
});

export type QueuedBike = z.infer<typeof queuedBikeSchema>;
export type TestDay = z.infer<typeof testDaySchema>;

const parse = (content: unknown): TestDay => {
  const parsed = testDaySchema.safeParse(content);
  return parsed.success ? parsed.data : { syringe: null, bikes: [] };
};

/** The test day as it stands; `ready` is false until the phone's store has answered. */
export function useTestDay(clubId: string) {
  const { data, isPending } = useDraft(clubId, FORM);
  const testDay = useMemo(() => parse(data?.content), [data]);
  return { testDay, ready: !isPending };
}

export const changeTestDay = (clubId: string, edit: (testDay: TestDay) => TestDay) =>
  changeDraft(clubId, FORM, (content) => edit(parse(content)));

/** Notes the check made of a queued bike; null puts the bike back among those that wait. */
export const noteCheck = (clubId: string, bikeId: string, entryId: string | null) =>
  changeTestDay(clubId, (testDay) => ({
    ...testDay,
    bikes: testDay.bikes.map((bike) => (bike.bikeId === bikeId ? { ...bike, entryId } : bike)),
  }));

export const endTestDay = (clubId: string) => dropDraft(clubId, FORM);

export const isTestDay = ({ form }: Draft): boolean => form === FORM;

/** The clubs that have a test day on this phone. */
export async function clubsOnTestDay(phone: Phone): Promise<string[]> {
  const drafts = await (await phone.open()).getAll("drafts");
  return drafts.filter(isTestDay).map(({ bikeId }) => bikeId);
}

/** Takes out, of those who wait and of those who are done, the bikes that are shared no more. */
export async function keepShared(
  phone: Phone,
  clubId: string,
  shared: ReadonlySet<string>,
): Promise<void> {
  const isShared = ({ bikeId }: QueuedBike) => shared.has(bikeId);
  const draft = await (await phone.open()).get("drafts", [clubId, FORM]);
  if (parse(draft?.content).bikes.every(isShared)) return;
  await changeTestDay(clubId, (now) => ({ ...now, bikes: now.bikes.filter(isShared) }));
}
