import { useEffect, useRef, type ReactNode } from "react";
import { Link } from "react-router-dom";
import { BackIcon } from "./icons.tsx";

interface Props {
  title: string;
  back?: { to: string; label: string };
  /** The screen's main action: full width at the bottom on a phone, always in reach. */
  action?: ReactNode;
  /** Room for two columns from 900 px up; otherwise one column of reading width. */
  wide?: boolean;
  children: ReactNode;
}

/** One screen: its title, the way back, what it shows and its main action. */
export function Page({ title, back, action, wide = false, children }: Props) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => {
    window.scrollTo(0, 0);
    heading.current?.focus({ preventScroll: true });
  }, []);
  const column = `mx-auto flex w-full flex-col px-4 ${wide ? "max-w-6xl" : "max-w-xl"}`;
  return (
    <main className="flex flex-1 flex-col">
      <title>{`${title} · Sumpless`}</title>
      <div className={`${column} flex-1 gap-4 pt-2 pb-8`}>
        <div>
          {back && (
            <Link
              to={back.to}
              className="-ml-1 inline-flex min-h-target items-center gap-1 font-bold text-oil"
            >
              <BackIcon className="shrink-0" />
              {back.label}
            </Link>
          )}
          <h1 ref={heading} tabIndex={-1} className="text-3xl wrap-anywhere">
            {title}
          </h1>
        </div>
        {children}
      </div>
      {action && (
        <div className="sticky bottom-0 border-t border-rule bg-paper pb-[env(safe-area-inset-bottom)]">
          <div className={`${column} gap-2 py-3`}>{action}</div>
        </div>
      )}
    </main>
  );
}
