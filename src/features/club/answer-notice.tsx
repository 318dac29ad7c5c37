import type { UseQueryResult } from "@tanstack/react-query";
import { formatWhen } from "../../ui/format-when.ts";
import { Notice } from "../../ui/notice.tsx";

/** Says so where the server could not be asked: then what is shown is as it last said. */
export function AnswerNotice({ answer }: { answer: UseQueryResult<unknown> }) {
  const { error, data, dataUpdatedAt } = answer;
  if (!error) return null;
  if (data === undefined) return <Notice tone="error" title={error.message} />;
  const when = formatWhen(new Date(dataUpdatedAt).toISOString());
  return (
    <p role="status" className="text-soft">
      {error.message} This is as the server last said, {when}.
    </p>
  );
}
