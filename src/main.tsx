import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { App } from "./app/app.tsx";
import { reloadOnMissingChunk } from "./app/missing-chunk.ts";
import "./ui/theme.css";

reloadOnMissingChunk();
createRoot(document.getElementById("root")!).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
// After the first paint: what the worker fetches must not hold it up.
window.addEventListener("load", () => {
  void import("./app/service-worker.ts").then((worker) => worker.registerServiceWorker());
});
