import { PersistQueryClientProvider } from "@tanstack/react-query-persist-client";
import { useEffect, useMemo } from "react";
import { BrowserRouter } from "react-router-dom";
import { createReadCache, settleAccount, startSyncing, useAccount } from "../offline/index.ts";
import { ErrorBoundary } from "./error-boundary.tsx";
import { AppRoutes } from "./routes.tsx";

export function App() {
  const accountId = useAccount()?.id ?? null;
  const cache = useMemo(() => createReadCache(accountId), [accountId]);
  useEffect(() => void settleAccount(), []);
  useEffect(() => startSyncing(), []);
  return (
    <ErrorBoundary>
      <BrowserRouter>
        <PersistQueryClientProvider key={accountId} {...cache}>
          <AppRoutes />
        </PersistQueryClientProvider>
      </BrowserRouter>
    </ErrorBoundary>
  );
}
