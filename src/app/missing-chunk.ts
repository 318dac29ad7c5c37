/**
 * A part of the app that cannot be had any more, because the app was renewed on the server: the
 * page loads anew, once for each build, and never over an open form. Otherwise the error takes its
 * course to the screen's error boundary.
 */
import { updatesHeld } from "../offline/index.ts";

const RELOADED = "sumpless-reloaded";
/** This file's address changes with every build. */
const BUILD = import.meta.url;

/** Loading anew with neither network nor service worker would leave the browser's own error page. */
const canReload = () => Boolean(navigator.serviceWorker?.controller) || navigator.onLine;

export function reloadOnMissingChunk(reload = () => window.location.reload()): void {
  window.addEventListener("vite:preloadError", (event) => {
    if (updatesHeld() || !canReload() || sessionStorage.getItem(RELOADED) === BUILD) return;
    event.preventDefault();
    sessionStorage.setItem(RELOADED, BUILD);
    reload();
  });
}
