import { useNavigate } from "react-router-dom";
import type { Syringe } from "../../../../shared/schemas/entry.ts";
import { useAccount, useSyringes, type BikeWithLog } from "../../../offline/index.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import { cautionsRead } from "../cautions-read.ts";
import { stepPaths } from "../check-paths.ts";
import { beginCheck } from "./check-draft.ts";
import type { CheckDraft } from "./check-draft-schema.ts";

/** The syringe of the bike's last check, while it is in use; or else the one used last. */
export function usualSyringe(log: BikeWithLog["log"], syringes: Syringe[]): Syringe | null {
  const lastUsed = log
    .map((line) =>
      line.understood && line.entry.kind === "check" ? line.entry.body.syringe : null,
    )
    .find((syringe) => syringe !== null);
  return syringes.find(({ id }) => id === lastUsed?.id) ?? syringes[0] ?? null;
}

/** Begins a check with all that is known, and goes to its first step. */
export function useBeginCheck(
  { record, log }: BikeWithLog,
  { set, hoseMaybeOff }: { set: (draft: CheckDraft) => void; hoseMaybeOff: boolean },
): () => void {
  const { data: syringes = [] } = useSyringes();
  const accountId = useAccount()?.id ?? "";
  const navigate = useNavigate();
  const paths = stepPaths(record.bikeId);
  return () => {
    const { now, displayOffset } = record.summary.hours;
    const { meter, meterFormat } = record.details;
    set(
      beginCheck({
        at: new Date().toISOString(),
        hoursText: now === null ? "" : formatHours(now - displayOffset, meterFormat),
        estimatedHours: meter === "estimated",
        syringe: usualSyringe(log, syringes),
        hoseMaybeOff,
      }),
    );
    void navigate(cautionsRead(accountId) ? paths.setUp : paths.cautions);
  };
}
