/** Delivery checks left half done, which the Shed must warn of: the oil hose may still be off. */
import { useDrafts } from "./drafts.ts";
import type { Draft } from "./types.ts";

/** The form under which a guided check keeps its draft. */
export const CHECK_FORM = "check";

export interface OpenCheck {
  bikeId: string;
  /** A run was begun and the check not closed out since: do not start this bike. */
  hoseMaybeOff: boolean;
  savedAt: string;
}

/** Whether a check's draft, of whatever version of the app, says that the hose may be off. */
export const isHoseMaybeOff = (content: unknown) =>
  (content as { hoseMaybeOff?: unknown } | null)?.hoseMaybeOff === true;

const asOpenCheck = ({ bikeId, content, savedAt }: Draft): OpenCheck => ({
  bikeId,
  hoseMaybeOff: isHoseMaybeOff(content),
  savedAt,
});

/** The guided checks begun on this phone and neither saved nor closed out. */
export function useOpenChecks(): OpenCheck[] {
  const { data: drafts = [] } = useDrafts();
  return drafts.filter(({ form }) => form === CHECK_FORM).map(asOpenCheck);
}
