import { isOver } from "./draft/check-draft.ts";
import type { CheckDraft } from "./draft/check-draft-schema.ts";
import { checkPath, checkResultPath, closeOutPath } from "../../ui/paths.ts";

/** The steps of a guided check, each at an address of its own, so that Back goes one step back. */
export const stepPaths = (bikeId: string) => {
  const step = (name: string) => `${checkPath(bikeId)}/${name}`;
  return {
    start: checkPath(bikeId),
    cautions: step("cautions"),
    setUp: step("set-up"),
    run: (n: number) => step(`run/${n}`),
    read: (n: number) => step(`read/${n}`),
    again: (n: number) => step(`again/${n}`),
    closeOut: closeOutPath(bikeId),
    quick: step("quick"),
    result: (entryId: string) => checkResultPath(bikeId, entryId),
  };
};

export type StepPaths = ReturnType<typeof stepPaths>;

/** Where a check that was left is gone on with. */
export function furthestStep(paths: StepPaths, { runs }: CheckDraft): string {
  const last = runs.at(-1);
  if (!last) return paths.setUp;
  return isOver(last) ? paths.again(runs.length) : paths.run(runs.length);
}
