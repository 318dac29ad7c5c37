import { Notice } from "../../ui/notice.tsx";

interface Props {
  errors: Record<string, string>;
  problem: string | null;
}

/** Why a check was not saved, where no field on the screen can say it. */
export function ProblemList({ errors, problem }: Props) {
  const sentences = [...new Set(Object.values(errors))];
  if (problem) return <Notice tone="error" title={problem} />;
  if (sentences.length === 0) return null;
  return (
    <Notice tone="error" title="Not saved yet">
      {sentences.map((sentence) => (
        <p key={sentence}>{sentence}</p>
      ))}
    </Notice>
  );
}
