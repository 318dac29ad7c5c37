interface Props {
  seconds: number;
  /** What the number is: "of 30 s", "s to wait". */
  under: string;
  /** How far it is, 0 to 1; null where the end is not known. */
  share: number | null;
}

/** Whole seconds, as large as the screen allows: read from across the shed. */
export function BigTimer({ seconds, under, share }: Props) {
  return (
    <div className="flex flex-col items-center">
      <p role="timer" className="flex flex-col items-center">
        <span className="text-[min(13rem,46vw)] leading-none font-bold tabular-nums">
          {Math.floor(seconds)}
        </span>
        <span className="text-2xl font-bold">{under}</span>
      </p>
      {share !== null && (
        <div
          aria-hidden
          className="mt-4 h-6 w-full overflow-hidden rounded-card border border-edge"
        >
          <div className="h-full bg-oil" style={{ width: `${100 * Math.min(1, share)}%` }} />
        </div>
      )}
    </div>
  );
}
