export interface ButtonLook {
  /** One primary action a screen; danger for what cannot be taken back. */
  look?: "primary" | "quiet" | "danger";
  /** As wide as its container. */
  wide?: boolean;
}

const looks = {
  primary: "border-ink bg-ink text-paper hover:bg-ink/90",
  quiet: "border-edge bg-card text-ink hover:border-ink",
  danger: "border-low bg-card text-low hover:bg-low hover:text-paper",
};

/** The classes of a button, which a link that looks like one shares. */
export function buttonClass({ look = "quiet", wide = false }: ButtonLook, more = ""): string {
  const size = "inline-flex min-h-target min-w-target items-center justify-center gap-2 px-4 py-2";
  const shape = "rounded-card border text-center text-lg leading-tight font-bold";
  const still = "disabled:cursor-default disabled:opacity-60";
  return `${size} ${shape} ${still} ${looks[look]} ${wide ? "w-full" : ""} ${more}`;
}
