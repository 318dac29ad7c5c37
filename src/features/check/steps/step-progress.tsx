/** The steps as a rider counts them; running, reading and "one more?" repeat for each run. */
const steps = ["Set up", "Run", "Read", "Again or done", "Close-out"] as const;

/** How far the check is, as marks on a rule. */
export function StepProgress({ at }: { at: (typeof steps)[number] }) {
  const current = steps.indexOf(at);
  return (
    <div
      role="img"
      aria-label={`Step ${current + 1} of ${steps.length}: ${at}`}
      className="flex h-3 items-end gap-1"
    >
      {steps.map((step, index) => (
        <span
          key={step}
          className={`flex-1 rounded-sm ${index <= current ? "bg-oil" : "bg-rule"} ${index === current ? "h-3" : "h-1.5"}`}
        />
      ))}
    </div>
  );
}
