import { randomBytes } from "node:crypto";
import type { RequestHandler, Response } from "express";
import helmet from "helmet";

/**
 * Hashes of the style elements that Plotly 4.1.2 adds when it loads: an empty one, which it then fills through the
 * style sheet's own interface, and one for maps. After a change of version the browser's console names the new ones.
 */
const plotlyStyles = [
  "'sha256-47DEQpj8HBSa+/TImW+5JCeuQeRkm5NMpJWZG3hSuFU='",
  "'sha256-2GF9hCGTDj/GGFNlQA54jDdMGl2fvoeZmZjAvBSiAtM='",
];

/** The token of this answer by which the page's own style elements, such as the editor's, pass the policy. */
export const nonceOf = (res: Response): string => (res.locals as { nonce: string }).nonce;

/**
 * What a page may load: its own files and nothing else; scripts never inline. Style attributes are allowed, since
 * formulas and figures set them; style elements only with the token of the page.
 */
export function securityHeaders({ isHttps }: { isHttps: boolean }): RequestHandler[] {
  const giveNonce: RequestHandler = (_req, res, next) => {
    res.locals.nonce = randomBytes(16).toString("base64");
    next();
  };
  const setHeaders = helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        "default-src": ["'self'"],
        "script-src": ["'self'"],
        "style-src": ["'self'", ...plotlyStyles, (_req, res) => `'nonce-${nonceOf(res as Response)}'`],
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
  return [giveNonce, setHeaders];
}
