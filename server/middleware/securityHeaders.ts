import type { RequestHandler } from "express";
import helmet from "helmet";

/**
 * What a page may load: its own files and nothing else. Scripts never inline. Style attributes are allowed, since
 * formulas and figures set them. Style elements are allowed, since the editor and the figures write theirs at run time.
 */
export function securityHeaders({ isHttps }: { isHttps: boolean }): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        "default-src": ["'self'"],
        "script-src": ["'self'"],
        "style-src": ["'self'"],
        "style-src-attr": ["'unsafe-inline'"],
        "img-src": ["'self'", "data:", "blob:"],
        "font-src": ["'self'"],
        "connect-src": ["'self'"],
        "worker-src": ["'self'"],
        "object-src": ["'none'"],
        "base-uri": ["'none'"],
        "form-action": ["'self'"],
        "frame-ancestors": ["'none'"],
        ...(isHttps ? { "upgrade-insecure-requests": [] } : {}),
      },
    },
    strictTransportSecurity: isHttps ? { maxAge: 31_536_000, includeSubDomains: false } : false,
    // Meaningless, and complained of in the console, where the page does not come over https.
    crossOriginOpenerPolicy: isHttps ? { policy: "same-origin" } : false,
    originAgentCluster: isHttps,
    referrerPolicy: { policy: "same-origin" },
    xFrameOptions: { action: "deny" },
  });
}
