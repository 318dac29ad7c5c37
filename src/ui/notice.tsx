import type { ReactNode } from "react";
import { ErrorIcon, InfoIcon, CautionIcon } from "./icons.tsx";

const tones = {
  info: { Icon: InfoIcon, look: "border-edge", ink: "text-soft" },
  caution: { Icon: CautionIcon, look: "border-dropping", ink: "text-dropping" },
  error: { Icon: ErrorIcon, look: "border-low", ink: "text-low" },
};

interface Props {
  tone: keyof typeof tones;
  title?: ReactNode;
  children?: ReactNode;
}

/** Something to know before going on. An error is also read out when it appears. */
export function Notice({ tone, title, children }: Props) {
  const { Icon, look, ink } = tones[tone];
  return (
    <div
      role={tone === "error" ? "alert" : undefined}
      className={`flex gap-3 rounded-card border-2 bg-card p-3 ${look}`}
    >
      <Icon className={`mt-0.5 shrink-0 ${ink}`} />
      <div className="flex min-w-0 flex-1 flex-col gap-2">
        {title && <p className={`text-lg leading-snug font-bold ${ink}`}>{title}</p>}
        {children}
      </div>
    </div>
  );
}
