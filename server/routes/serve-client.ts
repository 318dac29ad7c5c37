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
  const assets = express.static(path.join(clientDir, "assets"), {
    index: false,
    immutable: true,
    maxAge: "1y",
  });
  const files = express.static(clientDir, {
    index: false,
    redirect: false,
    cacheControl: false,
    setHeaders: (response) => response.set("Cache-Control", "no-cache"),
  });

  const router = Router();
  router.use("/assets", assets);
  router.use(files);
  router.use((request, response, next) => {
    if (!asksForPage(request)) return next();
    request.url = "/index.html";
    files(request, response, next);
  });
  return router;
}
