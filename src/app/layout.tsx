import { lazy, Suspense } from "react";
import { Outlet, useLocation } from "react-router-dom";
import { ErrorBoundary } from "./error-boundary.tsx";
import { TopBar } from "./top-bar.tsx";

const UpdateBanner = lazy(() => import("./update-banner.tsx"));

/** What surrounds every screen. */
export function Layout() {
  const { pathname } = useLocation();
  return (
    <div className="flex min-h-dvh flex-col">
      <TopBar />
      <Suspense>
        <UpdateBanner />
      </Suspense>
      <ErrorBoundary place={pathname}>
        <Suspense fallback={<main className="flex-1" aria-busy />}>
          <Outlet />
        </Suspense>
      </ErrorBoundary>
    </div>
  );
}
