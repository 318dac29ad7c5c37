/** Sends what waits and fetches what is new, call after call, until both sides agree. */
import {
  MAX_PUSHED_ENTRIES,
  type SyncRequest,
  type SyncResponse,
} from "../../../shared/schemas/sync.ts";
import { ApiError, NoNetworkError } from "../errors.ts";
import type { Phone } from "../logbook/phone.ts";
import { applyAnswer } from "./apply-answer.ts";
import { prepareRound, type Round } from "./prepare-round.ts";

/** Far more than any logbook needs: a server that never says "enough" is not heard for ever. */
const MAX_ROUNDS = 500;

export interface SyncSession {
  phone: Phone;
  send(request: SyncRequest): Promise<SyncResponse>;
  /** False once another account has signed in: an answer for this one then changes nothing. */
  isCurrent(): boolean;
  /** Called after each answer that was applied. */
  onApplied(): void;
}

/** An answer counts only if it names each entry of the round once, in its place. */
function answersRound({ entries }: Round, { results }: SyncResponse): boolean {
  const ids = new Map(results.map(({ index, id }) => [index, id]));
  return (
    results.length === entries.length && entries.every(({ id }, index) => ids.get(index) === id)
  );
}

const isTooLarge = (error: unknown) =>
  (error instanceof ApiError || error instanceof NoNetworkError) && error.status === 413;

/** The answer; null where the round was too large to be taken. */
async function exchange(session: SyncSession, round: Round): Promise<SyncResponse | null> {
  try {
    const answer = await session.send(round);
    if (!answersRound(round, answer)) throw new NoNetworkError();
    return answer;
  } catch (error) {
    if (round.entries.length > 0 && isTooLarge(error)) return null;
    throw error;
  }
}

/** Throws what went wrong on the way; all that was applied until then stays. */
export async function runSyncSession(session: SyncSession): Promise<void> {
  const answered = new Set<string>();
  let limit = MAX_PUSHED_ENTRIES;
  let asked = false;
  for (let rounds = 0; rounds < MAX_ROUNDS; rounds += 1) {
    const round = await prepareRound(session.phone, limit, answered);
    if (asked && round.entries.length === 0) return;
    const answer = await exchange(session, round);
    if (!session.isCurrent()) return;
    if (answer === null) {
      limit = Math.ceil(round.entries.length / 2);
      // One entry too large by itself must not keep the others back.
      if (round.entries.length === 1) answered.add(round.entries[0]!.id);
      continue;
    }
    const counts = await applyAnswer(session.phone, round, answer);
    session.onApplied();
    // What a restored server refused for want of a bike's registration may go once that is there.
    if (counts) for (const { id } of round.entries) answered.add(id);
    else answered.clear();
    asked = counts && !answer.more;
  }
}
