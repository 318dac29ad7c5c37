import type { RequestHandler } from "express";
import helmet from "helmet";

const own = "'self'";

/** What our pages may do: nothing from elsewhere, no inline script, in nobody's frame. */
const contentSecurityPolicy = (secure: boolean) => ({
  useDefaults: false,
  directives: {
    defaultSrc: [own],
    scriptSrc: [own],
    // The dialogs' library writes a style element to hold the page still behind them.
    styleSrc: [own, "'unsafe-inline'"],
    imgSrc: [own, "data:", "blob:"],
    mediaSrc: [own, "blob:"],
    workerSrc: [own],
    objectSrc: ["'none'"],
    baseUri: ["'none'"],
    formAction: [own],
    frameAncestors: ["'none'"],
    ...(secure && { upgradeInsecureRequests: [] }),
  },
});

const PERMISSIONS =
  "camera=(self), microphone=(self), screen-wake-lock=(self), geolocation=(), payment=(), usb=()";

/** Over plain http (a laptop in the shed, a test) browsers must not be told to use https. */
export function securityHeaders(publicOrigin: string): RequestHandler[] {
  const secure = publicOrigin.startsWith("https:");
  return [
    helmet({
      contentSecurityPolicy: contentSecurityPolicy(secure),
      strictTransportSecurity: secure,
      crossOriginOpenerPolicy: secure,
      originAgentCluster: secure,
      referrerPolicy: { policy: "no-referrer" },
      xFrameOptions: { action: "deny" },
    }),
    (_request, response, next) => {
      response.set("Permissions-Policy", PERMISSIONS);
      next();
    },
  ];
}
