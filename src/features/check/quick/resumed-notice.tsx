import { Button } from "../../../ui/button.tsx";
import { formatWhen } from "../../../ui/format-when.ts";
import { Notice } from "../../../ui/notice.tsx";

interface Props {
  at: string;
  onStartAfresh: () => void;
}

/** The form kept what was typed before; an old one may not be meant any more. */
export function ResumedNotice({ at, onStartAfresh }: Props) {
  return (
    <Notice tone="info" title={`As you left it, for ${formatWhen(at)}`}>
      <Button onClick={onStartAfresh}>Start afresh</Button>
    </Notice>
  );
}
