/** Which bikes of the board are shown, and in which order. */
import { DUE_SOON_HOURS } from "../../../../shared/schemas/club.ts";
import { readBikeTag } from "../../../../shared/logbook/bike-tag.ts";
import type { BoardRow } from "./board.ts";
import { remarksOf } from "./line-up-words.ts";

interface Show {
  label: string;
  has: (row: BoardRow) => boolean;
}

export const shows = {
  all: { label: "Every bike", has: () => true },
  act: {
    label: "Stop, or repeat first",
    has: ({ place }) => place === "stop" || place === "repeat",
  },
  due: { label: "Overdue, or due soon", has: ({ dueInHours }) => dueInHours <= DUE_SOON_HOURS },
  dropping: { label: "Delivery dropping", has: ({ verdict }) => verdict === "dropping" },
  settling: { label: "Nothing to compare with yet", has: ({ ratio }) => ratio === null },
  holding: { label: "Delivery holding", has: ({ verdict }) => verdict === "holding" },
  remarks: {
    label: "With a remark",
    has: (row) => row.hoseMaybeOff || remarksOf(row).length > 0,
  },
} satisfies Record<string, Show>;

export type ShowName = keyof typeof shows;
export const isShow = (name: string | null): name is ShowName => name !== null && name in shows;

/** Whether a bike is meant by what was typed: its name, its owner's, or its tag. */
export function isFoundBy(row: { name: string; tag: string; owner: string }, typed: string) {
  const words = typed.trim().toLowerCase();
  if (words === "") return true;
  const named = `${row.name}\n${row.owner}`.toLowerCase().includes(words);
  const tag = readBikeTag(typed);
  return named || (tag !== "" && row.tag.startsWith(tag));
}
