import type { LogEntry, LogEntryOf } from "../schemas/entry.ts";

type Note = LogEntryOf<"note">;
export type AdviceNote = Note & { body: { advice: NonNullable<Note["body"]["advice"]> } };

const isAdvice = (entry: LogEntry): entry is AdviceNote =>
  entry.kind === "note" && entry.body.advice !== undefined;

/**
 * The advice that stands: the last note with advice, by the owner or a mechanic. A *stop* thus
 * stands until a later note says *ride* or *repeat*, whatever is measured meanwhile.
 * Input: the standing entries in effective order. Edge: null where nobody advised anything.
 *
 * @example standingAdvice([note "stop", check, note without advice]) // the first note
 */
export const standingAdvice = (standing: readonly LogEntry[]): AdviceNote | null =>
  standing.findLast(isAdvice) ?? null;
