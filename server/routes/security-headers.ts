import type { RequestHandler } from "express";
import helmet from "helmet";

const own = "'self'";

/** What our pages may do: nothing from elsewhere, nothing inline, in nobody's frame. */
const contentSecurityPolicy = (secure: boolean) => ({
  useDefaults: false,
  directives: {
    defaultSrc: [own],
    scriptSrc: [own],
    styleSrc: [own],
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

/** Of what browsers ask people for: what the delivery check and the bike tags use, and nothing else. */
const PERMISSIONS = [
  "camera=(self)",
  "microphone=(self)",
  "screen-wake-lock=(self)",
  ...["bluetooth", "display-capture", "geolocation", "hid", "midi", "payment", "serial", "usb"].map(
    (feature) => `${feature}=()`,
  ),
].join(", ");

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
