import { useEffect, useRef, type ReactNode } from "react";
import { Link } from "react-router-dom";
import { BackIcon } from "./icons.tsx";

interface Props {
  title: string;
  back?: { to: string; label: string; state?: unknown };
  /** The main action: on a phone full width at the bottom, always in reach; otherwise at the end. */
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
      <div className={`${column} flex-1 gap-4 pb-8 sm:flex-none ${back ? "pt-2" : "pt-5"}`}>
        <div>
          {back && (
            <Link
              to={back.to}
              state={back.state}
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
        <div className="sticky bottom-0 border-t border-rule bg-paper pb-[env(safe-area-inset-bottom)] sm:static sm:border-0">
          <div className={`${column} gap-2 py-3`}>{action}</div>
        </div>
      )}
    </main>
  );
}
