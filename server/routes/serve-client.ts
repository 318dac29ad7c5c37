import express, { Router, type Request } from "express";
import path from "node:path";

/** A page of the app, as opposed to a file that is not there. */
const asksForPage = (request: Request) =>
  ["GET", "HEAD"].includes(request.method) &&
  path.extname(request.path) === "" &&
  !request.path.startsWith("/assets/") &&
  Boolean(request.accepts("html"));

/**
 * The built client. Files under `assets/` bear their content's hash in their name and never change;
 * everything else is asked about anew, so that a new version is found. Every page is `index.html`.
 */
export function serveClient(clientDir: string): Router {
  const router = Router();
  router.use(
    "/assets",
    express.static(path.join(clientDir, "assets"), { index: false, immutable: true, maxAge: "1y" }),
  );
  const revalidated = { cacheControl: false, headers: { "Cache-Control": "no-cache" } };
  router.use(
    express.static(clientDir, {
      index: false,
      redirect: false,
      cacheControl: false,
      setHeaders: (response) => response.set(revalidated.headers),
    }),
  );
  router.use((request, response, next) => {
    if (!asksForPage(request)) return next();
    // Without a built client there are no pages: the same 404 as for anything else.
    response.sendFile("index.html", { root: clientDir, ...revalidated }, (error) => {
      if (error) next();
    });
  });
  return router;
}
