import type { RequestHandler } from "express";
import helmet from "helmet";

/** No script, style or font but our own files, no frame, no form that leads away. HSTS only where the site is on https. */
export function securityHeaders(https: boolean): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        scriptSrcAttr: ["'none'"],
        styleSrc: ["'self'"],
        styleSrcAttr: ["'none'"],
        imgSrc: ["'self'", "data:", "blob:"],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        baseUri: ["'none'"],
        objectSrc: ["'none'"],
        ...(https && { upgradeInsecureRequests: [] }),
      },
    },
    strictTransportSecurity: https ? { maxAge: 31_536_000 } : false,
    referrerPolicy: { policy: "same-origin" },
  });
}
