/** The service worker: serves the built app with no network. Data is none of its business. */
import { clientsClaim } from "workbox-core";
import {
  cleanupOutdatedCaches,
  createHandlerBoundToURL,
  precacheAndRoute,
  type PrecacheEntry,
} from "workbox-precaching";
import { NavigationRoute, registerRoute } from "workbox-routing";

declare const self: ServiceWorkerGlobalScope & { __WB_MANIFEST: (string | PrecacheEntry)[] };

precacheAndRoute(self.__WB_MANIFEST);
cleanupOutdatedCaches();

// Every page of the app is index.html; the API answers for itself.
const page = createHandlerBoundToURL("/index.html");
registerRoute(new NavigationRoute(page, { denylist: [/^\/(api|dev)(\/|$)/] }));

// From the first visit on, so that a screen opened for the first time in a shed is there too.
clientsClaim();

// A new version waits until the page says that no form is open.
self.addEventListener("message", (event) => {
  const message = event.data as { type?: unknown } | null;
  if (message?.type === "SKIP_WAITING") void self.skipWaiting();
});
