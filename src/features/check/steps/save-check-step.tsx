import { useNavigate } from "react-router-dom";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { Button } from "../../../ui/button.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { Page } from "../../../ui/page.tsx";
import { TextArea } from "../../../ui/text-area.tsx";
import { FieldErrors, useSubmit } from "../../../ui/use-submit.ts";
import { CloseOutTicks } from "../close-out-ticks.tsx";
import { isClosedOut, nextRun, voidRun } from "../draft/check-draft.ts";
import { checkEntry } from "../draft/check-entry.ts";
import { saveCheck } from "../draft/save-check.ts";
import type { OpenCheckContext } from "../open-check.ts";
import { ProblemList } from "../problem-list.tsx";
import { StepProgress } from "./step-progress.tsx";

/** The last step before the result: the bike is made safe, and the check saved. */
export function SaveCheck({ check }: { check: OpenCheckContext }) {
  const { record, draft, change, paths, forget, sequence } = check;
  const navigate = useNavigate();
  const closedOut = isClosedOut(draft.closeOut);
  const unread = nextRun(draft) <= draft.runs.length ? nextRun(draft) : null;
  const { submit, busy, errors, problem } = useSubmit(async () => {
    if (unread) throw new FieldErrors({ run: `Run ${unread} was begun and not read.` });
    const entry = checkEntry(draft, { bikeId: record.bikeId, sequence });
    if (!entry)
      throw new FieldErrors({ hours: "Type the engine hours: Back leads to the set-up." });
    const entryId = await saveCheck(record, entry, { sequence: draft.sequence });
    forget();
    await navigate(paths.result(entryId), { replace: true });
  });
  return (
    <Page
      title="Close-out"
      back={{ to: paths.again(draft.runs.length), label: "Again or done" }}
      action={
        <Button
          look={closedOut ? "primary" : "quiet"}
          wide
          disabled={busy}
          onClick={() => void submit()}
        >
          {closedOut ? "Save the check" : "Save it, and close out later"}
        </Button>
      }
    >
      <StepProgress at="Close-out" />
      {unread && (
        <Notice tone="caution" title={`Run ${unread} was begun and not read`}>
          <ButtonLink to={paths.read(unread)}>Read it</ButtonLink>
          <Button onClick={() => change((now) => voidRun(now, unread, "interrupted"))}>
            Make it void
          </Button>
        </Notice>
      )}
      <CloseOutTicks
        chosen={draft.closeOut}
        onChange={(closeOut) => change((now) => ({ ...now, closeOut }))}
      />
      {!closedOut && (
        <Notice tone="caution" title="Hose may be off: do not start">
          <p>The Shed says so on this bike until all five are ticked.</p>
        </Notice>
      )}
      <p className="text-soft">Ticking does not prove that oil moves: watch the smoke.</p>
      <TextArea
        label="Note"
        hint="May be left empty."
        value={draft.note}
        onChange={(event) => {
          const note = event.target.value;
          change((now) => ({ ...now, note }));
        }}
      />
      <ProblemList errors={errors} problem={problem} />
    </Page>
  );
}
