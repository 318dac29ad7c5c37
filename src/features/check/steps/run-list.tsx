import { Link } from "react-router-dom";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { startTextOf } from "../draft/check-draft.ts";
import { voidWords } from "../draft/check-entry.ts";
import type { RunDraft } from "../draft/check-draft-schema.ts";
import { useOpenCheck } from "../open-check.ts";
import { formatMl } from "../../../ui/format-quantity.ts";

interface RunLineProps {
  n: number;
  run: RunDraft;
  startText: string;
  to: string;
}

/** The runs as recorded, void ones ruled through; each leads back to where it can be put right. */
export function RunList() {
  const { draft, paths } = useOpenCheck();
  return (
    <ol className="flex flex-col">
      {draft.runs.map((run, index) => (
        <RunLine
          key={index}
          n={index + 1}
          run={run}
          startText={startTextOf(draft, index + 1, null)}
          to={run.voided ? paths.run(index + 1) : paths.read(index + 1)}
        />
      ))}
    </ol>
  );
}

function RunLine({ n, run, startText, to }: RunLineProps) {
  return (
    <li className="border-b border-rule">
      <Link to={to} className="flex min-h-target flex-wrap items-center gap-x-3 py-1 text-lg">
        <strong>{n}.</strong>
        <span className={`flex-1 ${run.voided ? "text-soft line-through" : ""}`}>
          {levels(startText, run)}
        </span>
        <strong className="text-right tabular-nums">{outcome(startText, run)}</strong>
      </Link>
    </li>
  );
}

const levels = (startText: string, { endText }: RunDraft) =>
  endText ? `${startText || "?"} to ${endText}` : `from ${startText || "?"}`;

function outcome(startText: string, { voided, endText }: RunDraft): string {
  if (voided) return `void: ${voidWords[voided]}`;
  const start = parseDecimal(startText);
  const end = parseDecimal(endText);
  return start === null || end === null ? "not read yet" : formatMl(end - start);
}
