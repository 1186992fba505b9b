import type { RequestHandler } from "express";
import { crossOrigin } from "../errors";

const changesNothing = new Set(["GET", "HEAD", "OPTIONS"]);

/**
 * Takes changes only from the product's own pages. Browsers say where a request comes from, in `Sec-Fetch-Site` or,
 * on plain http, in `Origin`; what is no browser sends neither and carries no one's cookies by accident.
 */
export function sameOrigin(publicOrigin: string | undefined): RequestHandler {
  return (req, _res, next) => {
    if (changesNothing.has(req.method)) return next();
    const site = req.get("Sec-Fetch-Site");
    if (site !== undefined) return next(site === "same-origin" ? undefined : crossOrigin());
    const origin = req.get("Origin");
    if (origin === undefined) return next();
    const own = publicOrigin ?? `${req.protocol}://${req.get("Host")}`;
    next(origin === own ? undefined : crossOrigin());
  };
}
